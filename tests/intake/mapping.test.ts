import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { ColumnReading } from '../../src/intake/column-reading.js';
import { mappingDocument, readMappingDocument } from '../../src/intake/csvw.js';
import type { ListMapping } from '../../src/intake/mapping.js';
import { fieldsOfReading, readingOfFields } from '../../src/intake/reading-fields.js';
import { readAnyHeader } from '../../src/intake/recognised.js';
import { FIGURE_WORDS, IDENTITY_TERMS, RAIL_WORDS, SPECIAL_WORDS } from '../../src/intake/vocabulary.js';
import type { Part } from '../../src/parts/part.js';
import { accepted, refused } from './reading.js';

const LIST = 'Part number;Approval;Vos typ/max (mV);Iq/ch (µA);Supply (V);Ib max/nA @ 85 °C;Swing @ high side (mV);Price (EUR @1k);House bin\nA-1;Preferred;0,5/3;85;1,8..5,5;0,5;x;0,14;B1\n'.replace('Swing @ high side (mV)', 'Swing high side @ 2k (mV)').replace(';x;', ';35;');
const words = new Map([['preferred', 'approved' as const]]);

function mappingOf(text: string): ListMapping {
  return accepted(text, { words, missing: ['see DS'], declare: { temperature: [-40, 85], by: 'A. Owner' } }).mapping!;
}

describe('a mapping as a document of CSV on the Web', () => {
  const document = mappingDocument(mappingOf(LIST));

  it('says dialect, titles and what each column means, one thing a field', () => {
    const json = JSON.parse(document) as { dialect: object; tableSchema: { columns: object[]; primaryKey: string } };
    expect(json.dialect).toEqual({ encoding: 'utf-8', delimiter: ';', skipRows: 0, headerRowCount: 1, trim: true });
    expect(json.tableSchema.columns[2]).toMatchObject({ titles: ['Vos typ/max (mV)'], 'railfit:field': 'offset voltage', 'railfit:limit': 'typ/max', 'railfit:unit': 'mV', datatype: { base: 'decimal', format: { decimalChar: ',', groupChar: '.' } } });
    expect(json.tableSchema.columns[5]).toMatchObject({ 'railfit:field': 'bias current', 'railfit:limit': 'max', 'railfit:unit': 'nA', 'railfit:condition': '85 °C' });
    expect(json.tableSchema.primaryKey).toBe('column1');
  });

  it('is read back, and reads the next issue of the list the same', () => {
    const read = readMappingDocument(document, 'hardware.json');
    if (!read.ok) throw new Error(read.reason);
    expect(mappingDocument({ ...read.mapping, name: 'list.csv' })).toBe(document);
    const next = LIST.replace('A-1;', 'A-2;');
    expect(accepted(next, { mappings: [read.mapping] }).parts[0]).toEqual({ ...accepted(next, { words, declare: { temperature: [-40, 85], by: 'A. Owner' } }).parts[0] });
  });

  it('edited by hand counts: a unit, a title, a word', () => {
    const read = readMappingDocument(document.replace('"railfit:unit": "nA"', '"railfit:unit": "pA"'), 'edited.json');
    if (!read.ok) throw new Error(read.reason);
    const [part] = accepted(LIST, { mappings: [read.mapping] }).parts;
    expect(part?.figures.find(({ parameter }) => parameter === 'biasCurrent')?.value).toBe(0.5e-12);
  });

  it.each([
    ['{', /no JSON/u],
    ['{}', /no tableSchema.columns/u],
    ['{"tableSchema":{"columns":[{"railfit:field":"id"}]}}', /titles is missing/u],
    ['{"tableSchema":{"columns":[{"titles":["A"],"railfit:field":"ofset"}]}}', /"ofset" is no field/u],
    ['{"tableSchema":{"columns":[{"titles":["A"],"railfit:field":"slew rate","railfit:limit":"most"}]}}', /no limit kind/u],
    ['{"tableSchema":{"columns":[{"titles":["A"],"railfit:field":"slew rate","railfit:condition":"loud"}]}}', /loud/u],
  ])('says what in %s cannot be used', (text, reason) => {
    expect(readMappingDocument(text, 'm.json')).toMatchObject({ ok: false, code: 'I212', reason: expect.stringMatching(reason) as string });
  });

  it('never throws, whatever the document', () => {
    fc.assert(fc.property(fc.json({ maxDepth: 4 }), (text) => { expect([true, false]).toContain(readMappingDocument(text, 'm.json').ok); }));
  });
});

describe('the next issue of a list', () => {
  const mapping = mappingOf(LIST);

  it('is known also with columns moved and one more', () => {
    const [header = '', row = ''] = LIST.split('\n');
    const moved = [header, row].map((line) => { const cells = line.split(';'); return [...cells.slice(2), ...cells.slice(0, 2), line === header ? 'Second source' : 'yes'].join(';'); }).join('\n');
    const list = accepted(moved, { mappings: [mapping] });
    expect(list.notes.some((note) => note.includes('9 of 9 columns known by their exact header'))).toBe(true);
    expect(list.parts[0]?.figures).toEqual(accepted(LIST, { mappings: [mapping] }).parts[0]?.figures);
  });

  it('is not taken for it when hardly a header is the same', () => {
    expect(accepted('Part number,Status,Vos max (mV)\nA,Approved,3\n', { mappings: [mapping] }).notes.some((note) => note.startsWith('mapping'))).toBe(false);
  });

  it('with a changed unit and equal figures is told, with another it is an error', () => {
    const text = 'Part number,Status,Vos max (mV),Iq max (µA)\nA,Approved,3,85\nB,Approved,1.5,850\n';
    const before = accepted(text);
    const options = { mappings: [before.mapping!], previous: (id: string): Part | null => before.parts.find((part) => part.id === id) ?? null };
    const right = accepted('Part number,Status,Vos max (mV),Iq max (mA)\nA,Approved,3,0.085\nB,Approved,1.5,0.85\n', options);
    expect(right.notes.some((note) => note.includes('its unit was µA and is mA; the figures agree'))).toBe(true);
    expect(refused('Part number,Status,Vos max (mV),Iq max (mA)\nA,Approved,3,85\nB,Approved,1.5,95\n', options).problems.map(({ code }) => code)).toContain('I208');
    const scaled = refused('Part number,Status,Vos max (mV),Iq max (nA)\nA,Approved,3,85\nB,Approved,1.5,850\n', options);
    expect(scaled.problems.map(({ code }) => code)).toEqual(['I602']);
    expect(scaled.questions.map(({ samples }) => samples)).toEqual([['85', '850']]);
  });
});

describe('every meaning of a column', () => {
  const phrases = [FIGURE_WORDS, IDENTITY_TERMS, SPECIAL_WORDS, RAIL_WORDS].flatMap((table) => Object.values(table).flat()).map((phrase) => phrase.replace(/[[\]]/gu, ''));
  it.each(phrases)('of "%s" is known, and comes back from its fields', (phrase) => {
    for (const header of [phrase, `${phrase} max`, `${phrase} @ 2 kΩ, 5 V`]) {
      const reading = readAnyHeader(header);
      if (reading.kind === 'problem' || reading.kind === 'question' || reading.kind === 'text') continue;
      const back = readingOfFields(fieldsOfReading(reading));
      const expected: ColumnReading = reading.kind === 'figure' ? { kind: 'measured', target: reading.parameter, limit: reading.limit, order: null, unit: reading.unit, condition: reading.condition, perPackage: false } : reading;
      expect(back).toEqual(reading.kind === 'known' && reading.field === null ? { ...reading, unit: reading.unit } : expected);
    }
    expect(readAnyHeader(phrase).kind).not.toBe('text');
  });
});
