import type { LoadedOutput } from './phase-margin-loop.js';

const DEGREES = 180 / Math.PI;

/** Magnitude of the load alone, V/V, by the frequency in Hz. What a load resistance divides away at all frequencies is in the printed gain bandwidth already. */
export function loadSize(load: LoadedOutput | null): (frequency: number) => number {
  if (load === null) return () => 1;
  const [zero, pole] = [slope(load, load.isolation), slope(load, load.outputResistance + load.isolation)];
  return (frequency) => Math.sqrt((1 + (zero * frequency) ** 2) / (1 + (pole * frequency) ** 2));
}

/** What the load turns the phase by at a frequency, degrees. */
export function loadAngle(load: LoadedOutput | null, frequency: number): number {
  if (load === null) return 0;
  return (Math.atan(slope(load, load.isolation) * frequency) - Math.atan(slope(load, load.outputResistance + load.isolation) * frequency)) * DEGREES;
}

/** 2π·(R||RL)·CL, seconds: times the frequency it is the tangent of the angle. The zero stands at Riso, the pole at Ro + Riso. */
export function slope({ resistance, capacitance }: LoadedOutput, ohms: number): number {
  const parallel = resistance === null ? ohms : (ohms * resistance) / (ohms + resistance);
  return 2 * Math.PI * parallel * capacitance;
}
