import { commandOf } from '../index.js';
import { commandContext } from './command-context.js';
import type { ReportOptions } from './report.js';
import { STDIN, STDIN_NAME } from './standard-input.js';

interface Asked {
  readonly files: readonly string[];
  readonly options: ReportOptions;
  readonly time: string;
}

/** The command that makes the same report again, every option in it that matters; typed again it gives the same bytes. */
export function reportCommand({ files, options, time }: Asked): string {
  const { output, format, part, symbols, order, top, all } = options;
  const more = [
    ...named('--order', order === 'merit' ? undefined : order),
    ...named('--top', top === undefined ? undefined : String(top)),
    ...(all === true ? ['--all'] : []),
    ...named('--part', part),
    ...named('--symbols', symbols),
    ...named('--format', format),
    ...named('--time', time),
    ...named('-o', output),
  ];
  const operands = files.map((file) => (file === STDIN_NAME ? STDIN : file));
  return commandOf(commandContext(null, options), ['report', ...operands], more).join(' ');
}

const named = (option: string, value: string | undefined): string[] => (value === undefined ? [] : [option, value]);
