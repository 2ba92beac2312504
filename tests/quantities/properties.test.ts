import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { formatQuantity, formatRange } from '../../src/quantities/format.js';
import { FIELD_KINDS, type FieldKind } from '../../src/quantities/kinds.js';
import { parseQuantity } from '../../src/quantities/parse.js';
import type { Quantity, ReadingContext } from '../../src/quantities/quantity.js';

const SETTINGS = { seed: 20240217, numRuns: 1000 };

const read = (text: string, kind: FieldKind, context: ReadingContext = {}): Quantity => {
  const result = parseQuantity(text, kind, context);
  return result.ok ? result.quantity : expect.unreachable(`${text} as ${kind}: ${result.problem.code} ${result.problem.message}`);
};

/** Plausible sizes per kind and the unit formatQuantity is given. */
const PRINTABLE: readonly (readonly [FieldKind, string, number, number])[] = [
  ['supply', 'V', 0.2, 900],
  ['voltage', 'V', 2e-9, 900],
  ['offset_limit', 'V', 2e-9, 9],
  ['amplitude', 'Vpk', 2e-9, 900],
  ['current', 'A', 2e-17, 900],
  ['resistance', 'Ω', 2e-6, 9e11],
  ['capacitance', 'F', 2e-17, 0.9],
  ['frequency', 'Hz', 0.02, 9e10],
  ['gbw', 'Hz', 20, 9e10],
  ['slew', 'V/s', 20, 9e10],
  ['vnoise', 'V/√Hz', 2e-10, 9e-5],
  ['inoise', 'A/√Hz', 2e-17, 9e-9],
  ['gain', 'V/V', 2e-6, 9e6],
  ['drift', 'V/K', 2e-10, 0.09],
  ['tempco', '1/K', 2e-10, 0.09],
  ['temperature', '°C', 0.01, 299],
  ['thermal', 'K/W', 2e-3, 9000],
  ['time', 's', 2e-15, 9e5],
  ['price', 'EUR', 2e-6, 9e5],
  ['angle', '°', 1e-3, 359],
  ['charge', 'C', 2e-3, 9e6],
  ['share', '1', 1e-6, 0.9],
  ['number', '1', 1e-5, 9e5],
];

/** A value spread over the decades of a range. */
const logarithmic = (low: number, high: number) =>
  fc.double({ min: Math.log10(low), max: Math.log10(high), noNaN: true }).map((exponent) => 10 ** exponent);

describe('what is printed pastes back', () => {
  it.each(PRINTABLE)('%s in %s', (kind, unit, low, high) => {
    const options = fc.record({ digits: fc.integer({ min: 2, max: 12 }), ascii: fc.boolean() });
    fc.assert(
      fc.property(logarithmic(low, high), options, (value, { digits, ascii }) => {
        const back = read(formatQuantity(value, unit, { digits, ascii }), kind).nominal ?? Number.NaN;
        expect(Math.abs(back - value)).toBeLessThanOrEqual(0.5000001 * 10 ** (1 - digits) * value);
      }),
      { ...SETTINGS, numRuns: 300 },
    );
  });

  it.each(['voltage', 'current', 'temperature'] as const)('negative numbers of %s', (kind) => {
    const unit = { voltage: 'V', current: 'A', temperature: '°C' }[kind];
    fc.assert(
      fc.property(fc.double({ min: -199, max: -0.001, noNaN: true }), (value) => {
        expect(read(formatQuantity(value, unit, { digits: 12 }), kind).nominal).toBeCloseTo(value, 8);
      }),
      SETTINGS,
    );
  });

  it('ranges', () => {
    fc.assert(
      fc.property(logarithmic(0.2, 900), logarithmic(0.2, 900), (one, other) => {
        const [low, high] = [Math.min(one, other), Math.max(one, other)];
        const back = read(formatRange(low, high, 'V'), 'supply');
        expect(Math.abs((back.min ?? Number.NaN) - low)).toBeLessThanOrEqual(0.00501 * low);
        expect(Math.abs((back.max ?? Number.NaN) - high)).toBeLessThanOrEqual(0.00501 * high);
      }),
      SETTINGS,
    );
  });
});

/** Units to type per kind, and a scale that keeps three-digit numbers plausible. */
const TYPED: readonly (readonly [FieldKind, readonly string[]])[] = [
  ['supply', ['V']],
  ['voltage', ['mV', 'µV', 'V']],
  ['offset_limit', ['mV', 'uV']],
  ['amplitude', ['mVpk', 'mVpp', 'mVrms', 'Vpk', 'dBV', 'dBu']],
  ['current', ['mA', 'nA', 'pA']],
  ['resistance', ['Ω', 'kΩ', 'k', 'Mohm']],
  ['capacitance', ['pF', 'n', 'uF']],
  ['frequency', ['Hz', 'kHz']],
  ['gbw', ['MHz', 'kHz']],
  ['slew', ['V/µs', 'V/ms', 'mV/us']],
  ['vnoise', ['nV/√Hz', 'nV/rtHz']],
  ['inoise', ['fA/√Hz', 'pA/rtHz']],
  ['gain', ['', 'V/V', 'dB']],
  ['ratio', ['dB', 'V/mV', 'µV/V']],
  ['fraction', ['ppm', '‰']],
  ['drift', ['µV/°C', 'nV/K']],
  ['tempco', ['ppm/°C']],
  ['temperature', ['°C', 'K']],
  ['thermal', ['K/W']],
  ['time', ['µs', 'ms']],
  ['price', ['EUR', 'USD']],
  ['angle', ['°']],
  ['charge', ['mAh', 'Ah', 'C', 'A·s']],
  ['share', ['', '%']],
  ['number', ['']],
];

describe('the canonical echo', () => {
  const number = fc.integer({ min: 100, max: 14000 }).map((n) => (n / 100).toFixed(2));
  const shapes = ['NU', '< NU', 'min NU', 'typ NU', 'NU ±5 %', 'NU +5/-10 %', 'NU..MU', 'N..M U', 'min NU, max MU'] as const;

  it.each(TYPED)('of %s reads back to the same numbers', (kind, units) => {
    fc.assert(
      fc.property(fc.constantFrom(...units), fc.constantFrom(...shapes), fc.tuple(number, number), (unit, shape, pair) => {
        const [low = '', high = ''] = [...pair].sort((a, b) => Number(a) - Number(b));
        const text = shape.replaceAll('U', ` ${unit}`).replace('N', low).replace('M', high);
        const first = parseQuantity(text, kind);
        fc.pre(first.ok);
        const again = read(first.quantity.echo, kind);
        for (const end of ['min', 'nominal', 'max'] as const) {
          const [a, b] = [first.quantity[end], again[end]];
          if (a === undefined) expect(b).toBeUndefined();
          else expect(Math.abs((b ?? Number.NaN) - a)).toBeLessThanOrEqual(1e-9 * Math.abs(a));
        }
        expect(again.limit).toBe(first.quantity.limit);
        expect(again.tolerance).toBe(first.quantity.tolerance);
        expect(again.unit).toBe(first.quantity.unit);
      }),
      { ...SETTINGS, maxSkipsPerRun: 1000 },
    );
  });
});

/** Text that looks like quantities more often than chance would have it. */
const fragment = fc.oneof(
  fc.constantFrom(...'0123456789.,+-±/()<>~ _\'%µΩ√°eExXkKmMRVAFHzsCWnpuGTPUN\u200b\u2212–…×½⁻⁹$€'.split('')),
  fc.constantFrom('min', 'typ', 'max', 'to', '..', 'Hz', 'V/µs', 'nV/√Hz', 'dB', 'ppm', 'ohm', 'meg', '+/-', 'pp', 'rms', 'EUR', '1e', '10^', 'sqrt(', '4k7', '°C', ' V', 'Mar', '#'),
);
const quantityLike = fc.array(fragment, { maxLength: 14 }).map((pieces) => pieces.join(''));
const anyText = fc.oneof(quantityLike, fc.string({ unit: 'binary', maxLength: 20 }), fc.string({ unit: 'grapheme', maxLength: 20 }));
const anyContext: fc.Arbitrary<ReadingContext> = fc.record(
  { decimal: fc.constantFrom('point', 'comma'), headerUnit: fc.oneof(fc.constantFrom('mV', 'nA', 'µV/K', 'MHz', '%', 'V/V', 'EUR', ''), fc.string({ maxLength: 6 })), waveform: fc.constantFrom('sine', null), rms: fc.boolean() },
  { requiredKeys: [] },
);

describe('any text', () => {
  it.each(FIELD_KINDS)('as %s is read or refused with code and span', (kind) => {
    fc.assert(
      fc.property(anyText, anyContext, (text, context) => {
        const result = parseQuantity(text, kind, context);
        if (result.ok) {
          const { min, nominal, max } = result.quantity;
          const given = [min, nominal, max].filter((value) => value !== undefined);
          expect(given.length).toBeGreaterThan(0);
          expect(given.every((value) => Number.isFinite(value) && !Object.is(value, -0))).toBe(true);
          expect([...given].sort((a, b) => a - b)).toEqual(given);
          read(result.quantity.echo, kind);
          return;
        }
        const { code, message, span } = result.problem;
        expect(code).toMatch(/^Q0(?:0[1-9]|1[0-7]|19|2[01])$/);
        expect(message).not.toBe('');
        expect(message).not.toMatch(/undefined|NaN|null|please|oops/);
        expect(span[0]).toBeGreaterThanOrEqual(0);
        expect(span[0]).toBeLessThanOrEqual(span[1]);
        expect(span[1]).toBeLessThanOrEqual(text.length);
      }),
      SETTINGS,
    );
  });
});

describe('ways to write one number', () => {
  const whole = fc.integer({ min: 1000, max: 999_999_999 });
  const grouped = (value: number, mark: string): string => String(value).replace(/\B(?=(\d{3})+$)/g, mark);

  it.each([' ', "'", '_', '\u00a0', '\u202f', '\u2019'])('groups of three with %j are the plain number', (mark) => {
    fc.assert(
      fc.property(whole, (value) => {
        expect(read(`${grouped(value, mark)} Ω`, 'resistance').nominal).toBe(value);
      }),
      SETTINGS,
    );
  });

  it('decimal comma and point agree, whether declared or plain from the digits', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 999 }), fc.stringMatching(/^\d{1,6}$/), (before, after) => {
        const point = read(`${before}.${after} V`, 'voltage').nominal;
        expect(read(`${before},${after} V`, 'voltage', { decimal: 'comma' }).nominal).toBe(point);
        const open = parseQuantity(`${before},${after} V`, 'voltage');
        if (after.length === 3) expect(open).toMatchObject({ ok: false, problem: { code: 'Q005' } });
        else expect(open).toMatchObject({ ok: true, quantity: { nominal: point } });
      }),
      SETTINGS,
    );
  });

  it('letter codes, prefixes and exponents give the very same binary number', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 999 }), fc.integer({ min: 1, max: 99 }), (a, b) => {
        const expected = Number(`${a}.${b}e3`);
        for (const text of [`${a}k${b}`, `${a}K${b}`, `${a}.${b}k`, `${a}.${b} kΩ`, `${a}.${b} kohm`, `${a}.${b}e3 Ω`, `${a}.${b}×10³ Ω`, `${a}.${b}x10^3 Ω`]) {
          expect(read(text, 'resistance').nominal).toBe(expected);
        }
      }),
      SETTINGS,
    );
  });
});
