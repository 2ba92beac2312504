import { describe, expect, it } from 'vitest';
import { renderProblems } from '../../src/presentation/problems-text.js';
import type { Problem } from '../../src/quantities/problem.js';
import { styleOf } from '../support/sample-report.js';

const shown = (problems: readonly Problem[], summary: string, width = 100, more = {}): string => `\n${renderProblems(problems, styleOf(width, more), summary)}`;

const OPTIONS: Problem[] = [
  { code: 'Q007', severity: 'error', message: 'the range runs downwards', text: '4.2..3.0 V', span: [0, 8], fix: '3.0..4.2 V', place: { path: '--supply' } },
  { code: 'Q002', severity: 'error', message: '10M has no unit: 10 MΩ (SI, IEC 60062) or 10 mΩ (SPICE)', text: '10M', span: [2, 3], fix: '10 MΩ, 10meg or 10 mΩ', place: { path: '--load' } },
  { code: 'C101', severity: 'error', message: 'unknown option --gian', fix: 'did you mean --gain?', place: { path: '--gian' } },
];

function cell(row: number, column: string, more: Partial<Problem>): Problem {
  return {
    code: 'Q001', severity: 'error', message: 'no unit in the cell and none in the header', text: '0.35',
    place: { file: 'approved.csv', line: row, row, column: column.charCodeAt(0) - 64, columnLetter: column, header: 'GBW', part: `TEAM-${row}` }, ...more,
  };
}

describe('problems of a command line', () => {
  it('stand in order, the summary last', () => { expect(shown(OPTIONS, '3 problems, nothing was run. (exit 2)')).toMatchInlineSnapshot(`
    "
    error[Q007]: --supply: the range runs downwards
       4.2..3.0 V
       ^^^^^^^^
       fix: 3.0..4.2 V

    error[Q002]: --load: 10M has no unit: 10 MΩ (SI, IEC 60062) or 10 mΩ (SPICE)
       10M
         ^
       fix: 10 MΩ, 10meg or 10 mΩ

    error[C101]: unknown option --gian
       fix: did you mean --gain?

    3 problems, nothing was run. (exit 2)
    "
  `); });
  it('in ASCII, at 40 columns', () => { expect(shown(OPTIONS, '3 problems, nothing was run. (exit 2)', 40, { ascii: true })).toMatchInlineSnapshot(`
    "
    error[Q007]: --supply: the range runs
      downwards
       4.2..3.0 V
       ^^^^^^^^
       fix: 3.0..4.2 V

    error[Q002]: --load: 10M has no unit:
      10 Mohm (SI, IEC 60062) or 10 mohm
      (SPICE)
       10M
         ^
       fix: 10 Mohm, 10meg or 10 mohm

    error[C101]: unknown option --gian
       fix: did you mean --gain?

    3 problems, nothing was run. (exit 2)
    "
  `); });
  it('of a stage file name line and column', () => {
    const problem: Problem = { code: 'S101', severity: 'error', message: 'supply is missing', fix: 'supply: 5 V ± 5 %\ngain: 8', place: { file: 'probe.yaml', line: 3, column: 10, path: 'supply' } };
    expect(shown([problem], '1 problem, nothing was run. (exit 2)')).toMatchInlineSnapshot(`
      "
      error[S101]: supply is missing
        --> probe.yaml line 3, column 10
         fix: supply: 5 V ± 5 %
              gain: 8

      1 problem, nothing was run. (exit 2)
      "
    `);
  });
});

describe('problems of a list', () => {
  it('one cause stands once, with its cells', () => {
    const problems = [
      cell(3, 'B', { code: 'Q002', message: 'is 10M 10 MHz or 0.01 Hz? It has no unit', text: 'TEAM-3,10M,7 V/uS', span: [7, 10], fix: '10 MHz' }),
      cell(6, 'B', { fix: 'put the unit in the header, for example "GBW (MHz)", or in each cell' }),
      cell(7, 'C', { text: '20', fix: 'put the unit in the header, for example "GBW (MHz)", or in each cell' }),
      cell(4, 'I', { code: 'Q004', message: '40 nV/Hz: the square root is missing', text: '40 nV/Hz', fix: '40 nV/√Hz' }),
      cell(5, 'I', { code: 'Q004', message: '8.5 nV/Hz: the square root is missing', text: '8.5 nV/Hz', fix: '8.5 nV/√Hz' }),
      cell(6, 'H', { code: 'I601', severity: 'warning', message: '25 mA for a 0.35 MHz part', text: '25', fix: '25 µA' }),
    ];
    expect(shown(problems, 'approved.csv was not imported: 5 cells in 5 parts must be corrected first. Nothing was changed. (exit 3)')).toMatchInlineSnapshot(`
      "
      error[Q002]: is 10M 10 MHz or 0.01 Hz? It has no unit
        --> approved.csv line 3, row 3, column B "GBW", part TEAM-3
         3 | TEAM-3,10M,7 V/uS
           |        ^^^
         fix: 10 MHz

      error[Q001]: no unit in the cell and none in the header (2 cells)
        --> approved.csv
         B6  "0.35"
         C7  "20"
         fix: put the unit in the header, for example "GBW (MHz)", or in each cell

      error[Q004]: the square root is missing (2 cells)
        --> approved.csv
         I4  "40 nV/Hz"   fix: 40 nV/√Hz
         I5  "8.5 nV/Hz"  fix: 8.5 nV/√Hz

      warning[I601]: 25 mA for a 0.35 MHz part
        --> approved.csv line 6, row 6, column H "GBW", part TEAM-6
         6 | 25
           | ^^
         fix: 25 µA

      approved.csv was not imported: 5 cells in 5 parts must be corrected first. Nothing was changed.
      (exit 3)
      "
    `);
  });

  it('ten are shown, the rest is counted', () => {
    const text = shown(Array.from({ length: 37 }, (_, at) => cell(at + 2, 'B', { text: String(at), fix: `${at} MHz` })), 'Not imported. (exit 3)');
    expect(text).toMatchInlineSnapshot(`
      "
      error[Q001]: no unit in the cell and none in the header (37 cells)
        --> approved.csv
         B2   "0"  fix: 0 MHz
         B3   "1"  fix: 1 MHz
         B4   "2"  fix: 2 MHz
         B5   "3"  fix: 3 MHz
         B6   "4"  fix: 4 MHz
         B7   "5"  fix: 5 MHz
         B8   "6"  fix: 6 MHz
         B9   "7"  fix: 7 MHz
         B10  "8"  fix: 8 MHz
         B11  "9"  fix: 9 MHz

      … and 27 more (the full list: --errors FILE)

      Not imported. (exit 3)
      "
    `);
  });
});

describe('the text with carets', () => {
  it('is cut around what is meant', () => {
    const text = `${'x'.repeat(120)} 10M ${'y'.repeat(120)}`;
    const lines = shown([{ code: 'Q002', severity: 'error', message: 'no unit', text, span: [121, 124] }], '', 60).split('\n').filter((line) => line.trim() !== '');
    expect(lines[1]?.length).toBeLessThanOrEqual(60);
    const at = lines[2]?.indexOf('^') ?? -1;
    expect(lines[1]?.slice(at, at + 3)).toBe('10M');
    expect(lines[2]?.trim()).toBe('^^^');
  });

  it('stays under what is meant when characters before it are escaped or wide', () => {
    const lines = shown([{ code: 'Q016', severity: 'error', message: 'a character', text: '\u0007電10M', span: [2, 5] }], '', 60).split('\n');
    expect(lines.slice(2, 4)).toEqual(['   \\u{7}電10M', '          ^^^']);
  });
});
