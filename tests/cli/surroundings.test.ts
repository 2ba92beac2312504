import { chmodSync, copyFileSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { dirname, join } from 'node:path';
import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { beforeAll, describe, expect, it } from 'vitest';
import { type Ran, withWorkplace } from '../support/railfit.js';

const PROBE = 'soil-moisture-probe.yaml';

const workplace = withWorkplace(['import', 'approved.csv']);

const inFolder = (...names: string[]): string => join(workplace().folder, ...names);
const ids = async (catalog: string): Promise<string[]> =>
  (JSON.parse((await workplace().run(['parts', '--tier', 'approved', '--json', '--catalog', catalog])).stdout) as { parts: { part: string }[] }).parts.map(({ part }) => part);

function expectRefused(ran: Ran, ...words: readonly string[]): void {
  expect(ran.exit, ran.stderr).toBe(5);
  expect(ran.stdout).toBe('');
  for (const word of words) expect(ran.stderr).toContain(word);
  expect(ran.stderr).toMatch(/ {3}fix: \S.*\n\n.*\(exit 5\)\n$/su);
  expect(ran.stderr).not.toContain('    at ');
}

describe('a catalog that cannot be used', () => {
  it('inside a file instead of a folder', async () => {
    expectRefused(await workplace().run(['shortlist', PROBE, '--catalog', join('approved.csv', 'catalog.sqlite')]), 'E501', 'cannot be read');
  });

  it('a folder', async () => {
    expectRefused(await workplace().run(['parts', '--catalog', '.']), 'E501', 'a folder, where a catalog file is expected');
  });

  it('another file, which is left as it is', async () => {
    const before = readFileSync(inFolder('approved.csv'));
    expectRefused(await workplace().run(['import', 'approved.csv', '--catalog', 'approved.csv']), 'E501', 'not a catalog of railfit');
    expect(readFileSync(inFolder('approved.csv')).equals(before)).toBe(true);
  });

  it('cut short', async () => {
    const whole = readFileSync(workplace().catalog);
    writeFileSync(inFolder('short.sqlite'), whole.subarray(0, Math.floor(whole.length / 3)));
    expectRefused(await workplace().run(['shortlist', PROBE, '--catalog', 'short.sqlite']), 'E501');
  });

  it('RAILFIT_CATALOG, then the user data folder', async () => {
    const data = inFolder('data');
    const ran = await workplace().run(['parts', '--json'], { env: { RAILFIT_CATALOG: '', XDG_DATA_HOME: data } });
    expect(ran.stderr).toContain(join(data, 'railfit', 'catalog.sqlite'));
    const home = await workplace().run(['parts', '--json'], { env: { RAILFIT_CATALOG: undefined } });
    expect(home.stderr).toContain(join('home', '.local', 'share', 'railfit', 'catalog.sqlite'));
  });
});

// Permissions do not bind the root user; there the command runs as the user without rights, who must be able to read the build.
describe.skipIf(process.platform === 'win32')('what may not be written', () => {
  const asAnybody = { unprivileged: true };
  let readable = false;

  beforeAll(async () => {
    chmodSync(workplace().folder, 0o755);
    mkdirSync(inFolder('locked'));
    copyFileSync(workplace().catalog, inFolder('locked', 'catalog.sqlite'));
    writeFileSync(inFolder('secret.yaml'), 'topology: follower\n');
    chmodSync(inFolder('locked', 'catalog.sqlite'), 0o444);
    chmodSync(inFolder('locked'), 0o555);
    chmodSync(inFolder('secret.yaml'), 0o000);
    readable = (await workplace().run(['--version'], asAnybody).catch(() => ({ exit: null }))).exit === 0;
  });

  it('a read-only catalog in a read-only folder answers', async ({ skip }) => {
    skip(!readable, 'the user without rights cannot read the build');
    const words = ['shortlist', PROBE, '--json', '--catalog', join('locked', 'catalog.sqlite')];
    const ran = await workplace().run(words, asAnybody);
    expect(ran.stderr).toBe('');
    expect(ran.exit).toBe(0);
    expect(ran.stdout).toBe((await workplace().run(['shortlist', PROBE, '--json'])).stdout);
  });

  it('and takes no import', async ({ skip }) => {
    skip(!readable, 'the user without rights cannot read the build');
    const ran = await workplace().run(['import', 'approved-next.csv', '--catalog', join('locked', 'catalog.sqlite')], asAnybody);
    expectRefused(ran, 'E501', 'cannot be written');
    expect(await ids(inFolder('locked', 'catalog.sqlite'))).toContain('HOUSE-08');
  });

  it('a new catalog in a read-only folder is refused', async ({ skip }) => {
    skip(!readable, 'the user without rights cannot read the build');
    expectRefused(await workplace().run(['parts', '--catalog', join('locked', 'other.sqlite')], asAnybody), 'E501', 'the folder cannot be written');
  });

  it('a stage file without the right to read it', async ({ skip }) => {
    skip(!readable, 'the user without rights cannot read the build');
    expectRefused(await workplace().run(['demands', 'secret.yaml'], asAnybody), 'E502', 'no permission');
  });
});

describe('import', () => {
  it('does nothing when the file for its problems cannot be written', async () => {
    const catalog = inFolder('errors.sqlite');
    await workplace().run(['import', 'approved.csv', '--catalog', catalog]);
    const ran = await workplace().run(['import', 'approved-next.csv', '--catalog', catalog, '--errors', join('approved.csv', 'errors.csv')]);
    expectRefused(ran, 'E503', 'Nothing was imported');
    expect(await ids(catalog)).toContain('HOUSE-08');
  });

  it('writes one line for each problem with --errors', async () => {
    const ran = await workplace().run(['import', 'refused.csv', '--errors', 'errors.csv']);
    expect(ran.exit).toBe(3);
    const lines = readFileSync(inFolder('errors.csv'), 'utf8').trimEnd().split('\r\n');
    expect(lines[0]).toBe('line,row,column,header,part,value,code,reason,fix,at');
    expect(lines).toHaveLength(7);
  });

  it('is told of a class that does not exist', async () => {
    const list = readFileSync(inFolder('approved.csv'), 'utf8').replace(',cmos-micropower,', ',cmos-micropwoer,');
    writeFileSync(inFolder('class.csv'), list);
    const ran = await workplace().run(['import', 'class.csv', '--dry-run']);
    expect(ran.exit).toBe(0);
    expect(ran.stderr).toContain('I511');
    expect(ran.stderr).toContain('cmos-micropower');
  });

  it('twice at once: one after the other, and one list is in force', async () => {
    const catalog = inFolder('both.sqlite');
    const both = await Promise.all(['approved.csv', 'approved-next.csv'].map((list) => workplace().run(['import', list, '--json', '--catalog', catalog])));
    expect(both.map(({ exit }) => exit), both.map(({ stderr }) => stderr).join('')).toEqual([0, 0]);
    const left = await ids(catalog);
    expect(left).toHaveLength(9);
    expect([left.includes('HOUSE-08'), left.includes('HOUSE-09')].sort()).toEqual([false, true]);
    expect((await workplace().run(['shortlist', PROBE, '--catalog', catalog])).exit).toBe(0);
  });

  it('that finds the catalog locked says so and leaves it', { timeout: 60_000 }, async () => {
    const catalog = inFolder('held.sqlite');
    await workplace().run(['import', 'approved.csv', '--catalog', catalog]);
    const holder = spawn(process.execPath, ['-e', HOLDER, createRequire(import.meta.url).resolve('better-sqlite3'), catalog]);
    await once(holder.stdout, 'data');
    const ran = await workplace().run(['import', 'approved-next.csv', '--catalog', catalog]);
    holder.kill();
    await once(holder, 'close');
    expectRefused(ran, 'E501', 'locked');
    expect(await ids(catalog)).toContain('HOUSE-08');
  });
});

/** Another process that holds the write lock of a catalog until it is ended. */
const HOLDER = `
  const [, module, file] = process.argv;
  const database = new (require(module))(file);
  database.exec('begin immediate');
  process.stdout.write('locked');
  setInterval(() => {}, 1000);
`;

it('the generic sets come from beside the program, wherever it is run', async () => {
  const ran = await workplace().run(['parts', '--json', '--catalog', inFolder('elsewhere.sqlite')], { env: { PWD: dirname(workplace().folder) } });
  expect(JSON.parse(ran.stdout)).toMatchObject({ counts: { generic: 95, approved: 0 } });
});
