import type { LoadedOutput } from './phase-margin-loop.js';

const DEGREES = 180 / Math.PI;

/** Magnitude of the load alone, V/V, by the frequency in Hz. What a load resistance divides away at all frequencies is in the printed gain bandwidth already. */
export function loadSize(load: LoadedOutput | null): (frequency: number) => number {
  if (load === null) return () => 1;
  const [zero, pole] = [turned(load, load.isolation), turned(load, load.outputResistance + load.isolation)];
  return (frequency) => Math.hypot(1, Math.tan(zero(frequency) / DEGREES)) / Math.hypot(1, Math.tan(pole(frequency) / DEGREES));
}

/** What the load turns the phase by at a frequency, degrees. */
export function loadAngle(load: LoadedOutput | null, frequency: number): number {
  return load === null ? 0 : turned(load, load.isolation)(frequency) - turned(load, load.outputResistance + load.isolation)(frequency);
}

/** Angle of (R||RL)·CL by the frequency, degrees: the zero stands at Riso, the pole at Ro + Riso. */
function turned({ resistance, capacitance }: LoadedOutput, ohms: number): (frequency: number) => number {
  const parallel = resistance === null ? ohms : (ohms * resistance) / (ohms + resistance);
  return parallel === 0 ? () => 0 : (frequency) => Math.atan(2 * Math.PI * frequency * parallel * capacitance) * DEGREES;
}
