import type { SupplyRippleDemand } from '../demands/index.js';
import { rejectionAbove } from '../formulas/rejection.js';
import { weakest, type Basis } from '../parts/basis.js';
import type { Reading } from '../parts/reading.js';
import type { Readings } from '../parts/readings.js';
import type { Spread } from '../parts/spread.js';
import { formatDecibels, formatQuantity } from '../quantities/format.js';
import type { Finding, Missing, Term } from '../verdicts/finding.js';
import type { Check } from './check.js';

/** Ripple of the supply at the output: over the rejection at its frequency, times the noise gain there (M5). */
export const supplyRipple: Check<SupplyRippleDemand> = {
  id: 'supply-ripple',
  title: 'supply ripple',
  unit: 'V',
  reads: ['supplyRejection', 'supplyRejectionCorner', 'gainBandwidth'],
  hasMargin: true,
  asks: ({ 'supply-ripple': asked }) => (asked?.required == null ? null : asked),
  judge: (asked, readings) => judgeRipple(asked, asked.required ?? Infinity, readings),
};

/** What reaches the output; `required` V peak, Infinity where only the number is wanted. */
export function judgeRipple(asked: SupplyRippleDemand, required: number, readings: Readings): Finding {
  const { unit, sense } = asked;
  const rejection = readings.figureOrClass('supplyRejection');
  const bandwidth = readings.spread('gainBandwidth');
  const corner = rejection === null ? null : cornerOf(readings, rejection, bandwidth);
  if (rejection === null || corner === null) {
    const missing: Missing[] = [...(rejection === null ? [{ figure: 'supplyRejection', kind: 'min' } as const] : []), ...(corner === null && rejection !== null ? [{ figure: 'supplyRejectionCorner', kind: 'min' } as const] : [])];
    return { kind: 'undecided', required: Number.isFinite(required) ? required : null, unit, sense, cause: 'missing-figure', missing };
  }
  const term = termOf(asked, { rejection, corner, bandwidth });
  return { kind: 'numbers', required, unit, sense, offered: term.value, basis: term.basis, terms: [term], borrowed: term.basis === 'borrowed' ? term.value : 0 };
}

interface Corner {
  readonly hertz: number;
  readonly basis: Basis;
  readonly how: string;
}

/**
 * A list that does not state it leaves the gain bandwidth: the rejection is lost as the loop gain is, and reaches 0 dB about there
 * (common practice). At best it does not fall at all.
 */
function cornerOf(readings: Readings, rejection: Reading, bandwidth: Spread | null): Corner | null {
  const stated = readings.figure('supplyRejectionCorner');
  if (stated !== null) return { hertz: stated.value, basis: stated.basis, how: `corner ${hertz(stated.value)}` };
  if (bandwidth === null) return null;
  const estimate = (bandwidth.ends?.least ?? bandwidth.value) / rejection.value;
  return { hertz: readings.bounded(estimate, Infinity), basis: 'estimated', how: `corner not stated: ${hertz(estimate)} from the gain bandwidth` };
}

const hertz = (value: number): string => (Number.isFinite(value) ? formatQuantity(value, 'Hz', { digits: 2 }) : 'as high as can be');

interface Figures {
  readonly rejection: Reading;
  readonly corner: Corner;
  readonly bandwidth: Spread | null;
}

/** A faster part passes more of it: the noise gain is taken with the most bandwidth it may have, without any with an endless one. */
function termOf({ amplitude, frequency, noiseGainAt }: SupplyRippleDemand, { rejection, corner, bandwidth }: Figures): Term {
  // As good as can be: nothing of the ripple is left.
  const there = rejection.value === Infinity ? Infinity : rejectionAbove(rejection.value, { frequency, corner: corner.hertz });
  const gain = noiseGainAt({ gainBandwidth: bandwidth?.ends?.most ?? Infinity, inputCapacitance: 0 });
  const bases = [rejection.basis, corner.basis, ...(bandwidth === null ? [] : [bandwidth.basis])];
  const basis = rejection.basis === 'borrowed' ? 'borrowed' : weakest(bases);
  const at = `${there === Infinity ? 'no loss' : formatDecibels(there)} at ${formatQuantity(frequency, 'Hz')} (${corner.how})`;
  const how = [rejection.how, at, `× noise gain ${Number(gain.toPrecision(3))} there`].filter((step) => step !== null).join(', ');
  const figure = rejection.printed === null ? null : { value: rejection.printed, unit: 'V/V' };
  return { name: 'supply ripple', value: (amplitude * gain) / there, slot: rejection.slot, basis, figure, how };
}
