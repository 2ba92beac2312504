import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { runCommandLine } from '../../src/cli/run.js';
import { displayWidth } from '../../src/presentation/layout.js';

let folder: string;
let stage: string;
beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), 'railfit-predict-'));
  stage = join(folder, 'stage.yaml');
  writeFileSync(stage, 'topology: non-inverting\nsupply: 5 V\ngain: 8\nsignal: {input: 25 mV..330 mV, frequency: 2 kHz}\nlimits: {settling: {within: 20 µs, to: 0.1 %}}\n');
});
afterAll(() => { rmSync(folder, { recursive: true, force: true }); });

const [ONE, OTHER] = ['GX-CMOS-10M-RRIO', 'GX-NANO'];

async function railfit(words: readonly string[], columns = '100'): Promise<{ exit: number; stdout: string; stderr: string }> {
  const text = { stdout: '', stderr: '' };
  const stream = { isTTY: false, columns: undefined };
  const env = { LANG: 'C.UTF-8', COLUMNS: columns, RAILFIT_CATALOG: join(folder, 'catalog.sqlite') };
  const exit = await runCommandLine(words, { env, stdout: stream, stderr: stream, write: (to, more) => { text[to] += more; } });
  return { exit, ...text };
}

describe('railfit predict', { timeout: 60_000 }, () => {
  it('tells both outcomes beside what is asked, and what the model does not have', async () => {
    const { exit, stdout } = await railfit(['predict', ONE, stage]);
    expect(exit).toBe(0);
    expect(stdout).toMatch(/^GX-CMOS-10M-RRIO \(generic set\) in the stage, predicted, not judged\.$/mu);
    expect(stdout).toMatch(/^ settling time +at most 20 µs +\d+(?:\.\d+)? [nµ]s +\d+(?:\.\d+)? [nµ]s$/mu);
    expect(stdout).toContain('Limits of the model');
  });

  it('puts two parts side by side, spelled either way', async () => {
    const [one, other] = [await railfit(['predict', ONE, '--compare', OTHER, stage]), await railfit(['predict', '--compare', OTHER, ONE, stage])];
    expect(one.stdout).toBe(other.stdout);
    expect(one.stdout).toContain(`${ONE} (generic set) and ${OTHER} (generic set) in the stage`);
    const compared = JSON.parse((await railfit(['predict', ONE, '--compare', OTHER, stage, '--json'])).stdout) as { part: { id: string }; compared: { part: { id: string } } };
    expect([compared.part.id, compared.compared.part.id]).toEqual([ONE, OTHER]);
  });

  it('--csv is the waveform', async () => {
    const { stdout } = await railfit(['predict', ONE, stage, '--csv']);
    const [head, ...rows] = stdout.trimEnd().split('\r\n');
    expect(head).toBe('t (s),ideal (V),typical (V),worst (V)');
    expect(rows).toHaveLength(257);
    expect(rows.at(-1)!.split(',').map(Number)[0]).toBeCloseTo(0.5e-3, 6);
  });

  it('refuses by name a part that is not there, all at once, and a part that was forgotten', async () => {
    const { exit, stderr } = await railfit(['predict', 'GX-NAN', '--compare', 'GX-NOPE', stage]);
    expect(exit).toBe(2);
    expect(stderr).toContain('no part GX-NAN in the catalog');
    expect(stderr).toContain('no part GX-NOPE in the catalog');
    expect((await railfit(['predict', stage])).stderr).toContain('predict: no PART');
  });

  it.each([40, 60, 80, 100])('keeps to %d columns', async (columns) => {
    const { stdout } = await railfit(['predict', ONE, stage, '--ascii'], String(columns));
    const wide = stdout.split('\n').filter((line) => displayWidth(line) > columns && line.trim().includes(' ') && !line.includes(folder));
    expect(wide).toEqual([]);
    expect(stdout).toMatch(/^\p{ASCII}*$/u);
  });

  it('explain uses it where a check has no closed form, and says so', async () => {
    const { stdout } = await railfit(['explain', OTHER, '--topology', 'integrator', '--supply', '5 V', '--reference', '2.5 V', '--input', '2..3 V', '--set', 'integrator.resistance=10 kΩ', '--set', 'integrator.capacitance=10 nF', '--set', 'integrator.window=100 µs', '--set', 'limits.settling.within=1 ms', '--set', 'limits.settling.to=1 %']);
    expect(stdout.replaceAll(/\s+/gu, ' ')).toContain('Predict predicted, not judged, since no closed form holds here. settling time: the output of this stage does not rest at a steady signal.');
    expect((await railfit(['explain', OTHER, stage])).stdout).not.toContain('Predict');
  });
});
