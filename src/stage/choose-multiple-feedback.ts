import { multipleFeedback, type MultipleFeedback } from '../formulas/filters.js';
import { E24, E96 } from '../quantities/e-series.js';
import { naturalOf } from './filter-response.js';
import { bestChoice, firstAtLeast, ladder, neighbours, remembered, type Choice } from './preferred.js';

/** Natural frequency in Hz, Q, magnitude of the DC gain, and what stands in series with R1 already, Ω. */
export interface MultipleFeedbackWish {
  readonly frequency: number;
  readonly q: number;
  readonly gain: number;
  readonly source: number;
}

/** Resistors are sized about this, Ω. */
const AIM = 10e3;
const CAPACITORS = ladder(E24, 100e-12, 100e-6);
/** The usual resistors first; very low or very high frequencies and large gains take others. */
const RESISTORS = [ladder(E96, 2e3, 50e3), ladder(E96, 500, 1e6)];
/** Where the ladder ends, the nearest value may be far off: that is no choice. */
const REACHED = 0.05;

/**
 * E96 resistors and E24 capacitors with the least error of natural frequency, Q and gain, C1/C2 the smallest E24 ratio from
 * 4Q²(1+|H0|) on for each C2, which needs the least gain bandwidth (Mancini (ed.), Op Amps for Everyone, 2002, ch. 16, from
 * memory; own algebra). Null when no such components give it.
 */
export const chooseMultipleFeedback = remembered((wish: MultipleFeedbackWish): MultipleFeedback | null => {
  for (const values of RESISTORS) {
    const best = bestChoice(choices(wish, values), AIM);
    if (best !== null) return best;
  }
  return null;
});

function* choices(wish: MultipleFeedbackWish, values: readonly number[]): Generator<Choice<MultipleFeedback>> {
  for (const c2 of CAPACITORS) {
    const c1 = CAPACITORS[firstAtLeast(CAPACITORS, 4 * wish.q ** 2 * (1 + wish.gain) * c2)];
    if (c1 !== undefined) yield* rounded(wish, values, { c1, c2 });
  }
}

/** R2·R3·C1·C2 = 1/ω0² and C2·[R3(1+|H0|) + R2] = 1/(Q·ω0), solved for R2: the smaller root, which needs less gain bandwidth. */
function* rounded(wish: MultipleFeedbackWish, values: readonly number[], { c1, c2 }: Pick<MultipleFeedback, 'c1' | 'c2'>): Generator<Choice<MultipleFeedback>> {
  const omega = 2 * Math.PI * wish.frequency;
  const product = 1 / (omega ** 2 * c1 * c2);
  const sum = 1 / (wish.q * omega * c2);
  const exact = (sum - Math.sqrt(Math.max(0, sum ** 2 - 4 * product * (1 + wish.gain)))) / 2;
  for (const r2 of neighbours(values, exact)) {
    const input = r2 / wish.gain - wish.source;
    if (input <= 0) continue;
    for (const r3 of neighbours(values, product / r2)) {
      for (const r1 of neighbours(values, input)) {
        const parts = { r1, r2, r3, c1, c2 };
        const error = errorOf(parts, wish);
        if (error < REACHED) yield { parts, error, resistors: [r1, r2, r3] };
      }
    }
  }
}

function errorOf(parts: MultipleFeedback, wish: MultipleFeedbackWish): number {
  const response = multipleFeedback({ ...parts, r1: parts.r1 + wish.source }, Infinity);
  const { corner, q } = naturalOf(response);
  return Math.max(Math.abs(corner / wish.frequency - 1), Math.abs(q / wish.q - 1), Math.abs(-response.gain / wish.gain - 1));
}
