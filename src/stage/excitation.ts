import type { SignalSpec, Swing } from '../spec/spec.js';
import type { InputPoint } from './stage.js';

/** The signal as points at the stage's inputs: every combination of extremes, the centre, and one step per independent quantity. */
export interface Excitation {
  readonly points: readonly InputPoint[];
  readonly centre: InputPoint;
  /** From the centre to the end of each independent quantity, all others at their centre. */
  readonly steps: readonly InputPoint[];
}

/** Turns the signal of a stage into its extreme input points. AC-coupled inputs are deviations from the bias. */
export function excitation(signal: SignalSpec): Excitation {
  if (signal.amplitude !== undefined && signal.coupling === 'ac') {
    const peak = signal.amplitude.value;
    return { points: [{ input: -peak }, { input: peak }], centre: { input: 0 }, steps: [{ input: peak }] };
  }
  if (signal.input !== undefined) return single(signal.input);
  if (signal.positive !== undefined && signal.negative !== undefined) return independent(signal.positive, signal.negative);
  if (signal.differential !== undefined && signal.commonMode !== undefined) return coupled(signal.differential, signal.commonMode);
  throw new RangeError('a stage without a signal reached the circuit');
}

const ends = (swing: Swing): number[] => (swing.min === swing.max ? [swing.min] : [swing.min, swing.max]);
const middle = (swing: Swing): number => (swing.min + swing.max) / 2;
const half = (swing: Swing): number => (swing.max - swing.min) / 2;

function single(swing: Swing): Excitation {
  return {
    points: ends(swing).map((input) => ({ input })),
    centre: { input: middle(swing) },
    steps: [{ input: half(swing) }],
  };
}

function independent(positive: Swing, negative: Swing): Excitation {
  return {
    points: ends(positive).flatMap((p) => ends(negative).map((n) => ({ positive: p, negative: n }))),
    centre: { positive: middle(positive), negative: middle(negative) },
    steps: [
      { positive: half(positive), negative: 0 },
      { positive: 0, negative: half(negative) },
    ],
  };
}

function coupled(differential: Swing, commonMode: Swing): Excitation {
  const legs = (d: number, c: number): InputPoint => ({ positive: c + d / 2, negative: c - d / 2 });
  return {
    points: ends(differential).flatMap((d) => ends(commonMode).map((c) => legs(d, c))),
    centre: legs(middle(differential), middle(commonMode)),
    steps: [legs(half(differential), 0), legs(0, half(commonMode))],
  };
}

/** Centre plus one step. */
export function moved(centre: InputPoint, step: InputPoint): InputPoint {
  return Object.fromEntries(Object.entries(centre).map(([name, value]) => [name, value + (step[name] ?? 0)]));
}
