import { SHOWN } from './nearest.js';

/** A rejected part and how far it is from fitting. */
export interface Near {
  readonly position: number;
  readonly distance: number;
}

export interface NearestKeeper {
  /** Whether a part that is so far or farther may be among the nearest. */
  wants(distance: number): boolean;
  see(position: number, distance: number): void;
  found(): readonly Near[];
}

/** Keeps the few nearest of many; of equals the first seen, which is the first by id. */
export function nearestKeeper(): NearestKeeper {
  const kept: Near[] = [];
  let farthest = Number.POSITIVE_INFINITY;
  const wants = (distance: number): boolean => kept.length < SHOWN || distance < farthest;
  return {
    wants,
    see(position, distance) {
      if (!wants(distance)) return;
      const before = kept.findIndex((near) => distance < near.distance);
      kept.splice(before < 0 ? kept.length : before, 0, { position, distance });
      if (kept.length > SHOWN) kept.pop();
      farthest = kept.at(-1)?.distance ?? Number.POSITIVE_INFINITY;
    },
    found: () => kept,
  };
}
