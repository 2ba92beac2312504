import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { wholeBytes, type ByteSource } from '../../src/intake/byte-source.js';
import { openStream } from '../../src/intake/list-stream.js';
import type { ListOptions } from '../../src/intake/list.js';
import { recordsOf, recordStream } from '../../src/intake/records.js';
import { readList } from '../../src/intake/read-list.js';
import { LIMITS } from '../../src/intake/limits.js';
import { ListRefused, NeedsWhole } from '../../src/intake/stream-errors.js';
import { textTallies } from '../../src/intake/text-tally.js';

const OPTIONS: ListOptions = { file: 'list.csv', tier: 'approved', genericIds: new Set(['GX-A']), classes: new Set(['precision']) };
const HEADER = 'id,description,class,slew rate min (V/µs),offset voltage max (mV),bin xyz';

const bytesOf = (text: string): Uint8Array => new TextEncoder().encode(text);

/** What row by row gives: a list, its refusal, or null where it is left to the whole. */
const streamed = (text: string): unknown => streamedFrom(wholeBytes(bytesOf(text)));

function streamedFrom(source: ByteSource): unknown {
  const stream = openStream(source, OPTIONS);
  if (stream === null) return null;
  try {
    const rows = [...stream.rows()];
    return { parts: rows.map(({ part }) => part), records: rows.map(({ record }) => record), sha256: stream.sha256, warnings: stream.warnings, tallies: stream.tallies };
  } catch (error) {
    if (error instanceof NeedsWhole) return null;
    if (error instanceof ListRefused) return { problems: error.list.problems, counts: error.list.counts };
    throw error;
  }
}

function whole(text: string): unknown {
  const list = readList(bytesOf(text), OPTIONS);
  if (!list.ok) return { problems: list.problems, counts: list.counts };
  const tallies = textTallies(list.columns);
  for (const record of list.records) tallies.add(record);
  return { parts: list.parts, records: list.records, sha256: list.sha256, warnings: list.warnings, tallies: tallies.found() };
}

const cell = fc.constantFrom('', '1', '2.5', '-3', '0', '4 V/µs', 'n/a', 'word', '"a, b"', '"two\r\nlines"', 'GX-A', 'precision');
const row = fc.tuple(fc.integer({ min: 1, max: 999 }), fc.array(cell, { minLength: 5, maxLength: 5 }));

describe('a canonical list row by row', () => {
  it('gives what it gives as a whole, refused or not', () => {
    fc.assert(
      fc.property(fc.array(row, { minLength: 1, maxLength: 12 }), fc.constantFrom('', '\ufeff'), (rows, mark) => {
        const sorted = [...new Map(rows)].sort(([a], [b]) => a - b);
        const text = `${mark}${[HEADER, ...sorted.map(([id, cells]) => `T-${String(id).padStart(4, '0')},${cells.join(',')}`)].join('\r\n')}\r\n`;
        const found = streamed(text);
        expect(found).not.toBeNull();
        expect(found).toEqual(whole(text));
      }),
    );
  });

  it('tells ids that fall out of the habits of the list, and reserved ones', () => {
    const text = [HEADER, ...['GX-9', 'T-0011', 'T-0012', 'T-0013', 'T-0014', 'T-O0O5'].map((id) => `${id},,other,1,1,`)].join('\n');
    const habits = text.replace('GX-9,,other,1,1,\n', '');
    expect(streamed(habits)).toEqual(whole(habits));
    expect((whole(habits) as { warnings: readonly { code: string }[] }).warnings.map(({ code }) => code)).toContain('I404');
    const reserved = text.replace('\nT-O0O5,,other,1,1,', '');
    expect(streamed(reserved)).toEqual(whole(reserved));
    expect((whole(reserved) as { problems: readonly { code: string }[] }).problems.map(({ code }) => code)).toContain('I405');
  });

  it.each([
    ['a ragged row', `${HEADER}\nA,1\n`],
    ['a quote that never closes', `${HEADER}\nA,"x,,1,1,\n`],
    ['a blank row', `${HEADER}\n\nA,,,1,1,\n`],
    ['ids alike', `${HEADER}\nA0,,,1,1,\nAO,,,1,1,\n`],
    ['another order', `${HEADER}\nB,,,1,1,\nA,,,1,1,\n`],
    ['no part', `${HEADER}\n`],
    ['an ordinary header', 'id,Vos max (mV)\nA,1\n'],
    ['semicolons', `${HEADER.replaceAll(',', ';')}\nA;;;1;1;\n`],
    ['a field twice', 'id,slew rate min (V/µs),slew rate min (V/µs)\nA,1,1\n'],
    ['a header with a semicolon', 'id,x;id;y\nA,1\n'],
    ['a header with a bar in quotes', 'id,"x|y"\nA,1\n'],
    ['a header with a tab', 'id,x\ty\nA,1\n'],
    ['a byte of nothing', `${HEADER}\nA,\u0000,,1,1,\n`],
  ])('leaves %s to the whole', (_what, text) => {
    expect(streamed(text)).toBeNull();
  });
});

it('leaves odd ids to the whole where not all problems can be told', () => {
  const classes = Array.from({ length: LIMITS.problems + 5 }, (_, at) => `T-${String(at).padStart(6, '0')},,other,1,1,`);
  const text = [HEADER, ...classes, 'T-O09999,,,1,1,'].join('\n');
  expect(streamed(text)).toBeNull();
  const within = [HEADER, ...classes.slice(0, 20), 'T-O09999,,,1,1,'].join('\n');
  expect(streamed(within)).toEqual(whole(within));
  expect((whole(within) as { warnings: readonly { code: string }[] }).warnings.map(({ code }) => code)).toContain('I404');
});

it('gives the same wherever the chunks end: in a character, in quotes, between CR and LF', () => {
  const text = `\ufeff${HEADER}\r\nA,"µΩ, ""q""\r\nsecond é",precision,1,1,𝄞\r\nB,"x",other,-1,2 V,\r\nC,,,3,4,é\r\n`;
  const bytes = bytesOf(text);
  for (let size = 1; size <= bytes.length; size += 1) {
    const source = { length: bytes.length, *chunks() { for (let at = 0; at < bytes.length; at += size) yield bytes.subarray(at, at + size); } };
    expect(streamedFrom(source)).toEqual(whole(text));
  }
});

it('records of a text in pieces are those of the text', () => {
  const text = fc.array(fc.constantFrom('a', ',', '"', '\r', '\n', '""', 'é'), { maxLength: 40 }).map((all) => all.join(''));
  fc.assert(
    fc.property(text, fc.integer({ min: 1, max: 7 }), (whole, size) => {
      const pieces = Array.from({ length: Math.ceil(whole.length / size) }, (_, at) => whole.slice(at * size, (at + 1) * size));
      const { records, faults } = recordsOf(whole, ',');
      const found = [...recordStream(pieces, ',')];
      expect(found.filter((one) => 'cells' in one)).toEqual(records);
      expect(found.filter((one) => !('cells' in one))).toEqual(faults);
    }),
  );
});
