import { describe, expect, it } from 'vitest';
import { sallenKey } from '../../src/formulas/filters.js';
import { E24, E96 } from '../../src/quantities/e-series.js';
import { chooseSallenKey } from '../../src/stage/choose-sallen-key.js';
import { naturalOf } from '../../src/stage/filter-response.js';

const mantissa = (value: number): number => Number((value / 10 ** Math.floor(Math.log10(value) + 1e-9)).toPrecision(6));

describe('components of a Sallen-Key low-pass', () => {
  const WISHES = [[1e3, 0.707, 1, 0], [1e3, 0.707, 1, 1e3], [10e3, 2, 1, 0], [1e3, 10, 1, 0], [5e3, 0.3, 1.5, 0], [1e3, 0.707, 8, 0], [1, 0.5, 1, 0], [1e6, 1, 1, 0], [1e3, 5, 2.8, 0]] as const;
  it.each(WISHES)('for %f Hz at Q %f, gain %f, source %f Ω are preferred values that give it to 0.3 %%', (frequency, q, gain, source) => {
    const parts = chooseSallenKey({ frequency, q, gain, source })!;
    for (const ohms of [parts.r1, parts.r2]) expect(E96).toContain(mantissa(ohms));
    for (const farad of [parts.c1, parts.c2]) expect(E24).toContain(mantissa(farad));
    expect(parts.c2).toBeGreaterThanOrEqual(100e-12);
    const got = naturalOf(sallenKey({ ...parts, r1: parts.r1 + source }, Infinity));
    expect(Math.abs(got.corner / frequency - 1)).toBeLessThan(0.003);
    expect(Math.abs(got.q / q - 1)).toBeLessThan(0.003);
  });

  it('have resistors of 2..50 kΩ where that can be', () => {
    const { r1, r2 } = chooseSallenKey({ frequency: 1e3, q: 0.707, gain: 1, source: 0 })!;
    expect(Math.min(r1, r2)).toBeGreaterThanOrEqual(2e3);
    expect(Math.max(r1, r2)).toBeLessThanOrEqual(50e3);
  });

  it('have the smaller resistor at the source at unity gain: (R1+R2)C2 + R1C1 is smaller than with the two exchanged', () => {
    const { r1, r2, c1, c2 } = chooseSallenKey({ frequency: 10e3, q: 2, gain: 1, source: 0 })!;
    expect(r1).toBeLessThanOrEqual(r2);
    expect(r1 * c1).toBeLessThanOrEqual(r2 * c1);
    expect(c1 / c2).toBeGreaterThanOrEqual(4 * 2 ** 2 * 0.99);
  });

  it('are none where capacitors would be strays', () => {
    expect(chooseSallenKey({ frequency: 10e6, q: 1, gain: 1, source: 0 })).toBeNull();
  });
});
