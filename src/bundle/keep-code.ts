import { mkdtempSync, readdirSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { compiled } from '../cli/compiled.js';

const TERMINAL = { isTTY: true, columns: 100 };

/** Runs what users run on every stage in `stages`, once, and keeps the code the engine compiled for it beside the program in `folder`. */
export async function keepCode(folder: string, stages: string): Promise<void> {
  const program = compiled(folder);
  if (program === null) throw new Error(`no program in ${folder}`);
  const { runCommandLine, keep } = program;
  const scratch = mkdtempSync(join(tmpdir(), 'railfit-build-'));
  const answer = async (...words: string[]): Promise<string> => {
    const told: string[] = [];
    const write = (stream: string, text: string): void => {
      if (stream === 'stdout') told.push(text);
    };
    await runCommandLine([...words, '--catalog', join(scratch, 'catalog.sqlite')], { env: {}, stdout: TERMINAL, stderr: TERMINAL, write });
    return told.join('');
  };
  try {
    for (const name of readdirSync(stages).sort()) {
      const stage = join(stages, name);
      const { fit, nearest } = JSON.parse(await answer('shortlist', stage, '--json')) as Record<'fit' | 'nearest', readonly { readonly part: string }[]>;
      await answer('shortlist', stage);
      for (const { part } of [...fit.slice(0, 1), ...nearest.slice(0, 1)]) await answer('explain', part, stage);
      await answer('report', stage, '-o', join(scratch, `${name}.html`));
    }
    keep();
  } finally {
    rmSync(scratch, { recursive: true, force: true });
  }
}
