import type { LimitKind, Parameter } from '../../src/parts/figures.js';
import type { Part } from '../../src/parts/part.js';
import { central, COMMON_PRACTICE, figuresOf, from, isBipolar, isChopped, isFet, limit, ROOM, sameCondition, stated, type Relation } from './band-figures.js';

const ratioOf = (decibels: number): number => 10 ** (decibels / 20);
/** A signal on a 5 V supply that goes from rail to rail. */
const WHOLE_RANGE = 5;

/** Relations between offset, drift, input currents, rejections and the input range. */
export const INPUT_RELATIONS: readonly Relation[] = [
  {
    name: 'bias current of the input type',
    source: `${COMMON_PRACTICE}: at 25 °C gates leak (or, chopped, are charged) with less than 1.5 nA; bases take more`,
    unit: 'A',
    band: (part) => (isBipolar(part) ? [1.5e-9, 30e-6] : [1e-15, 1.5e-9]),
    values: (part) => from([stated(part, 'biasCurrent', 'max')], (bias) => bias),
  },
  {
    name: 'bias current against quiescent current',
    source: 'a base takes Ic/β (Gray, Hurst, Lewis & Meyer, 5th ed. 2009, ch. 1, from memory); β of 20..500, 1..50 % of the current in the pair, a tenth left by cancellation: common practice',
    unit: 'A/A',
    band: [2e-6, 1e-2],
    values: (part) => (isBipolar(part) ? from([central(part, 'biasCurrent'), central(part, 'quiescentCurrent')], (bias, current) => bias / current) : []),
  },
  {
    name: 'bias current over temperature',
    source: 'leakage doubles per 10 K (Jung (ed.), Op Amp Applications Handbook, 2005, ch. 1, from memory), limits are tested coarsely at 25 °C; base current changes little: common practice',
    unit: 'doublings per 10 K',
    band: (part) => (isFet(part) ? [0, 1.2] : [-0.15, 0.3]),
    values: hotDoublings,
  },
  {
    name: 'offset current against bias current',
    source: `${COMMON_PRACTICE}: a difference of two currents is smaller than either; of chopped inputs, whose currents may have opposite sign, twice as large`,
    unit: 'A/A',
    band: (part) => (isChopped(part) ? [0.02, 2] : [0.02, 1]),
    values: (part) => from([stated(part, 'offsetCurrent', 'max'), stated(part, 'biasCurrent', 'max')], (difference, bias) => difference / bias),
  },
  {
    name: 'drift against offset',
    source: 'a bipolar pair drifts by Vos/T (Gray, Hurst, Lewis & Meyer, 5th ed. 2009, ch. 3, from memory); trimming takes the offset and leaves drift; FET pairs, common practice',
    unit: 'times Vos/T',
    band: (part) => (isFet(part) ? [0.1, 10] : [0.5, 6]),
    values: (part) => pairs(part, 'offsetDrift', 'offsetVoltage').map(([drift, offset]) => (drift * ROOM) / offset),
  },
  {
    name: 'offset without 1/f noise',
    source: `${COMMON_PRACTICE}: what takes 1/f noise away takes the offset away`,
    unit: 'V',
    band: [0, 60e-6],
    values: (part) => (isChopped(part) ? from([limit(part, 'offsetVoltage')], (offset) => offset) : []),
  },
  {
    name: 'common-mode rejection',
    source: COMMON_PRACTICE,
    unit: 'V/V',
    band: [ratioOf(50), ratioOf(140)],
    values: (part) => from([limit(part, 'commonModeRejection')], (rejection) => rejection),
  },
  {
    name: 'supply rejection',
    source: COMMON_PRACTICE,
    unit: 'V/V',
    band: [ratioOf(56), ratioOf(140)],
    values: (part) => from([limit(part, 'supplyRejection')], (rejection) => rejection),
  },
  {
    name: 'rejection across the crossover',
    source: `${COMMON_PRACTICE}: the two pairs have offsets of their own, so a way across costs about the offset: 5 V over the rejection, against the offset limit`,
    unit: 'times Vos',
    band: [0.1, 4],
    values: (part) =>
      stated(part, 'inputCrossover', 'min') === null || isChopped(part)
        ? []
        : from([stated(part, 'commonModeRejection', 'min'), limit(part, 'offsetVoltage')], (rejection, offset) => WHOLE_RANGE / rejection / offset),
  },
  {
    name: 'input range at the lowest supply',
    source: `${COMMON_PRACTICE}: a part is not sold for a supply on which its inputs have no room`,
    unit: 'V',
    band: [0.2, Number.POSITIVE_INFINITY],
    values: (part) => from([limit(part, 'inputLowHeadroom'), limit(part, 'inputHighHeadroom'), stated(part, 'supplyVoltage', 'min')], (low, high, supply) => supply - low - high),
  },
  {
    name: 'crossover inside the supply',
    source: `${COMMON_PRACTICE}: two pairs hand over below V+ and above V-, and reach V+ together`,
    unit: 'V',
    band: (part) => [0.2, stated(part, 'supplyVoltage', 'min') ?? Number.POSITIVE_INFINITY],
    values: (part) => [
      ...from([stated(part, 'inputCrossover', 'min'), limit(part, 'inputHighHeadroom')], (nearer, reach) => nearer - Math.max(0, reach)),
      ...from([stated(part, 'inputCrossover', 'max')], (farther) => farther),
    ],
  },
  {
    name: 'limit against typical figure',
    source: `${COMMON_PRACTICE}: limits of offset and drift stand 2 to 8 sigma-like typical values out, currents less, speeds within a factor of two`,
    unit: 'limit/typical',
    band: [1.05, 30],
    values: (part) => SPREADS.flatMap(([parameter, kind, most]) => spread(part, parameter, kind).map((ratio) => 1.05 + ((ratio - 1.05) / (most - 1.05)) * 28.95)),
  },
];

/** How far a limit may stand from its typical figure; input currents are tested coarsely. */
const SPREADS = [
  ['offsetVoltage', 'max', 8],
  ['offsetDrift', 'max', 8],
  ['biasCurrent', 'max', 60],
  ['quiescentCurrent', 'max', 2],
  ['slewRate', 'min', 2.5],
  ['gainBandwidth', 'min', 2],
  ['shortCircuitCurrent', 'min', 3],
] as const satisfies readonly (readonly [Parameter, LimitKind, number])[];

/** Limit over typical figure, the other way round for a minimum, under equal conditions. */
function spread(part: Part, parameter: Parameter, kind: LimitKind): number[] {
  return figuresOf(part, parameter, kind).flatMap((one) =>
    figuresOf(part, parameter, 'typ').flatMap((typical) => (sameCondition(one, typical) ? [kind === 'min' ? typical.value / one.value : one.value / typical.value] : [])),
  );
}

/** Both limits, or both typical figures: a typical drift is not compared with the limit of an offset. */
function pairs(part: Part, one: Parameter, other: Parameter): [number, number][] {
  return (['max', 'typ'] as const).flatMap((kind): [number, number][] => {
    const [first, second] = [stated(part, one, kind), stated(part, other, kind)];
    return first === null || second === null ? [] : [[first, second]];
  });
}

/** Growth of the bias limit from 25 °C to a hotter row, as its base-2 logarithm per 10 K. */
function hotDoublings(part: Part): number[] {
  const cool = stated(part, 'biasCurrent', 'max');
  return figuresOf(part, 'biasCurrent', 'max').flatMap(({ value, condition: { temperature } }) =>
    cool === null || typeof temperature !== 'number' || temperature <= 25 ? [] : [Math.log2(value / cool) / ((temperature - 25) / 10)],
  );
}
