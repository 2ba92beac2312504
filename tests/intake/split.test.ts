import { describe, expect, it } from 'vitest';
import { trialWords } from '../../src/intake/delimiter.js';
import { splitList } from '../../src/intake/split.js';

const split = (text: string): ReturnType<typeof splitList> => splitList(text);
const places = (text: string): (string | number)[][] => split(text).records.map(({ line, lineEnd, row, cells }) => [line, lineEnd, row, ...cells]);

describe('splitList', () => {
  it.each(['\n', '\r\n', '\r'])('finds line and row of records that span lines (%j)', (eol) => {
    const text = ['a,b', '1,2', '', '"x', 'µ', 'y",3', '4,5', ''].join(eol);
    expect(places(text)).toEqual([
      [1, 1, 1, 'a', 'b'],
      [2, 2, 2, '1', '2'],
      [3, 3, 3, ''],
      [4, 6, 4, `x${eol}µ${eol}y`, '3'],
      [7, 7, 5, '4', '5'],
    ]);
  });

  it('takes the last record also without a line end', () => {
    expect(places('a\n1').at(-1)).toEqual([2, 2, 2, '1']);
  });

  it.each([
    ['a,b;c', ','],
    ['a;b', ';'],
    ['a\tb;c', ';'],
    ['a\tb', '\t'],
    ['a', ','],
    ['"a,b";c', ';'],
  ])('separates %j by %j', (header, delimiter) => {
    expect(split(`${header}\n`).delimiter).toBe(delimiter);
  });

  it.each([
    ['id;a @ 1, 2;b\nA;1;2\nB;3;4', ';'],
    ['id,a;b\nA,1\nB,2\nC,3;4', ','],
    ['id\ta @ 1, 2;x\nA\t1,5\nB\t2', '\t'],
    ['id;low;high @ 1, 2\nA;1,8;5\nB;1,7;6', ';'],
    ['id;a @ 1, 2\nA;"x, y"\nB;"one;two"\nC;1', ';'],
    ['id;a @ 1, 2;b\nA;1;2\nB;3\nC;3;4', ';'],
  ])('takes the delimiter under which the rows have as many cells as the header (%j)', (text, delimiter) => {
    expect(split(text)).toMatchObject({ delimiter });
    expect(split(text).undecided).toBeUndefined();
  });

  it.each([
    ['two fit equally', 'a,b;c\n1,2;3\n4,5;6'],
    ['none fits', 'id;a @ 1, 2\nA;1;2\nB'],
  ])('does not choose where %s', (_, text) => {
    expect(split(text).undecided?.map(({ delimiter }) => delimiter)).toEqual([',', ';']);
  });

  it('says what each delimiter gives', () => {
    const wide = 'id;a @ 1, 2;b @ 3, 4\nA;1\nB;2';
    expect(split(wide).undecided?.map(trialWords)).toEqual(['at commas: 3 columns, rows have 1', 'at semicolons: 3 columns, rows have 2']);
    expect(split('a,b;c\n1,2;3').undecided?.map(trialWords)).toEqual(['at commas: 2 columns everywhere', 'at semicolons: 2 columns everywhere']);
    expect(split('a,b;c\n1\n2;3').undecided?.map(trialWords)).toEqual(['at commas: 2 columns, rows have 1', 'at semicolons: 2 columns in 1 of 2 rows']);
  });

  it('tells stray and open quotes with the place, and goes on behind them', () => {
    const { faults, records } = split('a,b\n1,"x 5" y"\n2,5" z\n3,4\n4,"open\n5,6');
    expect(faults).toEqual([
      { code: 'I304', line: 2, quoteLine: 2, row: 2, column: 2, character: 7, text: 'x 5 y"' },
      { code: 'I304', line: 3, quoteLine: 3, row: 3, column: 2, character: 4, text: '5" z' },
      { code: 'I303', line: 5, quoteLine: 5, row: 5, column: 2, character: 3, text: 'open\n5,6' },
    ]);
    expect(records.map(({ line, row }) => [line, row])).toEqual([[1, 1], [4, 4]]);
  });
});
