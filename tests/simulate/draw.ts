import { CHECKS } from '../../src/checks/index.js';
import type { Figure } from '../../src/parts/figures.js';
import { readingsOf } from '../../src/parts/readings.js';
import { judgePart, judging } from '../../src/screening/index.js';
import { decide } from '../../src/verdicts/decide.js';
import type { Outcome, Verdict } from '../../src/verdicts/verdict.js';
import { partWith } from '../support/bench.js';
import { drawPart, SIMULATED_CHECKS, type SimulatedCheck } from './draw-part.js';
import { drawStage } from './draw-stage.js';
import type { DrawnPart } from './part-drawn.js';
import { dice, type Dice } from './random.js';
import type { Reading } from './reading.js';
import type { DrawnStage } from './stage-drawn.js';

/** One verdict to be confirmed: a stage, and a part near the edge of one reading of one check. */
export interface Draw {
  readonly number: number;
  readonly check: SimulatedCheck;
  readonly stage: DrawnStage;
  readonly part: DrawnPart;
  readonly scale: number;
  readonly aim: Aim;
  readonly verdict: Verdict;
}

/** Which reading of the figures stands near the edge, on which side of it, and how far (fraction, or volts). */
interface Aim {
  readonly reading: Reading;
  readonly side: 'inside' | 'outside';
  readonly gap: number;
}

/** Checks take turns, so that each has its share of any number. */
export function draw(seed: number, number: number): Draw {
  const check = SIMULATED_CHECKS[number % SIMULATED_CHECKS.length]!;
  const rolled = dice(seed, number);
  for (let attempt = 0; attempt < 200; attempt += 1) {
    const found = attemptDraw(rolled, check);
    if (found !== null) return { number, check, ...found };
  }
  throw new Error(`no edge of ${check} in 200 draws: seed ${seed}, number ${number}`);
}

function attemptDraw(rolled: Dice, check: SimulatedCheck): Omit<Draw, 'number' | 'check'> | null {
  const stage = drawStage(rolled);
  // The rule also charges an AC-coupled stage with the moves of its signal, at the noise gain of DC: no circuit shows that sum.
  if (check === 'dc-error' && stage.isAc) return null;
  const part = drawPart(rolled, stage, check);
  const reading = rolled.pick(['pessimistic', 'optimistic'] as const);
  const side = rolled.pick(['inside', 'outside'] as const);
  const judged = (scale: number): Verdict => verdictOn(stage, check, { part, figures: part.figures(scale) });
  const edge = edgeOf(part, reading, (scale) => outcomeAlone(stage, check, { part, figures: part.figures(scale) }));
  if (edge === null) return null;
  const gap = part.isLinear ? rolled.ratio(0.2e-3, 50e-3) : rolled.ratio(0.002, 0.05);
  const step = side === 'inside' ? -gap : gap;
  const scale = part.isLinear ? edge + step : edge * (1 + step);
  return { stage, part, scale, aim: { reading, side, gap }, verdict: judged(scale) };
}

export function verdictOn(stage: DrawnStage, check: string, of: { part: DrawnPart; figures: readonly Figure[] }): Verdict {
  const part = { ...partWith(of.figures), inputType: of.part.inputType };
  const verdict = judgePart(judging(stage.demands, [], false), part).verdicts.find((one) => one.check === check);
  if (verdict === undefined) throw new Error(`${check} is not asked of this stage`);
  return verdict;
}

/** The outcome of one check without the others: the search for the edge asks often. */
function outcomeAlone({ demands }: DrawnStage, id: string, of: { part: DrawnPart; figures: readonly Figure[] }): Outcome {
  const check = CHECKS.find((one) => one.id === id)!;
  const part = { ...partWith(of.figures), inputType: of.part.inputType };
  const under = (outlook: Reading) => check.judge(demands, readingsOf({ part, operating: demands.operating, strict: false, classWorst: null, outlook }))!;
  return decide(check, under('pessimistic'), under('optimistic')).outcome;
}

/** Where the product's verdict turns: the worst part that passes, or the least bad one that fails. Null: it does not turn. */
function edgeOf(part: DrawnPart, reading: Reading, outcome: (scale: number) => Outcome): number | null {
  const isGood = (scale: number): boolean => (reading === 'pessimistic' ? outcome(scale) === 'pass' : outcome(scale) !== 'fail');
  let [good, bad] = part.ends;
  if (!isGood(good) || isGood(bad)) return null;
  for (let step = 0; step < 60 && Math.abs(bad - good) > 1e-6 * Math.abs(good); step += 1) {
    const middle = part.isLinear ? (good + bad) / 2 : Math.sqrt(good * bad);
    if (isGood(middle)) good = middle;
    else bad = middle;
  }
  return good;
}
