import type { FieldKind } from '../quantities/kinds.js';

export type LimitKind = 'min' | 'typ' | 'max';

/** What the trade calls it in a canonical header, the unit it is stored in, how its cells are read, and which kinds it may have. */
export interface ParameterDescription {
  readonly words: string;
  /** SI unit of the stored number. */
  readonly unit: string;
  /** Unit of the canonical header, as written in the parentheses. */
  readonly headerUnit: string;
  readonly field: FieldKind;
  readonly kinds: readonly LimitKind[];
}

/** Words, SI unit, header unit, field, kinds: one row of the table below. */
const describe = (
  ...[words, unit, headerUnit, field, kinds]: [string, string, string, FieldKind, readonly LimitKind[]]
): ParameterDescription => ({ words, unit, headerUnit, field, kinds });

const TYP_MAX = ['typ', 'max'] as const;
const MIN_TYP = ['min', 'typ'] as const;
const MIN_MAX = ['min', 'max'] as const;

/** Every figure railfit knows about an amplifier, named as a datasheet names it. Order is the order of canonical columns. */
export const PARAMETERS = {
  supplyVoltage: describe('supply voltage', 'V', 'V', 'voltage', MIN_MAX),
  supplyAbsoluteMaximum: describe('supply absolute maximum', 'V', 'V', 'voltage', ['max']),
  inputLowHeadroom: describe('input low headroom', 'V', 'V', 'voltage', TYP_MAX),
  inputHighHeadroom: describe('input high headroom', 'V', 'V', 'voltage', TYP_MAX),
  outputLowHeadroom: describe('output low headroom', 'V', 'mV', 'voltage', TYP_MAX),
  outputHighHeadroom: describe('output high headroom', 'V', 'mV', 'voltage', TYP_MAX),
  slewRate: describe('slew rate', 'V/s', 'V/µs', 'slew', MIN_TYP),
  gainBandwidth: describe('gain bandwidth', 'Hz', 'MHz', 'gbw', MIN_TYP),
  minimumStableGain: describe('minimum stable gain', 'V/V', 'V/V', 'gain', ['max']),
  openLoopGain: describe('open loop gain', 'V/V', 'dB', 'ratio', MIN_TYP),
  offsetVoltage: describe('offset voltage', 'V', 'mV', 'offset_limit', TYP_MAX),
  offsetDrift: describe('offset drift', 'V/K', 'µV/K', 'drift', TYP_MAX),
  biasCurrent: describe('bias current', 'A', 'pA', 'current', TYP_MAX),
  offsetCurrent: describe('offset current', 'A', 'pA', 'current', TYP_MAX),
  commonModeRejection: describe('common mode rejection', 'V/V', 'dB', 'ratio', MIN_TYP),
  supplyRejection: describe('supply rejection', 'V/V', 'dB', 'ratio', MIN_TYP),
  voltageNoise: describe('voltage noise', 'V/√Hz', 'nV/√Hz', 'vnoise', TYP_MAX),
  noiseCorner: describe('noise corner', 'Hz', 'Hz', 'frequency', TYP_MAX),
  currentNoise: describe('current noise', 'A/√Hz', 'fA/√Hz', 'inoise', TYP_MAX),
  quiescentCurrent: describe('quiescent current', 'A', 'µA', 'current', TYP_MAX),
  outputCurrent: describe('output current', 'A', 'mA', 'current', ['min']),
  shortCircuitCurrent: describe('short circuit current', 'A', 'mA', 'current', MIN_TYP),
  phaseMargin: describe('phase margin', '°', '°', 'angle', ['typ']),
  unityCrossover: describe('unity crossover', 'Hz', 'MHz', 'frequency', ['typ']),
  outputResistance: describe('output resistance', 'Ω', 'Ω', 'resistance', ['typ']),
  capacitiveLoad: describe('capacitive load', 'F', 'pF', 'capacitance', ['max']),
  inputCapacitance: describe('input capacitance', 'F', 'pF', 'capacitance', ['typ']),
  temperature: describe('temperature', '°C', '°C', 'temperature', MIN_MAX),
  thermalResistance: describe('thermal resistance', 'K/W', 'K/W', 'thermal', TYP_MAX),
  junctionTemperature: describe('junction temperature', '°C', '°C', 'temperature', ['max']),
  inputCrossover: describe('input crossover', 'V', 'V', 'voltage', MIN_MAX),
  inputOverdrive: describe('input overdrive', 'V', 'V', 'voltage', ['max']),
  overdriveCurrent: describe('overdrive current', 'A', 'mA', 'current', ['max']),
  differentialInput: describe('differential input', 'V', 'V', 'voltage', ['max']),
  overloadRecovery: describe('overload recovery', 's', 'µs', 'time', TYP_MAX),
  startUpTime: describe('start up time', 's', 'µs', 'time', TYP_MAX),
  supplyRejectionCorner: describe('supply rejection corner', 'Hz', 'Hz', 'frequency', MIN_TYP),
} as const satisfies Record<string, ParameterDescription>;

export type Parameter = keyof typeof PARAMETERS;

/** Where the output load of a condition goes. A bare resistance means mid-supply. */
export type LoadEnd = 'ground' | 'supply' | 'mid-supply';

export type LoadCondition =
  | { readonly kind: 'current'; readonly amperes: number }
  | { readonly kind: 'resistance'; readonly ohms: number; readonly to: LoadEnd };

/** Under which condition a figure was rated; what is absent was not stated. */
export interface Condition {
  /** Volts between V+ and V-. */
  readonly supply?: number;
  readonly load?: LoadCondition;
  /** Degrees Celsius, or `over` for "@ over temperature" (the part's whole specified range). */
  readonly temperature?: number | 'over';
  /** Noise gain, V/V. */
  readonly gain?: number;
}

/** One number of one part with limit kind and condition; the value is in the SI unit of its parameter. */
export interface Figure {
  readonly parameter: Parameter;
  readonly kind: LimitKind;
  readonly value: number;
  readonly condition: Condition;
  /** Present only on a figure nobody printed: assumed for this run (`--assume`), or read from words, declared for a whole list or lent by a class. */
  readonly assumed?: true;
}

/** The condition in canonical words, in the order supply-load-temperature-gain is read: `10 kΩ to ground, 5 V, 25 °C`. */
export function conditionKey(condition: Condition): string {
  const words: string[] = [];
  const load = condition.load;
  if (load?.kind === 'current') words.push(`I${load.amperes}`);
  if (load?.kind === 'resistance') words.push(`R${load.ohms}:${load.to}`);
  if (condition.supply !== undefined) words.push(`V${condition.supply}`);
  if (condition.temperature !== undefined) words.push(`T${condition.temperature}`);
  if (condition.gain !== undefined) words.push(`G${condition.gain}`);
  return words.join(',');
}

/** The slot of a figure within its part: one value per slot. Origins (file, cell) are joined on it. */
export function figureSlot(figure: Pick<Figure, 'parameter' | 'kind' | 'condition'>): string {
  const key = conditionKey(figure.condition);
  return key === '' ? `${figure.parameter}.${figure.kind}` : `${figure.parameter}.${figure.kind}@${key}`;
}
