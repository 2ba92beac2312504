import { SHOWN } from './nearest.js';

/** A rejected part and how far it is from fitting. */
export interface Near {
  readonly position: number;
  readonly distance: number;
}

/** Keeps the few nearest of many; of equals the first seen, which is the first by id. */
export function nearestKeeper(): { see(position: number, distance: number): void; found(): readonly Near[] } {
  const kept: Near[] = [];
  let farthest = Number.POSITIVE_INFINITY;
  return {
    see(position, distance) {
      if (kept.length === SHOWN && !(distance < farthest)) return;
      const before = kept.findIndex((near) => distance < near.distance);
      kept.splice(before < 0 ? kept.length : before, 0, { position, distance });
      if (kept.length > SHOWN) kept.pop();
      farthest = kept.at(-1)?.distance ?? Number.POSITIVE_INFINITY;
    },
    found: () => kept,
  };
}
