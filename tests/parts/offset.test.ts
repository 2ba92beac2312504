import { describe, expect, it } from 'vitest';
import type { Figure } from '../../src/parts/figures.js';
import { offsetReading } from '../../src/parts/offset.js';
import { AT_25, max, typ, under } from '../support/parts.js';

const WARM = { operating: { ...AT_25, hottest: 85 } };
const read = (...figures: Figure[]): ReturnType<typeof offsetReading> => offsetReading(under(figures, WARM));

describe('the offset that counts', () => {
  it('is the limit at 25 °C, with drift, however warm the stage', () => {
    expect(read(max('offsetVoltage', 1e-3, { temperature: 25 }))).toMatchObject({ value: 1e-3, basis: 'guaranteed', overTemperature: false, ratedSupply: null });
    expect(read(max('offsetVoltage', 1e-3))).toMatchObject({ overTemperature: false });
  });

  it('is three times a typical one', () => {
    expect(read(typ('offsetVoltage', 1e-3))).toMatchObject({ value: 3e-3, basis: 'derated' });
    expect(offsetReading(under([typ('offsetVoltage', 1e-3)], { outlook: 'optimistic' }))).toMatchObject({ value: 1e-3, basis: 'derated' });
  });

  it('is the one over temperature where both are known, which excludes the drift', () => {
    expect(read(max('offsetVoltage', 1e-3, { temperature: 25 }), max('offsetVoltage', 2e-3, { temperature: 'over' }))).toMatchObject({ value: 2e-3, overTemperature: true });
  });

  it('is a limit at 25 °C before a typical over temperature', () => {
    expect(read(max('offsetVoltage', 1e-3), typ('offsetVoltage', 2e-3, { temperature: 'over' }))).toMatchObject({ value: 1e-3, overTemperature: false });
  });

  it('is the one rated nearest the nominal supply, as a ratio', () => {
    // 5/3 = 1.667 against 8.2/5 = 1.64 and 8.4/5 = 1.68.
    expect(read(max('offsetVoltage', 1e-3, { supply: 3 }), max('offsetVoltage', 2e-3, { supply: 8.2 }))).toMatchObject({ value: 2e-3, ratedSupply: 8.2 });
    expect(read(max('offsetVoltage', 1e-3, { supply: 3 }), max('offsetVoltage', 2e-3, { supply: 8.4 }))).toMatchObject({ value: 1e-3, ratedSupply: 3 });
  });

  it('is the larger of two equally near, in either order', () => {
    const both = [max('offsetVoltage', 1e-3), max('offsetVoltage', 2e-3, { supply: 5 })];
    expect([read(...both)?.value, read(...[...both].reverse())?.value]).toEqual([2e-3, 2e-3]);
    expect(read(max('offsetVoltage', 2e-3, { supply: 2.5 }), max('offsetVoltage', 1e-3, { supply: 10 }))).toMatchObject({ value: 2e-3, ratedSupply: 2.5 });
  });

  it('is missing when none is printed, or with --strict none is a limit', () => {
    expect(read()).toBeNull();
    expect(offsetReading(under([typ('offsetVoltage', 1e-3)], { strict: true }))).toBeNull();
  });
});
