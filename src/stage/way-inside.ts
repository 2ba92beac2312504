import { nearestE96 } from '../quantities/e-series.js';
import { formatPercent, formatQuantity } from '../quantities/format.js';
import type { ReferenceSpec, StageSpec, Topology } from '../spec/spec.js';
import { gainForm } from './gain-form.js';
import type { Stage } from './stage.js';

/** The stage a changed specification implies, whatever its output; null when there is none. */
export type Rebuild = (spec: StageSpec) => Stage | null;

interface Trial {
  readonly rebuild: Rebuild;
  /** Whether the changed specification is free of the contradiction. */
  readonly accepts: (spec: StageSpec) => boolean;
  /** Whether it is so at the corners too: tolerances of resistors and signal, the lowest supply. */
  readonly acceptsAtCorners: (spec: StageSpec) => boolean;
}

/**
 * How the nominal output comes to lie within the supply: another reference, a lower gain, or both, each tried before it is offered;
 * a sentence that says what to change when none of them does it.
 */
export function wayInside(spec: StageSpec, stage: Stage, trial: Trial): string {
  const reference = anotherReference(spec, trial);
  if (reference !== null) return `write ${written(reference, spec)}`;
  const lower = lowerGain(spec, stage, trial) ?? lessFeedback(spec, trial);
  if (lower !== null) return lower;
  if (passesItsInput(stage) && !isGrown(stage)) return `keep the signal within ${volts(0)}..${volts(stage.supply.nominal)}`;
  if (span(stage) > stage.supply.nominal || passesItsInput(stage)) return `${span(stage) > stage.supply.nominal ? 'the swing is larger than the supply' : 'the peak of the filter leaves the supply'}: ${SMALLER[stage.topology] ?? 'a smaller signal, other resistors or a larger supply'}`;
  return NOTHING_DOES[stage.topology] ?? 'no reference within the supply and no lower gain brings the output inside: another input range, AC coupling or another topology';
}

/** A follower, and a filter without gain resistors: neither gain nor reference can be changed. */
function passesItsInput({ topology, gain }: Stage): boolean {
  return topology === 'follower' || (topology === 'sallen-key-low-pass' && gain === 1);
}

/** Its own peak or overshoot carries the output beyond its input. */
const isGrown = ({ response }: Stage): boolean => response.kind === 'low-pass' && response.growth > 1;

/** How the swing of a topology gets smaller, where signal and resistors are not all. */
const SMALLER: Readonly<Partial<Record<Topology, string>>> = {
  summing: 'smaller signals, larger leg resistors, a smaller feedback resistor or a larger supply',
  transimpedance: 'a smaller feedback resistor, less light or a larger supply',
  'low-side-sense': 'a smaller shunt, a lower gain or a larger supply',
  'high-side-sense': 'a smaller shunt, a lower gain or a larger supply',
  'sallen-key-low-pass': 'a smaller signal, a lower gain or q, or a larger supply',
  'multiple-feedback-low-pass': 'a smaller signal, a lower gain or q, or a larger supply',
  integrator: 'a larger R or C, a shorter window, a smaller signal or a larger supply',
};

/** What is left where no reference does it, and there is no gain to lower or none is low enough. */
const NOTHING_DOES: Readonly<Partial<Record<Topology, string>>> = {
  summing: 'no reference within the supply brings the output inside: other leg resistors, a leg to the supply, or a smaller feedback resistor',
  transimpedance: 'no reference within the supply and no smaller feedback resistor brings the output inside: the other direction of the photodiode',
  'low-side-sense': 'no reference within the supply and no lower gain brings the output inside: another range of currents, or a high-side stage',
  'high-side-sense': 'no reference within the supply and no lower gain brings the output inside: another range of currents',
  integrator: 'no reference within the supply brings the output inside: a larger R or C, a shorter window, or another input range',
};

const volts = (value: number): string => formatQuantity(value, 'V', { digits: 4 });
const span = ({ outputNominal }: Stage): number => outputNominal.max - outputNominal.min;

/** Mid-supply where that does it, since it follows the supply; else the voltage that centres the output. */
function anotherReference(spec: StageSpec, { rebuild, accepts }: Trial): ReferenceSpec | null {
  const middle: ReferenceSpec = { ...kept(spec), kind: 'mid-supply', value: { min: 1, nominal: 1, max: 1, text: 'mid-supply' } };
  const candidates = [middle, centring(spec, rebuild)].filter((one) => one !== null);
  return candidates.find((reference) => accepts({ ...spec, reference })) ?? null;
}

/** Resistance and bypass stay. */
function kept({ reference }: StageSpec): Pick<ReferenceSpec, 'resistance' | 'bypass'> {
  const { resistance, bypass } = reference ?? {};
  return { ...(resistance === undefined ? {} : { resistance }), ...(bypass === undefined ? {} : { bypass }) };
}

/** The output moves in proportion with the reference: two of them tell which one centres it. Three digits, as it is printed. */
function centring(spec: StageSpec, rebuild: Rebuild): ReferenceSpec | null {
  const centreAt = (reference: number): number => {
    const built = rebuild({ ...spec, reference: atVoltage(spec, reference) });
    return built === null ? Number.NaN : (built.outputNominal.min + built.outputNominal.max) / 2;
  };
  const [low, high] = [centreAt(0), centreAt(spec.supply.nominal)];
  const wanted = (spec.supply.nominal * (spec.supply.nominal / 2 - low)) / (high - low);
  return wanted >= 0 && wanted <= spec.supply.nominal ? atVoltage(spec, Number(wanted.toPrecision(3))) : null;
}

function atVoltage(spec: StageSpec, value: number): ReferenceSpec {
  return { ...kept(spec), kind: 'voltage', value: { min: value, nominal: value, max: value, text: formatQuantity(value, 'V', { digits: 3 }) } };
}

/** As a line of the stage file; a map where the reference has more than its voltage. */
function written({ value, resistance, bypass }: ReferenceSpec, spec: StageSpec): string {
  const tolerance = toleranceOf(spec);
  if (tolerance === 0 && resistance === undefined && bypass === undefined) return `reference: ${value.text}`;
  const more = [tolerance === 0 ? '' : `, tolerance: ${formatPercent(tolerance, { digits: 3 })}`, resistance === undefined ? '' : `, resistance: ${resistance.text}`, bypass === undefined ? '' : `, bypass: ${bypass.text}`];
  return `reference: {value: ${value.text}${more.join('')}}`;
}

/** Half the relative width of the reference as written: the tolerance is that of its source and stays. */
function toleranceOf({ reference }: StageSpec): number {
  const { min, nominal, max } = reference?.value ?? { min: 0, nominal: 0, max: 0 };
  return nominal <= 0 ? 0 : (max - min) / 2 / nominal;
}

/** Steps of 5 %, from just below the gain there is to a hundredth of it. */
const STEPS = Array.from({ length: 90 }, (_, at) => 0.95 ** (at + 1));

/** The largest of these gains that does it as the reference stands, at the corners where one does; else the largest that does it with another reference. */
function lowerGain(spec: StageSpec, stage: Stage, trial: Trial): string | null {
  const form = gainForm(stage.topology);
  if (form === null || passesItsInput(stage) || isFitted(spec)) return null;
  const least = form === 'non-inverting' ? 1 : 0;
  const gains = STEPS.map((step) => Number((Math.abs(stage.gain) * step).toPrecision(3))).filter((gain) => gain > least);
  const sign = form === 'inverting' ? '-' : '';
  const at = (gain: number): StageSpec => ({ ...spec, gain: { value: gain, text: String(gain) } });
  const alone = gains.find((gain) => trial.acceptsAtCorners(at(gain))) ?? gains.find((gain) => trial.accepts(at(gain)));
  if (alone !== undefined) return `write gain: ${sign}${alone}`;
  for (const gain of gains) {
    const reference = anotherReference(at(gain), trial);
    if (reference !== null) return `write gain: ${sign}${gain} and ${written(reference, spec)}`;
  }
  return null;
}

/** Components that are written rule the gain. */
function isFitted({ filter, topology }: StageSpec): boolean {
  return topology === 'multiple-feedback-low-pass' && filter?.r1 !== undefined;
}

/** The largest of these feedback resistors of a transimpedance stage that does it, as the reference stands or with another one. */
function lessFeedback(spec: StageSpec, trial: Trial): string | null {
  const built = trial.rebuild(spec);
  if (built?.response.kind !== 'transimpedance') return null;
  const { feedback } = built.response;
  for (const ohms of new Set(STEPS.map((step) => nearestE96(feedback * step)))) {
    const at = { ...spec, resistors: { ...spec.resistors, feedback: { value: ohms, text: String(ohms) } } };
    const write = `write resistors.feedback: ${formatQuantity(ohms, 'Ω')}`;
    if (trial.accepts(at)) return write;
    const reference = anotherReference(at, trial);
    if (reference !== null) return `${write} and ${written(reference, spec)}`;
  }
  return null;
}
