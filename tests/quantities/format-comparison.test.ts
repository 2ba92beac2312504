import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { formatComparison } from '../../src/quantities/format.js';
import { parseQuantity } from '../../src/quantities/parse.js';

const read = (text: string): number => {
  const result = parseQuantity(text, 'voltage');
  return result.ok ? (result.quantity.nominal ?? Number.NaN) : expect.unreachable(result.problem.message);
};

describe('formatComparison', () => {
  it('rounds to nearest, and the difference is that of the printed numbers', () => {
    expect(formatComparison(0.0274321, 0.02, 'V', 'at-most')).toEqual(['27.4 mV', '20 mV', '7.4 mV']);
    expect(formatComparison(0.06752, 0.07637, 'V', 'at-most')).toEqual(['67.5 mV', '76.4 mV', '8.9 mV']);
    expect(formatComparison(1e-3, 80e-6, 'A', 'at-most')).toEqual(['1 mA', '80 µA', '920 µA']);
  });
  it('takes the digits it needs for the difference to read right', () => {
    expect(formatComparison(1.2349, 1.2, 'V', 'at-least')).toEqual(['1.235 V', '1.2 V', '35 mV']);
    expect(formatComparison(0.0503810867, 0.05038108, 'V', 'at-most')).toEqual(['50.3810867 mV', '50.38108 mV', '6.7 nV']);
    expect(formatComparison(5.5, 5.500001, 'V', 'at-least')).toEqual(['5.5 V', '5.500001 V', '1 µV']);
  });
  it('shows a narrow fail as a fail and a narrow pass as a pass', () => {
    expect(formatComparison(4.9996, 5, 'V', 'at-least')).toEqual(['4.9996 V', '5 V', '400 µV']);
    expect(formatComparison(5.0004, 5, 'V', 'at-most')).toEqual(['5.0004 V', '5 V', '400 µV']);
    expect(formatComparison(5.0009, 5.0001, 'V', 'at-least')).toEqual(['5.0009 V', '5.0001 V', '800 µV']);
  });
  it('reads met exactly as equal', () => {
    expect(formatComparison(1 / 3, 1 / 3, 'V', 'at-least')).toEqual(['333 mV', '333 mV', '0 V']);
  });
  it('tells numbers apart that differ in the last bit', () => {
    const [offered, required] = formatComparison(4.999999999999999, 5, 'V', 'at-least');
    expect(offered).toBe('4.999999999999999 V');
    expect(required).toBe('5 V');
  });
  it('never prints a comparison that reads the other way round', () => {
    const volts = fc.double({ min: 1e-6, max: 900, noNaN: true });
    const near = fc.tuple(volts, fc.double({ min: -1e-3, max: 1e-3, noNaN: true })).map(([value, by]) => [value, value * (1 + by)] as const);
    fc.assert(
      fc.property(near, fc.constantFrom('at-least' as const, 'at-most' as const), ([offered, required], sense) => {
        const [shown = Number.NaN, limit = Number.NaN] = formatComparison(offered, required, 'V', sense).slice(0, 2).map(read);
        expect(shown === limit).toBe(offered === required);
        const met = (a: number, b: number): boolean => (sense === 'at-least' ? a >= b : a <= b);
        expect(met(shown, limit)).toBe(met(offered, required));
      }),
      { seed: 20240217, numRuns: 2000 },
    );
  });
});
