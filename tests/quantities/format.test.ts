import { describe, expect, it } from 'vitest';
import { asciiText } from '../../src/quantities/ascii.js';
import { formatDecibels, formatPercent, formatQuantity, formatRange } from '../../src/quantities/format.js';

describe('formatQuantity', () => {
  it.each([
    [4700, 'Ω', '4.7 kΩ'],
    [0.47, 'Ω', '470 mΩ'],
    [0, 'V', '0 V'],
    [-0, 'V', '0 V'],
    [-0.0015, 'V', '-1.5 mV'],
    [999.6, 'Ω', '1 kΩ'],
    [999.4, 'Ω', '999 Ω'],
    [0.1 + 0.2, 'V', '300 mV'],
    [2.2e-9, 'F', '2.2 nF'],
    [5e-15, 'A/√Hz', '5 fA/√Hz'],
    [3e-7, 'V/√Hz', '300 nV/√Hz'],
    [1e-16, 'A', '0.1 fA'],
    [1.5e6, 'V/s', '1.5 V/µs'],
    [25000, 'V/s', '25 mV/µs'],
    [3000, 'V/s', '3 V/ms'],
    [160, 'V/s', '160 V/s'],
    [9996, 'V/s', '10 mV/µs'],
    [0, 'V/s', '0 V/s'],
    [2e-6, 'V/K', '2 µV/°C'],
    [5e-5, '1/K', '50 ppm/°C'],
    [12345, 'V/V', '12300 V/V'],
    [86.0206, 'dB', '86 dB'],
    [26.85, '°C', '26.9 °C'],
    [120, 'K/W', '120 K/W'],
    [2, '1', '2'],
    [5, '%', '5 %'],
    [45, '°', '45°'],
    [0.42, 'EUR', '0.42 EUR'],
    [0.5, 'Vpk', '500 mVpk'],
  ])('%d %s is %s', (value, unit, text) => expect(formatQuantity(value, unit)).toBe(text));

  it('shows as many digits as asked, without trailing zeros', () => {
    expect(formatQuantity(12345, 'Ω', { digits: 5 })).toBe('12.345 kΩ');
    expect(formatQuantity(12345, 'Ω', { digits: 2 })).toBe('12 kΩ');
    expect(formatQuantity(12000, 'Ω', { digits: 8 })).toBe('12 kΩ');
    expect(formatQuantity(1 / 3, 'V', { digits: 17 })).toBe('333.3333333333333 mV');
  });

  it('rounds up and down on the number line, not on the size', () => {
    expect(formatQuantity(1.2341, 'V', { round: 'up' })).toBe('1.24 V');
    expect(formatQuantity(1.2349, 'V', { round: 'down' })).toBe('1.23 V');
    expect(formatQuantity(-1.2341, 'V', { round: 'up' })).toBe('-1.23 V');
    expect(formatQuantity(-1.2341, 'V', { round: 'down' })).toBe('-1.24 V');
    expect(formatQuantity(0.1 + 0.2, 'V', { round: 'up' })).toBe('300 mV');
    expect(formatQuantity(9.999, 'V', { round: 'up' })).toBe('10 V');
  });

  it('refuses what is no number', () => {
    expect(() => formatQuantity(Number.NaN, 'V')).toThrow(RangeError);
    expect(() => formatQuantity(Number.POSITIVE_INFINITY, 'V')).toThrow('Infinity');
  });

  it('has ASCII spellings', () => {
    expect(formatQuantity(15e-9, 'V/√Hz', { ascii: true })).toBe('15 nV/rtHz');
    expect(formatQuantity(4700, 'Ω', { ascii: true })).toBe('4.7 kohm');
    expect(formatQuantity(2e-6, 'V/K', { ascii: true })).toBe('2 uV/C');
    expect(formatQuantity(45, '°', { ascii: true })).toBe('45 deg');
    expect(asciiText('5 V ±5 %, −40 °C, ≤ 3 µA')).toBe('5 V +/-5 %, -40 C, <= 3 uA');
  });
});

describe('the other forms', () => {
  it('prints a range with a prefix for each end', () => {
    expect(formatRange(3, 4.2, 'V')).toBe('3 V..4.2 V');
    expect(formatRange(0.9, 1.2, 'V')).toBe('900 mV..1.2 V');
  });
  it('prints decibels of a ratio', () => {
    expect(formatDecibels(20000)).toBe('86 dB');
    expect(formatDecibels(-100)).toBe('40 dB');
    expect(() => formatDecibels(0)).toThrow(RangeError);
  });
  it('prints percent of a fraction', () => {
    expect(formatPercent(0.05)).toBe('5 %');
    expect(formatPercent(0.000005)).toBe('0.0005 %');
  });
});
