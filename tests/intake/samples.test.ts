import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import type { ListOptions, ListResult } from '../../src/intake/list.js';
import type { ListMapping } from '../../src/intake/mapping.js';
import { readList } from '../../src/intake/read-list.js';
import type { Figure } from '../../src/parts/figures.js';
import type { Part } from '../../src/parts/part.js';

// One list for each habit of spreadsheets: what must be read, and every fault with line, row, column, header and cell as written.

const FOLDER = join(import.meta.dirname, 'samples');

function sample(file: string, options: Partial<ListOptions> = {}): ListResult {
  return readList(readFileSync(join(FOLDER, file)), { file, tier: 'approved', ...options });
}

function accepted(file: string, options: Partial<ListOptions> = {}): Extract<ListResult, { ok: true }> {
  const result = sample(file, options);
  if (!result.ok) throw new Error(JSON.stringify(result.problems, null, 1));
  return result;
}

/** Code, line, row, column letter, header and cell of every problem of a severity. */
function told(result: ListResult, severity: 'error' | 'warning'): (string | number | undefined)[][] {
  const problems = result.ok ? result.warnings : result.problems;
  return problems.filter((one) => one.severity === severity && one.code !== 'I515').map(({ code, place, text }) => [code, place?.line, place?.row, place?.columnLetter, place?.header, text]);
}

const part = (result: Extract<ListResult, { ok: true }>, id: string): Part => result.parts.find((one) => one.id === id)!;
const figure = ({ figures }: Part, parameter: Figure['parameter'], kind: Figure['kind']): Figure | undefined => figures.find((one) => one.parameter === parameter && one.kind === kind);
const value = (one: Part, parameter: Figure['parameter'], kind: Figure['kind']): number | undefined => figure(one, parameter, kind)?.value;

describe('01: byte-order mark, semicolon, decimal comma', () => {
  const list = accepted('01_bom_semicolon_decimal_comma.csv');

  it('reads all eight parts and says how', () => {
    expect(list.parts.map(({ id }) => id)).toEqual(['1', '2', '3', '4', '5', '6', '7', '8'].map((n) => `ORG-OA-000${n}`));
    expect(list.warnings).toEqual([]);
    expect(list.notes[0]).toBe('encoding UTF-8 (byte-order mark, removed), delimiter `;` (19 fields in 9 of 9 records), decimal mark `,` (53 cells such as `1,8` can be nothing else), grouping `.`, header row 1.');
    expect(list.columns[0]?.header).toBe('Internal P/N');
  });

  it('reads figures in SI, with the kind the header says', () => {
    const is = (id: string, parameter: Figure['parameter'], kind: Figure['kind']): number | undefined => value(part(list, `ORG-OA-000${id}`), parameter, kind);
    expect(is('1', 'supplyVoltage', 'min')).toBe(1.8);
    expect(is('4', 'quiescentCurrent', 'max')).toBe(0.95e-6);
    expect(is('4', 'gainBandwidth', 'typ')).toBe(8000);
    expect(is('4', 'slewRate', 'typ')).toBe(3000);
    expect(is('5', 'offsetVoltage', 'max')).toBe(1e-5);
    expect(is('6', 'biasCurrent', 'typ')).toBe(45e-9);
    expect(is('8', 'quiescentCurrent', 'typ')).toBe(1.7e-3);
    expect(is('8', 'biasCurrent', 'typ')).toBe(250e-9);
    expect(is('6', 'biasCurrent', 'max')).toBeUndefined();
    expect(part(list, 'ORG-OA-0001')).toMatchObject({ description: '1 MHz CMOS, rail-to-rail in/out', price: { amount: 0.14, currency: 'EUR', quantity: 1000 }, status: 'approved' });
  });

  it('takes one swing figure for both rails, at the load of the header', () => {
    const bipolar = part(list, 'ORG-OA-0006');
    for (const side of ['outputLowHeadroom', 'outputHighHeadroom'] as const) {
      expect(figure(bipolar, side, 'max')).toEqual({ parameter: side, kind: 'max', value: 1.5, condition: { load: { kind: 'resistance', ohms: 10_000, to: 'mid-supply' } } });
    }
    expect(value(bipolar, 'shortCircuitCurrent', 'typ')).toBe(0.02);
    expect(figure(bipolar, 'outputCurrent', 'min')).toBeUndefined();
  });

  it('finds the cell of each figure by its slot', () => {
    const swings = [...list.sources.usual].filter(([, number]) => number === 17).map(([slot]) => slot.split('@')[0]);
    expect(swings).toEqual(['outputLowHeadroom.max', 'outputHighHeadroom.max']);
    expect(list.columns).toHaveLength(19);
  });
});

describe('02: UTF-16LE, tabs, units behind a slash', () => {
  const list = accepted('02_utf16le_tab.csv');

  it('reads all six parts, one column kept as text', () => {
    expect(list.notes[0]).toContain('encoding UTF-16LE (byte-order mark, removed), delimiter TAB (17 fields in 7 of 7 records), decimal mark `.`');
    expect(list.parts).toHaveLength(6);
    expect(told(list, 'warning')).toEqual([['I203', 1, 1, 'Q', 'Stock bin', 'Stock bin']]);
    expect(list.records[3]?.cells[16]).toBe('tbd');
    expect(list.notes).toContain('2 figures are unknown in 6 rows; unknown is never a pass.');
    expect(JSON.stringify(list.parts)).not.toContain('\\u0000');
  });

  it('reads grouped digits, ranges and the condition of a header', () => {
    const [first, , third, fourth, fifth, sixth] = list.parts;
    expect([value(first!, 'gainBandwidth', 'typ'), value(first!, 'offsetVoltage', 'max')]).toEqual([1e6, 3e-3]);
    expect([value(first!, 'temperature', 'min'), value(first!, 'temperature', 'max')]).toEqual([-40, 125]);
    expect(first).toMatchObject({ qualification: 'AEC-Q100 Grade 1', package: 'SOT-23-5 (MO-178)', lifecycle: 'active', status: null });
    expect(figure(third!, 'biasCurrent', 'max')).toEqual({ parameter: 'biasCurrent', kind: 'max', value: 250e-9, condition: { temperature: 85 } });
    expect(third?.lifecycle).toBe('nrnd');
    expect(third?.qualification).toBe('none');
    expect(value(fourth!, 'supplyVoltage', 'min')).toBe(1.7);
    expect(figure(fifth!, 'biasCurrent', 'max')).toBeUndefined();
    expect(figure(sixth!, 'gainBandwidth', 'typ')).toBeUndefined();
    expect(sixth?.lifecycle).toBe('preliminary');
  });
});

describe('03: Windows-1252, cells of several lines', () => {
  const result = sample('03_windows_1252_multiline.csv');
  it('states the encoding, and keeps line and row apart', () => {
    expect(result.notes[0]).toContain('encoding Windows-1252 (not UTF-8: the byte 0xB5 at offset 33, line 1)');
    expect(told(result, 'error')).toEqual([['Q013', 5, 4, 'D', 'Vos max (mV)', '3x5']]);
  });
});

describe('04: title block and merged header rows', () => {
  const FILE = '04_two_header_rows_merged.csv';
  const answered: Partial<ListOptions> = { layout: { headerRows: [4, 5], untilBlank: true }, map: [{ column: 'M', header: 'Load (kΩ)' }] };

  it('is one message with a proposal, never a guess', () => {
    const result = sample(FILE);
    if (result.ok) throw new Error('accepted');
    expect(result.problems).toHaveLength(1);
    const [problem] = result.problems;
    expect(problem).toMatchObject({ code: 'I207', place: { line: 1 } });
    expect(problem?.message).toContain('(1 of 13 cells filled); proposed: skip 3 lines, header rows 4 and 5 joined, data from row 6, stop at the first blank row (row 11)');
    const names = [
      'A "Internal part number"', 'B "Package"', 'C "Status"', 'D "Input offset (mV) / typ"', 'E "Input offset (mV) / max"', 'F "Supply (V) / min"', 'G "Supply (V) / max"',
      'H "Supply current (µA/ch) / typ"', 'I "Supply current (µA/ch) / max"', 'J "GBW (MHz) / typ"', 'K "Output swing from rail (mV) / low side max"', 'L "Output swing from rail (mV) / high side max"', 'M "Load (kΩ)"',
    ];
    expect(problem?.message).toContain(names.join(', '));
    expect(problem?.fix).toBe(`railfit import ${FILE} --header-rows 4-5 --until-blank --map "Load (kΩ)=Load (kΩ)"`);
  });

  it('asks what the column under a group of another unit is', () => {
    const result = sample(FILE, { layout: { headerRows: [4, 5], untilBlank: true } });
    expect(told(result, 'error')).toEqual([['I209', 4, 5, 'M', 'Load (kΩ)', 'Load (kΩ)']]);
    expect(!result.ok && result.questions[0]?.samples).toEqual(['10', '50']);
  });

  it.each(['answered', 'by the saved mapping'])('reads five parts when %s', (how) => {
    const options = how === 'answered' ? answered : { mappings: [accepted(FILE, answered).mapping!] };
    const list = accepted(FILE, options);
    expect(list.parts).toHaveLength(5);
    expect(list.notes.some((note) => note.startsWith('rows skipped: 1, 2, 12, 13'))).toBe(true);
    expect(list.notes).toContain('the footer says 5 parts, and 5 were read.');
    const third = part(list, 'ORG-OA-0303');
    expect(figure(third, 'outputHighHeadroom', 'max')).toMatchObject({ value: 1.5, condition: { load: { kind: 'resistance', ohms: 10_000 } } });
    expect(value(third, 'outputLowHeadroom', 'max')).toBe(0.02);
    expect(figure(part(list, 'ORG-OA-0304'), 'outputHighHeadroom', 'max')).toMatchObject({ value: 0.012, condition: { load: { kind: 'resistance', ohms: 50_000 } } });
    expect(value(part(list, 'ORG-OA-0305'), 'offsetVoltage', 'max')).toBe(1e-5);
    expect(list.records[0]).toMatchObject({ line: 6, row: 6 });
  });
});

describe('05: two figures in one cell', () => {
  const result = sample('05_typ_max_in_one_cell.csv');

  it('refuses four cells', () => {
    expect(told(result, 'error')).toEqual([
      ['Q013', 4, 4, 'H', 'en 1 kHz [nV/rtHz]', '~40'],
      ['Q007', 5, 5, 'B', 'Vos [mV] typ/max', '3.5/0.6'],
      ['Q009', 6, 6, 'D', 'Ib [pA]', '70/200'],
      ['Q009', 7, 7, 'E', 'GBW [MHz]', '4.5/3.0'],
    ]);
    expect(!result.ok && result.problems.filter(({ code }) => code.startsWith('Q0')).map(({ fix }) => fix)).toEqual(['give a value with a tolerance, or mark it typ 40', '0.6/3.5 if the two were swapped', '70 typ, 200 max', '4.5 typ, 3.0 min']);
    expect(told(result, 'warning')).toEqual([]);
  });

  it('reads the others', () => {
    const text = readFileSync(join(FOLDER, '05_typ_max_in_one_cell.csv'), 'utf8').replace('~40', '40').replace('3.5/0.6', '0.6/3.5').replace('70/200', '200').replace('4.5/3.0', '4.5');
    const list = readList(new TextEncoder().encode(text), { file: 'x.csv', tier: 'approved' });
    if (!list.ok) throw new Error('refused');
    const pairs = (id: string, parameter: Figure['parameter']): Record<string, number> => Object.fromEntries(part(list, id).figures.filter((one) => one.parameter === parameter).map((one) => [one.kind, one.value]));
    expect(pairs('ORG-OA-0401', 'offsetVoltage')).toEqual({ typ: 5e-4, max: 3e-3 });
    expect(pairs('ORG-OA-0402', 'offsetVoltage')).toEqual({ typ: 3e-4, max: 1.5e-3 });
    expect(pairs('ORG-OA-0403', 'offsetVoltage')).toEqual({ typ: 2e-3, max: 5e-3 });
    expect(pairs('ORG-OA-0406', 'offsetVoltage')).toEqual({ max: 7.5e-4 });
    expect(pairs('ORG-OA-0401', 'biasCurrent')).toEqual({ max: 1e-11 });
    expect(pairs('ORG-OA-0402', 'biasCurrent')).toEqual({ typ: 2e-12 });
    expect(pairs('ORG-OA-0402', 'gainBandwidth')).toEqual({ typ: 1e7, min: 7e6 });
    expect(pairs('ORG-OA-0401', 'supplyRejection')).toEqual({ min: 1e4 });
    expect(pairs('ORG-OA-0401', 'supplyVoltage')).toEqual({ min: 1.8, max: 5.5 });
    expect(pairs('ORG-OA-0402', 'supplyVoltage')).toEqual({ min: 2.2, max: 5.5 });
    expect(pairs('ORG-OA-0405', 'supplyVoltage')).toEqual({ min: 1.8, max: 5.5 });
    expect(pairs('ORG-OA-0402', 'voltageNoise')).toEqual({ typ: 8.5e-9 });
    expect(pairs('ORG-OA-0401', 'gainBandwidth')).toEqual({ typ: 1e6 });
    expect(list.notes.some((note) => note.startsWith('limit kind assumed'))).toBe(true);
  });
});

it('06: missing-value words, impossible zeros, an empty status', () => {
  const result = sample('06_missing_value_tokens.csv');
  expect(told(result, 'error')).toEqual([
    ['I502', 7, 7, 'H', 'Ib max (pA)', 'see DS'],
    ['I501', 9, 9, 'B', 'Status', ''],
    ['I505', 9, 9, 'H', 'Ib max (pA)', '0'],
  ]);
  expect(told(result, 'warning')).toEqual([['I506', 4, 4, 'K', 'Price (USD)', '0']]);
  expect(result.notes.some((note) => note.includes('"not applicable" and "unknown" cannot be told apart in J "Shutdown"'))).toBe(true);
  const repaired = sample('06_missing_value_tokens.csv', { missing: ['see DS'], words: new Map() });
  expect(told(repaired, 'error').map(([code]) => code)).toEqual(['I501', 'I505']);
});

it('07: dates, exponent ids, lost zeros, hashes', () => {
  const result = sample('07_spreadsheet_damage.csv');
  expect(told(result, 'error')).toEqual([
    ['Q017', 2, 2, 'A', 'Internal P/N', '1.2E+10'],
    ['Q017', 3, 3, 'C', 'Supply (V)', '02-May'],
    ['Q017', 4, 4, 'B', 'Package', '8-May'],
    ['Q017', 4, 4, 'D', 'Vos typ/max (mV)', '05-Mar'],
    ['Q017', 5, 5, 'E', 'Ib max (pA)', '####'],
    ['Q017', 7, 7, 'D', 'Vos typ/max (mV)', '2024-03-05'],
    ['Q017', 7, 7, 'F', 'GBW (MHz)', '######'],
    ['Q017', 8, 8, 'F', 'GBW (MHz)', 'Jan 00'],
    ['Q017', 9, 9, 'F', 'GBW (MHz)', '#REF!'],
  ]);
  expect(told(result, 'warning')).toEqual([['I408', 5, 5, 'A', 'Internal P/N', '14'], ['I408', 8, 8, 'A', 'Internal P/N', '17']]);
});

it('08: duplicate headers and ids, look-alikes', () => {
  const result = sample('08_duplicates.csv');
  expect(told(result, 'error')).toEqual([
    ['I201', 1, 1, 'F', 'GBW (MHz)', 'GBW (MHz)'],
    ['I403', 5, 5, 'A', 'Internal P/N', 'org-oa-0703 '],
    ['I402', 8, 8, 'A', 'Internal P/N', 'ORG-OA-0704'],
  ]);
  expect(told(result, 'warning')).toEqual([
    ['I202', 1, 1, 'G', 'Vos max (µV)', 'Vos max (µV)'],
    ['I401', 4, 4, 'A', 'Internal P/N', 'ORG-OA-0701'],
    ['I404', 9, 9, 'A', 'Internal P/N', 'ORG-OA-O705'],
  ]);
  const messages = new Map(!result.ok ? result.problems.map(({ code, message, fix }) => [code, [message, fix] as const]) : []);
  expect(messages.get('I201')?.[0]).toBe('header "GBW (MHz)" is also in column C; the columns disagree in row 3 (10 and 7.0)');
  expect(messages.get('I402')?.[0]).toContain('row 7 and differs in D ("0.010", then "0.025"), G ("10", then "25"), H ("Approved", then "Restricted")');
  expect(messages.get('I403')?.[1]).toBe('ORG-OA-0703');
  expect(messages.get('I404')).toEqual(['letter O where 7 of 8 ids have the digit 0', 'ORG-OA-0705']);
});

it('09: ragged rows, stray and open quotes; no cell is read', () => {
  const result = sample('09_ragged_rows.csv');
  expect(told(result, 'error')).toEqual([
    ['I301', 3, 3, undefined, undefined, undefined],
    ['I302', 4, 4, undefined, undefined, undefined],
    ['I304', 5, 5, 'B', 'Description', 'Nanopower 5 reel"'],
    ['I303', 9, 9, 'B', 'Description', '50 MHz CMOS,SOT-23-5,2.5,5.5,5200,4.0,50,,\n'],
  ]);
  expect(told(result, 'warning')).toEqual([['I305', 6, 6, undefined, undefined, undefined], ['I205', 7, 7, 'J', '', 'see note']]);
  const messages = new Map(!result.ok ? result.problems.map(({ code, message, fix }) => [code, [message, fix] as const]) : []);
  expect(messages.get('I301')).toEqual(['11 cells, the header has 10 (8 named); text in column D "SO-8" suggests an unquoted separator in column B', '"Low noise, dual"']);
  expect(messages.get('I302')?.[0]).toBe('6 cells, the header has 8; "Vos max (mV)", "GBW (MHz)" are missing');
  expect(messages.get('I304')?.[0]).toContain('character 25');
  expect(messages.get('I304')?.[1]).toBe('"Nanopower 5"" reel"');
  expect(messages.get('I303')?.[0]).toContain('line 9, character 13');
});

it('10: unit traps, and a cross-check by the likely reading', () => {
  const result = sample('10_unit_traps.csv');
  expect(told(result, 'error')).toEqual([
    ['Q002', 3, 3, 'B', 'GBW', '10M'],
    ['Q004', 4, 4, 'I', 'en (nV/√Hz)', '40 nV/Hz'],
    ['Q003', 5, 5, 'G', 'Cload max', '50 PF'],
    ['Q001', 6, 6, 'B', 'GBW', '0.35'],
    ['Q001', 7, 7, 'C', 'Slew', '20'],
    ['Q012', 7, 7, 'E', 'Ib max (nA)', '0.01k'],
    ['Q003', 8, 8, 'B', 'GBW', '50MHZ'],
    ['Q001', 8, 8, 'F', 'Rload min', '150'],
    ['Q005', 9, 9, 'E', 'Ib max (nA)', '1,500'],
    ['Q001', 9, 9, 'F', 'Rload min', '600'],
  ]);
  expect(told(result, 'warning')).toEqual([['I601', 6, 6, 'H', 'Iq max (mA)', '25']]);
  const doubt = !result.ok ? result.problems.find(({ code }) => code === 'I601') : undefined;
  expect(doubt?.message).toContain('1.8 to 13 MHz per mA; 25 µA would fit');
  expect(doubt?.fix).toBe('0.025 or 25 µA');
});

it('10, once the bandwidth is corrected: the slew rate is doubted too', () => {
  const text = readFileSync(join(FOLDER, '10_unit_traps.csv'), 'utf8').replace('0905,0.35,', '0905,0.35 MHz,');
  const result = readList(new TextEncoder().encode(text), { file: 'x.csv', tier: 'approved' });
  expect(told(result, 'warning')).toEqual([['I607', 6, 6, 'C', 'Slew', '160 V/s'], ['I601', 6, 6, 'H', 'Iq max (mA)', '25']]);
  const doubt = !result.ok ? result.problems.find(({ code }) => code === 'I607') : undefined;
  expect([doubt?.message, doubt?.fix]).toEqual(['slew rate / (2π·GBW) is 72.8 µV, far below any input stage (20 mV to 20 V)', '160 V/ms']);
});

it('11: formulas and control characters; markup is text', () => {
  const result = sample('11_formulas_controls.csv');
  expect(told(result, 'error')).toEqual([
    ['I510', 3, 3, 'D', 'GBW (MHz)', '=B2*2'],
    ['I516', 4, 4, 'B', 'Description', 'bell\u0007 here'],
    ['I510', 5, 5, 'E', 'Iq max (µA)', '@SUM(A1)'],
    ['I516', 6, 6, 'B', 'Description', 'ltr \u202e txt'],
    ['Q019', 6, 6, 'D', 'GBW (MHz)', '-1'],
  ]);
});

describe('12: the next issue of 01, a unit changed', () => {
  const FILE = '12_next_revision_of_01.csv';
  const earlier = accepted('01_bom_semicolon_decimal_comma.csv');
  const mapping: ListMapping = earlier.mapping!;
  const known: Partial<ListOptions> = { mappings: [mapping], previous: (id) => earlier.parts.find((part) => part.id === id) ?? null };

  it('is one cause with the cells that fail on their own', () => {
    const result = sample(FILE, known);
    expect(told(result, 'error')).toEqual([
      ['I602', 1, 1, 'I', 'Iq typ (mA/ch)', 'Iq typ (mA/ch)'],
      ['Q010', 4, 4, 'I', 'Iq typ (mA/ch)', '620'],
      ['Q010', 4, 4, 'J', 'Iq max (mA/ch)', '850'],
      ['Q010', 7, 7, 'I', 'Iq typ (mA/ch)', '350'],
      ['Q010', 7, 7, 'J', 'Iq max (mA/ch)', '600'],
      ['Q010', 8, 8, 'I', 'Iq typ (mA/ch)', '560'],
      ['Q010', 8, 8, 'J', 'Iq max (mA/ch)', '700'],
      ['Q010', 9, 9, 'I', 'Iq typ (mA/ch)', '4.300'],
      ['Q010', 9, 9, 'J', 'Iq max (mA/ch)', '5.200'],
    ]);
    expect(told(result, 'warning')).toEqual([['I519', 4, 4, 'D', 'Status', 'NRND']]);
    expect(!result.ok && result.problems[0]?.message).toBe('"Iq typ (mA/ch)" and "Iq max (mA/ch)" are exactly 1000 times the last import in 7 of 7 known parts; the header unit went from µA/ch to mA/ch, and the figures did not change');
    expect(result.notes.some((note) => note.includes('17 of 19 columns known by their exact header, 2 by name with another unit'))).toBe(true);
  });

  it('is read when the unit is answered', () => {
    const list = accepted(FILE, { ...known, map: [{ column: 'I', header: 'Iq typ (µA/ch)' }, { column: 'J', header: 'Iq max (µA/ch)' }] });
    expect(list.parts).toHaveLength(8);
    expect(value(part(list, 'ORG-OA-0009'), 'quiescentCurrent', 'typ')).toBe(4.3e-3);
    expect(part(list, 'ORG-OA-0003')).toMatchObject({ status: null, lifecycle: 'nrnd' });
  });

  it('asks when there is nothing to compare with', () => {
    const result = sample(FILE, { mappings: [mapping] });
    expect(told(result, 'error').filter(([code]) => code === 'I208').map(([, , , letter]) => letter)).toEqual(['I', 'J']);
  });
});
