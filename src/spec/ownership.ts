import { TOPOLOGIES, type Topology } from './spec.js';

const except = (...without: readonly Topology[]): readonly Topology[] => TOPOLOGIES.filter((one) => !without.includes(one));

export const FILTERS: readonly Topology[] = ['sallen-key-low-pass', 'multiple-feedback-low-pass'];
export const SENSES: readonly Topology[] = ['low-side-sense', 'high-side-sense'];
/** Fed by one voltage. */
export const ONE_INPUT: readonly Topology[] = ['follower', 'non-inverting', 'inverting', ...FILTERS, 'integrator'];
/** Gain made by a feedback and an input resistor. */
const RESISTOR_PAIR: readonly Topology[] = ['non-inverting', 'inverting', 'difference', ...SENSES, 'sallen-key-low-pass'];
const AMPLIFYING = except('relaxation-oscillator');

/** Fields that only some topologies have; what is not named here every stage has, as far as the map around it. */
const OWNERS: Readonly<Record<string, readonly Topology[] | undefined>> = {
  gain: except('summing', 'transimpedance', 'integrator', 'relaxation-oscillator'),
  resistors: except('follower'),
  'resistors.feedback': [...RESISTOR_PAIR, 'summing', 'transimpedance', 'integrator'],
  'resistors.input': RESISTOR_PAIR,
  'resistors.positiveInput': ['difference', 'high-side-sense'],
  'resistors.toReference': ['difference', 'high-side-sense'],
  reference: AMPLIFYING,
  legs: ['summing'],
  photodiode: ['transimpedance'],
  shunt: SENSES,
  'shunt.bus': ['high-side-sense'],
  filter: FILTERS,
  'filter.r3': ['multiple-feedback-low-pass'],
  integrator: ['integrator'],
  oscillator: ['relaxation-oscillator'],
  drives: ['relaxation-oscillator'],
  capacitors: except('follower'),
  'capacitors.feedback': ['non-inverting', 'inverting', 'summing', 'difference', 'transimpedance', ...SENSES],
  signal: AMPLIFYING,
  'signal.input': ONE_INPUT,
  'signal.amplitude': ONE_INPUT,
  'signal.center': ONE_INPUT,
  'signal.output': except('integrator', 'relaxation-oscillator'),
  'signal.positive': ['difference'],
  'signal.negative': ['difference'],
  'signal.differential': ['difference'],
  'signal.commonMode': ['difference'],
  source: [...ONE_INPUT, 'difference'],
  overdrive: except('transimpedance', 'relaxation-oscillator'),
  sequencing: except('transimpedance', 'relaxation-oscillator'),
  supplyRipple: AMPLIFYING,
  following: AMPLIFYING,
  converter: AMPLIFYING,
  'limits.swingLoss': AMPLIFYING,
  'limits.gainError': AMPLIFYING,
  'limits.gainErrorKind': AMPLIFYING,
  'limits.dcError': AMPLIFYING,
  'limits.outputNoise': AMPLIFYING,
  'limits.snr': AMPLIFYING,
  'limits.distortion': AMPLIFYING,
  'limits.settling': AMPLIFYING,
  'limits.phaseMargin': AMPLIFYING,
  'limits.frequencyError': ['relaxation-oscillator'],
  'limits.supplyRipple': AMPLIFYING,
};

/** The fields some topology lacks, maps before what is in them. */
export const OWNED_FIELDS: readonly string[] = Object.keys(OWNERS);

/** Topologies that have this field, by its own row; undefined: all that have the map around it. */
export function ownersOf(path: string): readonly Topology[] | undefined {
  return OWNERS[path];
}

/** True when the topology has the field, and every map around it. */
export function belongsTo(path: string, topology: Topology): boolean {
  const keys = path.split('.');
  return keys.every((_, at) => OWNERS[keys.slice(0, at + 1).join('.')]?.includes(topology) !== false);
}

/** Topologies that may be AC-coupled; a difference stage may not be yet. */
export const AC_COUPLED: readonly Topology[] = [...ONE_INPUT, 'summing'];
