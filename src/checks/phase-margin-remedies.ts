import { withFeedbackCapacitor, type PhaseMarginDemand } from '../demands/index.js';
import { isolationGainError, isolationResistance, poleFrequency } from '../formulas/stability.js';
import { E24 } from '../quantities/e-series.js';
import { formatPercent, formatQuantity } from '../quantities/format.js';
import { meets } from '../verdicts/compare.js';
import type { Remedy } from '../verdicts/finding.js';
import { atEitherEnd, worstMargin, type Ends, type Loop } from './phase-margin-loop.js';

/** A loop that falls short, over all gain bandwidths of its part. */
export interface ShortLoop {
  readonly asked: PhaseMarginDemand;
  readonly loop: Loop;
  readonly ends: Ends;
}

/** What would bring the margin up to the limit, each recomputed in the same loop: nothing is offered that falls short itself. */
export function phaseMarginRemedies(short: ShortLoop, isUnityStable: boolean): Remedy[] {
  return [isolation(short), isUnityStable ? feedbackCapacitor(short) : null].filter((one) => one !== null);
}

/** An isolation resistor beyond twice the output resistance (79° by itself, for any load) only costs. */
const MOST_TIMES = 2;

/** The resistor that holds the margin for any capacitance whatever, from E24 upwards, more where other poles take their share. */
function isolation({ asked, loop, ends }: ShortLoop): Remedy | null {
  const { load } = loop;
  if (load === null || asked.required >= 90 || asked.required <= 0) return null;
  // The more it isolates, the nearer the margin comes to that without any load, and no further.
  if (!suffices(asked, { ...loop, load: null }, ends)) return null;
  const start = Math.max(isolationResistance(load.outputResistance, asked.required), load.isolation * 1.001);
  const isolated = (ohms: number): Loop => ({ ...loop, load: { ...load, isolation: ohms } });
  const ohms = leastThat((value) => suffices(asked, isolated(value), ends), e24Between(start, MOST_TIMES * load.outputResistance));
  return ohms === null ? null : { path: 'load.isolation', text: formatQuantity(ohms, 'Ω'), offered: worstMargin(isolated(ohms), ends).margin, cost: isolationCost(ohms, load) };
}

/** At both ends first, which is quick; then over all gain bandwidths. */
function suffices({ required }: PhaseMarginDemand, loop: Loop, ends: Ends): boolean {
  return meets(required, atEitherEnd(loop, ends), 'at-least') && meets(required, worstMargin(loop, ends).margin, 'at-least');
}

function isolationCost(ohms: number, { resistance, capacitance }: { readonly resistance: number | null; readonly capacitance: number }): string {
  const gain = resistance === null ? [] : [`gain error ${formatPercent(isolationGainError(ohms, resistance))} into the load`];
  return [...gain, `a pole at ${formatQuantity(poleFrequency(ohms, capacitance), 'Hz')} at the load`, 'head-room of the load current through it'].join(', ');
}

/** Less than a picofarad nobody fits beside a resistor that has a tenth of one itself, F. */
const SMALLEST = 1e-12;
const LARGEST = 10e-9;
/** Two values a decade find the range, halving among E24 the value in it. */
const COARSE = 3.3;
/** No two values of E24 lie further apart than this. */
const NEXT = 1.16;

/** The smallest capacitor of E24 across the feedback resistor that suffices; none beyond what the gain error allows. */
function feedbackCapacitor({ asked, loop, ends }: ShortLoop): Remedy | null {
  const { feedback } = asked;
  if (feedback === null) return null;
  const fitted = (farad: number): Loop => ({ ...loop, network: withFeedbackCapacitor(loop.network, farad) });
  const helps = (farad: number): boolean => suffices(asked, fitted(farad), ends);
  const most = Math.min(LARGEST, feedback.largest);
  let [before, farad] = [SMALLEST, SMALLEST];
  while (farad <= most && !helps(farad)) [before, farad] = [farad, farad * COARSE];
  const chosen = leastThat(helps, e24Between(before, Math.min(most, farad * NEXT)));
  if (chosen === null) return null;
  const pole = formatQuantity(poleFrequency(feedback.resistance, chosen), 'Hz');
  return { path: 'capacitors.feedback', text: formatQuantity(chosen, 'F'), offered: worstMargin(fitted(chosen), ends).margin, cost: `the gain falls from ${pole} on` };
}

/** The first of rising values for which a condition holds that holds for all above it; null when it holds for none. */
function leastThat(holds: (value: number) => boolean, values: readonly number[]): number | null {
  let [low, high] = [0, values.length];
  while (low < high) {
    const middle = Math.floor((low + high) / 2);
    if (holds(values[middle] ?? 0)) high = middle;
    else low = middle + 1;
  }
  return values[low] ?? null;
}

function e24Between(from: number, to: number): number[] {
  const values: number[] = [];
  for (let value = atLeastE24(from); value <= to; value = atLeastE24(value * 1.001)) values.push(value);
  return values;
}

/** The smallest E24 value that is no less, in the unit of the argument. */
function atLeastE24(value: number): number {
  const decade = Math.floor(Math.log10(value));
  const candidates = [decade, decade + 1].flatMap((power) => E24.map((mantissa) => Number(`${mantissa}e${power}`)));
  return candidates.find((candidate) => candidate >= value * (1 - 1e-12)) ?? value;
}
