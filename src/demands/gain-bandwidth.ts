import { vectorErrorAt } from '../formulas/gain-bandwidth.js';
import { formatDecibels, formatQuantity } from '../quantities/format.js';
import type { Stage } from '../stage/index.js';
import { stepCriteria, type Criterion } from './bandwidth-criteria.js';
import { gainErrorCriterion } from './gain-error.js';
import type { GainBandwidthDemand } from './speed-demand.js';

const SOURCES: Readonly<Record<Exclude<Stage['response']['kind'], 'oscillator'>, string>> = {
  amplifier: 'M3: one-pole amplifier, noise gain (Franco, Design with Operational Amplifiers and Analog Integrated Circuits, 3rd ed. 2002, ch. 6, from memory)',
  transimpedance: 'M3b: exact second-order loop (Graeme, Photodiode Amplifiers: Op Amp Solutions, 1996, ch. 3, from memory; own algebra)',
  'low-pass': 'M3a: exact cubic of the filter, bisected (own algebra; Budak & Petrela, IEEE Trans. Circuit Theory 19(4), 1972, from memory)',
  integrator: 'M3: exact loop of the integrator (Franco, Design with Operational Amplifiers and Analog Integrated Circuits, 3rd ed. 2002, ch. 6, from memory)',
};

/**
 * Gain bandwidth that gain error, edge and settling time ask, Hz; the largest counts. Null when none of them is asked, and of an
 * oscillator.
 */
export function gainBandwidth(stage: Stage): GainBandwidthDemand | null {
  const { response } = stage;
  if (response.kind === 'oscillator') return null;
  const criteria = [...gainErrorCriterion(stage), ...stepCriteria(stage)];
  const first = largest(criteria);
  if (first === null) return null;
  const margin = stage.asked.margins.gainBandwidth ?? 1;
  const neededWith = (own: number): number => Math.max(...criteria.map(({ needed }) => needed(own))) * margin;
  const required = neededWith(0);
  return {
    check: 'gain-bandwidth',
    required,
    unit: 'Hz',
    sense: 'at-least',
    because: `${first.what}${margin === 1 ? '' : `, × ${margin} asked by the team`}${othersNote(criteria, first)}${vectorNote(stage, required)}`,
    source: SOURCES[response.kind],
    requiredWith: response.kind === 'transimpedance' ? neededWith : null,
  };
}

function largest(criteria: readonly Criterion[]): Criterion | null {
  return criteria.reduce<Criterion | null>((best, next) => (best === null || next.needed(0) > best.needed(0) ? next : best), null);
}

/** What asks less. */
function othersNote(criteria: readonly Criterion[], first: Criterion): string {
  const less = criteria.filter((one) => one !== first).map(({ what, needed }) => `${what} asks ${formatQuantity(needed(0), 'Hz')}`);
  return less.length === 0 ? '' : `; ${less.join('; ')}`;
}

/**
 * Difference stage: the vector error of the amplifier multiplies both paths alike, so common mode still cancels; what is
 * left of it comes from the resistors (M1, resistor-limited rejection).
 */
function vectorNote(stage: Stage, required: number): string {
  if (stage.topology !== 'difference' || stage.frequency === null) return '';
  const error = vectorErrorAt(stage.noiseGain.nominal, stage.frequency, required);
  const rejection = stage.resistorRejection;
  const resistors = rejection === null || !Number.isFinite(rejection) ? '' : `, which the resistors limit to ${formatDecibels(rejection)}`;
  return `; the vector error of ${formatQuantity(error * 100, '%')} there acts on both inputs alike and leaves the common-mode rejection${resistors}`;
}
