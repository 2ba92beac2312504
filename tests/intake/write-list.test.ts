import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { writeList } from '../../src/intake/write-list.js';
import { arbitraryParts } from '../support/arbitrary-part.js';
import { accepted } from './reading.js';

const again = (csv: string): ReturnType<typeof accepted> => accepted(csv, { tier: 'generic' });

describe('writeList', () => {
  it('writes only the columns that hold something, in canonical order', () => {
    const list = accepted(
      ['offset voltage max (µV),"output low headroom max (V) @ 5V, 2k to ground",phase reversal,class,id', '150,0.03,no,,0012', '2500,,,,1E10'].join('\n'),
    );
    expect(writeList(list.parts)).toMatchInlineSnapshot(`
      "id,phase reversal,"output low headroom max (mV) @ 2 kΩ to ground, 5 V",offset voltage max (mV)
      0012,no,30,0.15
      1E10,,,2.5
      "
    `);
  });

  it('reads back as the same parts, and is then the same bytes', { timeout: 60_000 }, () => {
    fc.assert(
      fc.property(arbitraryParts, (parts) => {
        const csv = writeList(parts);
        const read = again(csv);
        expect(read.parts).toEqual(parts);
        expect(writeList(read.parts)).toBe(csv);
      }),
      { numRuns: 100 },
    );
  });

  it('keeps a spreadsheet from running a cell, but leaves numbers alone', () => {
    const list = accepted("id,description,family\n-1,'=1+1,plain\n2,\"@x, y\",'-2\n");
    expect(writeList(list.parts)).toBe("id,description,family\r\n-1,'=1+1,plain\r\n2,\"'@x, y\",-2\r\n");
  });

  it('writes a ratio that no decibel value hits exactly with its own unit', () => {
    const list = accepted('id,open loop gain min (V/V)\nA,123456.789\nB,100000\n');
    const csv = writeList(list.parts);
    expect(again(csv).parts.map((part) => part.figures[0]?.value)).toEqual([123456.789, 1e5]);
    expect(csv).toContain('B,100\r\n');
  });
});
