import { rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { beforeAll, describe, expect, it } from 'vitest';
import { DOCUMENTS } from '../../src/presentation/schemas/index.js';
import { requireBuilt } from '../support/built.js';
import { makeWorkplace, type Workplace } from '../support/railfit.js';

const PROBE = 'soil-moisture-probe.yaml';
const BUFFER = 'reference-buffer.yaml';
let place: Workplace;

beforeAll(async () => {
  requireBuilt();
  place = makeWorkplace();
  await place.run(['import', 'approved.csv']);
  writeFileSync(join(place.folder, 'broken.yaml'), 'topology: follower\nsupply: 5\n');
  return () => { place.remove(); };
}, 60_000);

interface CheckDocument {
  readonly stages: readonly { readonly file: string; readonly part: string | null; readonly outcome: string | null; readonly reason?: string; readonly verdicts: readonly { readonly outcome: string }[] }[];
}

async function check(words: readonly string[]): Promise<{ exit: number | null; stages: CheckDocument['stages'] }> {
  const ran = await place.run(['check', ...words, '--json']);
  return { exit: ran.exit, stages: (JSON.parse(ran.stdout) as CheckDocument).stages };
}

const chosenOn = async (stage: string, part: string): Promise<unknown> => {
  const { exit, stages } = await check([stage, '--part', part]);
  return [exit, stages[0]?.outcome, stages[0]?.reason];
};

describe('railfit check', () => {
  it('one part on one stage: 0 fits, 4 cannot be decided, 1 does not fit, 2 is not there', async () => {
    expect(await chosenOn(PROBE, 'HOUSE-01')).toEqual([0, 'fits', undefined]);
    expect(await chosenOn(PROBE, 'HOUSE-03')).toEqual([4, 'undecided', undefined]);
    expect(await chosenOn(PROBE, 'HOUSE-06')).toEqual([1, 'does-not-fit', undefined]);
    expect(await chosenOn(PROBE, 'HOUSE-99')).toEqual([2, null, 'unknown-part']);
    expect(await chosenOn('nowhere.yaml', 'HOUSE-01')).toEqual([2, null, 'gone']);
    expect(await chosenOn('broken.yaml', 'HOUSE-01')).toEqual([2, null, 'wrong']);
  });

  it('says that a pattern matched no file, not that a file is gone', async () => {
    const ran = await place.run(['check', 'nothing/*.yaml', '--part', 'HOUSE-01']);
    expect(ran.exit).toBe(2);
    expect(ran.stdout.replace(/\s+/gu, ' ')).toContain('nothing/*.yaml: no file matches this pattern, so the shell passed it on as it is');
    expect((await place.run(['check', 'nothing.yaml', '--part', 'HOUSE-01'])).stdout).toContain('nothing.yaml: the file is gone');
  });

  it('gives the verdicts that explain gives', async () => {
    const { stages } = await check([PROBE, '--part', 'HOUSE-06']);
    const explained = JSON.parse((await place.run(['explain', 'HOUSE-06', PROBE, '--json'])).stdout) as { verdicts: unknown[] };
    expect(stages[0]?.verdicts).toEqual(explained.verdicts);
  });

  it('exits with the worst: 2 before 4 before 1, whatever the order', async () => {
    await place.run(['stages', 'add', PROBE, '--part', 'HOUSE-06']);
    await place.run(['stages', 'add', BUFFER, '--part', 'HOUSE-01']);
    expect((await check([PROBE, BUFFER])).exit).toBe(1);
    await place.run(['stages', 'add', BUFFER, '--part', 'HOUSE-03']);
    const both = await check([BUFFER, PROBE]);
    expect(both.stages.map(({ file, part }) => [file, part])).toEqual([[BUFFER, 'HOUSE-03'], [PROBE, 'HOUSE-06']]);
    const undecided = both.stages.some(({ outcome }) => outcome === 'undecided');
    expect(both.exit).toBe(undecided ? 4 : 1);
    expect((await check([PROBE, 'nowhere.yaml', BUFFER])).exit).toBe(2);
    expect((await check([PROBE, 'thermistor-bridge.yaml'])).stages[1]).toMatchObject({ part: null, outcome: null, reason: 'not-chosen', verdicts: [] });
    await place.run(['stages', 'remove', PROBE, BUFFER]);
  });

  it('without a stage takes every saved one; one without a choice is told and is no fault, unless no stage has one', async () => {
    expect((await place.run(['check'])).exit).toBe(2);
    await place.run(['stages', 'add', BUFFER]);
    expect((await check([])).exit).toBe(2);
    await place.run(['stages', 'add', PROBE, '--part', 'HOUSE-01']);
    const all = await check([]);
    expect(all).toMatchObject({ exit: 0, stages: [{ file: BUFFER, reason: 'not-chosen' }, { file: PROBE, outcome: 'fits' }] });
    const text = (await place.run(['check'])).stdout;
    expect(text).toContain(`${PROBE}: HOUSE-01 fits, rank 1 of`);
    expect(text.trimEnd().split('\n').at(-1)).toBe('2 stages: 1 fits, 1 without a chosen part.');
    await place.run(['stages', 'remove', PROBE, BUFFER]);
  });

  it('a part withdrawn since is a no', async () => {
    const catalog = { env: { RAILFIT_CATALOG: join(place.folder, 'next.sqlite') } };
    for (const words of [['import', 'approved.csv'], ['stages', 'add', PROBE, '--part', 'HOUSE-08'], ['import', 'approved-next.csv']]) expect((await place.run(words, catalog)).exit).toBe(0);
    const ran = await place.run(['check'], catalog);
    expect(ran).toMatchObject({ exit: 1, stderr: '' });
    expect(ran.stdout).toContain('HOUSE-08 was withdrawn: approved-next.csv no longer has it');
    const explained = await place.run(['explain', 'HOUSE-08', PROBE], catalog);
    expect(explained.exit).toBe(2);
    expect(explained.stderr).toContain('error[C113]');
    const shown = await place.run(['part', 'HOUSE-08', '--json', '--sources'], catalog);
    expect(shown.exit).toBe(1);
    expect(DOCUMENTS.part.safeParse(JSON.parse(shown.stdout)).error?.issues ?? []).toEqual([]);
    expect(JSON.parse(shown.stdout)).toMatchObject({ part: { id: 'HOUSE-08' }, withdrawn: { file: 'approved-next.csv', takenBack: false }, figures: expect.arrayContaining([expect.objectContaining({ origin: expect.stringMatching(/^approved\.csv#cell=10,/u) as unknown })]) as unknown });
    rmSync(join(place.folder, 'next.sqlite'));
  });

  it('takes only limits with --strict, and assumptions for this run', async () => {
    expect((await check([PROBE, '--part', 'HOUSE-02', '--strict'])).exit).not.toBe(0);
    expect((await check([PROBE, '--part', 'HOUSE-02'])).exit).toBe(0);
  });

  it.each<[string, readonly string[], string]>([
    ['standard input', ['-'], 'C102'],
    ['a part without a stage', ['--part', 'HOUSE-01'], 'C106'],
    ['an option that does not exist', [PROBE, '--prat', 'HOUSE-01'], 'C101'],
  ])('refuses %s', async (_, words, code) => {
    const ran = await place.run(['check', ...words]);
    expect(ran).toMatchObject({ exit: 2, stdout: '' });
    expect(ran.stderr).toContain(`error[${code}]`);
  });
});
