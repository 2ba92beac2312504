import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { formatComparison } from '../../src/quantities/format.js';
import { parseQuantity } from '../../src/quantities/parse.js';

const read = (text: string): number => {
  const result = parseQuantity(text, 'voltage');
  return result.ok ? (result.quantity.nominal ?? Number.NaN) : expect.unreachable(result.problem.message);
};

describe('formatComparison', () => {
  it('rounds toward the unsafe side', () => {
    expect(formatComparison(1.2349, 1.2, 'V', 'at-least')).toEqual(['1.23 V', '1.2 V']);
    expect(formatComparison(0.0274321, 0.02, 'V', 'at-most')).toEqual(['27.5 mV', '20 mV']);
    expect(formatComparison(1e-3, 80e-6, 'A', 'at-most')).toEqual(['1 mA', '80 µA']);
  });
  it('shows a narrow fail as a fail and a narrow pass as a pass', () => {
    expect(formatComparison(4.9996, 5, 'V', 'at-least')).toEqual(['4.99 V', '5 V']);
    expect(formatComparison(5.0004, 5, 'V', 'at-most')).toEqual(['5.01 V', '5 V']);
    expect(formatComparison(5.0009, 5.0001, 'V', 'at-least')).toEqual(['5.0009 V', '5.0001 V']);
  });
  it('reads met exactly as equal', () => {
    expect(formatComparison(1 / 3, 1 / 3, 'V', 'at-least')).toEqual(['333 mV', '333 mV']);
  });
  it('tells numbers apart that differ in the last bit', () => {
    const [offered, required] = formatComparison(4.999999999999999, 5, 'V', 'at-least');
    expect(offered).toBe('4.9999999999999 V');
    expect(required).toBe('5 V');
  });
  it('never prints a comparison that reads the other way round', () => {
    const volts = fc.double({ min: 1e-6, max: 900, noNaN: true });
    const near = fc.tuple(volts, fc.double({ min: -1e-3, max: 1e-3, noNaN: true })).map(([value, by]) => [value, value * (1 + by)] as const);
    fc.assert(
      fc.property(near, fc.constantFrom('at-least' as const, 'at-most' as const), ([offered, required], sense) => {
        const [shown = Number.NaN, limit = Number.NaN] = formatComparison(offered, required, 'V', sense).map(read);
        const met = (a: number, b: number): boolean => (sense === 'at-least' ? a >= b : a <= b);
        expect(met(shown, limit)).toBe(met(offered, required));
      }),
      { seed: 20240217, numRuns: 2000 },
    );
  });
});
