import type { Condition, Figure, LimitKind, LoadEnd, Parameter } from '../../src/parts/figures.js';
import type { Part } from '../../src/parts/part.js';
import type { Operating, PartUnderTest } from '../../src/parts/reading.js';

type FigureBuilder = (parameter: Parameter, value: number, condition?: Condition) => Figure;

const figure = (kind: LimitKind): FigureBuilder => (parameter, value, condition = {}) => ({ parameter, kind, value, condition });

/** One figure in SI, under a condition. */
export const min = figure('min');
export const typ = figure('typ');
export const max = figure('max');

/** `@ 2 mA, 5 V` and `@ 2 kΩ to ground, 5 V`: amperes or ohm, then volts. */
export const amperes = (current: number, supply?: number): Condition => ({ load: { kind: 'current', amperes: current }, ...at(supply) });
export const ohms = (resistance: number, to: LoadEnd, supply?: number): Condition => ({ load: { kind: 'resistance', ohms: resistance, to }, ...at(supply) });

const at = (supply: number | undefined): Condition => (supply === undefined ? {} : { supply });

/** As the user assumes it for one run. */
export const assumed = (one: Figure): Figure => ({ ...one, assumed: true });

/** An approved part of which only the figures are known, unless the test says more. */
export function partOf(figures: readonly Figure[], identity: Partial<Part> = {}): Part {
  return { ...UNKNOWN, ...identity, figures };
}

const UNKNOWN: Omit<Part, 'figures'> = {
  id: 'P-1', tier: 'approved', description: null, status: null, lifecycle: null, package: null, channels: null, qualification: null,
  class: null, family: null, price: null, phaseReversal: null, inputClamp: null, inputType: null, crossoverFree: null,
};

export const euro = (amount: number): Part['price'] => ({ amount, currency: 'EUR', quantity: 1000 });

/** Every figure the checks read, all limits: comfortable on a 5 V stage of a few kHz. */
export const FULL: readonly Figure[] = [
  min('supplyVoltage', 1.8), max('supplyVoltage', 5.5), max('supplyAbsoluteMaximum', 6),
  max('inputLowHeadroom', -0.1), max('inputHighHeadroom', 0.1),
  max('outputLowHeadroom', 0.01, amperes(1e-4, 5)), max('outputHighHeadroom', 0.01, amperes(1e-4, 5)),
  max('outputLowHeadroom', 0.1, amperes(2e-3, 5)), max('outputHighHeadroom', 0.1, amperes(2e-3, 5)),
  min('slewRate', 1e6), min('gainBandwidth', 2e6), max('minimumStableGain', 1), min('openLoopGain', 1e5),
  max('offsetVoltage', 1e-3), max('offsetDrift', 2e-6), max('biasCurrent', 20e-12, { temperature: 85 }), max('offsetCurrent', 10e-12, { temperature: 85 }),
  min('commonModeRejection', 1e4), min('supplyRejection', 1e4), max('quiescentCurrent', 60e-6), min('outputCurrent', 5e-3),
  min('temperature', -40), max('temperature', 125),
];

/** The figures with every one of a parameter replaced by those given: none takes the parameter away. */
export function replacing(parameter: Parameter, ...by: readonly Figure[]): Figure[] {
  return [...FULL.filter((one) => one.parameter !== parameter), ...by];
}

export const AT_25: Operating = { coldest: 25, hottest: 25, nominalSupply: 5 };

/** A part under one outlook: pessimistic at 25 °C on 5 V unless the test says otherwise. */
export function under(figures: readonly Figure[], rules: Partial<PartUnderTest> = {}): PartUnderTest {
  return { part: partOf(figures), operating: AT_25, strict: false, classWorst: null, outlook: 'pessimistic', ...rules };
}
