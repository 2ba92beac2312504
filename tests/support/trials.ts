import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { changingOf, rerunOf } from '../../src/cli/rerun.js';
import { overridesOf } from '../../src/cli/stage-input.js';
import { deriveDemands } from '../../src/demands/index.js';
import { readList } from '../../src/intake/read-list.js';
import type { Part } from '../../src/parts/part.js';
import { judgePart, judging, type JudgedPart } from '../../src/screening/index.js';
import type { Changing } from '../../src/explanation/index.js';
import { readStage } from '../../src/spec/read.js';
import { buildStage, type Stage } from '../../src/stage/index.js';
import { ROOT } from './built.js';

const read = readList(readFileSync(join(ROOT, 'catalog', 'generic.csv')), { file: 'generic.csv', tier: 'generic' });
if (!read.ok) throw new Error('the shipped sets are refused');

/** The generic sets that ship. */
export const SHIPPED: readonly Part[] = read.parts;

/** A demo stage under `--set` options, as a command has it. Null where it would be refused. */
export interface Demo {
  readonly stage: Stage;
  readonly changing: Changing;
  /** The stage with further `--set` options, through the reader of the command line. */
  again(set: readonly string[]): Stage | null;
}

export function demo(name: string, set: readonly string[] = []): Demo | null {
  const text = readFileSync(join(ROOT, 'catalog', 'stages', `${name}.yaml`), 'utf8');
  return demoOf(text, set);
}

export function demoOf(text: string | null, set: readonly string[] = []): Demo | null {
  const { overrides } = overridesOf({ set });
  const spec = readStage(text, { overrides });
  if (!spec.ok) return null;
  const built = buildStage(spec.spec);
  if (!built.ok) return null;
  return { stage: built.stage, changing: changingOf(spec.spec, { text, overrides }), again: (more) => rerunOf({ text, overrides: [] })(overridesOf({ set: [...set, ...more] }).overrides) };
}

/** Judged as every command does it: all checks, both readings. */
export const judgedOn = (stage: Stage, part: Part): JudgedPart => judgePart(judging(deriveDemands(stage), SHIPPED, false), part);
