import { fallsThrough, GROUND, magnitude, solve, type Element } from './nodal.js';

/** Sallen-Key low-pass as a circuit driven with 1 V; gain K set by a pair of resistors. */
export function sallenKeyCircuit(parts: {
  readonly r: readonly [number, number];
  readonly c: readonly [number, number];
  readonly gain: number;
  readonly gainBandwidth: number;
  readonly outputResistance?: number;
}): Element[] {
  const { r, c, gain, gainBandwidth, outputResistance = 0 } = parts;
  const feedback: Element[] =
    gain === 1
      ? [{ r: 1e-3, between: ['out', 'n'] }]
      : [
          { r: (gain - 1) * 1e4, between: ['out', 'n'] },
          { r: 1e4, between: ['n', GROUND] },
        ];
  return [
    { volts: 1, at: 'in' },
    { r: r[0], between: ['in', 'x'] },
    { r: r[1], between: ['x', 'p'] },
    { c: c[0], between: ['x', 'out'] },
    { c: c[1], between: ['p', GROUND] },
    ...feedback,
    { plus: 'p', minus: 'n', output: 'out', gainBandwidth, outputResistance },
  ];
}

/** Multiple-feedback low-pass as a circuit driven with 1 V. */
export function multipleFeedbackCircuit(parts: {
  readonly r: readonly [number, number, number];
  readonly c: readonly [number, number];
  readonly gainBandwidth: number;
}): Element[] {
  const { r, c, gainBandwidth } = parts;
  return [
    { volts: 1, at: 'in' },
    { r: r[0], between: ['in', 'x'] },
    { r: r[1], between: ['x', 'out'] },
    { r: r[2], between: ['x', 'n'] },
    { c: c[0], between: ['x', GROUND] },
    { c: c[1], between: ['n', 'out'] },
    { plus: GROUND, minus: 'n', output: 'out', gainBandwidth },
  ];
}

/** Measured −3 dB frequency (Hz) of a circuit driven with 1 V, searched upwards from a frequency in its flat range. */
export function measuredBandwidth(circuit: readonly Element[], from: number): number {
  const gain = (frequency: number): number => magnitude(solve(circuit, frequency)('out'));
  return fallsThrough(gain, gain(from * 1e-4) / Math.SQRT2, from);
}
