import type { DistortionDemand } from '../demands/index.js';
import { thirdHarmonicBipolar, thirdHarmonicMos } from '../formulas/input-pair-distortion.js';
import { slewedDistortion } from '../formulas/slewed-sine.js';
import { weakest, type Basis } from '../parts/basis.js';
import type { Readings } from '../parts/readings.js';
import { formatQuantity } from '../quantities/format.js';
import type { Term } from '../verdicts/finding.js';
import { NONE, type DistortionPart } from './distortion-part.js';

/**
 * What the input pair adds on its way to the slew limit, and slewing itself beyond it. With the kind of pair not known the bipolar one
 * is the worse, the MOS one the better.
 */
export function slewingPart({ slewing }: DistortionDemand, readings: Readings): DistortionPart {
  if (slewing === null || slewing.slewRate === 0) return NONE;
  const rate = readings.figure('slewRate');
  const bandwidth = readings.figure('gainBandwidth');
  if (rate === null || bandwidth === null) {
    const missing = [...(rate === null ? [{ figure: 'slewRate', kind: 'min' } as const] : []), ...(bandwidth === null ? [{ figure: 'gainBandwidth', kind: 'min' } as const] : [])];
    return { ...NONE, missing };
  }
  const ratio = slewing.slewRate / rate.value;
  const input = slewing.countsInput ? readings.figure('inputCapacitance') : null;
  const loop = { gainBandwidth: bandwidth.value, inputCapacitance: input?.value ?? 0 };
  const hasHarmonic = Number.isFinite(bandwidth.value) && ratio > 0;
  const drive = { frequency: slewing.frequency, gainBandwidth: bandwidth.value, ratio: Math.min(1, ratio) };
  const own = hasHarmonic ? pairHarmonic({ ...drive, noiseGain: slewing.noiseGainAt(loop) }, readings) : 0;
  // Never less than just at the limit.
  const value = ratio > 1 ? Math.max(own, slewedDistortion(1 / ratio)) : own;
  const basis: Basis[] = [rate.basis, bandwidth.basis, ...(slewing.countsInput ? [input?.basis ?? ('assumed' as const)] : []), ...(readings.identity.inputType === null ? (['estimated'] as const) : [])];
  const counted = !slewing.countsInput ? null : input === null ? 'input capacitance not known and not counted' : `with ${formatQuantity(input.value, 'F')} of its own at the input`;
  const how = [rate.how, ratio > 1 ? 'beyond the slew limit' : `at ${Number((ratio * 100).toPrecision(3))} % of the slew rate, ${pairWords(readings)}`, counted];
  const figure = rate.printed === null ? null : { value: rate.printed, unit: 'V/s' };
  const term: Term = { name: 'slewing', value, slot: rate.slot, basis: weakest(basis), figure, how: how.filter((step) => step !== null).join(', ') };
  return { ...NONE, terms: [term], cautions: ratio > 1 && slewing.remembers ? [MEMORY] : [] };
}

/** In the circuit it is more or less than that just beyond the limit, and a triangle far beyond it, as here. */
const MEMORY = 'beyond the slew limit the distortion is that of a stage without memory; the capacitors of this one remember, so that near the limit it is about right only';

function pairHarmonic(drive: Parameters<typeof thirdHarmonicBipolar>[0], readings: Readings): number {
  const { identity } = readings;
  if (identity.inputType === 'bipolar') return thirdHarmonicBipolar(drive);
  if (identity.inputType === 'fet') return thirdHarmonicMos(drive);
  return readings.bounded(thirdHarmonicBipolar(drive), thirdHarmonicMos(drive));
}

function pairWords(readings: Readings): string {
  const { identity } = readings;
  if (identity.inputType === 'bipolar') return 'third harmonic of a bipolar pair';
  if (identity.inputType === 'fet') return 'third harmonic of a square-law FET pair';
  return `input type not known: third harmonic of a ${readings.bounded(0, 1) === 0 ? 'bipolar' : 'square-law FET'} pair`;
}
