import fc from 'fast-check';
import { compareFigures } from '../../src/parts/figure-order.js';
import type { Condition, Figure, LimitKind, Parameter } from '../../src/parts/figures.js';
import { figureSlot, PARAMETERS } from '../../src/parts/figures.js';
import type { Part } from '../../src/parts/part.js';
import { LIFECYCLES, STATUSES } from '../../src/parts/part.js';

/** Plausible ends of each parameter in SI, wide of every class of amplifier. */
const RANGES: Readonly<Record<Parameter, readonly [number, number]>> = {
  supplyVoltage: [0.9, 40], supplyAbsoluteMaximum: [40, 60], inputLowHeadroom: [-0.3, 4], inputHighHeadroom: [-0.3, 4],
  outputLowHeadroom: [1e-3, 3], outputHighHeadroom: [1e-3, 3], slewRate: [1e3, 5e8], gainBandwidth: [1e4, 5e8], minimumStableGain: [1, 20],
  openLoopGain: [1e3, 1e7], offsetVoltage: [1e-6, 1e-2], offsetDrift: [1e-8, 2e-5], biasCurrent: [1e-14, 1e-5], offsetCurrent: [1e-14, 1e-5],
  commonModeRejection: [1e3, 1e7], supplyRejection: [1e3, 1e7], voltageNoise: [1e-9, 3e-7], noiseCorner: [1, 1e4], currentNoise: [1e-15, 1e-11],
  quiescentCurrent: [1e-6, 1e-2], outputCurrent: [1e-3, 0.2], shortCircuitCurrent: [1e-3, 0.4], phaseMargin: [30, 80], unityCrossover: [1e4, 5e8],
  outputResistance: [10, 1e4], capacitiveLoad: [1e-11, 1e-8], inputCapacitance: [1e-12, 2e-11], temperature: [-55, 150],
  thermalResistance: [30, 300], junctionTemperature: [100, 175], inputCrossover: [0.5, 2.5],
  inputOverdrive: [0.1, 1], overdriveCurrent: [1e-4, 0.05], differentialInput: [0.3, 40], overloadRecovery: [1e-7, 1e-2], startUpTime: [1e-7, 0.1],
  supplyRejectionCorner: [1, 1e5],
};

const KIND_RANK: Readonly<Record<LimitKind, number>> = { min: 0, typ: 1, max: 2 };

const condition: fc.Arbitrary<Condition> = fc
  .record(
    {
      supply: fc.constantFrom(1.8, 3.3, 5, 30),
      load: fc.oneof(
        fc.constantFrom(1e-5, 1e-3, 0.0125).map((amperes) => ({ kind: 'current' as const, amperes })),
        fc.record({
          kind: fc.constant('resistance' as const),
          ohms: fc.constantFrom(600, 2000, 10_000, 1e6),
          to: fc.constantFrom('ground' as const, 'supply' as const, 'mid-supply' as const),
        }),
      ),
      temperature: fc.constantFrom<number | 'over'>(-40, 25, 85, 'over'),
      gain: fc.constantFrom(1, 10, 2.5),
    },
    { requiredKeys: [] },
  )
  .map((value) => value as Condition);

/** All figures of one parameter under one condition, rising from min to max. */
function ratings(parameter: Parameter): fc.Arbitrary<Figure[]> {
  const [low, high] = RANGES[parameter];
  const kinds = [...PARAMETERS[parameter].kinds].sort((a, b) => KIND_RANK[a] - KIND_RANK[b]);
  const value = fc.oneof(
    fc.double({ min: low, max: high, noNaN: true }),
    fc.double({ min: low, max: high, noNaN: true }).map((number) => Number(number.toPrecision(3))),
  );
  return fc.tuple(condition, fc.array(value, { minLength: kinds.length, maxLength: kinds.length })).map(([under, values]) => {
    // Nearer to zero than a microvolt or a microdegree is not a figure of a datasheet.
    const rising = values.map((number) => (low < 0 && Math.abs(number) < 1e-6 ? 0 : Math.min(high, Math.max(low, number))));
    rising.sort((a, b) => a - b);
    return kinds.map((kind, index) => ({ parameter, kind, value: rising[index] ?? low, condition: under }));
  });
}

const figures: fc.Arbitrary<Figure[]> = fc
  .array(fc.constantFrom(...(Object.keys(PARAMETERS) as Parameter[])).chain(ratings), { maxLength: 12 })
  .map((lists) => {
    const slots = new Map<string, Figure>();
    for (const list of lists) {
      if (!list.some((figure) => slots.has(figureSlot(figure)))) for (const figure of list) slots.set(figureSlot(figure), figure);
    }
    return [...slots.values()].sort(compareFigures);
  });

/** Text as a list keeps it: trimmed, not one of the words for "not known". */
const text = fc
  .oneof(fc.string({ minLength: 5, maxLength: 12, unit: 'grapheme' }), fc.constantFrom('=1+1;x', "'=quoted", '"quoted", twice', 'two\r\nlines', '@home'))
  .map((value) => value.trim())
  .filter((value) => value.length >= 5 && !value.includes('\0'));

const maybe = <T>(value: fc.Arbitrary<T>): fc.Arbitrary<T | null> => fc.option(value, { nil: null });

const anyPart = fc.record({
  tier: fc.constant('generic' as const),
  description: maybe(text),
  status: maybe(fc.constantFrom(...STATUSES)),
  lifecycle: maybe(fc.constantFrom(...LIFECYCLES)),
  package: maybe(text),
  channels: maybe(fc.constantFrom(1, 2, 4)),
  qualification: maybe(text),
  class: maybe(text),
  family: maybe(text),
  price: maybe(
    fc.record({
      amount: fc.double({ min: 0.01, max: 50, noNaN: true }),
      currency: fc.constantFrom('EUR', 'USD'),
      quantity: maybe(fc.constantFrom(1, 1000)),
    }),
  ),
  phaseReversal: maybe(fc.boolean()),
  inputClamp: maybe(fc.boolean()),
  inputType: maybe(fc.constantFrom('fet' as const, 'bipolar' as const)),
  crossoverFree: maybe(fc.boolean()),
  figures,
});

/** Parts such as a list can hold, with ids of their own. */
export const arbitraryParts: fc.Arbitrary<Part[]> = fc
  .array(anyPart, { minLength: 1, maxLength: 6 })
  .map((parts) => parts.map((part, index) => ({ id: `00${index + 2}`, ...part })));
