import { describe, expect, it } from 'vitest';
import { tableLines, type Table } from '../../src/presentation/table.js';
import { styleOf } from '../support/sample-report.js';

const TABLE: Table = {
  columns: [{ title: 'Part', key: true }, { title: 'Class', moves: 1, name: '' }, { title: 'Current', align: 'right', moves: 2, name: 'current' }, { title: 'empty' }],
  rows: [['TEAM-1', 'a rather long class of parts with more words than needed', '35 µA', ''], ['TEAM-22', '電圧', '1.2 mA', '']],
};

describe('a table', () => {
  it('whole where it fits, padded by what a terminal shows; empty columns are left out', () => {
    expect(tableLines(TABLE, styleOf(100))).toMatchInlineSnapshot(`
      [
        " Part     Class                                                     Current",
        " TEAM-1   a rather long class of parts with more words than needed    35 µA",
        " TEAM-22  電圧                                                       1.2 mA",
      ]
    `);
  });
  it('cells move under their row where it does not', () => { expect(tableLines(TABLE, styleOf(62))).toMatchInlineSnapshot(`
    [
      " Part     Current",
      " TEAM-1     35 µA",
      "   a rather long class of parts with more words than needed",
      " TEAM-22   1.2 mA",
      "   電圧",
    ]
  `); });
  it('stands upright below 60 columns', () => { expect(tableLines(TABLE, styleOf(59))).toMatchInlineSnapshot(`
    [
      " TEAM-1",
      "    a rather long class of parts with more words than",
      "    needed; current 35 µA",
      " TEAM-22",
      "    電圧; current 1.2 mA",
    ]
  `); });
  it('a wrapping last column takes what room is left', () => {
    const columns = [{ title: '' }, { title: '', wraps: true }, { title: '', name: '', moves: 1 }] as const;
    expect(tableLines({ columns, rows: [['offset', 'a long way in which a figure was made from another one', 'approved.csv row 2']], indent: 8 }, styleOf(60))).toMatchInlineSnapshot(`
      [
        "        offset  a long way in which a figure was made from",
        "                another one; approved.csv row 2",
      ]
    `);
  });
  it('without rows is nothing', () => { expect(tableLines({ columns: TABLE.columns, rows: [] }, styleOf(100))).toEqual([]); });
});
