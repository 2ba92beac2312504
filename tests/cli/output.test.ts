import { spawnSync } from 'node:child_process';
import { closeSync, existsSync, openSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { beforeAll, describe, expect, it } from 'vitest';
import { BUILT } from '../support/built.js';
import { ended, withWorkplace } from '../support/railfit.js';

const PROBE = 'soil-moisture-probe.yaml';

const workplace = withWorkplace(['parts']);

const EVERYTHING = ['shortlist', PROBE, '--json', '--all', '--top', '5000', '--catalog', 'long.sqlite'];

/** Parts that do not fit: with --all every one of them is in the answer. */
async function importLongList(): Promise<void> {
  const [header = '', ...rows] = readFileSync(join(workplace().folder, 'approved.csv'), 'utf8').split('\n');
  const rejected = rows.find((row) => row.startsWith('HOUSE-06,')) ?? '';
  const copies = Array.from({ length: 600 }, (_, at) => rejected.replace('HOUSE-06', `HOUSE-${1000 + at}`));
  writeFileSync(join(workplace().folder, 'long.csv'), [header, ...copies, ''].join('\n'));
  expect((await workplace().run(['import', 'long.csv', '--catalog', 'long.sqlite'])).exit).toBe(0);
}

describe('the streams', () => {
  it('the answer is on stdout and talk is on stderr', async () => {
    const first = await workplace().run(['parts', '--json'], { env: { RAILFIT_CATALOG: join(workplace().folder, 'new', 'catalog.sqlite') } });
    expect(first.stderr).toMatch(/^note: new catalog .+, filled with \d+ generic sets \(classes of parts, not something to order\)\n$/u);
    expect(JSON.parse(first.stdout)).toMatchObject({ schema: 'railfit/parts' });
    const second = await workplace().run(['parts', '--json'], { env: { RAILFIT_CATALOG: join(workplace().folder, 'new', 'catalog.sqlite') } });
    expect(second).toEqual({ exit: 0, stdout: first.stdout, stderr: '' });
  });

  it('warnings of an import are talk', async () => {
    writeFileSync(join(workplace().folder, 'warned.csv'), 'id,status,package,shelf\nA,approved,SO-8,4\n');
    const catalog = { RAILFIT_CATALOG: join(workplace().folder, 'warned.sqlite') };
    await workplace().run(['parts'], { env: catalog });
    const ran = await workplace().run(['import', 'warned.csv'], { env: catalog });
    expect(ran.exit).toBe(0);
    expect(ran.stdout).toMatch(/^Imported 1 part from warned\.csv/u);
    expect(ran.stderr).toContain('I203');
  });
});

describe('a long answer', () => {
  beforeAll(importLongList);

  it('arrives whole through a slow pipe', async () => {
    const file = openSync(join(workplace().folder, 'whole.json'), 'w');
    const direct = spawnSync(process.execPath, [BUILT, ...EVERYTHING], { cwd: workplace().folder, env: { PATH: process.env['PATH'] }, stdio: ['ignore', file, 'pipe'] });
    closeSync(file);
    expect(direct.status).toBe(0);
    const whole = readFileSync(join(workplace().folder, 'whole.json'));
    expect(whole.length).toBeGreaterThan(5_000_000);

    const child = workplace().start(EVERYTHING);
    const pieces: Buffer[] = [];
    child.stdout?.on('data', (piece: Buffer) => {
      pieces.push(piece);
      child.stdout?.pause();
      setTimeout(() => child.stdout?.resume(), 2);
    });
    expect(await new Promise((resolve) => child.on('close', resolve))).toBe(0);
    expect(Buffer.concat(pieces).equals(whole)).toBe(true);
    expect(JSON.parse(whole.toString('utf8'))).toMatchObject({ schema: 'railfit/shortlist' });
  });

  it('may be left unread: nothing on stderr', async () => {
    const child = workplace().start(EVERYTHING);
    child.stdout?.once('data', () => child.stdout?.destroy());
    const ran = await ended(child);
    expect(ran.stderr).toBe('');
    expect(ran.exit).toBe(0);
  });

  it.skipIf(process.platform === 'win32')('| head -1 leaves stderr empty', () => {
    const ran = spawnSync('sh', ['-c', '"$0" "$@" | head -1', process.execPath, BUILT, ...EVERYTHING], { cwd: workplace().folder, env: { PATH: process.env['PATH'] }, encoding: 'utf8' });
    expect(ran.stderr).toBe('');
    expect(ran.stdout).toBe('{\n');
  });

  it.skipIf(!existsSync('/dev/full'))('that finds no space is exit 5, not an answer', () => {
    const full = openSync('/dev/full', 'w');
    const ran = spawnSync(process.execPath, [BUILT, 'demands', PROBE], { cwd: workplace().folder, stdio: ['ignore', full, 'pipe'], encoding: 'utf8' });
    closeSync(full);
    expect(ran.status).toBe(5);
    expect(ran.stderr).toMatch(/^error\[E504\]: the answer could not be written \(ENOSPC\) \(exit 5\)\n {3}fix: /u);
    expect(ran.stderr).not.toContain('    at ');
  });
});

describe('same input, same bytes', () => {
  it.each<[string, readonly string[]]>([
    ['shortlist', ['shortlist', PROBE]],
    ['shortlist --json', ['shortlist', PROBE, '--json']],
    ['explain', ['explain', 'GX-NANO', PROBE, '--sources']],
    ['parts --csv', ['parts', '--csv', '--tier', 'generic']],
    ['part', ['part', 'GX-NANO']],
    ['a refusal', ['demands', PROBE, '--supply', '5']],
  ])('%s: twice, under other locales and time zones', async (_what, words) => {
    const once = await workplace().run(words, { env: { LC_ALL: 'C.UTF-8', TZ: 'UTC' } });
    expect(await workplace().run(words, { env: { LC_ALL: 'C.UTF-8', TZ: 'UTC' } })).toEqual(once);
    expect(await workplace().run(words, { env: { LC_ALL: 'tr_TR.UTF-8', TZ: 'Pacific/Kiritimati' } })).toEqual(once);
    expect(await workplace().run(words, { env: { LANG: undefined, TZ: 'America/St_Johns' } })).toEqual(once);
  });

  it('the order of the rows of a list changes nothing', async () => {
    const [header = '', ...rows] = readFileSync(join(workplace().folder, 'approved.csv'), 'utf8').trimEnd().split('\n');
    writeFileSync(join(workplace().folder, 'turned.csv'), [header, ...rows.reverse(), ''].join('\n'));
    const answers = await Promise.all(['approved', 'turned'].map(async (name) => {
      const env = { RAILFIT_CATALOG: join(workplace().folder, `${name}.sqlite`) };
      await workplace().run(['import', `${name}.csv`], { env });
      return (await workplace().run(['shortlist', PROBE], { env })).stdout;
    }));
    expect(answers[0]).toBe(answers[1]);
  });

  it('the list that is written is read back as the same list', async () => {
    const env = { RAILFIT_CATALOG: join(workplace().folder, 'back.sqlite') };
    await workplace().run(['import', 'approved.csv'], { env });
    const written = await workplace().run(['parts', '--csv'], { env });
    writeFileSync(join(workplace().folder, 'written.csv'), written.stdout);
    const again = await workplace().run(['import', 'written.csv', '--json'], { env });
    expect(JSON.parse(again.stdout)).toMatchObject({ outcome: 'no-change', counts: { rows: 9, added: 0, changed: 0, removed: 0, unchanged: 9 }, problems: [] });
    expect((await workplace().run(['parts', '--csv'], { env })).stdout).toBe(written.stdout);
  });
});
