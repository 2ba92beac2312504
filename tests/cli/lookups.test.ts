import { copyFileSync, existsSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import Database from 'better-sqlite3';
import { parse } from 'csv-parse/sync';
import { beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { requireBuilt, ROOT } from '../support/built.js';
import { makeWorkplace, type Ran, type Workplace } from '../support/railfit.js';

const PROBE = 'soil-moisture-probe.yaml';
let place: Workplace;
const demo = (): string => join(place.folder, 'demo.sqlite');
const read = (file: string): string => readFileSync(join(place.folder, file), 'utf8');

beforeAll(async () => {
  requireBuilt();
  place = makeWorkplace();
  copyFileSync(join(ROOT, 'catalog', 'demo-approved.csv'), join(place.folder, 'list.csv'));
  expect((await place.run(['import', 'list.csv', '--catalog', 'demo.sqlite'])).exit).toBe(0);
  expect((await place.run(['shortlist', PROBE, '--lookups', '-o', 'sheet.csv', '--catalog', 'demo.sqlite'])).exit).toBe(0);
  return () => { place.remove(); };
}, 120_000);
beforeEach(() => { copyFileSync(demo(), place.catalog); });

const rowsOf = (file: string): string[][] => parse(read(file));

/** The sheet with these cells filled: `ID/header` → cell. */
function fill(file: string, cells: Readonly<Record<string, string>>, change: (rows: string[][]) => string[][] = (rows) => rows): void {
  const rows = rowsOf('sheet.csv');
  const [header = []] = rows;
  for (const [key, cell] of Object.entries(cells)) {
    const [id, name = ''] = key.split('/', 1).concat(key.slice(key.indexOf('/') + 1));
    const row = rows.find(([first]) => first === id);
    const at = header.indexOf(name);
    if (row === undefined || at < 0) throw new Error(`no cell ${key}`);
    row[at] = cell;
  }
  writeFileSync(join(place.folder, file), `${change(rows).map((row) => row.map((cell) => (/[",]/u.test(cell) ? `"${cell.replaceAll('"', '""')}"` : cell)).join(',')).join('\r\n')}\r\n`);
}

const DRIFT = 'GH-AMP-05/offset drift max (µV/K)';
const patch = (file: string, ...more: readonly string[]): Promise<Ran> => place.run(['import', file, '--patch', ...more]);

interface Problems {
  readonly outcome: string;
  readonly patch?: object;
  readonly problems: readonly { code: string; row?: number; column?: string; reason: string; fix?: string }[];
  readonly difference?: { changes: readonly { part: string; field: string; was: string | null; now: string | null; cell: string; at: string }[] };
}
const documentOf = ({ stdout }: Ran): Problems => JSON.parse(stdout) as Problems;

describe('railfit shortlist --lookups', () => {
  it('says what to look up, in which cell, and what it must be', async () => {
    const { stdout, exit } = await place.run(['shortlist', PROBE, '--lookups']);
    expect(exit).toBe(0);
    expect(stdout).toMatch(/^Look up these 5 figures in 4 datasheets and 4 undecided parts are settled; the first could rank 2\./u);
    expect(stdout).toMatch(/offset drift maximum: 68\.3 µV\/°C or less \(DC error\)\n\s+list\.csv row 6, AT \(cell is empty\)/u);
    expect(stdout).toContain('a new column "output resistance typ (Ω)"');
    expect(stdout).toMatch(/Apart from these, to confirm before release/u);
  });

  it('stands in one sentence at the end of a shortlist, with the command', async () => {
    const { stdout } = await place.run(['shortlist', PROBE]);
    expect(stdout).toContain('Look up these 5 figures in 4 datasheets and 4 undecided parts are settled; the first could rank 2.');
    expect(stdout).toContain(`railfit shortlist ${PROBE} --lookups`);
  });

  it('writes a sheet with a question mark in every cell to fill, and never over another file', async () => {
    const [header = [], ...rows] = rowsOf('sheet.csv');
    expect(header.slice(0, 2)).toEqual(['id', 'look up']);
    expect(rows.map(([id]) => id).sort()).toEqual(['GH-AMP-05', 'GH-AMP-18', 'GH-AMP-19', 'GH-AMP-20']);
    expect(rows.flatMap((row) => row.slice(2)).filter((cell) => cell === '?')).toHaveLength(5);
    const before = read('sheet.csv');
    expect(await place.run(['shortlist', PROBE, '--lookups', '-o', 'sheet.csv'])).toMatchObject({ exit: 2, stdout: '' });
    expect(read('sheet.csv')).toBe(before);
    expect((await place.run(['shortlist', PROBE, '--lookups', '-o', 'sheet.csv', '--force'])).exit).toBe(0);
    expect(read('sheet.csv')).toBe(before);
  });

  it('writes nothing where there is nothing to look up', async () => {
    expect((await place.run(['shortlist', PROBE, '--lookups', '-o', 'none.csv', '--set', 'limits.supplyCurrent=1 µA'])).stdout).toMatch(/^Nothing to look up/u);
    expect(existsSync(join(place.folder, 'none.csv'))).toBe(false);
  });

  it.each([[['-o', 'x.csv'], '-o belongs to --lookups'], [['--lookups', '--csv'], '--lookups and --csv'], [['--lookups', '-o', 'nowhere/x.csv'], 'there is no folder nowhere']])('refuses %j', async (words, said) => {
    const { exit, stderr } = await place.run(['shortlist', PROBE, ...words]);
    expect([2, 5]).toContain(exit);
    expect(stderr).toContain(said);
  });
});

describe('an assumption that is printed', () => {
  it('pastes back and decides', async () => {
    const { stdout, exit } = await place.run(['explain', 'GH-AMP-05', PROBE]);
    expect(exit).toBe(4);
    const wish = /--assume (\S+)/u.exec(stdout)?.[1] ?? '';
    expect(wish).toBe('GH-AMP-05.offsetDrift=68.32uV/C');
    expect(stdout).toMatch(/If it is so, GH-AMP-05 would rank 3 of 10/u);
    expect((await place.run(['explain', 'GH-AMP-05', PROBE, '--assume', wish])).exit).toBe(0);
    expect((await place.run(['explain', 'GH-AMP-05', PROBE, '--assume', 'GH-AMP-05.offsetDrift=69uV/C'])).exit).toBe(4);
  });

  it('names one end of a range, and leaves the other alone', async () => {
    const { stdout } = await place.run(['explain', 'GH-AMP-20', PROBE]);
    const wish = /--assume (\S+)/u.exec(stdout)?.[1] ?? '';
    expect(wish).toMatch(/^GH-AMP-20\.temperature\.min=/u);
    expect((await place.run(['explain', 'GH-AMP-20', PROBE, '--assume', wish])).exit).toBe(0);
    expect((await place.run(['explain', 'GH-AMP-20', PROBE, '--assume', 'GH-AMP-20.slewRate.min=1 V/µs'])).stderr).toContain('has one limit');
  });

  it('is not offered for cells of a generic set, which has no datasheet', async () => {
    const { stdout } = await place.run(['explain', 'GX-NANO', PROBE, '--set', 'limits.distortion=-70 dB']);
    expect(stdout).not.toMatch(/GX-NANO .*row/u);
  });
});

describe('railfit import --patch', () => {
  it('changes the filled cells and nothing else, with the cell of the sheet as origin, and can be taken back', async () => {
    const before = (await place.run(['parts', '--csv'])).stdout;
    fill('filled.csv', { [DRIFT]: '5' });
    const dry = documentOf(await patch('filled.csv', '--dry-run', '--json'));
    expect(dry).toMatchObject({ outcome: 'dry-run', patch: { cells: 1, parts: 1, list: 'list.csv' } });
    expect((await place.run(['parts', '--csv'])).stdout).toBe(before);
    const ran = await patch('filled.csv', '--json');
    expect(ran.exit).toBe(0);
    expect(documentOf(ran).difference?.changes).toEqual([{ part: 'GH-AMP-05', field: 'offset drift max (µV/K)', was: null, now: '5', cell: 'D4', at: 'filled.csv#cell=4,4' }]);
    const changed = rowsTold((await place.run(['parts', '--csv'])).stdout);
    for (const [id, row] of rowsTold(before)) for (const [header, cell] of row) expect(changed.get(id)?.get(header), `${id} ${header}`).toBe(id === 'GH-AMP-05' && header === 'offset drift max (µV/K)' ? '5' : cell);
    expect((await place.run(['part', 'GH-AMP-05', '--sources'])).stdout).toMatch(/offset drift[^]*from filled\.csv \(sha256 [0-9a-f]{8}\) line 4, row 4, column D, offset drift max \(µV\/K\) = "5"/u);
    expect((await place.run(['part', 'GH-AMP-05', '--sources'])).stdout).toMatch(/from list\.csv/u);
    expect((await place.run(['explain', 'GH-AMP-05', PROBE])).exit).toBe(0);
    expect(documentOf(await patch('filled.csv', '--json')).outcome).toBe('no-change');
    expect((await place.run(['import', '--undo'])).exit).toBe(0);
    expect((await place.run(['parts', '--csv'])).stdout).toBe(before);
    expect((await place.run(['explain', 'GH-AMP-05', PROBE])).exit).toBe(4);
  });

  it('adds a second sheet to the first, and keeps both origins in the tables', async () => {
    fill('one.csv', { [DRIFT]: '5' });
    fill('two.csv', { 'GH-AMP-05/common mode rejection min (dB)': '?', 'GH-AMP-20/temperature min (°C)': '-40' });
    expect((await patch('one.csv')).exit).toBe(0);
    expect((await patch('two.csv')).exit).toBe(0);
    const database = new Database(place.catalog, { readonly: true });
    const kept = database.prepare('select part_id, patched from record where patched is not null and import_id = (select max(id) from list_import where undone = 0) order by part_id').all() as { part_id: string; patched: string }[];
    database.close();
    expect(kept.map(({ part_id, patched }) => [part_id, Object.entries(JSON.parse(patched) as Record<string, { file: string }>).map(([slot, { file }]) => [slot, file])])).toEqual([
      ['GH-AMP-05', [['offsetDrift.max', 'one.csv']]],
      ['GH-AMP-20', [['temperature.min', 'two.csv']]],
    ]);
  });

  it.each<[string, string, RegExp, () => void]>([
    ['an id the list does not have', 'I801', /GH-AMP-55 is no part of the list in force \(list\.csv\)/u, () => { fill('bad.csv', { [DRIFT]: '5' }, (rows) => rows.map((row) => row.map((cell) => (cell === 'GH-AMP-05' ? 'GH-AMP-55' : cell)))); }],
    ['nothing filled', 'I802', /no cell of the sheet is filled/u, () => { fill('bad.csv', {}); }],
    ['no rows', 'I802', /no part: nothing is filled/u, () => { fill('bad.csv', {}, (rows) => rows.slice(0, 1)); }],
    ['a figure the list has, otherwise', 'I803', /the list already says common mode rejection min \(dB\) = "\d+" \(list\.csv [A-Z]+6\)/u, () => { fill('bad.csv', { 'GH-AMP-05/common mode rejection min (dB)': '60' }); }],
    ['a header that says nothing', 'I804', /"offset drfit max \(µV\/K\)", and 1 filled cell of it would be lost/u, () => { fill('bad.csv', { [DRIFT]: '5' }, ([header = [], ...rows]) => [header.map((cell) => cell.replace('drift', 'drfit')), ...rows]); }],
    ['a cell that is no figure', 'Q013', /./u, () => { fill('bad.csv', { [DRIFT]: '~5' }); }],
    ['a limit below the typical of the list', 'I512', /gain bandwidth: min 900 MHz \(C2\) is above typ/u, () => { fill('bad.csv', { 'GH-AMP-18/gain bandwidth min (MHz)': '900' }); }],
  ])('refuses %s: %s, and writes nothing', async (_, code, said, make) => {
    make();
    const before = (await place.run(['parts', '--csv'])).stdout;
    const ran = await patch('bad.csv', '--json');
    expect(ran.exit).toBe(3);
    const { outcome, problems } = documentOf(ran);
    expect(outcome).toBe('refused');
    expect(problems.map((one) => one.code)).toContain(code);
    expect(problems.find((one) => one.code === code)?.reason).toMatch(said);
    expect((await place.run(['parts', '--csv'])).stdout).toBe(before);
  });

  it('refuses a sheet given as a list, with the command to paste, and a sheet without a list', async () => {
    fill('filled.csv', { [DRIFT]: '5' });
    const asList = await place.run(['import', 'filled.csv']);
    expect(asList).toMatchObject({ exit: 3 });
    expect(asList.stderr).toMatch(/error\[I805\][^]*fix: railfit import filled\.csv --patch/u);
    const alone = await patch('filled.csv', '--catalog', 'empty.sqlite');
    expect(alone.exit).toBe(3);
    expect(alone.stderr).toContain('error[I806]');
  });
});

/** Canonical CSV as id → header → cell. */
function rowsTold(text: string): Map<string, Map<string, string>> {
  const [header = [], ...rows] = parse(text);
  return new Map(rows.map((row) => [row[0] ?? '', new Map(header.map((name, at) => [name, row[at] ?? '']))]));
}
