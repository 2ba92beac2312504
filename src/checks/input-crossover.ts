import type { DistortionDemand, InputSwing } from '../demands/index.js';
import { inputCrossoverDistortion } from '../formulas/input-crossover.js';
import { weakest } from '../parts/basis.js';
import type { Readings } from '../parts/readings.js';
import type { Term } from '../verdicts/finding.js';
import { NONE, type DistortionPart } from './distortion-part.js';

/** Hand-over of the input pairs lies within this of V+ where a part has one, V (common practice: 1 to 1.8 V). */
export const USUAL = 2;
/** A part whose inputs must stay this far below V+ has one pair only, V (common practice). */
export const ONE_PAIR = 0.9;

/**
 * The step of the offset where the inputs cross from one pair to the other. No list states its size: the rejection over the whole
 * supply contains it, so it is at most supply/CMRR, at best nothing.
 */
export function crossoverPart(asked: DistortionDemand, readings: Readings): DistortionPart {
  if (asked.crossovers.length === 0) return NONE;
  if (readings.identity.crossoverFree === true) return NONE;
  const [min, max] = [readings.figure('inputCrossover', 'min'), readings.figure('inputCrossover', 'max')];
  if (min === null || max === null) return notStated(asked, readings);
  const perVolt = crossoverPerRejection(asked.crossovers, { from: min.value, to: max.value });
  if (perVolt === 0) return NONE;
  const rejection = readings.figureOrClass('commonModeRejection');
  if (rejection === null) return { ...NONE, missing: [{ figure: 'commonModeRejection', kind: 'min' }] };
  const basis = rejection.basis === 'borrowed' ? rejection.basis : weakest([rejection.basis, 'estimated']);
  const figure = rejection.printed === null ? null : { value: rejection.printed, unit: 'V/V' };
  const how = [rejection.how, 'step at the hand-over of the input pairs, at most the supply over the rejection'].filter((step) => step !== null).join(', ');
  const term: Term = { name: 'input crossover', value: readings.bounded(perVolt / rejection.value, 0), slot: rejection.slot, basis, figure, how };
  return { ...NONE, terms: [term] };
}

/** Distortion at the output, worst corner, times the rejection that bounds the step; 0 where no swing reaches the region (V below V+). */
export function crossoverPerRejection(swings: readonly InputSwing[], region: { readonly from: number; readonly to: number }): number {
  return Math.max(0, ...swings.map((swing) => swing.supply * worstShare(swing, region)));
}

/** Where in the region it is worst; distortion at the output for a step of 1 V. */
function worstShare({ near, far, noiseGain, outputPeak }: InputSwing, region: { readonly from: number; readonly to: number }): number {
  const [from, to] = [Math.max(near, region.from), Math.min(far, region.to)];
  if (from >= to) return 0;
  const [level, peak] = [(near + far) / 2, (far - near) / 2];
  const places = Array.from({ length: PLACES + 1 }, (_none, k) => from + ((to - from) * k) / PLACES);
  const at = (crossover: number): number => inputCrossoverDistortion({ step: 1, crossover: Math.min(level + peak, Math.max(level - peak, crossover)), level, peak });
  return (Math.max(...places.map(at)) * noiseGain * peak) / outputPeak;
}

const PLACES = 64;

/** Inputs that come near V+ may cross a region the list does not state: said, taken as none. */
function notStated(asked: DistortionDemand, readings: Readings): DistortionPart {
  const room = readings.figure('inputHighHeadroom');
  if (asked.closest >= USUAL || (room !== null && room.value >= ONE_PAIR)) return NONE;
  const caution = `no input crossover known, and the inputs come within ${USUAL} V of V+: a hand-over of the input pairs there would add distortion, not counted`;
  return { ...NONE, cautions: [caution], terms: [{ name: 'input crossover', value: 0, slot: null, basis: 'assumed', figure: null, how: 'none stated: taken as none' }] };
}
