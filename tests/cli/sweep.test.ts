import { readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import stringWidth from 'string-width';
import { describe, expect, it } from 'vitest';
import { DOCUMENTS } from '../../src/presentation/schemas/index.js';
import { withWorkplace } from '../support/railfit.js';
import { readXml } from '../support/strict-xml.js';

const PROBE = 'soil-moisture-probe.yaml';

const workplace = withWorkplace(['import', 'approved.csv']);

interface Answer { readonly counts: { readonly fit: number } | null; readonly first: string | null; readonly reason?: string }
interface SweepDocument {
  readonly over: { readonly path: string; readonly steps: number; readonly scale: string; readonly keeps: unknown };
  readonly points: readonly (Answer & { readonly value: number })[];
  readonly turns: readonly { readonly at: number; readonly text: string; readonly from: Answer; readonly to: Answer }[];
}

async function sweep(over: string, ...more: readonly string[]): Promise<SweepDocument> {
  const ran = await workplace().run(['sweep', PROBE, '--over', over, ...more, '--json']);
  expect(ran).toMatchObject({ exit: 0, stderr: '' });
  const document: unknown = JSON.parse(ran.stdout);
  expect(DOCUMENTS.sweep.safeParse(document).error?.issues ?? []).toEqual([]);
  return document as SweepDocument;
}

const shortlist = async (...changes: readonly string[]): Promise<Answer & { readonly fit: number }> => {
  const { counts, fit } = JSON.parse((await workplace().run(['shortlist', PROBE, ...changes, '--json'])).stdout) as { counts: { fit: number }; fit: { part: string }[] };
  return { counts, fit: counts.fit, first: fit[0]?.part ?? null };
};

describe('railfit sweep', () => {
  it('says what a shortlist says at each value, and turns where it turns', async () => {
    const { points, turns, over } = await sweep('limits.dcError=5..50 mV', '--steps', '5');
    expect(over).toMatchObject({ path: 'limits.dcError', steps: 5, scale: 'log' });
    for (const { value, counts, first } of points) expect(await shortlist('--set', `limits.dcError=${value} V`)).toMatchObject({ fit: counts?.fit, first });
    expect(turns.length).toBeGreaterThan(2);
    const turn = turns[0];
    if (turn === undefined) throw new Error('no turn');
    // Told with six digits, rounded up: by less than 1e-5 of it.
    expect(await shortlist('--set', `limits.dcError=${turn.at * (1 - 1e-5)} V`)).toMatchObject({ fit: turn.from.counts?.fit, first: turn.from.first });
    // What is printed, pasted back, holds already.
    expect(await shortlist('--set', `limits.dcError=${turn.text}`)).toMatchObject({ fit: turn.to.counts?.fit, first: turn.to.first });
  }, 240_000);

  it('tells a value at which the stage contradicts itself, and where it is one again', async () => {
    const { points, turns, over } = await sweep('supply=2V..4V', '--steps', '3');
    expect(over.keeps).toEqual({ kind: 'nothing', replaced: '3 V..4.2 V' });
    expect(points[0]).toMatchObject({ value: 2, counts: null, first: null });
    expect(points[0]?.reason).toContain('above the 2 V supply');
    expect(turns[0]?.from.reason).toContain('supply');
    expect(turns[0]?.at).toBe(2.64001);
    const text = (await workplace().run(['sweep', PROBE, '--over', 'supply=2V..4V', '--steps', '3'])).stdout;
    expect(text).toContain('no such stage: the output is asked to swing');
    expect(text).toContain('from 2.64001 V on: a stage again; 0 fit');
  }, 120_000);

  it('assumes nothing about the field that is swept', async () => {
    const told = async (over: string): Promise<string> => (await workplace().run(['sweep', PROBE, '--over', over, '--steps', '2'])).stdout.replaceAll(/\s+/gu, ' ');
    expect(await told('limits.dcError=5..50 mV')).toContain('phase margin 45');
    expect(await told('limits.phaseMargin=30 °..60 °')).not.toContain('phase margin 45');
  }, 120_000);

  it.each([40, 60, 100])('stands within %d columns, in ASCII too', async (width) => {
    const { stdout } = await workplace().run(['sweep', PROBE, '--over', 'temperature=20..85 °C', '--steps', '3', '--ascii'], { env: { COLUMNS: String(width) } });
    expect(stdout).toMatch(/^[\n\u0020-\u007e]+$/u);
    for (const line of stdout.split('\n')) expect(stringWidth(line), line).toBeLessThanOrEqual(width);
    expect(stdout.replace(/\s+/gu, ' ')).toContain('each value is the upper end, the lower one stays at -20 C');
  }, 120_000);

  it('is a table with --csv: steps and turns by value', async () => {
    const { stdout, exit } = await workplace().run(['sweep', PROBE, '--over', 'gain=2..8', '--steps', '3', '--csv']);
    expect(exit).toBe(0);
    const [header, ...rows] = stdout.trimEnd().split('\r\n');
    expect(header).toBe('kind,gain (V/V),fit,cannot be decided,do not fit,first choice,no such stage');
    expect(rows.filter((row) => row.startsWith('step,')).map((row) => row.split(',')[1])).toEqual(['2', '5', '8']);
    const values = rows.map((row) => Number(row.split(',')[1]));
    expect(values).toEqual([...values].sort((a, b) => a - b));
  }, 120_000);

  it('takes options alone, and a field that only the sweep gives', async () => {
    const ran = await workplace().run(['sweep', '--topology', 'follower', '--input', '1..2 V', '--over', 'supply=3V..5V', '--steps', '2']);
    expect(ran).toMatchObject({ exit: 0, stderr: '' });
    expect(ran.stdout).toContain('2 values in even steps');
  }, 60_000);

  it.each<[string, readonly string[], string]>([
    ['nothing to sweep', [], 'nothing is swept'],
    ['two fields', ['--over', 'gain=1..8', '--over', 'supply=3..5 V'], 'one field is swept at a time'],
    ['a field that is none', ['--over', 'gian=1..8'], 'did you mean gain?'],
    ['a word', ['--over', 'wishes.package=A..B'], 'no values between two others'],
    ['one value', ['--over', 'gain=8'], 'two values are needed'],
    ['one step', ['--over', 'gain=1..8', '--steps', '1'], 'from 2 to 1000'],
    ['two spacings', ['--over', 'gain=1..8', '--log', '--linear'], 'one spacing'],
    ['ratios through zero', ['--over', 'temperature=-20..60 °C', '--log'], 'above 0'],
    ['two forms', ['--over', 'gain=1..8', '--json', '--csv'], 'one form'],
    ['values at which nothing is a stage', ['--over', 'supply=1V..2V', '--steps', '2'], 'above the 1 V supply'],
  ])('refuses %s', async (_, words, said) => {
    const ran = await workplace().run(['sweep', PROBE, ...words]);
    expect(ran.exit).toBe(2);
    expect(`${ran.stdout}${ran.stderr}`.replace(/\s+/gu, ' ')).toContain(said);
  }, 60_000);
});

describe('railfit explain --against', () => {
  const against = (...words: readonly string[]) => workplace().run(['explain', ...words]);

  it('decides by the step of the order, and carries both parts', async () => {
    const ran = await against('HOUSE-02', PROBE, '--against', 'HOUSE-01', '--json');
    expect(ran.exit).toBe(0);
    const document = JSON.parse(ran.stdout) as { parts: { id: string; rank: number }[] };
    expect(DOCUMENTS.comparison.safeParse(document).error?.issues ?? []).toEqual([]);
    expect(document).toMatchObject({ ahead: 1, decidedBy: 'proof', stability: { prices: [], weights: [] } });
    expect(document.parts.map(({ id, rank }) => [id, rank])).toEqual([['HOUSE-02', 2], ['HOUSE-01', 1]]);
  }, 60_000);

  it('exits as explain does, and blames neither for having no place', async () => {
    expect((await against('HOUSE-06', PROBE, '--against', 'HOUSE-01')).exit).toBe(1);
    expect((await against('HOUSE-03', PROBE, '--against', 'HOUSE-01')).exit).toBe(4);
    expect((await against('HOUSE-06', PROBE, '--against', 'GX-NANO')).stdout).toContain('neither fits');
  }, 60_000);

  it.each([40, 59, 60, 80, 100])('stands within %d columns', async (width) => {
    const { stdout } = await workplace().run(['explain', 'HOUSE-01', PROBE, '--against', 'HOUSE-06'], { env: { COLUMNS: String(width) } });
    for (const line of stdout.split('\n').filter((one) => !one.includes('railfit'))) expect(stringWidth(line), line).toBeLessThanOrEqual(width);
    expect(stdout.replace(/\s+/gu, ' ')).toContain('it fits, the other does not fit');
  }, 60_000);

  it.each<[string, string, string]>([['one that is not there', 'HOUSE-99', 'C108'], ['itself', 'HOUSE-01', 'C106']])('refuses %s', async (_, other, code) => {
    const ran = await against('HOUSE-01', PROBE, '--against', other);
    expect(ran).toMatchObject({ exit: 2, stdout: '' });
    expect(ran.stderr).toContain(`error[${code}]: --against`);
  }, 60_000);
});

describe('a check in a build', () => {
  it('takes the part of the stage file, and writes what a build server reads', async () => {
    writeFileSync(join(workplace().folder, 'chosen.yaml'), `${readFileSync(join(workplace().folder, PROBE), 'utf8')}part: HOUSE-06\n`);
    const words = ['check', 'chosen.yaml', '--junit', 'railfit.xml'];
    const ran = await workplace().run(words);
    expect(ran).toMatchObject({ exit: 1, stderr: '' });
    expect(ran.stdout).toContain('chosen.yaml: HOUSE-06 does not fit');
    const first = readFileSync(join(workplace().folder, 'railfit.xml'), 'utf8');
    const { name, attributes, children } = readXml(first);
    expect([name, children.length, Number(attributes['failures']) > 0, attributes['errors']]).toEqual(['testsuites', 1, true, '0']);
    await workplace().run(words);
    expect(readFileSync(join(workplace().folder, 'railfit.xml'), 'utf8')).toBe(first);
    const other = await workplace().run(['check', 'chosen.yaml', '--part', 'HOUSE-01', '--junit', '-']);
    expect(other.exit).toBe(0);
    expect(readXml(other.stdout).attributes['failures']).toBe('0');
  }, 120_000);

  it('says where the file cannot be written, and takes one form on stdout', async () => {
    expect((await workplace().run(['check', PROBE, '--part', 'HOUSE-01', '--junit', 'nowhere/r.xml'])).exit).toBe(5);
    expect((await workplace().run(['check', PROBE, '--part', 'HOUSE-01', '--junit', '-', '--json'])).exit).toBe(2);
  }, 60_000);
});
