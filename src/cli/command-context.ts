import type { CommandContext } from '../index.js';
import type { JudgingOptions } from './judging-input.js';

/** What the commands an answer offers must repeat, or they would ask about another stage or another catalog. */
export function commandContext(stageFile: string | null, options: JudgingOptions): CommandContext {
  const named = NAMED.flatMap((name) => {
    const text = options[name];
    return text === undefined ? [] : [`--${name}`, text];
  });
  const repeated = [...(options.set ?? []).flatMap((pair) => ['--set', pair]), ...(options.assume ?? []).flatMap((wish) => ['--assume', wish])];
  return {
    command: 'railfit',
    stageFile,
    changes: [...named, ...repeated, ...(options.strict === true ? ['--strict'] : [])],
    catalog: options.catalog === undefined ? [] : ['--catalog', options.catalog],
  };
}

const NAMED = ['topology', 'supply', 'gain', 'reference', 'input', 'frequency', 'load', 'temperature'] as const;
