import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { ListResult } from '../../src/intake/list.js';
import { readList } from '../../src/intake/read-list.js';
import { recordsOf } from '../../src/intake/records.js';
import { damaged, WOUNDS } from '../support/damage.js';
import { faultsOf } from '../support/whole.js';

// Whatever a file holds: a list or a refusal with its reasons, never an exception, and no row that is lost without a word.

const FOLDER = join(import.meta.dirname, 'samples');
const SAMPLES = readdirSync(FOLDER).map((name) => new Uint8Array(readFileSync(join(FOLDER, name))));

function read(bytes: Uint8Array): ListResult {
  return readList(bytes, { file: 'list.csv', tier: 'approved' });
}

function holds(result: ListResult): void {
  expect(faultsOf(result)).toEqual([]);
}

const damage = fc.record({ at: fc.nat(), kind: fc.constantFrom(...WOUNDS), byte: fc.nat(255) });

describe('reading never throws and never half-reads', () => {
  it('damaged samples', { timeout: 120_000 }, () => {
    fc.assert(fc.property(fc.constantFrom(...SAMPLES), fc.array(damage, { minLength: 1, maxLength: 6 }), (sample, wounds) => holds(read(damaged(sample, wounds)))), { numRuns: 400 });
  });

  const header = fc.constantFrom('Part number', 'id', 'Status', 'Vos typ/max (mV)', 'GBW', 'Iq/ch (µA)', 'Supply (V)', 'CMVR high', 'Rail-to-rail', 'Load (kΩ)', 'VOH @ 2k', 'Swing @10k (mV)', 'Price (EUR @1k)', 'Temp range (°C)', 'Ch', 'Ib max/nA @ 85 °C', 'House bin', '', 'Iq total (mA)', 'offset voltage max (mV)', 'Notes');
  const cell = fc.oneof(
    fc.constantFrom('1', '0', '-1', '1/2', '2/1', '<3', '1..5', 'V+ - 1.5', 'RRIO', 'yes', 'n/a', '####', '5-Mar', '1,5', '1.234', '=A1', '"', '10M', '5 mV', 'Approved', 'NRND', '25 °C', '±3', '~4', '1e999', '\u202e', '\u0000', '-40..125', '3 typ, 5 max'),
    fc.string({ maxLength: 8 }),
  );
  const table = fc.tuple(fc.array(header, { minLength: 1, maxLength: 8 }), fc.array(fc.array(cell, { minLength: 0, maxLength: 9 }), { maxLength: 8 }), fc.constantFrom(',', ';', '\t', '|'), fc.constantFrom('\n', '\r\n', '\r'));

  it('tables of any headers and cells', { timeout: 120_000 }, () => {
    fc.assert(
      fc.property(table, ([headers, rows, delimiter, eol]) => {
        const quote = (text: string): string => (/["\r\n]/u.test(text) || text.includes(delimiter) ? `"${text.replaceAll('"', '""')}"` : text);
        const text = [headers, ...rows].map((cells) => cells.map(quote).join(delimiter)).join(eol);
        const result = read(new TextEncoder().encode(text));
        holds(result);
        if (!result.ok) return;
        const filled = recordsOf(text, result.delimiter).records.slice(1).filter((record) => record.cells.some((one) => one.trim() !== ''));
        expect(result.parts.length + result.warnings.filter(({ code }) => code === 'I401').length).toBe(filled.length);
      }),
      { numRuns: 800 },
    );
  });

  it('bytes without any sense', () => {
    fc.assert(fc.property(fc.uint8Array({ maxLength: 300 }), (bytes) => holds(read(bytes))), { numRuns: 300 });
  });
});

describe('taking records apart', () => {
  const cells = fc.array(fc.array(fc.string({ maxLength: 6 }), { minLength: 2, maxLength: 5 }), { minLength: 1, maxLength: 8 });

  it.each([',', ';', '\t', '|'] as const)('gives back what was quoted, at %j', (delimiter) => {
    fc.assert(
      fc.property(cells, fc.constantFrom('\n', '\r\n', '\r'), (rows, eol) => {
        const text = rows.map((row) => row.map((one) => `"${one.replaceAll('"', '""')}"`).join(delimiter)).join(eol);
        const { records, faults } = recordsOf(text, delimiter);
        expect(faults).toEqual([]);
        expect(records.map((record) => record.cells)).toEqual(rows);
      }),
    );
  });

  it('counts every line and every record, whatever the quotes', () => {
    fc.assert(
      fc.property(fc.array(fc.constantFrom('a', '"', ',', '\n', '\r\n', '\r', 'b ', '""'), { maxLength: 40 }), (pieces) => {
        const text = pieces.join('');
        const { records, faults } = recordsOf(text, ',');
        const rows = [...records.map(({ row }) => row), ...faults.map(({ row }) => row)].sort((a, b) => a - b);
        expect(rows).toEqual(rows.map((_, index) => index + 1));
        const lines = text.split(/\r\n|\n|\r/u).length;
        for (const { line, lineEnd } of records) expect(line <= lineEnd && lineEnd <= lines).toBe(true);
      }),
      { numRuns: 1000 },
    );
  });
});
