import type { HeadroomDemand, NoiseDemand } from '../demands/index.js';
import { peakToPeakNoise, signalToNoise } from '../formulas/signal-to-noise.js';
import type { Side } from '../parts/headroom.js';
import type { Readings } from '../parts/readings.js';
import { formatQuantity } from '../quantities/format.js';

/** The noise question, with what the output is left at its rails. */
export interface NoiseQuestion {
  readonly noise: NoiseDemand;
  readonly low: HeadroomDemand;
  readonly high: HeadroomDemand;
}

/** Output swing that is really there, V peak to peak, and what was wanted. */
export interface Swing {
  readonly available: number;
  readonly wanted: number;
  /** False when a head-room is not known: then the wanted swing stands. */
  readonly isKnown: boolean;
}

/** What is wanted, less what the part's head-rooms take of it at the lowest supply. */
export function swingOf({ noise, low, high }: NoiseQuestion, readings: Readings): Swing {
  const { min, max } = noise.output;
  const [bottom, top] = [needed(low, 'low', readings), needed(high, 'high', readings)];
  const least = Math.max(min, bottom.volts ?? min);
  const most = Math.min(max, top.volts === null ? max : top.supply - top.volts);
  return { available: Math.max(0, most - least), wanted: Math.max(0, max - min), isKnown: bottom.volts !== null && top.volts !== null };
}

/** Head-room at the vertex of the lowest supply that leaves the least room. */
function needed({ vertices }: HeadroomDemand, side: Side, readings: Readings): { supply: number; volts: number | null } {
  const supply = Math.min(...vertices.map((vertex) => vertex.supply));
  const lowest = vertices.filter((vertex) => vertex.supply === supply);
  const vertex = lowest.reduce((one, other) => (other.room < one.room ? other : one));
  return { supply, volts: readings.headroom(side)(vertex).value };
}

const HALF_TO_RMS = 2 * Math.SQRT2;

/** rms of the largest sine that fits, V. */
export const signalOf = (swing: Swing): number => swing.available / HALF_TO_RMS;

/** The same noise as engineers also say it: peak to peak, signal to noise, bits (IEEE Std 1241-2010 for ENOB). */
export function noiseNotes(rms: number, swing: Swing): string[] {
  if (rms === 0) return [];
  const peaks = `${formatQuantity(peakToPeakNoise(rms), 'V')} peak to peak (6.6 × rms)`;
  if (swing.available === 0) return [peaks];
  const decibels = signalToNoise(swing.available, rms);
  const lost = swing.available < swing.wanted ? `; ${formatQuantity(swing.wanted, 'V')} wanted, the head-room takes the rest` : '';
  const unknown = swing.isKnown ? '' : '; head-room not known';
  const bits = Math.max(0, Math.log2(swing.available / peakToPeakNoise(rms)));
  return [
    peaks,
    `SNR ${formatQuantity(decibels, 'dB')} with a sine of ${formatQuantity(swing.available, 'V')} peak to peak${lost}${unknown}`,
    `${formatQuantity(bits, '1')} noise-free bits; ENOB ${formatQuantity((decibels - 1.7609) / 6.0206, '1')} by noise alone`,
  ];
}
