import { deriveDemands, type Demands } from '../../src/demands/index.js';
import type { Figure } from '../../src/parts/figures.js';
import type { Part } from '../../src/parts/part.js';
import { judgePart, judging } from '../../src/screening/index.js';
import { buildStage, type Stage } from '../../src/stage/index.js';
import type { Verdict } from '../../src/verdicts/verdict.js';
import type { Bench } from './netlists.js';
import { specOf } from './stage-file.js';

/** The rest of a stage file beside topology and resistors. `reference` is a value as it stands in the file. */
export interface Asked {
  readonly supply: string;
  readonly signal: string;
  readonly reference?: string;
  /** Per cent, of the value of a mid-supply reference, of the resistors, of the source resistance. */
  readonly referenceTolerance?: number;
  readonly tolerance?: number;
  readonly sourceTolerance?: number;
  readonly more?: readonly string[];
}

/** The stage file of a bench, so that both routes start from the same resistors. */
export function stageFile(bench: Bench, asked: Asked): string {
  const { topology, source, referenceResistance: _own, ...resistors } = bench;
  const fitted = Object.entries(resistors).map(([name, ohms]) => `${name}: ${ohms} Ω`);
  if (fitted.length > 0) fitted.push(`tolerance: ${asked.tolerance ?? 0} %`);
  const sourceTolerance = asked.sourceTolerance === undefined ? '' : `, tolerance: ${asked.sourceTolerance} %`;
  return [
    `topology: ${topology}`,
    `supply: ${asked.supply}`,
    `signal: {${asked.signal}}`,
    ...(fitted.length === 0 ? [] : [`resistors: {${fitted.join(', ')}}`]),
    ...referenceLine(bench, asked),
    ...(source === undefined ? [] : [`source: {resistance: ${source} Ω${sourceTolerance}}`]),
    ...(asked.more ?? []),
    '',
  ].join('\n');
}

function referenceLine({ referenceResistance }: Bench, { reference, referenceTolerance }: Asked): string[] {
  if (reference === undefined) return [];
  const tolerance = referenceTolerance === undefined ? '' : `, tolerance: ${referenceTolerance} %`;
  const resistance = referenceResistance === undefined ? '' : `, resistance: ${referenceResistance} Ω`;
  return [`reference: {value: ${reference}${tolerance}${resistance}}`];
}

/** The product's stage; a contradiction fails the test. */
export function stageOf(bench: Bench, asked: Asked): Stage {
  const built = buildStage(specOf(stageFile(bench, asked)));
  if (built.ok) return built.stage;
  throw new Error(built.problems.map((problem) => problem.message).join('\n'));
}

export function demandsOf(bench: Bench, asked: Asked): Demands {
  return deriveDemands(stageOf(bench, asked));
}

/** A part of which only the figures are known. */
export function partWith(figures: readonly Figure[]): Part {
  return {
    id: 'bench', tier: 'approved', description: null, status: null, lifecycle: null, package: null, channels: null, qualification: null,
    class: null, family: null, price: null, phaseReversal: null, inputClamp: null, inputType: null, crossoverFree: null, figures,
  };
}

/** What the product says of a part on a stage in one check. */
export function verdictOn(demands: Demands, check: string, figures: readonly Figure[]): Verdict {
  const verdict = judgePart(judging(demands, [], false), partWith(figures)).verdicts.find((one) => one.check === check);
  if (verdict === undefined) throw new Error(`${check} is not asked of this stage`);
  return verdict;
}
