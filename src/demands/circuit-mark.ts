import type { Stage } from '../stage/index.js';

/**
 * A text that is equal for two stages of the same circuit in the same surroundings: what the functions of a demand (noise over
 * frequency, closed loop, edges) are made of. Budgets that only a part is held to, and wishes, are no part of it; functions of the
 * stage are left out, since they follow from its networks.
 */
export function circuitMark(stage: Stage): string {
  const { asked, name: _name, assumptions: _assumptions, cautions: _cautions, ...circuit } = stage;
  const { dcError: _dcError, supplyCurrent: _supplyCurrent, outputNoise: _outputNoise, snr: _snr, distortion: _distortion, phaseMargin: _phaseMargin, ...limits } = asked.limits;
  const { limits: _limits, wishes: _wishes, avoid: _avoid, battery: _battery, ...rest } = asked;
  return markOf({ circuit, limits, rest }, '');
}

/** Any value as a text that tells it from every other; functions stand for `mark`. */
export function markOf(value: unknown, mark: string): string {
  return JSON.stringify(value, (_, one: unknown) => {
    if (typeof one === 'function') return mark;
    return typeof one === 'number' && !Number.isFinite(one) ? `number ${one}` : one;
  });
}
