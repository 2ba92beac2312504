import { describe, expect, it } from 'vitest';
import { accepted, places, refused } from './reading.js';

const HEADER = 'Part number,Status,Package,Ch,Qual,Temp range (°C),GBW typ (MHz),SR typ (V/µs),Iq typ (µA),Vos max (mV)';
const ROW = ['A-1', 'Approved', 'SOT-23-5', '1', 'none', '-40..125', '1', '0.5', '60', '3'];

/** The places of the warnings when cells of one row (by header position, from 1) are changed. */
function warned(changes: Readonly<Record<number, string>>): string[] {
  const row = ROW.map((cell, index) => changes[index + 1] ?? cell);
  return places(accepted(`${HEADER}\n${row.join(',')}\n`).warnings);
}

describe('figures that do not go together are doubted, with the cell', () => {
  it('says nothing of an ordinary row', () => expect(warned({})).toEqual([]));

  it.each([
    ['a current a thousand times too large', { 9: '60000' }, 'I601 2 2 I'],
    ['a bandwidth a thousand times too large', { 7: '1000', 8: '500' }, 'I601 2 2 I'],
    ['a slew rate a thousand times too small', { 8: '0.0005' }, 'I607 2 2 H'],
    ['two amplifiers in five pins', { 4: '2' }, 'I605 2 2 D'],
    ['four amplifiers in eight pins', { 3: 'VSSOP-8', 4: '4' }, 'I605 2 2 D'],
    ['a grade without its temperatures', { 5: 'AEC-Q100 grade 1', 6: '0..70' }, 'I606 2 2 E'],
  ])('%s', (_, changes, place) => {
    expect(warned(changes)).toEqual([place]);
  });

  it.each([
    ['four amplifiers in fourteen pins', { 3: 'TSSOP-14', 4: '4' }],
    ['a package that names no pins', { 3: 'SOT-23', 4: '2' }],
    ['a grade with wider temperatures', { 5: 'AEC-Q100 grade 2', 6: '-40..125' }],
    ['a nanopower part', { 7: '0.008', 8: '0.003', 9: '0.6' }],
  ])('not %s', (_, changes) => {
    expect(warned(changes)).toEqual([]);
  });

  it('offers what would fit, in the unit of the header', () => {
    const row = ROW.map((cell, index) => (index === 8 ? '60000' : cell));
    const [warning] = accepted(`${HEADER}\n${row.join(',')}\n`).warnings;
    expect(warning?.fix).toBe('60 or 60 µA');
  });

  it('a value a thousand times off the median of a column that is close together', () => {
    const rows = ['3', '1.5', '3000', '2', '4', '2.5'].map((vos, index) => ['A-' + String(index + 1), ...ROW.slice(1, 9), vos].join(','));
    expect(places(refusedOrAccepted(`${HEADER}\n${rows.join('\n')}\n`))).toEqual(['Q010 4 4 J']);
    const small = rows.map((row) => row.replace(',3000', ',0.0025'));
    expect(places(refusedOrAccepted(`${HEADER}\n${small.join('\n')}\n`))).toEqual(['I608 4 4 J']);
  });

  it('typ over max is an error with both cells', () => {
    const { problems } = refused('Part number,Status,Vos typ (mV),Vos max (mV)\nA,Approved,3,1\n');
    expect(problems.map(({ code, message }) => [code, message])).toEqual([['I512', 'offset voltage: typ 3 mV (C2) is above max 1 mV (D2)']]);
  });
});

function refusedOrAccepted(text: string): ReturnType<typeof refused>['problems'] {
  try {
    return accepted(text).warnings;
  } catch {
    return refused(text).problems;
  }
}
