import { describe, expect, it } from 'vitest';
import { compareConditions, compareFigures } from '../../src/parts/figure-order.js';
import type { Condition, Figure } from '../../src/parts/figures.js';

const IN_ORDER: readonly Condition[] = [
  {},
  { gain: 10 },
  { temperature: 25 },
  { temperature: 85 },
  { temperature: 'over' },
  { supply: 3 },
  { supply: 5 },
  { load: { kind: 'current', amperes: 1e-7 } },
  { load: { kind: 'current', amperes: 0.002 } },
  { load: { kind: 'current', amperes: 0.01 } },
  { load: { kind: 'resistance', ohms: 10_000, to: 'ground' } },
  { load: { kind: 'resistance', ohms: 2000, to: 'ground' } },
  { load: { kind: 'resistance', ohms: 2000, to: 'mid-supply' } },
];

describe('the order of figures', () => {
  it('goes by condition from light to heavy and from low to high', () => {
    for (const [i, a] of IN_ORDER.entries()) {
      for (const [j, b] of IN_ORDER.entries()) expect(Math.sign(compareConditions(a, b))).toBe(Math.sign(i - j));
    }
  });

  it('goes by parameter, then kind, then condition', () => {
    const figure = (parameter: Figure['parameter'], kind: Figure['kind'], condition: Condition = {}): Figure => ({ parameter, kind, value: 1, condition });
    const ordered = [
      figure('supplyVoltage', 'min'),
      figure('supplyVoltage', 'max'),
      figure('slewRate', 'min', { supply: 5 }),
      figure('slewRate', 'typ'),
      figure('offsetVoltage', 'max'),
    ];
    expect([...ordered].reverse().sort(compareFigures)).toEqual(ordered);
  });
});
