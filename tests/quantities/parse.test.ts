import { describe, expect, it } from 'vitest';
import type { FieldKind } from '../../src/quantities/kinds.js';
import { parseQuantity } from '../../src/quantities/parse.js';
import type { Quantity, QuantityProblem, ReadingContext } from '../../src/quantities/quantity.js';

const read = (text: string, kind: FieldKind, context: ReadingContext = {}): Quantity => {
  const result = parseQuantity(text, kind, context);
  return result.ok ? result.quantity : expect.unreachable(`${text}: ${result.problem.code} ${result.problem.message}`);
};
const refused = (text: string, kind: FieldKind, context: ReadingContext = {}): QuantityProblem => {
  const result = parseQuantity(text, kind, context);
  return result.ok ? expect.unreachable(`${text}: ${result.quantity.echo}`) : result.problem;
};
const nominal = (text: string, kind: FieldKind, context: ReadingContext = {}): number | undefined => read(text, kind, context).nominal;
const code = (text: string, kind: FieldKind, context: ReadingContext = {}): string => refused(text, kind, context).code;
const marked = (text: string, kind: FieldKind, context: ReadingContext = {}): string => text.slice(...refused(text, kind, context).span);

describe('Q-2 characters', () => {
  it.each(['4.7 kΩ', '4.7 k\u2126', '４．７ ｋΩ', '4.7\u202fkΩ', '4.7\u2009kΩ', '4.7\u2007kΩ'])('%j is 4.7 kΩ', (text) => expect(nominal(text, 'resistance')).toBe(4700));
  it('reads both micro signs, kelvin sign and degree Celsius sign', () => {
    expect(nominal('4\u03bc7', 'capacitance')).toBe(nominal('4\u00b57', 'capacitance'));
    expect(nominal('300 \u212a', 'temperature')).toBe(26.85);
    expect(nominal('25\u2103', 'temperature')).toBe(25);
  });
  it.each([
    ['\ufeff5 V', 'invisible character U+FEFF at position 1', '\ufeff'],
    ['5 V\u00ad', 'invisible character U+00AD at position 4', '\u00ad'],
    ['5\u2003V', 'invisible character U+2003 at position 2', '\u2003'],
    ['fünf V', 'character ü (U+00FC) at position 2', 'ü'],
    ['5 💥', 'character 💥 (U+1F4A5) at position 3', '💥'],
  ])('%j is named by code point', (text, message, character) => {
    const problem = refused(text, 'supply');
    expect(problem.code).toBe('Q016');
    expect(problem.message).toContain(message);
    expect(text.slice(...problem.span)).toBe(character);
  });
  it('keeps spans right when one character becomes two', () => expect(marked('3.0…4.2 mA', 'supply')).toBe('mA'));
});

describe('Q-3, Q-4 numbers', () => {
  it.each([['2.2 nF', 2.2e-9], ['0.1u', 1e-7], ['4n7', 4.7e-9], ['22 pF', 2.2e-11]] as const)('%s is exactly %d', (text, value) => expect(nominal(text, 'capacitance')).toBe(value));
  it.each(['3e-9 A', '3E-9 A', '3×10⁻⁹ A', '3x10^-9 A', '3·10⁻⁹ A', '3*10^-9 A', '3 nA', '0.003 µA'])('%s is 3 nA', (text) => expect(nominal(text, 'current')).toBe(3e-9));
  it('reads a leading or trailing point', () => {
    expect(nominal('.5 V', 'voltage')).toBe(0.5);
    expect(nominal('5. V', 'voltage')).toBe(5);
  });
  it.each(['0x10 V', 'Infinity V', 'NaN', '1.5.2e V', 'see DS', 'mV', '=5 V', '5 5 V', '5 V?'])('%s is not read', (text) => expect(code(text, 'voltage')).toMatch(/^Q0(05|13)$/));
  it('refuses what is beyond binary numbers', () => {
    expect(code('1e999 V', 'voltage')).toBe('Q010');
    expect(code('1e-999 V', 'voltage')).toBe('Q010');
  });
});

describe('Q-5 comma and grouping', () => {
  it.each(["10'000 Ω", '10’000 Ω', '10_000 Ω', '10 000 Ω'])('%s is accepted without a note', (text) => {
    expect(nominal(text, 'resistance')).toBe(10000);
    expect(read(text, 'resistance').note).toBeUndefined();
  });
  it.each([['1.000.000 ohm', 1e6], ['1,234.5 ohm', 1234.5], ['1.234,5 ohm', 1234.5], ['0,008 ohm', 0.008], ['1,25 ohm', 1.25], [',5 ohm', 0.5]] as const)('%s is accepted with a note', (text, value) => {
    expect(nominal(text, 'resistance')).toBe(value);
    expect(read(text, 'resistance').note).toBeDefined();
  });
  it('offers both readings', () => {
    expect(refused('2,500 V', 'supply')).toMatchObject({ code: 'Q005', fix: '2500 V or 2.5 V', span: [0, 5] });
    expect(refused('1,500', 'current', { headerUnit: 'nA' })).toMatchObject({ code: 'Q005', fix: '1500 or 1.5' });
  });
  it.each(['1,00,000 V', '1,5,5 V', '1.2.3 V', '1 00 V', '1,234,5 V'])('%s is refused', (text) => expect(code(text, 'voltage')).toMatch(/^Q0(05|13)$/));
  it('follows a declared mark, also for groups', () => {
    const comma = { decimal: 'comma', headerUnit: 'pA' } as const;
    expect(nominal('45.000', 'current', comma)).toBe(4.5e-8);
    expect(nominal('0,95', 'current', comma)).toBe(9.5e-13);
    expect(read('1.5', 'current', comma).note).toContain('decimal point');
    expect(nominal('1,000 V', 'supply', { decimal: 'point' })).toBe(1000);
    expect(nominal('1.234,56 €', 'price', { decimal: 'comma' })).toBe(1234.56);
  });
});

describe('Q-6, Q-7 prefixes and letter case', () => {
  it.each([['10 KHz', 1e4], ['1megHz', 1e6], ['1 GHz', 1e9]] as const)('%s', (text, value) => expect(nominal(text, 'gbw')).toBe(value));
  it.each([['8khz', 'frequency'], ['5v', 'supply'], ['10UA', 'current'], ['100nf', 'capacitance'], ['10 OHM', 'resistance'], ['15 nV/rthz', 'vnoise']] as const)('%s is accepted with a note', (text, kind) => expect(read(text, kind).note).toBeDefined());
  it.each([
    ['50MHZ', 'gbw', '50 MHz'],
    ['1 Mhz', 'gbw', '1 MHz'],
    ['10 MOHM', 'resistance', '10 MΩ or 10 mΩ'],
    ['1 mf', 'capacitance', '1 mF'],
    ['100 mvpp', 'amplitude', '100 mVpp'],
    ['50 PF', 'capacitance', '50 pF'],
    ['10 PA', 'current', '10 pA'],
    ['10 mS', 'time', '10 ms'],
    ['7 V/mS', 'slew', '7 V/ms'],
    ['1f', 'capacitance', '1 F or 1 fF'],
  ] as const)('%s as %s is refused, fix %s', (text, kind, fix) => expect(refused(text, kind)).toMatchObject({ code: 'Q003', fix }));
});

describe('Q-8 no unit', () => {
  it.each([
    ['10m', 'resistance', '10 MΩ, 10meg or 10 mΩ'],
    ['10m', 'capacitance', '10 mF'],
    ['5m', 'voltage', '5 mV'],
    ['10M', 'gbw', '10 MHz'],
  ] as const)('%s as %s has two readings', (text, kind, fix) => expect(refused(text, kind)).toMatchObject({ code: 'Q002', fix }));
  it.each([
    ['150', 'resistance', '150 Ω or 150R'],
    ['1_000', 'resistance', '1_000 Ω'],
    ['0.35', 'gbw', '0.35 MHz'],
    ['20', 'slew', '20 V/µs'],
    ['10u', 'current', '10 µA'],
    ['2k', 'frequency', '2 kHz'],
    ['100', 'capacitance', '100 pF'],
    ['3.0..4.2', 'supply', '3.0..4.2 V'],
    ['3/3.6/4.2', 'supply', '3/3.6/4.2 V'],
    ['5±5 %', 'supply', '5 V ±5 %'],
    ['0.001', 'fraction', '0.1 % or 0.001 %'],
    ['0', 'temperature', '0 °C'],
    ['1', 'amplitude', '1 Vpk, 1 Vpp or 1 Vrms'],
    ['1e5', 'ratio', '1e5 V/V'],
    ['45', 'angle', '45 °'],
  ] as const)('%s as %s: fix %s', (text, kind, fix) => expect(refused(text, kind)).toMatchObject({ code: 'Q001', fix }));
  it.each([['0', 'voltage', 0], ['0', 'current', 0], ['8', 'gain', 8], ['3', 'count', 3], ['2K', 'resistance', 2000], ['100 k', 'resistance', 1e5], ['1n', 'capacitance', 1e-9], ['200p', 'capacitance', 2e-10], ['1G', 'resistance', 1e9], ['10k', 'gain', 1e4]] as const)(
    '%s as %s needs none',
    (text, kind, value) => expect(nominal(text, kind)).toBe(value),
  );
});

describe('units from a header', () => {
  it.each([
    ['V', 'voltage', 1], ['mV', 'voltage', 1e-3], ['µV', 'voltage', 1e-6], ['uV', 'offset_limit', 1e-6], ['A', 'current', 1], ['mA', 'current', 1e-3], ['µA', 'current', 1e-6], ['uA', 'current', 1e-6], ['nA', 'current', 1e-9],
    ['pA', 'current', 1e-12], ['fA', 'current', 1e-15], ['µA/ch', 'current', 1e-6], ['Ω', 'resistance', 1], ['kΩ', 'resistance', 1e3], ['MΩ', 'resistance', 1e6], ['ohm', 'resistance', 1], ['F', 'capacitance', 1], ['µF', 'capacitance', 1e-6],
    ['nF', 'capacitance', 1e-9], ['pF', 'capacitance', 1e-12], ['Hz', 'frequency', 1], ['kHz', 'frequency', 1e3], ['MHz', 'gbw', 1e6], ['V/µs', 'slew', 1e6], ['V/us', 'slew', 1e6], ['V/ms', 'slew', 1e3], ['nV/√Hz', 'vnoise', 1e-9],
    ['fA/√Hz', 'inoise', 1e-15], ['pA/√Hz', 'inoise', 1e-12], ['V/V', 'gain', 1], ['V/mV', 'ratio', 1e3], ['µV/V', 'ratio', 1e6], ['dB', 'ratio', 10 ** 0.05], ['µV/K', 'drift', 1e-6], ['µV/°C', 'drift', 1e-6], ['mV/K', 'drift', 1e-3],
    ['°C', 'temperature', 1], ['K/W', 'thermal', 1], ['°C/W', 'thermal', 1], ['%', 'fraction', 0.01], ['ppm', 'fraction', 1e-6], ['ppm/K', 'tempco', 1e-6], ['s', 'time', 1], ['ms', 'time', 1e-3], ['µs', 'time', 1e-6], ['ns', 'time', 1e-9],
    ['EUR', 'price', 1], ['°', 'angle', 1], ['(V/µs)', 'slew', 1e6],
  ] as const)('1 under %s as %s', (headerUnit, kind, value) => expect(nominal('1', kind, { headerUnit })).toBeCloseTo(value, 15));

  it('the unit of the cell wins, with a note', () => {
    expect(read('0.95 uA', 'current', { headerUnit: 'mA' })).toMatchObject({ nominal: 9.5e-7, note: "the cell's own unit µA taken, not mA of the header" });
    expect(read('5 mV', 'voltage', { headerUnit: 'mV' }).note).toBeUndefined();
  });
  it('a prefix on a prefixed header makes two scale factors', () => {
    expect(refused('0.01k', 'current', { headerUnit: 'nA' })).toMatchObject({ code: 'Q012', fix: '10 nA' });
    expect(refused('10M', 'gbw', { headerUnit: 'MHz' })).toMatchObject({ code: 'Q012', fix: '10 MHz' });
    expect(nominal('10M', 'gbw', { headerUnit: 'Hz' })).toBe(1e7);
  });
  it('a header nobody understands is named', () => expect(refused('1', 'voltage', { headerUnit: 'furlong' }).message).toContain('furlong'));
  it('$ is the dollar of the column, if it is one', () => {
    expect(read('$0.42', 'price', { headerUnit: 'CAD' }).unit).toBe('CAD');
    expect(refused('$0.42', 'price', { headerUnit: 'EUR' })).toMatchObject({ code: 'Q011', fix: '0.42 USD' });
  });
});

describe('Q-9 letter codes', () => {
  it.each([['2R2', 2.2], ['5L0', 0.005], ['1G5', 1.5e9], ['1T0', 1e12], ['4k7 Ω', 4700], ['R47', 0.47]] as const)('%s', (text, value) => expect(nominal(text, 'resistance')).toBe(value));
  it.each([['2u2', 2.2e-6], ['4p7', 4.7e-12], ['n47', 4.7e-10]] as const)('%s', (text, value) => expect(nominal(text, 'capacitance')).toBe(value));
  it.each([['4k7B', 0.001], ['4k7C', 0.0025], ['4k7D', 0.005], ['4k7F', 0.01], ['4k7G', 0.02], ['470RJ', 0.05]] as const)('%s has a tolerance', (text, tolerance) => {
    const { min, nominal: value = Number.NaN, max } = read(text, 'resistance');
    expect(min).toBeCloseTo(value * (1 - tolerance), 9);
    expect(max).toBeCloseTo(value * (1 + tolerance), 9);
  });
  it('letters belong to their kind', () => {
    expect(code('4k7', 'capacitance')).toBe('Q004');
    expect(code('4n7', 'resistance')).toBe('Q004');
    expect(code('3V3', 'resistance')).toBe('Q004');
    expect(code('4A7', 'resistance')).toBe('Q011');
    expect(refused('4n7J', 'capacitance')).toMatchObject({ code: 'Q006', fix: '4.7 nF ±5 %' });
    expect(code('4k7 kΩ', 'resistance')).toBe('Q012');
  });
});

describe('Q-10 tolerance', () => {
  it.each([
    ['5V +/-5%', 4.75, 5.25], ['5 V +5/-10 %', 4.5, 5.25], ['5 V +5%/-10%', 4.5, 5.25], ['5 V +5% -10%', 4.5, 5.25], ['5 V (+5/-10 %)', 4.5, 5.25], ['5 V +0.25/-0.1 V', 4.9, 5.25], ['5 V (±0.25 V)', 4.75, 5.25], ['5000 ± 250 mV', 4.75, 5.25],
    ['3V3 ±5%', 3.135, 3.465],
  ] as const)('%s', (text, min, max) => expect(read(text, 'supply')).toMatchObject({ min, max, tolerance: true }));
  it.each(['4k7 ±1 %', '4.7 kΩ ±1%', '4k7 1%', '4.7k +/- 1 %', '4.7 kΩ ±47 Ω'])('%s', (text) => expect(read(text, 'resistance')).toMatchObject({ min: 4653, nominal: 4700, max: 4747 }));
  it('is a difference for temperatures', () => expect(read('25 °C ±2 K', 'temperature')).toMatchObject({ min: 23, nominal: 25, max: 27 }));
  it.each([
    ['5 V ±5', 'Q006'], ['5V ± 5mA', 'Q006'], ['5 V -10%', 'Q006'], ['5 V +5%', 'Q006'], ['5 V ±-5 %', 'Q019'], ['5 V +5/+10 %', 'Q019'], ['5 V ±120 %', 'Q010'], ['5 ± 250 mV', 'Q008'], ['5%', 'Q021'], ['±5 V', 'Q015'], ['+5/-5 V', 'Q015'],
    ['+12V/-12V', 'Q015'],
  ] as const)('%s is refused: %s', (text, expected) => expect(code(text, 'supply')).toBe(expected));
  it('± alone is a magnitude only where the kind allows it', () => {
    expect(read('±50 ppm/°C', 'tempco')).toMatchObject({ max: 5e-5, limit: 'max' });
    expect(refused('±1 V', 'voltage')).toMatchObject({ code: 'Q021', fix: '-1 V..1 V' });
    expect(code('25 °C ±5 %', 'temperature')).toBe('Q006');
  });
});

describe('Q-11 ranges', () => {
  it.each(['20Hz-20kHz', '20 Hz - 20 kHz', '20 Hz to 20 kHz', '20 Hz…20 kHz', '0.02..20 kHz'])('%s', (text) => expect(read(text, 'frequency')).toMatchObject({ min: 20, max: 20000 }));
  it.each(['-40..85 °C', '-40..+85C', '-40 – 85 °C', '−40 °C to 85 °C'])('%s', (text) => expect(read(text, 'temperature')).toMatchObject({ min: -40, max: 85 }));
  it('a hyphen between unsigned numbers only', () => {
    expect(read('0-70 °C', 'temperature')).toMatchObject({ min: 0, max: 70 });
    expect(refused('-1-1 V', 'voltage')).toMatchObject({ code: 'Q007', fix: '-1..1 V' });
    expect(read('1e-3-2e-3 A', 'current')).toMatchObject({ min: 0.001, max: 0.002 });
  });
  it.each([['500..100 mV', 'Q007', '100..500 mV'], ['100..100 mV', 'Q008', '100 V..100 mV'], ['4.2 V..3 V', 'Q007', '3 V..4.2 V'], ['900 mV..1.2', 'Q008', '900 mV..1.2 mV']] as const)('%s is refused: %s', (text, expected, fix) =>
    expect(refused(text, 'voltage')).toMatchObject({ code: expected, fix }));
  it('a unit without prefix on the first end is enough', () => expect(read('3.0 V..4.2', 'supply')).toMatchObject({ min: 3, max: 4.2 }));
});

describe('Q-12, Q-13 slashes and limits', () => {
  const header = { headerUnit: 'mV' } as const;
  it.each([
    ['2 (5 max)', { nominal: 0.002, max: 0.005 }], ['1 typ, 3 max', { nominal: 0.001, max: 0.003 }], ['typ 1 max 3', { nominal: 0.001, max: 0.003 }], ['10 (min 7)', { min: 0.007, nominal: 0.01 }], ['max 0.75', { max: 0.00075, limit: 'max' }],
    ['<10', { max: 0.01, limit: 'max' }], ['<=5', { max: 0.005, limit: 'max' }], ['> 85', { min: 0.085, limit: 'min' }], ['≥ 85', { min: 0.085, limit: 'min' }], ['2 typ', { nominal: 0.002, limit: 'typ' }], ['1.8...5.5', { min: 0.0018, max: 0.0055 }],
  ] as const)('%s under mV', (text, expected) => expect(read(text, 'voltage', header)).toMatchObject(expected));
  it('a limit is never a nominal value', () => {
    for (const text of ['<5 mV', 'max 5 mV', '5 mV max.', 'at most 5 mV', '> 5 mV', 'min 5 mV']) expect(nominal(text, 'voltage')).toBeUndefined();
  });
  it.each([
    ['70/200', 'Q009'], ['3/1/2', 'Q007'], ['1/2/3/4', 'Q009'], ['5 max (2 typ, 3 max)', 'Q009'], ['5 (2 max)', 'Q007'], ['~40', 'Q013'], ['≈40', 'Q013'], ['about 40', 'Q013'], ['max 1..2', 'Q013'], ['max', 'Q013'],
  ] as const)('%s is refused: %s', (text, expected) => expect(code(text, 'voltage', header)).toBe(expected));
  it('offers typ for an approximate value', () => expect(refused('~40', 'vnoise', { headerUnit: 'nV/rtHz' }).fix).toContain('typ 40'));
});

describe('Q-14 amplitude', () => {
  it.each([['1 Vp', 1], ['1 V pk', 1], ['2 VPP', 1], ['200 mVpp', 0.1], ['2 Vpk-pk', 1], ['70 mVrms', 0.07 * Math.SQRT2], ['0 dBV', Math.SQRT2], ['0 dBu', Math.sqrt(1.2)]] as const)('%s', (text, value) => expect(nominal(text, 'amplitude')).toBeCloseTo(value, 12));
  it.each([['1 V', 'Q014'], ['1 Vac', 'Q014'], ['0 dBm', 'Q011'], ['1 mA', 'Q004'], ['-1 Vpk', 'Q019'], ['1 dbv', 'Q003']] as const)('%s is refused: %s', (text, expected) => expect(code(text, 'amplitude')).toBe(expected));
  it('rms has no peak without a waveform', () => expect(code('1 Vrms', 'amplitude', { waveform: null })).toBe('Q014'));
  it('a voltage takes rms only where it is asked for', () => {
    expect(code('300 µVrms', 'voltage')).toBe('Q004');
    expect(nominal('300 µVrms', 'voltage', { rms: true })).toBe(3e-4);
  });
});

describe('Q-15 ratios and gain', () => {
  it.each([['50 µV/V', 20000], ['10 µV/V', 1e5], ['1 V/µV', 1e6], ['0 dB', 1], ['120 dB', 1e6]] as const)('%s', (text, value) => expect(nominal(text, 'ratio')).toBe(value));
  it('a rejection that is small is good: limits turn', () => {
    expect(read('<50 µV/V', 'ratio')).toMatchObject({ min: 20000, limit: 'min' });
    expect(read('< -80 dB', 'ratio')).toMatchObject({ min: 1e4, limit: 'min' });
    expect(read('>80 dB', 'ratio')).toMatchObject({ min: 1e4, limit: 'min' });
    expect(read('-90..-80 dB', 'ratio')).toMatchObject({ min: 1e4 });
  });
  it.each([['10x', 10], ['x 10', 10], ['×-10', -10], ['-20 dB', 0.1], ['1e3', 1000]] as const)('gain %s', (text, value) => expect(nominal(text, 'gain')).toBeCloseTo(value, 12));
});

describe('Q-16, Q-17 noise and slew', () => {
  it.each(['15 nV/sqrtHz', '15 nV Hz^(-1/2)', '15 nV/Hz^(1/2)', '15 nV / √Hz', '15 nV/√(Hz)', '15 nV/rt Hz', '15nV/Hz½', '15 nV·Hz^-0.5'])('%s', (text) => expect(nominal(text, 'vnoise')).toBe(1.5e-8));
  it('names the missing root', () => expect(refused('40 nV/Hz', 'vnoise', { headerUnit: 'nV/√Hz' })).toMatchObject({ code: 'Q004', fix: '40 nV/√Hz or 40 nV/rtHz' }));
  it.each(['0.6 V/us', '0.6 V/µs', '0.6 V/usec', '0.6V per µs', '0.6 V·µs⁻¹', '0.0006 V/ns', '600 V/ms', '6e5 V/s'])('%s', (text) => expect(nominal(text, 'slew')).toBe(600000));
  it('notes the siemens reading', () => expect(read('7 V/uS', 'slew')).toMatchObject({ nominal: 7e6, note: 'S read as seconds, not siemens' }));
  it('notes a unit in the wrong case as it was typed', () => expect(read('2 khz', 'frequency')).toMatchObject({ nominal: 2000, note: 'unit written khz: read as kHz' }));
});

describe('Q-18 temperature and price', () => {
  it.each([['25 degC', 25], ['25 deg C', 25], ['298.15 K', 25], ['77 K', -196.15]] as const)('%s', (text, value) => expect(nominal(text, 'temperature')).toBe(value));
  it.each([['25 K', 'Q010'], ['-300 °C', 'Q010'], ['25°', 'Q004'], ['25 k', 'Q003'], ['-40/85 °C', 'Q009'], ['+85/-40 °C', 'Q007'], ['77 F', 'Q011']] as const)('%s is refused: %s', (text, expected) => expect(code(text, 'temperature')).toBe(expected));
  it.each([['CHF 0.42', 'CHF'], ['€0.42', 'EUR'], ['0.42€', 'EUR'], ['0.42 GBP', 'GBP']] as const)('%s', (text, unit) => expect(read(text, 'price')).toMatchObject({ nominal: 0.42, unit }));
  it.each([['$0.42', 'Q011'], ['£0.42', 'Q016'], ['-0.42 EUR', 'Q019'], ['0', 'Q001'], ['0.42 XYZ', 'Q011']] as const)('%s is refused: %s', (text, expected) => expect(code(text, 'price')).toBe(expected));
});

describe('Q-19 kind, sign and size', () => {
  it.each([
    ['5 kΩ', 'voltage', 'a resistance where a voltage is expected'], ['10 µF', 'resistance', 'a capacitance where a resistance is expected'], ['5 V/µs', 'voltage', 'a slew rate where a voltage is expected'], ['10 mH', 'capacitance', 'an inductance where a capacitance is expected'],
    ['5 fA', 'inoise', 'a current where a noise density is expected'], ['120 °C', 'thermal', 'a temperature where a thermal resistance is expected'],
  ] as const)('%s as %s', (text, kind, message) => expect(refused(text, kind)).toMatchObject({ code: 'Q004', message }));
  it.each([['-10 kΩ', 'resistance'], ['-5 V', 'supply'], ['-1', 'count'], ['-1 ms', 'time'], ['-3 mV', 'offset_limit']] as const)('%s as %s has a sign too many', (text, kind) => expect(code(text, kind)).toBe('Q019'));
  it.each([['2.5', 'Q013'], ['1,000', 'Q005'], ['two', 'Q013'], ['2k', 'Q011'], ['2 %', 'Q004']] as const)('count %s is refused: %s', (text, expected) => expect(code(text, 'count')).toBe(expected));
  it('holds at the edges of the plausible', () => {
    expect(nominal('1 F', 'capacitance')).toBe(1);
    expect(code('1.001 F', 'capacitance')).toBe('Q010');
    expect(nominal('100 %', 'fraction')).toBe(1);
    expect(code('100.1 %', 'fraction')).toBe('Q010');
    expect(code('0', 'supply')).toBe('Q010');
  });
});

describe('no quantity at all', () => {
  it.each(['', '  ', '-', '–', '?', 'n/a', 'NA', '#N/A', 'NULL', 'tbd', 'TBD'])('%j is Q020', (text) => expect(code(text, 'voltage')).toBe('Q020'));
  it.each(['#####', '5-Mar', 'Mar-05', '5. Mrz', '2024-03-05', '1/3/2024', '05.03.24', '12:30', '#REF!', '#DIV/0!'])('%j is Q017', (text) => expect(code(text, 'voltage')).toBe('Q017'));
});

describe('spans point at the fault', () => {
  it.each([
    ['5 mA', 'supply', 'mA'], ['5 V ±5', 'supply', '5'], ['4k7M', 'resistance', 'M'], ['10M', 'resistance', 'M'], ['1 V', 'amplitude', 'V'], ['  4.2..3.0 V  ', 'supply', '4.2..3.0 V'], ['typ 1,000 V', 'supply', '1,000'], ['5 V foo', 'supply', 'V foo'],
    ['25 mV..330 mA', 'voltage', 'mA'],
  ] as const)('%j as %s: %j', (text, kind, part) => expect(marked(text, kind)).toBe(part));
});

describe('charges', () => {
  it.each([['500 mAh', 1800], ['0.5 Ah', 1800], ['500 µAh', 1.8], ['500 uAh', 1.8], ['1800 C', 1800], ['10 A·s', 10], ['10 As', 10], ['500 mA h', 1800], ['2,5 Ah', 9000]] as const)('%s is %d coulomb', (text, value) => {
    expect(nominal(text, 'charge')).toBe(value);
    expect(read(text, 'charge').unit).toBe('C');
  });

  it('are shown as batteries state them, or as typed', () => {
    expect(read('0.5 Ah', 'charge').echo).toBe('500 mAh');
    expect(read('400..500 mAh', 'charge').echo).toBe('400 mAh..500 mAh');
    expect(read('2 C', 'charge').echo).toBe('2 C');
  });

  it.each([
    ['500', 'Q001', '500 mAh'],
    ['500 mah', 'Q003', '500 mAh'],
    ['500 mA', 'Q004', '500 mAh'],
    ['500 mAhh', 'Q011', '500 mAh'],
    ['-5 Ah', 'Q019', '5 Ah'],
  ])('%s is refused with %s and offers %s', (text, wanted, fix) => {
    expect([refused(text, 'charge').code, refused(text, 'charge').fix]).toEqual([wanted, fix]);
  });

  it('are named where something else is expected', () => expect(refused('20 mAh', 'current').message).toBe('a charge where a current is expected'));
  it('leave C a temperature elsewhere', () => expect(nominal('25 C', 'temperature')).toBe(25));
});

describe('plain numbers and shares', () => {
  it.each(['0.3..0.7', '30..70 %', '30 %..70 %'])('%s are shares', (text) => {
    expect(read(text, 'share')).toMatchObject({ min: 0.3, max: 0.7, unit: '1', echo: '0.3..0.7' });
  });
  it.each([['1.5', 'Q010'], ['150 %', 'Q010'], ['-0.3', 'Q019'], ['0.3 V', 'Q004'], ['300 m', 'Q011']])('%s is no share: %s', (text, wanted) => expect(code(text, 'share')).toBe(wanted));
  it('a number has no unit and no prefix', () => {
    expect(nominal('0.707', 'number')).toBe(0.707);
    expect(code('0.707 V', 'number')).toBe('Q004');
    expect([refused('2k', 'number').code, refused('2k', 'number').fix]).toEqual(['Q011', '2000']);
  });
});
