import { BOLTZMANN, ELEMENTARY_CHARGE, thermalVoltage } from '../../src/formulas/constants.js';
import { central, COMMON_PRACTICE, from, isBipolar, isChopped, isFet, ROOM, type Relation } from './band-figures.js';

const FOUR_KT = 4 * BOLTZMANN * ROOM;
const VT = thermalVoltage(ROOM);
/** Slope factor of a MOS device in weak inversion. */
const SLOPE = 1.2;

/** Voltage noise of an input pair that had all of the quiescent current, V/√Hz: no amplifier is quieter. */
function floorOf(current: number, isMos: boolean): number {
  // Each of the pair carries half of the current. Bipolar: 4kT·re/2 each, re = VT/Ic. MOS in weak inversion: 4kT·(n/2)/gm each, gm = I/(n·VT).
  return Math.sqrt(FOUR_KT * (VT / (current / 2)) * (isMos ? SLOPE ** 2 : 1));
}

/** Relations between noise, current, input current and the size of the input devices. */
export const NOISE_RELATIONS: readonly Relation[] = [
  {
    name: 'voltage noise against current',
    source: 'thermal and shot noise of the pair: Gray, Hurst, Lewis & Meyer, 5th ed. 2009, ch. 11; weak inversion: Enz, Krummenacher & Vittoz 1995 (both from memory). How far above, common practice',
    unit: 'times the floor',
    band: (part) => (isFet(part) ? [2, 40] : [1.5, 60]),
    values: (part) => from([central(part, 'voltageNoise'), central(part, 'quiescentCurrent')], (noise, current) => noise / floorOf(current, isFet(part))),
  },
  {
    name: 'current noise against bias current',
    source: '√(2qI): Schottky, "Über spontane Stromschwankungen in verschiedenen Elektrizitätsleitern", Annalen der Physik 57, 1918 (from memory). Above: bias cancellation and chopping, common practice',
    unit: 'times shot noise',
    band: (part) => (isFet(part) ? [1, 60] : [1, 6]),
    values: (part) => from([central(part, 'currentNoise'), central(part, 'biasCurrent')], (noise, bias) => noise / Math.sqrt(2 * ELEMENTARY_CHARGE * bias)),
  },
  {
    name: 'noise corner',
    source: `${COMMON_PRACTICE}: bipolar from some Hz, JFET from tens, MOS up to tens of kHz; none when chopped`,
    unit: 'Hz',
    band: (part) => (isBipolar(part) ? [1, 3e3] : [10, 30e3]),
    values: (part) => (isChopped(part) ? [] : from([central(part, 'noiseCorner')], (corner) => corner)),
  },
  {
    name: '1/f noise against input capacitance',
    source: 'en²·fc = K/(C of the gate area), K about 1e-25 V²·F: Razavi, Design of Analog CMOS Integrated Circuits, 2001, ch. 7 (from memory); JFET and old processes widen it, common practice',
    unit: 'V²·F',
    band: [1e-26, 3e-23],
    values: (part) =>
      isFet(part) && !isChopped(part)
        ? from([central(part, 'voltageNoise'), central(part, 'noiseCorner'), central(part, 'inputCapacitance')], (noise, corner, capacitance) => noise ** 2 * corner * capacitance)
        : [],
  },
  {
    name: 'white noise against input capacitance',
    source: `${COMMON_PRACTICE}: quiet FET inputs are large, and large inputs have capacitance`,
    unit: 'nV²·pF/Hz',
    band: [100, 1e6],
    values: (part) => (isFet(part) ? from([central(part, 'voltageNoise'), central(part, 'inputCapacitance')], (noise, capacitance) => noise ** 2 * capacitance * 1e30) : []),
  },
];
