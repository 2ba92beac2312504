import { E24, E96, nearestE24, nearestIn, seriesAround } from '../quantities/e-series.js';
import { formatPercent } from '../quantities/format.js';

/** Ω: the resistors that set a gain, their tolerance as a fraction, and what stands in series with the input resistor. */
export interface GainResistors {
  readonly feedback: number;
  readonly input: number;
  readonly tolerance: number;
  readonly series: number;
}

/** Ω, and by which share the magnitude of the gain ratio then differs, signed. */
export interface ResistorPair {
  readonly feedback: number;
  readonly input: number;
  readonly gainShift: number;
}

/** Resistors of this tolerance and finer are sold in E96 as well as in E24, coarser ones in E24 (IEC 60063; common practice). */
const FINE = 0.02;
/** How far the feedback resistor may be from what is aimed at, as a ratio, so that a better pair is found. */
const WINDOW = 1.15;
/** A gain that moves by more than this is another gain. */
const MOST_SHIFT = 0.01;
/** Less is rounding of binary fractions. */
const NONE = 1e-9;

const seriesFor = (tolerance: number): readonly number[] => (tolerance <= FINE ? [...new Set([...E24, ...E96])] : E24);

/**
 * Preferred values about `ratio` times the present feedback resistor that keep the gain, what stands in series with the input resistor
 * counted: the pair with the least shift of the gain, then the one nearest to what is aimed at. With `exactly` the input resistor
 * follows from the gain and only the other is chosen. Null where no pair keeps the gain within 1 %.
 */
export function pairAt(of: GainResistors, ratio: number, { exactly }: { readonly exactly: boolean }): ResistorPair | null {
  const aim = of.feedback * ratio;
  const gain = of.feedback / (of.input + of.series);
  if (exactly) {
    const feedback = nearestE24(aim);
    return { feedback, input: feedback / gain - of.series, gainShift: 0 };
  }
  const series = seriesFor(of.tolerance);
  const close = seriesAround(series, aim).filter((value) => value <= aim * WINDOW && value >= aim / WINDOW);
  const pairs = close.flatMap((feedback) => {
    const wanted = feedback / gain - of.series;
    if (wanted <= 0) return [];
    const input = nearestIn(series, wanted);
    return [{ feedback, input, gainShift: feedback / (input + of.series) / gain - 1 }];
  });
  const far = ({ feedback }: ResistorPair): number => Math.abs(Math.log(feedback / aim));
  const size = ({ gainShift }: ResistorPair): number => (Math.abs(gainShift) < NONE ? 0 : Math.abs(gainShift));
  const [best] = pairs.sort((one, other) => size(one) - size(other) || far(one) - far(other));
  return best === undefined || size(best) > MOST_SHIFT ? null : best;
}

/** `same gain`, or by how much it moves. */
export function gainWords({ gainShift }: ResistorPair): string {
  if (Math.abs(gainShift) < NONE) return 'same gain';
  return `gain ${formatPercent(Math.abs(gainShift), { digits: 2, round: 'up' })} ${gainShift > 0 ? 'higher' : 'lower'}`;
}
