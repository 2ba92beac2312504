import { writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { withWorkplace } from '../support/railfit.js';

const PROBE = 'soil-moisture-probe.yaml';

const workplace = withWorkplace(['import', 'approved.csv']);

async function answerOf(...words: string[]): Promise<string> {
  const ran = await workplace().run(words);
  expect(ran.stderr).toBe('');
  expect(ran.exit).toBe(0);
  return ran.stdout;
}

interface Told {
  readonly code: string;
  readonly reason: string;
  readonly path?: string;
  readonly fix?: string;
}

async function problemsOf(...words: string[]): Promise<Told[]> {
  const ran = await workplace().run([...words, '--json']);
  expect(ran.exit).toBe(2);
  return (JSON.parse(ran.stdout) as { problems: Told[] }).problems;
}

describe('options', () => {
  it('are written with a blank or an equals sign, before or after the operand', async () => {
    const expected = await answerOf('demands', PROBE, '--gain', '7', '--temperature', '-40..85C');
    expect(expected).toContain('Temperature  -40 °C..85 °C');
    expect(await answerOf('demands', PROBE, '--gain=7', '--temperature=-40..85C')).toBe(expected);
    expect(await answerOf('demands', '--gain', '7', '--temperature', '-40..85C', PROBE)).toBe(expected);
    expect(await answerOf('demands', '--gain=7', PROBE, '--temperature', '-40..85C')).toBe(expected);
    // The typographic minus, as it is pasted from a datasheet.
    expect(await answerOf('demands', '--gain=7', PROBE, '--temperature', '−40..85C')).toBe(expected);
  });

  it('take values that start with a minus', async () => {
    const motor = 'vent-motor-control.yaml';
    expect(await answerOf('demands', motor, '--gain', '-3')).toBe(await answerOf('demands', motor, '--gain=-3'));
    expect(await answerOf('demands', 'thermistor-bridge.yaml', '--set', 'signal.differential=-180 mV..180 mV')).toBe(await answerOf('demands', 'thermistor-bridge.yaml'));
  });

  it('end at --: what follows is an operand, whatever it looks like', async () => {
    writeFileSync(join(workplace().folder, '--gain.yaml'), 'topology: follower\nsupply: 5 V\nsignal: {input: 1..4 V}\n');
    expect(await answerOf('demands', '--', PROBE)).toBe(await answerOf('demands', PROBE));
    expect(await answerOf('demands', '--supply', '6 V', '--', '--gain.yaml')).toContain('6 V single');
    expect((await workplace().run(['demands', '--', '--json'])).stderr).toContain('--json: no such file');
    // Behind an unknown option, too.
    const ran = await workplace().run(['demands', '--gian', '8', '--', PROBE]);
    expect(ran.stderr).toMatch(/^error\[C101\].*\n.*\n\n1 problem, nothing was run\. \(exit 2\)\n$/u);
  });

  it('describe a whole stage without a file', async () => {
    const text = await answerOf('demands', '--topology', 'follower', '--supply', '5 V', '--input', '1..4 V', '--frequency', '1 kHz', '--load', '10 kΩ to ground, 100 pF');
    expect(text).toContain('follower');
    expect(text).toContain('10 kΩ to ground, 100 pF');
  });

  it('have word forms for signs that are hard to type', async () => {
    expect(await answerOf('demands', PROBE, '--load', '10 kohm to ground, 100 pF', '--set', 'limits.supplyCurrent=90uA')).toBe(await answerOf('demands', PROBE));
  });
});

describe('what is wrong with a command line', () => {
  it('is told at once, in order, with the option nobody knows', async () => {
    const problems = await problemsOf('shortlist', '--supply', '4.2..3.0 V', '--load', '10M', '--topology', 'non-inverting', '--set', 'signal.amplitude=1 V', '--set', 'signal.center=1.5 V', '--gian', '8');
    expect(problems.map(({ code, path }) => [code, path])).toEqual([
      ['C101', '--gian'],
      ['Q007', '--supply'],
      ['Q002', '--load'],
      ['Q014', '--set signal.amplitude'],
    ]);
    expect(problems.map(({ fix }) => fix)).toEqual(['did you mean --gain?', '3.0..4.2 V', '10 MΩ, 10meg or 10 mΩ', expect.stringContaining('1 Vpk')]);
  });

  it('ends with how many there are and that nothing was run', async () => {
    const ran = await workplace().run(['demands', PROBE, '--gian', '8', '--set', 'foo', '--supply', '5']);
    expect(ran.stderr.trimEnd().split('\n').at(-1)).toBe('3 problems, nothing was run. (exit 2)');
    expect(ran.stdout).toBe('');
  });

  it.each<[string, readonly string[], string, string]>([
    ['a command', ['shortlsit', PROBE], 'C100', 'did you mean shortlist?'],
    ['an option', ['demands', PROBE, '--suply', '5 V'], 'C101', 'did you mean --supply?'],
    ['an option with its value behind =', ['demands', PROBE, '--suply=5 V'], 'C101', 'did you mean --supply?'],
    ['a part', ['explain', 'H0USE-01', PROBE], 'C108', 'did you mean HOUSE-01'],
    ['a part in small letters', ['explain', 'house-o1', PROBE], 'C108', 'did you mean HOUSE-01'],
    ['a figure', ['shortlist', PROBE, '--assume', 'HOUSE-03.ofsetDrift=3µV/K'], 'C107', 'offsetDrift'],
    ['a check', ['parts', '--failing', 'dc-eror', '--stage', PROBE], 'C104', 'did you mean dc-error?'],
    ['a field', ['demands', PROBE, '--set', 'limits.dcErr=2 mV'], 'S101', 'limits.dcError'],
    ['a topic', ['help', 'figrues'], 'C109', 'did you mean figures?'],
    ['a part, forgotten', ['explain', PROBE], 'C102', `railfit explain PART ${PROBE}`],
  ])('offers what is near to %s', async (_what, words, code, fix) => {
    const problems = await problemsOf(...words);
    expect(problems).toHaveLength(1);
    expect(problems[0]).toMatchObject({ code, fix: expect.stringContaining(fix) as unknown });
  });

  it('is never acted on by guessing', async () => {
    const ran = await workplace().run(['part', 'HOUSE-O1']);
    expect(ran).toMatchObject({ exit: 1, stdout: '' });
  });

  it('names a command line without a command', async () => {
    expect(await problemsOf('--bogus')).toEqual([expect.objectContaining({ code: 'C100', fix: expect.stringContaining('shortlist') as unknown })]);
  });
});

describe('standard input', () => {
  it('is read for - and for nothing else', async () => {
    const { stdout } = await workplace().run(['demands', PROBE]);
    const text = 'topology: follower\nsupply: 5 V\nsignal: {input: 1..4 V}\n';
    expect((await workplace().run(['demands', '-'], { input: text })).stdout).toContain('follower');
    expect((await workplace().run(['demands', PROBE], { input: text })).stdout).toBe(stdout);
    // Never asked, never waited for: input that stays open does not hold a command up.
    const child = workplace().start(['demands', PROBE]);
    expect(await new Promise((resolve) => child.on('close', resolve))).toBe(0);
  });

  it('is named in messages', async () => {
    const ran = await workplace().run(['demands', '-'], { input: 'topology: follower\nsupply: 5\n' });
    expect(ran.stderr).toContain('--> standard input line 2');
    const list = await workplace().run(['import', '-'], { input: 'id,status\nA,aproved\n' });
    expect(list.stderr).toContain('--> standard input line 2, row 2');
    expect(list.stderr).toContain('standard input was not imported');
  });

  it('ends an import at once when it is empty', async () => {
    expect((await workplace().run(['import', '-'], { input: '' })).exit).toBe(3);
    expect((await workplace().run(['import'], { input: '' })).exit).toBe(2);
  });
});
