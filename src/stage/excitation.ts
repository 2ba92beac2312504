import type { SignalSpec, Swing } from '../spec/spec.js';
import type { InputPoint } from './stage.js';

/** The signal as points at the stage's inputs: every combination of extremes, the centre, and one step per independent quantity. */
export interface Excitation {
  readonly points: readonly InputPoint[];
  readonly centre: InputPoint;
  /** From the centre to the end of each independent quantity, all others at their centre; none: the points say it all. */
  readonly steps: readonly InputPoint[];
  /** Peak-to-peak size of the signal as a share of the distance between its extreme points: 1 unless a free duty doubles that. */
  readonly stepShare: number;
}

/**
 * Turns the signal of a stage into its extreme input points. AC-coupled inputs are deviations from the bias; a pulse stands
 * (1−D)·Vpp above it and D·Vpp below, each side up to Vpp when its duty D is free, and a lone step as well.
 */
export function excitation(signal: SignalSpec, name = 'input'): Excitation {
  if (signal.amplitude !== undefined && signal.coupling === 'ac') return alternating(signal, signal.amplitude.value);
  if (signal.input !== undefined) return single(signal.input, name);
  if (signal.positive !== undefined && signal.negative !== undefined) return pairs({ positive: signal.positive, negative: signal.negative });
  if (signal.differential !== undefined && signal.commonMode !== undefined) return coupled(signal.differential, signal.commonMode);
  throw new RangeError('a stage without a signal reached the circuit');
}

function alternating({ shape, duty }: SignalSpec, peak: number): Excitation {
  const whole = 2 * peak;
  if (shape === 'sine' || shape === 'band-limited') return about({ low: -peak, high: peak, share: 1 });
  if (shape === 'pulse' && duty !== undefined) return about({ low: -duty.value * whole, high: (1 - duty.value) * whole, share: 1 });
  return about({ low: -whole, high: whole, share: 0.5 });
}

function about({ low, high, share }: { low: number; high: number; share: number }): Excitation {
  const middleOf = (low + high) / 2;
  return { points: [{ input: low }, { input: high }], centre: { input: middleOf }, steps: [{ input: (high - low) / 2 }], stepShare: share };
}

/** Two independent quantities, every combination of their ends. */
export function pairs(swings: Readonly<Record<string, Pick<Swing, 'min' | 'max'>>>): Excitation {
  const names = Object.keys(swings);
  const each = (pick: (swing: Pick<Swing, 'min' | 'max'>) => number): InputPoint =>
    Object.fromEntries(Object.entries(swings).map(([name, swing]) => [name, pick(swing)]));
  const points = Object.entries(swings).reduce<InputPoint[]>((all, [name, swing]) => all.flatMap((point) => ends(swing).map((value) => ({ ...point, [name]: value }))), [{}]);
  const still = each(() => 0);
  return { points, centre: each(middle), steps: names.map((name) => ({ ...still, [name]: each(half)[name] ?? 0 })), stepShare: 1 };
}

const ends = (swing: Pick<Swing, 'min' | 'max'>): number[] => (swing.min === swing.max ? [swing.min] : [swing.min, swing.max]);
const middle = (swing: Pick<Swing, 'min' | 'max'>): number => (swing.min + swing.max) / 2;
const half = (swing: Pick<Swing, 'min' | 'max'>): number => (swing.max - swing.min) / 2;

function single(swing: Swing, name: string): Excitation {
  return pairs({ [name]: swing });
}

function coupled(differential: Swing, commonMode: Swing): Excitation {
  const legs = (d: number, c: number): InputPoint => ({ positive: c + d / 2, negative: c - d / 2 });
  return {
    points: ends(differential).flatMap((d) => ends(commonMode).map((c) => legs(d, c))),
    centre: legs(middle(differential), middle(commonMode)),
    steps: [legs(half(differential), 0), legs(0, half(commonMode))],
    stepShare: 1,
  };
}

/** Centre plus one step. */
export function moved(centre: InputPoint, step: InputPoint): InputPoint {
  return Object.fromEntries(Object.entries(centre).map(([name, value]) => [name, value + (step[name] ?? 0)]));
}
