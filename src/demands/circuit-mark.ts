import type { Stage } from '../stage/index.js';

/** Limits as they were asked. */
export type Limits = Stage['asked']['limits'];

/** Limits that only a part is held to: no circuit depends on what they say. */
const BUDGETS: readonly (keyof Limits)[] = ['dcError', 'supplyCurrent', 'outputNoise', 'snr', 'distortion', 'phaseMargin'];

/**
 * A text that is equal for two stages of the same circuit in the same surroundings: what the functions of a demand (noise over
 * frequency, closed loop, edges) are made of. Budgets and wishes are no part of it; functions of the stage are left out, since they
 * follow from its networks.
 */
export function circuitMark(stage: Stage): string {
  const { asked, name: _name, assumptions: _assumptions, cautions: _cautions, ...circuit } = stage;
  const { limits: _limits, wishes: _wishes, avoid: _avoid, battery: _battery, ...rest } = asked;
  return markOf({ circuit, limits: unbudgeted(asked.limits), rest }, '');
}

/** Limits the circuit depends on. */
export function unbudgeted(limits: Limits): object {
  return Object.fromEntries(Object.entries(limits).filter(([name]) => !(BUDGETS as readonly string[]).includes(name)));
}

/** Any value as a text that tells it from every other; functions stand for `mark`. */
export function markOf(value: unknown, mark: string): string {
  return JSON.stringify(value, (_, one: unknown) => {
    if (typeof one === 'function') return mark;
    return typeof one === 'number' && !Number.isFinite(one) ? `number ${one}` : one;
  });
}
