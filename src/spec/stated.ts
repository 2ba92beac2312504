import type { StageSpec } from './spec.js';

/** What a field holds. */
type Found =
  | { readonly value: number; readonly text: string; readonly unit?: string; readonly before?: string }
  | { readonly min: number; readonly max: number; readonly text: string }
  | { readonly words: readonly string[] }
  | undefined;

/** One field that can be moved: how it is written (`%` and `dB` stand for fractions and ratios) and where it stands. */
export interface Stated {
  readonly path: string;
  readonly unit?: string;
  readonly of: (spec: StageSpec) => Found;
}

const words = (list: readonly string[] | undefined): Found => (list === undefined ? undefined : { words: list });
const number = (value: number | undefined): Found => (value === undefined ? undefined : { value, text: String(value) });

/** Limits that stand when nobody writes them (interface: defaults of the stage file). */
const NO_LOSS = { value: 0, text: '0 V' };
const ONE_PERCENT = { value: 0.01, text: '1 %' };
const USUAL_MARGIN = { value: 45, text: '45°' };

const LIMITS: readonly Stated[] = [
  { path: 'limits.swingLoss', unit: 'V', of: ({ topology, limits }) => limits.swingLoss ?? (topology === 'relaxation-oscillator' ? undefined : NO_LOSS) },
  { path: 'limits.gainError', unit: '%', of: ({ topology, limits }) => limits.gainError ?? (topology === 'relaxation-oscillator' ? undefined : ONE_PERCENT) },
  { path: 'limits.dcError', unit: 'V', of: ({ limits }) => limits.dcError },
  { path: 'limits.outputNoise', unit: 'Vrms', of: ({ limits }) => limits.outputNoise },
  { path: 'limits.snr', unit: 'dB', of: ({ limits }) => limits.snr },
  { path: 'limits.distortion', unit: 'dB', of: ({ limits }) => limits.distortion },
  { path: 'limits.supplyCurrent', unit: 'A', of: ({ limits }) => limits.supplyCurrent },
  { path: 'limits.settling.within', unit: 's', of: ({ limits }) => limits.settling?.within },
  { path: 'limits.settling.to', unit: '%', of: ({ limits }) => limits.settling?.to },
  { path: 'limits.supplyRipple', unit: 'Vpk', of: ({ limits }) => limits.supplyRipple },
  { path: 'limits.startUp', unit: 's', of: ({ limits }) => limits.startUp },
  { path: 'limits.phaseMargin', unit: '°', of: ({ topology, limits }) => limits.phaseMargin ?? (topology === 'relaxation-oscillator' ? undefined : USUAL_MARGIN) },
  { path: 'limits.junctionTemperature', unit: '°C', of: ({ limits }) => limits.junctionTemperature },
  { path: 'limits.frequencyError', unit: '%', of: ({ limits }) => limits.frequencyError },
];

const TEAM: readonly Stated[] = [
  { path: 'wishes.price', of: ({ wishes: { price } }) => (price === undefined ? undefined : { value: price.amount, unit: price.currency, text: price.text }) },
  { path: 'wishes.package', of: ({ wishes }) => words(wishes.package) },
  { path: 'wishes.qualification', of: ({ wishes }) => (wishes.qualification === undefined ? undefined : { words: [wishes.qualification] }) },
  { path: 'wishes.status', of: ({ wishes }) => words(wishes.status) },
  { path: 'wishes.lifecycle', of: ({ wishes }) => words(wishes.lifecycle) },
  { path: 'margins.slewRate', unit: '1', of: ({ margins }) => number(margins.slewRate) },
  { path: 'margins.gainBandwidth', unit: '1', of: ({ margins }) => number(margins.gainBandwidth) },
  { path: 'margins.outputHeadroom', unit: 'V', of: ({ margins }) => margins.outputHeadroom },
];

const CIRCUIT: readonly Stated[] = [
  { path: 'supply', unit: 'V', of: ({ supply }) => supply },
  { path: 'supplyPeak', unit: 'V', of: ({ supplyPeak }) => supplyPeak },
  { path: 'temperature', unit: '°C', of: ({ temperature }) => temperature },
  { path: 'gain', unit: '1', of: ({ gain }) => gain },
  { path: 'signal.frequency', unit: 'Hz', of: ({ signal: { frequency } }) => (frequency === undefined ? undefined : topOf(frequency)) },
  { path: 'signal.input', unit: 'V', of: ({ signal }) => signal.input },
  { path: 'signal.amplitude', unit: 'Vpk', of: ({ signal }) => signal.amplitude },
  { path: 'signal.positive', unit: 'V', of: ({ signal }) => signal.positive },
  { path: 'signal.negative', unit: 'V', of: ({ signal }) => signal.negative },
  { path: 'signal.differential', unit: 'V', of: ({ signal }) => signal.differential },
  { path: 'signal.commonMode', unit: 'V', of: ({ signal }) => signal.commonMode },
  { path: 'signal.edge', unit: 's', of: ({ signal }) => signal.edge },
  { path: 'shunt.current', unit: 'A', of: ({ shunt }) => shunt?.current },
  { path: 'shunt.resistance', unit: 'Ω', of: ({ shunt }) => shunt?.resistance },
  { path: 'photodiode.current', unit: 'A', of: ({ photodiode }) => photodiode?.current },
  { path: 'photodiode.capacitance', unit: 'F', of: ({ photodiode }) => photodiode?.capacitance },
  { path: 'filter.corner', unit: 'Hz', of: ({ filter }) => filter?.corner },
  { path: 'oscillator.frequency', unit: 'Hz', of: ({ oscillator }) => oscillator?.frequency },
  { path: 'oscillator.edge', unit: '%', of: ({ oscillator }) => oscillator?.edge },
  { path: 'source.resistance', unit: 'Ω', of: ({ source }) => source?.resistance },
  { path: 'load.resistance', unit: 'Ω', of: ({ load }) => load?.resistance },
  { path: 'load.capacitance', unit: 'F', of: ({ load }) => load?.capacitance },
  { path: 'resistors.feedback', unit: 'Ω', of: ({ resistors }) => resistors?.feedback },
  { path: 'resistors.tolerance', unit: '%', of: ({ resistors }) => resistors?.tolerance },
  { path: 'reference.value', unit: 'V', of: referenceOf },
  { path: 'reference.resistance', unit: 'Ω', of: ({ reference }) => reference?.resistance },
];

/** A fixed voltage whose tolerance, if any, stands beside it: its ends are then no part of the figure. */
function referenceOf({ reference, positions }: StageSpec): Found {
  if (reference?.kind !== 'voltage') return undefined;
  const { min, nominal, max, text } = reference.value;
  return min === max || positions['reference.tolerance'] !== undefined ? { value: nominal, text } : undefined;
}

function topOf({ bottom, top, text }: { readonly bottom?: number; readonly top: number; readonly text: string }): Found {
  return bottom === undefined ? { value: top, text } : { value: top, text, before: `${text.split('..')[0] ?? ''}..` };
}

/** Every field a change can move, in the order it is told. */
export const STATED: readonly Stated[] = [...LIMITS, ...TEAM, ...CIRCUIT];
