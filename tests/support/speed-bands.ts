import { thermalVoltage } from '../../src/formulas/constants.js';
import { central, COMMON_PRACTICE, from, isFet, limit, ROOM, type Relation } from './band-figures.js';
import { loadedMargin } from './loaded-margin.js';

const degrees = (angle: number): number => (angle * Math.PI) / 180;
/** 2kT/q: the voltage that steers all the tail current of an undegenerated bipolar pair, V. */
const BIPOLAR_STEERING = 2 * thermalVoltage(ROOM);
/** A MOS pair in weak inversion needs the slope factor more; it is at least 1.2 in bulk CMOS. */
const WEAK_INVERSION = 1.2;

/** Relations between bandwidth, slew rate, current, open-loop gain and what loads the output. */
export const SPEED_RELATIONS: readonly Relation[] = [
  {
    name: 'slew rate against gain bandwidth',
    source: 'SR/(2π·GBW) is the steering voltage of the input pair: Solomon, "The monolithic op amp: a tutorial study", IEEE JSSC 9(6), 1974; weak inversion: Enz, Krummenacher & Vittoz, Analog Integrated Circuits and Signal Processing 8, 1995 (both from memory). Upper ends: degenerated or slew-boosted pairs, common practice',
    unit: 'V',
    band: (part) => (isFet(part) ? [WEAK_INVERSION * BIPOLAR_STEERING, 4] : [BIPOLAR_STEERING, 2]),
    values: (part) => from([central(part, 'slewRate'), central(part, 'gainBandwidth')], (rate, bandwidth) => rate / (2 * Math.PI * bandwidth)),
  },
  {
    name: 'gain bandwidth against current',
    source: `${COMMON_PRACTICE}: what bandwidth costs, in MHz per mA; a decompensated part is counted as if it were compensated for a gain of one`,
    unit: 'MHz/mA',
    band: (part) => (isFet(part) ? [1, 40] : [0.4, 100]),
    values: (part) =>
      from([central(part, 'gainBandwidth'), central(part, 'quiescentCurrent')], (bandwidth, current) => bandwidth / (limit(part, 'minimumStableGain') ?? 1) / current / 1e9),
  },
  {
    name: 'unity crossover against gain bandwidth',
    source: 'between GBW·sin(margin), where one further pole makes the whole phase, and GBW, where poles far above make it: Franco, Design with Operational Amplifiers and Analog Integrated Circuits, 3rd ed. 2002, ch. 8 (from memory)',
    unit: 'of GBW',
    band: (part) => [0.95 * Math.sin(degrees(central(part, 'phaseMargin') ?? 0)), 1.03],
    values: (part) => from([central(part, 'unityCrossover'), central(part, 'gainBandwidth')], (crossover, bandwidth) => crossover / bandwidth),
  },
  {
    name: 'open-loop gain against gain bandwidth',
    source: `${COMMON_PRACTICE}: GBW over DC gain is the dominant pole of the amplifier`,
    unit: 'Hz',
    band: [0.02, 100e3],
    values: (part) => from([central(part, 'gainBandwidth'), central(part, 'openLoopGain')], (bandwidth, gain) => bandwidth / gain),
  },
  {
    name: 'open-loop gain',
    source: COMMON_PRACTICE,
    unit: 'V/V',
    band: [10 ** (66 / 20), 10 ** (150 / 20)],
    values: (part) => from([limit(part, 'openLoopGain')], (gain) => gain),
  },
  {
    name: 'output resistance against current',
    source: 'an output device has a transconductance of at most I/VT: Gray, Hurst, Lewis & Meyer, Analysis and Design of Analog Integrated Circuits, 5th ed. 2009, ch. 1 (from memory); the share of the current it gets, common practice',
    unit: 'V',
    band: [0.5 * thermalVoltage(ROOM), 20 * thermalVoltage(ROOM)],
    values: (part) => from([central(part, 'outputResistance'), central(part, 'quiescentCurrent')], (resistance, current) => resistance * current),
  },
  {
    name: 'capacitive load against output resistance',
    source: 'phase margin left when Ro and the load capacitance add a pole: Franco, 3rd ed. 2002, ch. 8 (from memory); that makers stop between 15° and 65°, common practice',
    unit: '°',
    band: [15, 65],
    values: (part) =>
      from(
        [central(part, 'gainBandwidth'), central(part, 'phaseMargin'), central(part, 'unityCrossover'), central(part, 'outputResistance'), limit(part, 'capacitiveLoad')],
        (bandwidth, margin, crossover, resistance, capacitance) => loadedMargin({ bandwidth, margin, crossover, loadPole: 1 / (2 * Math.PI * resistance * capacitance) }),
      ),
  },
];
