import { parse } from 'csv-parse/sync';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { DELIMITERS } from '../../src/intake/list.js';
import { recordsOf } from '../../src/intake/records.js';

/** Lines as any of the three systems ends them, cells as wide as they come. */
const cellsOf = (text: string, delimiter: string): string[][] =>
  parse(text, { delimiter, record_delimiter: ['\r\n', '\n', '\r'], relax_column_count: true });

const word = fc.array(fc.constantFrom('a', 'µ', '𝄞', ' ', '0', '.', '"', ',', ';', '\n', '\r\n', '\r', '\t', '|'), { maxLength: 6 }).map((all) => all.join(''));
const row = fc.array(fc.tuple(word, fc.boolean()), { minLength: 1, maxLength: 5 });
const delimiters = fc.constantFrom(...DELIMITERS);
const eols = fc.constantFrom('\n', '\r\n', '\r');

function written([text, isQuoted]: readonly [string, boolean]): string {
  return isQuoted || /[",;\t|\r\n]/u.test(text) ? `"${text.replaceAll('"', '""')}"` : text;
}

describe('cells, beside those of csv-parse', () => {
  it('are the same of every file that is written by the rules', () => {
    fc.assert(
      fc.property(fc.array(row, { minLength: 1, maxLength: 6 }), delimiters, eols, fc.boolean(), (rows, delimiter, eol, isEnded) => {
        const text = rows.map((cells) => cells.map(written).join(delimiter)).join(eol) + (isEnded ? eol : '');
        const { records, faults } = recordsOf(text, delimiter);
        expect(faults).toEqual([]);
        expect(records.map(({ cells }) => cells)).toEqual(cellsOf(text, delimiter));
      }),
      { numRuns: 500 },
    );
  });

  it('go on behind a stray quote, where csv-parse ends', () => {
    const text = 'a,b\n1,2"\n3,4"\n5,6\n';
    const { records, faults } = recordsOf(text, ',');
    expect(records.map(({ cells }) => cells)).toEqual([['a', 'b'], ['5', '6']]);
    expect(faults.map(({ line, column, character }) => [line, column, character])).toEqual([[2, 2, 4], [3, 2, 4]]);
    expect(() => cellsOf(text, ',')).toThrow(/line 2/u);
  });
});
