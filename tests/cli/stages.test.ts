import { copyFileSync, mkdirSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { requireBuilt } from '../support/built.js';
import { makeWorkplace, type Workplace } from '../support/railfit.js';

const PROBE = 'soil-moisture-probe.yaml';
let place: Workplace;

const start = (): string => join(place.folder, 'start.sqlite');

beforeAll(async () => {
  requireBuilt();
  place = makeWorkplace();
  expect((await place.run(['import', 'approved.csv'])).exit).toBe(0);
  copyFileSync(place.catalog, start());
  return () => { place.remove(); };
}, 60_000);
beforeEach(() => { copyFileSync(start(), place.catalog); });

interface StagesDocument {
  readonly done: string;
  readonly files: readonly string[];
  readonly stages: readonly { readonly file: string; readonly part: string | null; readonly name: string | null; readonly problem: string | null }[];
}

async function stages(words: readonly string[] = []): Promise<StagesDocument> {
  const ran = await place.run(['stages', ...words, '--json']);
  expect(ran.exit, ran.stdout).toBe(0);
  return JSON.parse(ran.stdout) as StagesDocument;
}

const kept = async (): Promise<unknown[]> => (await stages()).stages.map(({ file, part }) => [file, part]);

describe('railfit stages', () => {
  it('keeps a file with its part, keeps the choice when it is added again, changes it and takes it back', async () => {
    expect(await stages(['add', PROBE, '--part', 'HOUSE-02'])).toMatchObject({ done: 'add', files: [PROBE], stages: [{ file: PROBE, part: 'HOUSE-02', name: 'Soil-moisture probe, second amplifier', problem: null }] });
    await stages(['add', 'reference-buffer.yaml', PROBE]);
    expect(await kept()).toEqual([['reference-buffer.yaml', null], [PROBE, 'HOUSE-02']]);
    await stages(['add', PROBE, '--part', 'HOUSE-01']);
    expect(await kept()).toEqual([['reference-buffer.yaml', null], [PROBE, 'HOUSE-01']]);
    await stages(['add', PROBE, '--no-part']);
    expect(await stages(['remove', 'reference-buffer.yaml'])).toMatchObject({ done: 'remove', files: ['reference-buffer.yaml'], stages: [{ file: PROBE, part: null }] });
  });

  it('keeps what lies below the catalog with it when the folder moves', async () => {
    mkdirSync(join(place.folder, 'team'));
    copyFileSync(join(place.folder, PROBE), join(place.folder, 'team', PROBE));
    const there = (folder: string): readonly string[] => ['stages', '--json', '--catalog', join(folder, 'c.sqlite')];
    copyFileSync(start(), join(place.folder, 'team', 'c.sqlite'));
    await place.run(['stages', 'add', join('team', PROBE), '--catalog', join('team', 'c.sqlite')]);
    renameSync(join(place.folder, 'team'), join(place.folder, 'moved'));
    expect(JSON.parse((await place.run(there('moved'))).stdout)).toMatchObject({ stages: [{ file: `moved/${PROBE}`, problem: null }] });
  });

  it('tells what became of a file, and forgets one that is gone', async () => {
    copyFileSync(join(place.folder, PROBE), join(place.folder, 'mine.yaml'));
    await stages(['add', 'mine.yaml']);
    writeFileSync(join(place.folder, 'mine.yaml'), 'topology: follower\nsupply: 5\n');
    expect((await stages()).stages).toMatchObject([{ file: 'mine.yaml', name: null, problem: expect.stringMatching(/^it no longer reads: line 2: .+, and 1 more$/u) as unknown }]);
    rmSync(join(place.folder, 'mine.yaml'));
    expect((await stages()).stages).toMatchObject([{ file: 'mine.yaml', problem: 'the file is gone' }]);
    expect((await stages(['remove', 'mine.yaml'])).stages).toEqual([]);
  });

  it.each<[string, readonly string[], string]>([
    ['a file that is no stage', ['add', PROBE, 'approved.csv'], 'S'],
    ['a part that is not there', ['add', PROBE, '--part', 'HOUSE-O2'], 'C108'],
    ['a stage that is not saved', ['remove', PROBE], 'C112'],
    ['another word', ['forget', PROBE], 'C102'],
    ['a file without add', [PROBE], 'C102'],
    ['no file', ['add'], 'C102'],
    ['standard input', ['add', '-'], 'C102'],
    ['a file to list', ['list', PROBE], 'C102'],
    ['a part to list', ['list', '--part', 'HOUSE-01'], 'C106'],
  ])('refuses %s and keeps nothing', async (_, words, code) => {
    const ran = await place.run(['stages', ...words]);
    expect(ran).toMatchObject({ exit: 2, stdout: '' });
    expect(ran.stderr).toContain(`error[${code}`);
    expect(await kept()).toEqual([]);
  });

  it('tells what is wrong with all files at once', async () => {
    const ran = await place.run(['stages', 'add', 'nowhere.yaml', PROBE, 'refused.csv', '--json']);
    const { problems } = JSON.parse(ran.stdout) as { problems: { file?: string; path?: string }[] };
    expect(new Set(problems.map(({ file, path }) => file ?? path))).toEqual(new Set(['nowhere.yaml', 'refused.csv']));
    expect(await kept()).toEqual([]);
  });
});
