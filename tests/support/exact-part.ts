import { deriveDemands } from '../../src/demands/index.js';
import { PARAMETERS, type Figure, type Parameter } from '../../src/parts/figures.js';
import type { Stage } from '../../src/stage/index.js';
import type { Verdict } from '../../src/verdicts/verdict.js';
import { verdictOn } from './bench.js';

/** Every figure as a limit and, where it has one, as the same typical: both readings then have one amplifier, the one on the bench. */
export function exactFigures(values: Readonly<Partial<Record<Parameter, number>>>): Figure[] {
  return Object.entries(values).flatMap(([name, value]) => {
    const parameter = name as Parameter;
    return PARAMETERS[parameter].kinds.map((kind): Figure => ({ parameter, kind, value, condition: {} }));
  });
}

/** The one number the product gives of a part of these figures in one check. */
export function judgedNumber(stage: Stage, check: string, values: Readonly<Partial<Record<Parameter, number>>>): { readonly verdict: Verdict; readonly offered: number } {
  const verdict = verdictOn(deriveDemands(stage), check, exactFigures(values));
  if (typeof verdict.offered !== 'number') throw new Error(`${check} gives no number: ${verdict.reason ?? ''} ${verdict.missing.map(({ figure }) => figure).join(', ')}`);
  return { verdict, offered: verdict.offered };
}
