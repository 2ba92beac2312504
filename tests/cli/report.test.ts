import { existsSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { runCommandLine } from '../../src/cli/run.js';
import { timeOf } from '../../src/cli/report-time.js';
import { DOCUMENTS } from '../../src/presentation/schemas/index.js';
import { ROOT } from '../support/built.js';
import { HOSTILE } from '../support/sample-review.js';

const PROBE = join(ROOT, 'catalog', 'stages', 'soil-moisture-probe.yaml');
const BUFFER = join(ROOT, 'catalog', 'stages', 'reference-buffer.yaml');
const TIME = ['--time', '2026-03-14T09:30:00Z'];

interface Ran {
  readonly exit: number;
  readonly stdout: string;
  readonly stderr: string;
}

let folder: string;
const at = (name: string): string => join(folder, name);
beforeAll(async () => {
  folder = mkdtempSync(join(tmpdir(), 'railfit-report-'));
  await railfit('import', join(ROOT, 'tests', 'golden', 'approved.csv'));
  expect((await railfit('report', PROBE, '-o', at('review.html'), ...TIME)).exit).toBe(0);
}, 120_000);
afterAll(() => { rmSync(folder, { recursive: true, force: true }); });

async function railfitWith(env: Readonly<Record<string, string>>, ...words: string[]): Promise<Ran> {
  const text = { stdout: '', stderr: '' };
  const stream = { isTTY: false, columns: undefined };
  const exit = await runCommandLine(words, { env: { LANG: 'C.UTF-8', COLUMNS: '100', RAILFIT_CATALOG: at('catalog.sqlite'), ...env }, stdout: stream, stderr: stream, write: (to, more) => { text[to] += more; } });
  return { exit, ...text };
}
const railfit = (...words: string[]): Promise<Ran> => railfitWith({}, ...words);
const read = (name: string): string => readFileSync(at(name), 'utf8');

/** A list of its own in a catalog of its own: the house list with one cell changed. */
async function withList(name: string, change: (list: string) => string): Promise<Readonly<Record<string, string>>> {
  const env = { RAILFIT_CATALOG: at(`${name}.sqlite`) };
  writeFileSync(at(`${name}.csv`), change(readFileSync(join(ROOT, 'tests', 'golden', 'approved.csv'), 'utf8')));
  const ran = await railfitWith(env, 'import', at(`${name}.csv`));
  expect(ran.exit, ran.stderr).toBe(0);
  return env;
}

describe('railfit report', { timeout: 120_000 }, () => {
  it('says what it wrote, and never writes over another file unless told', async () => {
    const again = await railfit('report', PROBE, '-o', at('review.html'), ...TIME);
    expect(again).toMatchObject({ exit: 2, stdout: '' });
    expect(again.stderr).toContain('C110');
    const forced = await railfit('report', PROBE, '-o', at('review.html'), '--force', ...TIME);
    expect(forced).toMatchObject({ exit: 0, stdout: '', stderr: `wrote ${at('review.html')}; railfit verify ${at('review.html')} judges it again\n` });
  });

  it('gives the same bytes for the same input and time, by option or SOURCE_DATE_EPOCH', async () => {
    const page = read('review.html');
    await railfit('report', PROBE, '-o', at('review.html'), '--force', ...TIME);
    expect(read('review.html')).toBe(page);
    const epoch = String(Date.parse('2026-03-14T09:30:00Z') / 1000);
    await railfitWith({ SOURCE_DATE_EPOCH: epoch }, 'report', PROBE, '-o', at('review.html'), '--force');
    expect(read('review.html')).toBe(page);
  });

  it('prints the document it embeds with --json, each stage with what shortlist --json prints', async () => {
    const [report, shortlist] = [await railfit('report', PROBE, '--json', ...TIME), await railfit('shortlist', PROBE, '--json')];
    const document = JSON.parse(report.stdout) as { readonly stages: readonly { readonly shortlist: unknown }[] };
    expect(DOCUMENTS.report.safeParse(document).error?.issues ?? []).toEqual([]);
    expect(document.stages[0]?.shortlist).toEqual(JSON.parse(shortlist.stdout));
  });

  it('is about the part that is named, kept, or first', async () => {
    const chosen = async (...more: string[]): Promise<unknown> => {
      const { stdout } = await railfit('report', PROBE, '--json', ...TIME, ...more);
      const [stage] = (JSON.parse(stdout) as { readonly stages: readonly { readonly chosen: { readonly part: string; readonly by: string; readonly outcome: string } }[] }).stages;
      return [stage?.chosen.part, stage?.chosen.by, stage?.chosen.outcome];
    };
    expect(await chosen('--part', 'HOUSE-06')).toEqual(['HOUSE-06', 'named', 'does-not-fit']);
    const [, first] = (await chosen()) as string[];
    expect(first).toBe('first');
    await railfit('stages', 'add', PROBE, '--part', 'HOUSE-03');
    expect(await chosen()).toEqual(['HOUSE-03', 'saved', 'undecided']);
    await railfit('stages', 'remove', PROBE);
  });

  it('is about the part the stage file names, before the one that is kept', async () => {
    writeFileSync(at('slip.yaml'), `${readFileSync(PROBE, 'utf8')}part: HOUSE-60\n`);
    const slip = await railfit('report', at('slip.yaml'), '-o', at('slip.html'), ...TIME);
    expect(slip).toMatchObject({ exit: 2, stdout: '' });
    expect(slip.stderr).toContain('HOUSE-60');
    expect(existsSync(at('slip.html'))).toBe(false);
    writeFileSync(at('named.yaml'), `${readFileSync(PROBE, 'utf8')}part: HOUSE-06\n`);
    await railfit('stages', 'add', at('named.yaml'), '--part', 'HOUSE-03');
    const { stdout } = await railfit('report', at('named.yaml'), '--json', ...TIME);
    expect((JSON.parse(stdout) as { readonly stages: readonly { readonly chosen: unknown }[] }).stages[0]?.chosen).toMatchObject({ part: 'HOUSE-06', by: 'saved' });
    await railfit('stages', 'remove', at('named.yaml'));
    await railfit('report', at('named.yaml'), '-o', at('named.html'), ...TIME);
    expect((await railfit('verify', at('named.html'))).exit).toBe(0);
  });

  it('has several stages in one page, and writes Markdown and CSV', async () => {
    const page = (await railfit('report', PROBE, BUFFER, ...TIME)).stdout;
    expect(page).toContain('<h1>Design review: <bdi class="k">2 stages</bdi></h1>');
    expect((await railfit('report', PROBE, '--format', 'md', ...TIME)).stdout).toMatch(/^# Design review: Soil-moisture probe, second amplifier\n/u);
    expect((await railfit('report', PROBE, BUFFER, '--format', 'csv', ...TIME)).stdout).toMatch(/^stage,file,rank,part,/u);
  });

  it('takes options as every command does, and prints a command that repeats them', async () => {
    const { stdout } = await railfit('report', PROBE, '--supply', '3.0..3.6 V', '--strict', '--json', ...TIME);
    const document = JSON.parse(stdout) as { readonly command: string; readonly stages: readonly { readonly changes: unknown }[] };
    expect(document.command).toBe(`railfit report ${PROBE} --supply '3.0..3.6 V' --strict --time 2026-03-14T09:30:00Z`);
    expect(document.stages[0]?.changes).toEqual([{ path: 'supply', text: '3.0..3.6 V', option: '--supply' }]);
  });

  it('refuses everything at once', async () => {
    writeFileSync(at('broken.yaml'), 'topology: follower\nsupply: 5\n');
    const { exit, stderr } = await railfit('report', PROBE, at('broken.yaml'), '--part', 'X', '--time', 'noon', '--supply', '3 V..2 V');
    expect(exit).toBe(2);
    for (const code of ['C106', 'C104', 'Q007']) expect(stderr).toContain(code);
    expect((await railfit('report', PROBE, '--part', 'NO-SUCH')).stderr).toContain('C108');
    expect((await railfit('report', at('nowhere.yaml'))).exit).toBe(5);
    expect((await railfit('report')).stderr).toContain('C103');
    expect((await railfit('report', '--json', '--format', 'md', PROBE)).stdout).toContain('C106');
  });
});

describe('railfit verify', { timeout: 120_000 }, () => {
  it('finds a page the same, and exits 0', async () => {
    const ran = await railfit('verify', at('review.html'));
    expect(ran).toMatchObject({ exit: 0, stderr: '' });
    expect(ran.stdout.replaceAll(/\s+/gu, ' ')).toContain('review.html: the same. 1 stage, made 2026-03-14T09:30:00Z');
  });

  it('needs nothing but the file: the stage may be gone, and its options were kept', async () => {
    writeFileSync(at('gone.yaml'), readFileSync(PROBE, 'utf8'));
    await railfit('report', at('gone.yaml'), '--set', 'limits.dcError=40 mV', '--assume', 'HOUSE-03.offsetDrift=4µV/K', '--order', 'price', '--strict', '-o', at('gone.html'), ...TIME);
    rmSync(at('gone.yaml'));
    expect(await railfit('verify', at('gone.html'))).toMatchObject({ exit: 0 });
    await railfit('report', '--topology', 'follower', '--supply', '5 V', '--input', '1..4 V', '-o', at('options.html'), ...TIME);
    expect(await railfit('verify', at('options.html'))).toMatchObject({ exit: 0 });
  });

  it('reads the document of --json as well', async () => {
    writeFileSync(at('report.json'), (await railfit('report', PROBE, '--json', ...TIME)).stdout);
    expect(await railfit('verify', at('report.json'))).toMatchObject({ exit: 0 });
  });

  it('tells what another list answers, the list first, and exits 1', async () => {
    const env = await withList('other', (list) => list.split('\n').filter((line) => !line.startsWith('HOUSE-02')).join('\n'));
    const ran = await railfitWith(env, 'verify', at('review.html'), '--json');
    expect(ran.exit).toBe(1);
    const document = JSON.parse(ran.stdout) as { readonly differences: readonly { readonly what: string; readonly subject: string; readonly is: string }[] };
    expect(DOCUMENTS.verification.safeParse(document).error?.issues ?? []).toEqual([]);
    expect(document.differences[0]?.what).toBe('catalog');
    expect(document.differences).toContainEqual(expect.objectContaining({ what: 'outcome', subject: 'HOUSE-02', is: 'not in the catalog' }));
  });

  it('sees a page that was edited, in its words as in its document', async () => {
    const page = read('review.html');
    writeFileSync(at('edited.html'), page.replace('✓ fits', '✓ fits well'));
    const edited = await railfit('verify', at('edited.html'));
    expect(edited.exit).toBe(1);
    expect(edited.stdout).toMatch(/changed after it was\s+written/u);
    writeFileSync(at('forged.html'), page.replace(/"offered":[\d.]+/u, '"offered":9'));
    expect(read('forged.html')).not.toBe(page);
    const forged = await railfit('verify', at('forged.html'));
    expect(forged.exit).toBe(1);
  });

  it('shows a part that was withdrawn since as it was, and says so', async () => {
    const env = await withList('withdrawn', (list) => list);
    await railfitWith(env, 'report', PROBE, '--part', 'HOUSE-01', '-o', at('was.html'), ...TIME);
    writeFileSync(at('next.csv'), readFileSync(at('withdrawn.csv'), 'utf8').split('\n').filter((line) => !line.startsWith('HOUSE-01,')).join('\n'));
    expect((await railfitWith(env, 'import', at('next.csv'))).exit).toBe(0);
    const ran = await railfitWith(env, 'verify', at('was.html'));
    expect(ran.exit).toBe(1);
    expect(ran.stdout.replaceAll(/\s+/gu, ' ')).toContain('HOUSE-01 fits (limits), was withdrawn: next.csv no longer has it');
    const anew = await railfitWith(env, 'report', PROBE, '--part', 'HOUSE-01', ...TIME);
    expect(anew.stderr).toContain('note: HOUSE-01 was withdrawn');
    expect(anew.stdout).toContain('it is shown as it was last and stands outside the shortlist');
  });

  it('keeps hostile words inert all the way from the list', async () => {
    const cell = HOSTILE.id.replaceAll('"', '""');
    const env = await withList('hostile', (list) => list.replace('HOUSE-02,', `"${cell}",`));
    await railfitWith(env, 'report', PROBE, '--part', HOSTILE.id, '-o', at('hostile.html'), ...TIME);
    expect([...read('hostile.html').matchAll(/<script/gu)]).toHaveLength(2);
    expect(await railfitWith(env, 'verify', at('hostile.html'))).toMatchObject({ exit: 0 });
  });

  it.each([
    ['no page at all', '', 2, 'no railfit report in it'],
    ['another page', '<html></html>', 2, 'no railfit report in it'],
    ['cut off', 'cut', 2, 'no railfit report in it'],
    ['damaged', 'damaged', 2, 'it is no JSON'],
    ['a picture', '\u0000\u0001', 2, 'no railfit report in it'],
  ] as const)('%s is refused with the reason', async (name, text, exit, why) => {
    const page = read('review.html');
    const made = text === 'cut' ? page.slice(0, page.indexOf('railfit-report') + 500) : text === 'damaged' ? page.replace('"schemaVersion":1', '"schemaVersion":') : text;
    writeFileSync(at('bad.html'), made);
    const ran = await railfit('verify', at('bad.html'));
    expect(ran.exit, name).toBe(exit);
    expect(ran.stderr).toContain('C121');
    expect(ran.stderr.replaceAll(/\s+/gu, ' ')).toContain(why);
  });

  it('a file that is not there is the surroundings', async () => {
    expect(await railfit('verify', at('nowhere.html'))).toMatchObject({ exit: 5 });
    expect(await railfit('verify')).toMatchObject({ exit: 2 });
  });
});

describe('when a report is made', () => {
  it.each(['2026-03-14T09:30:00Z', '2026-03-14T09:30+01:00', '2026-03-14T09:30:00.5-05:00'])('%s is a time', (time) => { expect(timeOf({ time }, {})).toEqual({ time, problem: null }); });
  it.each(['2026-03-14', '2026-03-14T09:30:00', '2026-13-14T09:30:00Z', 'noon', ''])('%j is none', (time) => { expect(timeOf({ time }, {}).problem?.code).toBe('C104'); });
  it('SOURCE_DATE_EPOCH counts in seconds, and the option goes before it', () => {
    expect(timeOf({}, { SOURCE_DATE_EPOCH: '0' }).time).toBe('1970-01-01T00:00:00Z');
    expect(timeOf({ time: '2026-03-14T09:30:00Z' }, { SOURCE_DATE_EPOCH: 'x' })).toEqual({ time: '2026-03-14T09:30:00Z', problem: null });
    expect(timeOf({}, { SOURCE_DATE_EPOCH: '-1' }).problem?.code).toBe('C104');
  });
  it('else the clock, in UTC to the second', () => { expect(timeOf({}, {}).time).toMatch(/^\d{4}-\d\d-\d\dT\d\d:\d\d:\d\dZ$/u); });
});
