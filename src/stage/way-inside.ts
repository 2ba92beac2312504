import { formatPercent, formatQuantity } from '../quantities/format.js';
import type { ReferenceSpec, StageSpec } from '../spec/spec.js';
import type { Stage } from './stage.js';

/** The stage a changed specification implies, whatever its output; null when there is none. */
export type Rebuild = (spec: StageSpec) => Stage | null;

interface Trial {
  readonly rebuild: Rebuild;
  /** Whether the changed specification is free of the contradiction. */
  readonly accepts: (spec: StageSpec) => boolean;
}

/**
 * How the nominal output comes to lie within the supply: another reference, a lower gain, or both, each tried before it is offered;
 * a sentence that says what to change when none of them does it.
 */
export function wayInside(spec: StageSpec, stage: Stage, trial: Trial): string {
  const reference = anotherReference(spec, trial);
  if (reference !== null) return `write ${written(reference, spec)}`;
  const lower = lowerGain(spec, stage, trial);
  if (lower !== null) return lower;
  if (stage.topology === 'follower') return `keep the signal within ${volts(0)}..${volts(stage.supply.nominal)}`;
  if (span(stage) > stage.supply.nominal) return 'the swing is larger than the supply: a smaller signal, other resistors or a larger supply';
  return 'no reference within the supply and no lower gain brings the output inside: another input range, AC coupling or another topology';
}

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

/** The largest of these gains that does it as the reference stands, else the largest that does it with another reference. */
function lowerGain(spec: StageSpec, stage: Stage, trial: Trial): string | null {
  if (stage.topology === 'follower') return null;
  const least = stage.topology === 'non-inverting' ? 1 : 0;
  const gains = STEPS.map((step) => Number((Math.abs(stage.gain) * step).toPrecision(3))).filter((gain) => gain > least);
  const sign = stage.topology === 'inverting' ? '-' : '';
  const at = (gain: number): StageSpec => ({ ...spec, gain: { value: gain, text: String(gain) } });
  const alone = gains.find((gain) => trial.accepts(at(gain)));
  if (alone !== undefined) return `write gain: ${sign}${alone}`;
  for (const gain of gains) {
    const reference = anotherReference(at(gain), trial);
    if (reference !== null) return `write gain: ${sign}${gain} and ${written(reference, spec)}`;
  }
  return null;
}
