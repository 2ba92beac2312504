import { sallenKey, type SallenKey } from '../formulas/filters.js';
import { E24, E96 } from '../quantities/e-series.js';
import { naturalOf } from './filter-response.js';
import { bestChoice, firstAtLeast, ladder, neighbours, remembered, type Choice } from './preferred.js';

/** Natural frequency in Hz, Q, gain of the amplifier (at least 1), and what stands in series with R1 already, Ω. */
export interface SallenKeyWish {
  readonly frequency: number;
  readonly q: number;
  readonly gain: number;
  readonly source: number;
}

/** Resistors are sized about this, Ω. */
const AIM = 10e3;
const CAPACITORS = ladder(E24, 100e-12, 100e-6);
/** The usual resistors first; very low or very high frequencies take others. */
const RESISTORS = [ladder(E96, 2e3, 50e3), ladder(E96, 500, 1e6)];
/** Capacitor ratios up to this many times the smallest possible one: beyond it the resistors are far apart. */
const WIDEST = 4;

/**
 * E96 resistors and E24 capacitors with the least error of natural frequency and Q, the smaller resistor at the source: that order
 * keeps (R1+R2)·C2 + R1·C1, hence the gain bandwidth that is needed, small (Budak & Petrela, IEEE Trans. Circuit Theory 19(4), 1972
 * for the treatment, from memory; own algebra). Null when no such components give it.
 */
export const chooseSallenKey = remembered((wish: SallenKeyWish): SallenKey | null => {
  for (const values of RESISTORS) {
    const best = bestChoice(choices(wish, values), AIM);
    if (best !== null) return best;
  }
  return null;
});

function* choices(wish: SallenKeyWish, values: readonly number[]): Generator<Choice<SallenKey>> {
  for (const c2 of CAPACITORS) {
    // The quadratic for R1 has real roots from this ratio on.
    const least = c2 / (1 / (4 * wish.q ** 2) + wish.gain - 1);
    for (let at = firstAtLeast(CAPACITORS, least); at < CAPACITORS.length; at += 1) {
      const c1 = CAPACITORS[at] ?? Number.POSITIVE_INFINITY;
      if (c1 > WIDEST * least) break;
      yield* rounded(wish, values, { c1, c2 });
    }
  }
}

/**
 * R1·R2·C1·C2 = 1/ω0² and (R1+R2)·C2 + R1·C1·(1−K) = 1/(Q·ω0), solved for R1: the smaller root, or the only positive one, in the
 * form without cancellation.
 */
function* rounded(wish: SallenKeyWish, values: readonly number[], { c1, c2 }: Pick<SallenKey, 'c1' | 'c2'>): Generator<Choice<SallenKey>> {
  const omega = 2 * Math.PI * wish.frequency;
  const product = 1 / (omega ** 2 * c1 * c2);
  const sum = 1 / (wish.q * omega);
  const slope = c2 + c1 * (1 - wish.gain);
  const exact = (2 * product * c2) / (sum + Math.sqrt(Math.max(0, sum ** 2 - 4 * slope * product * c2)));
  if (exact <= wish.source) return;
  for (const r1 of neighbours(values, exact - wish.source)) {
    for (const r2 of neighbours(values, product / exact)) {
      const parts = { r1, r2, c1, c2, gain: wish.gain };
      const error = errorOf(parts, wish);
      if (Number.isFinite(error) && error < REACHED) yield { parts, error, resistors: [r1, r2] };
    }
  }
}

/** Where the ladder ends, the nearest value may be far off: that is no choice. */
const REACHED = 0.05;

function errorOf(parts: SallenKey, wish: SallenKeyWish): number {
  const { corner, q } = naturalOf(sallenKey({ ...parts, r1: parts.r1 + wish.source }, Infinity));
  return Math.max(Math.abs(corner / wish.frequency - 1), Math.abs(q / wish.q - 1));
}
