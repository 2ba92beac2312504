import type { Limits } from './march.js';
import type { Run } from './run.js';

/** Limits for a run whose states count from `centre` (V at the output): its slope so that the output slews as the part does. */
export function limitsOf({ levels, slew, around }: Run, centre: number): Limits {
  const end = (level: number | null, open: number): number => (level === null ? open : level - centre);
  return { up: slew.up * around.restored, down: slew.down * around.restored, high: end(levels.high.level, Infinity), low: end(levels.low.level, -Infinity) };
}
