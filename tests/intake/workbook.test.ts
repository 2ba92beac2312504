import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { ListOptions, ListResult } from '../../src/intake/list.js';
import { readList } from '../../src/intake/read-list.js';
import { recordsOf } from '../../src/intake/records.js';
import { isWorkbook, readWorkbook } from '../../src/intake/workbook.js';
import { workbookBytes, type WorkbookCell, type WorkbookSheets } from '../support/workbook.js';
import { accepted } from './reading.js';

async function read(content: WorkbookSheets | Uint8Array, options: Partial<ListOptions> = {}): Promise<ListResult> {
  const bytes = content instanceof Uint8Array ? content : workbookBytes(content);
  expect(isWorkbook(bytes)).toBe(true);
  return readList(bytes, { file: 'list.xlsx', tier: 'approved', workbook: await readWorkbook(bytes), ...options });
}

const codes = (result: ListResult): string[] => (result.ok ? result.warnings : result.problems).map(({ code }) => code);

const LIST: readonly (readonly WorkbookCell[])[] = [['id', 'offset voltage max (V)', 'slew rate typ (V/µs)'], ['A-1', 0.003, 0.1 + 0.2], ['A-2', 5e-7, '0,5']];

describe('a workbook', () => {
  it('gives the parts of the same table as CSV, with the sheet in the place', async () => {
    const list = await read({ Approved: LIST });
    if (!list.ok) throw new Error(JSON.stringify(list.problems));
    expect(list.file).toBe('list.xlsx [Approved]');
    expect(list.parts).toEqual(accepted('id\toffset voltage max (V)\tslew rate typ (V/µs)\nA-1\t0.003\t0.3\nA-2\t0.0000005\t0,5\n').parts);
    expect(list.records.map(({ row }) => row)).toEqual([2, 3]);
  });

  it('with the ordinary list in it reads as the ordinary list', async () => {
    const text = readFileSync(join(import.meta.dirname, 'ordinary-list.csv'), 'utf8');
    const rows = recordsOf(text, ',').records.map(({ cells }, at) => cells.map((cell): WorkbookCell => (at > 0 && /^-?\d+(?:\.\d+)?$/u.test(cell) && cell !== '' ? Number(cell) : cell)));
    const list = await read({ Notes: [], 'House list': rows });
    if (!list.ok) throw new Error(JSON.stringify(list.problems));
    expect(list.parts).toEqual(accepted(text).parts);
    expect(list.notes[0]).toMatch(/^workbook, sheet "House list" \(24 columns, 41 rows\), header row 1/u);
  });

  it('points at the cell without a line, and names the sheet', async () => {
    const list = await read({ Approved: [['id', 'bias current max (pA)'], ['A-1', '5 mV']] });
    expect(codes(list)).toEqual(['Q004']);
    if (!list.ok) expect(list.problems[0]?.place).toMatchObject({ file: 'list.xlsx [Approved]', row: 2, columnLetter: 'B', part: 'A-1' });
    if (!list.ok) expect(list.problems[0]?.place).not.toHaveProperty('line');
  });

  it('tells a date that was a figure, and a header below a title', async () => {
    const damaged = await read({ Approved: [['id', 'slew rate typ (V/µs)'], ['A-1', new Date(Date.UTC(2024, 4, 3))]] });
    expect(damaged.ok).toBe(false);
    expect(codes(damaged)).toEqual(['Q017']);
    const titled = await read({ Approved: [['Approved amplifiers', null, null], [], ...LIST] });
    expect(codes(titled)).toEqual(['I207']);
    if (!titled.ok) expect(titled.problems[0]?.fix).toMatch(/^railfit import list\.xlsx --sheet "Approved" --header-rows 3/u);
    if (!titled.ok) expect((await read({ Approved: [['Approved amplifiers', null, null], [], ...LIST] }, titled.questions[0]?.choices[0]?.answer)).ok).toBe(true);
  });
});

describe('which sheet', () => {
  const several = { Cover: [['Team list']], Approved: LIST, Obsolete: [['id'], ['B-1']] };

  it('is asked when several have cells, with the option that answers', async () => {
    const list = await read(several);
    expect(codes(list)).toEqual(['I107']);
    if (list.ok) return;
    expect(list.problems[0]?.fix).toBe('--sheet "Cover" or --sheet "Approved" or --sheet "Obsolete"');
    const answered = await read(several, list.questions[0]?.choices[1]?.answer);
    expect(answered.ok && answered.parts.map(({ id }) => id)).toEqual(['A-1', 'A-2']);
  });

  it('is given by name or number; another name is refused with the nearest', async () => {
    expect((await read(several, { sheet: 'approved ' })).ok).toBe(true);
    expect((await read(several, { sheet: '3' })).ok).toBe(true);
    const wrong = await read(several, { sheet: 'Aproved' });
    expect(!wrong.ok && wrong.problems[0]?.fix).toBe('--sheet "Approved"');
  });

  it('is known again by the mapping of the last list', async () => {
    const house = (value: number): WorkbookSheets => ({ Cover: [['Team list']], House: [['Part number', 'Vos max (mV)'], ['A-1', value]] });
    const first = await read(house(3), { sheet: 'House' });
    if (!first.ok || first.mapping === null) throw new Error('refused');
    const next = await read(house(2), { mappings: [first.mapping] });
    expect(next.ok && next.file).toBe('list.xlsx [House]');
  });

  it('without a cell is an empty list', async () => expect(codes(await read({ Approved: [] }))).toEqual(['I103']));
});

describe('what is no workbook', () => {
  it('is refused with the reason and what to do, never with an exception', async () => {
    const older = await read(Uint8Array.from([0xd0, 0xcf, 0x11, 0xe0, 0xa1, 0xb1, 0x1a, 0xe1]));
    expect(codes(older)).toEqual(['I106']);
    const whole = workbookBytes({ Approved: LIST });
    for (let cut = 4; cut < whole.length; cut += 97) expect((await read(whole.slice(0, cut))).ok).toBe(false);
  });

  it('damaged anywhere is a list or a refusal', { timeout: 60_000 }, async () => {
    const whole = workbookBytes({ Approved: LIST });
    await fc.assert(
      fc.asyncProperty(fc.array(fc.tuple(fc.integer({ min: 4, max: whole.length - 1 }), fc.integer({ min: 0, max: 255 })), { minLength: 1, maxLength: 5 }), async (wounds) => {
        const bytes = whole.slice();
        for (const [at, byte] of wounds) bytes[at] = byte;
        const list = await read(bytes);
        expect(list.ok ? list.parts.length : codes(list).length).toBeGreaterThan(0);
      }),
      { numRuns: 150 },
    );
  });

  it('that unpacks to more than the limit is refused before it is unpacked', async () => {
    const bytes = workbookBytes({ Approved: LIST });
    const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
    for (let at = 0; at < bytes.length - 4; at += 1) if (view.getUint32(at, true) === 0x02014b50) view.setUint32(at + 24, 0xfffffff0, true);
    expect(codes(await read(bytes))).toEqual(['I105']);
  });
});
