import { copyFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { requireBuilt } from '../support/built.js';
import { makeWorkplace, type Ran, type Workplace } from '../support/railfit.js';

const PROBE = 'soil-moisture-probe.yaml';
let place: Workplace;

const empty = (): string => join(place.folder, 'empty.sqlite');
const house = (): string => join(place.folder, 'house.sqlite');

beforeAll(async () => {
  requireBuilt();
  place = makeWorkplace();
  await place.run(['parts', '--catalog', 'empty.sqlite']);
  copyFileSync(empty(), house());
  expect((await place.run(['import', 'approved.csv', '--catalog', 'house.sqlite'])).exit).toBe(0);
  return () => { place.remove(); };
}, 60_000);
beforeEach(() => { copyFileSync(empty(), place.catalog); });

const HEADER = 'id,status,lifecycle,gain bandwidth typ (MHz),quiescent current max (µA)';

function write(file: string, rows: readonly string[], header = HEADER): void {
  writeFileSync(join(place.folder, file), `${[header, ...rows].join('\n')}\n`);
}

const rows = (cells: string, count = 6): string[] => Array.from({ length: count }, (_, at) => `TEAM-${at},approved,${cells}`);

async function imported(file: string, ...words: readonly string[]): Promise<Ran> {
  return place.run(['import', file, ...words]);
}

interface ImportDocument {
  readonly outcome: string;
  readonly held?: true;
  readonly counts: object;
  readonly problems: readonly { readonly code: string; readonly severity: string; readonly reason: string; readonly fix?: string }[];
  readonly difference?: { readonly added: string[]; readonly withdrawn: string[]; readonly changes: object[]; readonly columns: object };
  readonly stages?: readonly { readonly file: string; readonly outcome: string; readonly reason?: string; readonly before: { first: string | null } | null; readonly after: { chosen: object | null } | null }[];
}

const documentOf = (ran: Ran): ImportDocument => JSON.parse(ran.stdout) as ImportDocument;

/** The option a refusal prints, as it stands there. */
function optionIn(text: string): string[] {
  return /--accept \w+/u.exec(text)?.[0].split(' ') ?? [];
}

describe('guards', () => {
  it.each<[string, string, () => void, RegExp]>([
    ['parts gone', 'I701', () => { write('next.csv', rows('active,1,50', 4)); }, /2 of the 6 parts in force \(33 %\) are not in this list and would be withdrawn: TEAM-4, TEAM-5/u],
    ['a unit slipped', 'I602', () => { write('next.csv', rows('active,1,50'), HEADER.replace('µA', 'mA')); }, /"quiescent current max \(mA\)" is exactly 1000 times the last import in 6 of 6 known parts; the header went from "quiescent current max \(µA\)" to "quiescent current max \(mA\)"; the figures as written are the same/u],
    ['two units slipped', 'I602', () => { write('next.csv', rows('active,1,50'), HEADER.replace('µA', 'mA').replace('MHz', 'GHz')); }, /"gain bandwidth typ \(GHz\)" and "quiescent current max \(mA\)" are exactly 1000 times the last import in 6 of 6 known parts/u],
    ['lifecycle better', 'I702', () => { write('next.csv', rows('active,1,50').map((row, at) => (at < 4 ? row : row.replace('active', 'obsolete')))); }, /the lifecycle of 4 of 6 known parts goes back towards active: TEAM-0, TEAM-1, TEAM-2, TEAM-3/u],
  ])('%s: %s holds the list back, prints the option, and that option lets it in', async (why, code, next, words) => {
    write('first.csv', rows(why === 'lifecycle better' ? 'nrnd,1,50' : 'active,1,50'));
    expect((await imported('first.csv')).exit).toBe(0);
    next();
    const held = await imported('next.csv', '--json');
    expect(held.exit).toBe(3);
    const document = documentOf(held);
    const found = document.problems.filter(({ severity }) => severity === 'error');
    expect(document).toMatchObject({ outcome: 'refused', held: true });
    expect(found.map((one) => one.code)).toEqual([code]);
    expect(found[0]?.reason).toMatch(words);
    const text = await imported('next.csv');
    expect(text).toMatchObject({ exit: 3, stdout: '' });
    expect(text.stderr.replaceAll(/\s+/gu, ' ')).toContain('Nothing was changed. (exit 3)');
    const dry = await imported('next.csv', '--dry-run');
    expect(dry).toEqual(text);
    const option = optionIn(text.stderr.replaceAll(/\s+/gu, ' '));
    expect(option).toHaveLength(2);
    const letIn = await imported('next.csv', ...option, '--json');
    expect(letIn.exit).toBe(0);
    expect(documentOf(letIn)).toMatchObject({ outcome: 'imported', problems: expect.arrayContaining([expect.objectContaining({ code, severity: 'warning' })]) as unknown });
  });

  it('an older file is held back with its own option', async () => {
    write('march.csv', rows('active,1,50'));
    write('april.csv', rows('active,2,60'));
    await imported('march.csv');
    await imported('april.csv');
    const held = await imported('march.csv');
    expect(held.exit).toBe(3);
    expect(held.stderr).toContain('error[I703]');
    expect(held.stderr).toContain('--accept older');
    expect((await imported('march.csv', '--accept', 'older')).exit).toBe(0);
  });

  it('several are all told, and each must be accepted', async () => {
    write('first.csv', rows('active,1,50'));
    write('next.csv', rows('active,1000,50', 3));
    await imported('first.csv');
    const codes = async (...words: readonly string[]): Promise<unknown> => documentOf(await imported('next.csv', '--json', ...words)).problems.map((one) => [one.code, one.severity]);
    expect(await codes()).toEqual([['I701', 'error'], ['I602', 'error']]);
    expect(await codes('--accept', 'removed')).toEqual([['I701', 'warning'], ['I602', 'error']]);
    expect(await codes('--accept', 'removed', '--accept', 'scaled')).toEqual([['I701', 'warning'], ['I602', 'warning']]);
  });

  it('a word that is no guard is refused', async () => {
    const ran = await imported('approved.csv', '--accept', 'everything');
    expect(ran.exit).toBe(2);
    expect(ran.stderr).toContain('accepted: removed, scaled, lifecycle, older');
  });
});

describe('what changed', () => {
  beforeEach(() => { copyFileSync(house(), place.catalog); });

  it('is told figure by figure with the cell, the same in a dry run', async () => {
    const dry = documentOf(await imported('approved-next.csv', '--dry-run', '--json'));
    const real = documentOf(await imported('approved-next.csv', '--json'));
    expect({ ...dry, outcome: 'imported' }).toEqual(real);
    expect(real.difference).toMatchObject({ added: ['HOUSE-09'], withdrawn: ['HOUSE-08'], columns: { added: [], removed: [] } });
    expect(real.difference?.changes).toContainEqual({ part: 'HOUSE-03', field: 'offset drift max (µV/K)', was: null, now: '4', cell: 'AD5', at: 'approved-next.csv#cell=5,30' });
  });

  it('a cell told is the cell of the figure', async () => {
    await imported('approved-next.csv');
    const shown = JSON.parse((await place.run(['part', 'HOUSE-03', '--json'])).stdout) as { figures: { parameter: string; kind: string; origin: string; cell: string }[] };
    expect(shown.figures.find(({ parameter, kind }) => parameter === 'offsetDrift' && kind === 'max')).toMatchObject({ origin: 'approved-next.csv#cell=5,30', cell: '4' });
  });

  it('is not told of the same list, in the same bytes or in others', async () => {
    const same = await imported('approved.csv', '--json');
    expect(documentOf(same)).toMatchObject({ outcome: 'no-change', counts: { unchanged: 9 } });
    expect(same.stdout).not.toContain('difference');
  });
});

describe('saved stages', () => {
  beforeEach(() => { copyFileSync(house(), place.catalog); });

  it('are judged before and after, in a dry run, an import and an undo', async () => {
    await place.run(['stages', 'add', PROBE, '--part', 'HOUSE-08']);
    await place.run(['stages', 'add', 'reference-buffer.yaml']);
    const dry = documentOf(await imported('approved-next.csv', '--dry-run', '--json')).stages;
    const real = documentOf(await imported('approved-next.csv', '--json')).stages;
    expect(dry).toEqual(real);
    expect(real).toMatchObject([
      { file: 'reference-buffer.yaml', part: null },
      { file: PROBE, part: 'HOUSE-08', outcome: 'other', before: { chosen: { outcome: 'does-not-fit' } }, after: { chosen: { outcome: 'absent', rank: null } } },
    ]);
    const answered = JSON.parse((await place.run(['shortlist', PROBE, '--json'])).stdout) as { counts: { fit: number; undecided: number; rejected: number }; fit: { part: string }[] };
    const { fit, undecided, rejected } = answered.counts;
    expect(real?.[1]?.after).toMatchObject({ first: answered.fit[0]?.part, fit, undecided, rejected });
    const back = documentOf(await place.run(['import', '--undo', '--json'])).stages?.[1];
    expect(back).toMatchObject({ before: real?.[1]?.after, after: real?.[1]?.before });
  });

  it('that are gone or read no more are told, and nothing is refused for it', async () => {
    for (const name of ['gone.yaml', 'wrong.yaml']) writeFileSync(join(place.folder, name), 'topology: follower\nsupply: 5 V\nsignal: {input: 1..4 V}\n');
    expect((await place.run(['stages', 'add', 'gone.yaml', 'wrong.yaml'])).exit).toBe(0);
    rmSync(join(place.folder, 'gone.yaml'));
    writeFileSync(join(place.folder, 'wrong.yaml'), 'topology: folower\n');
    const ran = await imported('approved-next.csv');
    expect(ran.exit).toBe(0);
    const told = ran.stdout.replaceAll(/\s+/gu, ' ');
    expect(told).toContain('gone.yaml: not judged: the file is gone');
    expect(told).toContain('wrong.yaml: not judged: it no longer reads: line 1:');
  });

  it('are not looked at when nothing changes, nor when the list is refused for its cells', async () => {
    await place.run(['stages', 'add', PROBE]);
    expect(documentOf(await imported('approved.csv', '--json')).stages).toBeUndefined();
    expect(documentOf(await imported('refused.csv', '--json')).stages).toBeUndefined();
  });
});
