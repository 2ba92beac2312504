import type { Draw } from './draw.js';
import type { Ground } from './corners.js';
import type { Reading } from './reading.js';

/** What a simulation says of one reading: how far over its limit the stage is (below zero: clean), and what would not be seen. */
export interface Measured {
  /** In the unit named; positive is violated. */
  readonly excess: number;
  readonly unit: 'V' | 'A' | 'fraction';
  /** Smaller than this, the simulator's own rounding and steps decide. */
  readonly resolution: number;
}

/** Both readings at once: most of the netlist is shared. Null: the reading has no figure to build an amplifier from. */
export type Both = Readonly<Record<Reading, Measured | null>>;

/** How one check is measured on the bench. */
export interface Bench {
  measure(draw: Draw, ground: Ground): Promise<Both>;
  /** What the written rules simplify, which `agreed` repeats; null: nothing. */
  readonly simplification: string | null;
}

/** One measured number per reading. */
export async function both(of: (reading: Reading) => Promise<Measured | null> | Measured | null): Promise<Both> {
  return { pessimistic: await of('pessimistic'), optimistic: await of('optimistic') };
}

/** A waveform that is left alone says nothing of how far the edge is: being clean is certain there, however small the number. */
export function oneSided(excess: number, unit: Measured['unit'], resolution: number): Measured {
  return { excess, unit, resolution: excess > 0 ? resolution : 0 };
}
