import { existsSync, mkdirSync, mkdtempSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { beforeAll, describe, expect, it } from 'vitest';
import { runCommandLine } from '../../src/cli/run.js';
import { draftFile } from '../../src/spec/draft-file.js';
import { DRAFTS } from '../../src/spec/draft-scenes.js';
import { requireBuilt } from '../support/built.js';
import { makeWorkplace, type Ran } from '../support/railfit.js';

let folder = '';

beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), 'railfit-'));
  return () => { rmSync(folder, { recursive: true, force: true }); };
});

const at = (file: string): string => join(folder, file);
const read = (file: string): string => readFileSync(at(file), 'utf8');

/** The whole command line in this process: many runs, none of them for the sake of the process. */
async function run(words: readonly string[], env: Readonly<Record<string, string>> = { LANG: 'C.UTF-8' }): Promise<Ran> {
  const written = { stdout: '', stderr: '' };
  const stream = { isTTY: false, columns: undefined };
  const world = { env: { RAILFIT_CATALOG: at('catalog.sqlite'), ...env }, stdout: stream, stderr: stream, write: (to: 'stdout' | 'stderr', text: string): void => { written[to] += text; } };
  const exit = await runCommandLine(words, world);
  return { exit, stdout: written.stdout, stderr: written.stderr.replaceAll(folder, 'FOLDER') };
}

describe('the built command', () => {
  it('drafts a stage that it reads', async () => {
    requireBuilt();
    const place = makeWorkplace();
    try {
      expect(await place.run(['draft', 'difference', '-o', 'bridge.yaml'])).toEqual({ exit: 0, stdout: '', stderr: 'wrote bridge.yaml; next: railfit demands bridge.yaml\n' });
      expect((await place.run(['demands', 'bridge.yaml'])).stdout).toContain('difference, gain 10 V/V');
    } finally {
      place.remove();
    }
  });
});

describe('railfit draft', () => {
  it.each(DRAFTS)('$topology, $coupling, goes to stdout and is a stage that railfit reads', async ({ topology, coupling }) => {
    const words = coupling === 'ac' ? ['draft', topology, '--ac'] : ['draft', topology];
    const { exit, stdout, stderr } = await run(words);
    expect({ exit, stderr }).toEqual({ exit: 0, stderr: '' });
    expect(stdout).toBe(draftFile({ topology, coupling }));
    writeFileSync(at('stage.yaml'), stdout);
    expect((await run(['demands', at('stage.yaml')])).exit).toBe(0);
  });

  it('without a word is non-inverting', async () => {
    const { stdout } = await run(['draft']);
    expect(stdout).toBe(draftFile({ topology: 'non-inverting', coupling: 'dc' }));
  });

  it.each([{ words: ['draft', '--ascii'], env: {} }, { words: ['draft'], env: { LANG: 'C', LC_ALL: 'C' } }])('in ASCII where asked or where the locale says so: $words', async ({ words, env }) => {
    const { stdout } = await run(words, env);
    expect(stdout).toMatch(/^\p{ASCII}+$/u);
    writeFileSync(at('stage.yaml'), stdout);
    expect((await run(['demands', at('stage.yaml')])).exit).toBe(0);
  });

  it('takes no catalog and makes none', async () => {
    await run(['draft', 'follower']);
    expect(existsSync(at('catalog.sqlite'))).toBe(false);
  });

  it('refuses a word that is no topology', async () => {
    const { exit, stdout, stderr } = await run(['draft', 'comparator']);
    expect({ exit, stdout }).toEqual({ exit: 2, stdout: '' });
    expect(stderr).toContain('error[S104]: topology: comparator is not one of the words taken here');
  });

  it('says what was probably meant', async () => {
    const { exit, stderr } = await run(['draft', 'invertin']);
    expect(exit).toBe(2);
    expect(stderr).toMatchInlineSnapshot(`
      "error[S104]: topology: invertin is not one of the words taken here, did you mean inverting?
        accepted: follower, non-inverting, inverting, summing, difference, transimpedance, low-side-sense,
        high-side-sense, sallen-key-low-pass, multiple-feedback-low-pass, integrator,
        relaxation-oscillator
         invertin
         ^^^^^^^^
         fix: inverting

      1 problem, nothing was run. (exit 2)
      "
    `);
  });

  it('refuses an AC-coupled difference stage, which cannot be judged either', async () => {
    const { exit, stderr } = await run(['draft', 'difference', '--ac']);
    expect(exit).toBe(2);
    expect(stderr).toMatchInlineSnapshot(`
      "error[S107]: --ac: an AC-coupled difference stage is not built yet; built: difference with coupling
        dc
         fix: leave out --ac

      1 problem, nothing was run. (exit 2)
      "
    `);
  });
});

describe('railfit draft --ac', () => {
  it.each(['transimpedance', 'low-side-sense', 'high-side-sense'])('refuses %s, which nothing couples through a capacitor', async (topology) => {
    const { exit, stderr } = await run(['draft', topology, '--ac']);
    expect(exit).toBe(2);
    expect(stderr.replaceAll(/\s+/gu, ' ')).toMatch(/^error\[S108\]: --ac: the (?:shunt|photodiode) of a .* stage drives it directly: there is no coupling capacitor fix: leave out --ac /u);
  });

  it('refuses an oscillator, which has no signal', async () => {
    const { exit, stderr } = await run(['draft', 'relaxation-oscillator', '--ac']);
    expect(exit).toBe(2);
    expect(stderr).toContain('error[S108]: --ac: an oscillator makes its own signal');
  });
});

describe('railfit draft -o', () => {
  it('writes the file, says so on stderr, and nothing on stdout', async () => {
    expect(await run(['draft', 'inverting', '-o', at('new.yaml')])).toEqual({ exit: 0, stdout: '', stderr: 'wrote FOLDER/new.yaml; next: railfit demands FOLDER/new.yaml\n' });
    expect(read('new.yaml')).toBe(draftFile({ topology: 'inverting', coupling: 'dc' }));
  });

  it('never writes over a file', async () => {
    writeFileSync(at('mine.yaml'), 'mine\n');
    const { exit, stdout, stderr } = await run(['draft', '-o', at('mine.yaml')]);
    expect({ exit, stdout }).toEqual({ exit: 2, stdout: '' });
    expect(stderr.replaceAll(/\s+/gu, ' ')).toBe('error[C110]: -o: FOLDER/mine.yaml exists and is not written over fix: another name, or --force Nothing was written. (exit 2) ');
    expect(read('mine.yaml')).toBe('mine\n');
  });

  it('unless forced, and leaves nothing beside it', async () => {
    writeFileSync(at('old.yaml'), 'old\n');
    expect((await run(['draft', 'follower', '-o', at('old.yaml'), '--force'])).exit).toBe(0);
    expect(read('old.yaml')).toBe(draftFile({ topology: 'follower', coupling: 'dc' }));
    expect(readdirSync(folder).filter((name) => name.endsWith('.part'))).toEqual([]);
  });

  it.each([
    { file: 'nowhere/new.yaml', said: 'FOLDER/nowhere/new.yaml: there is no folder FOLDER/nowhere' },
    { file: 'folder', said: 'FOLDER/folder: it is a folder' },
  ])('$file is refused as surroundings', async ({ file, said }) => {
    mkdirSync(at('folder'), { recursive: true });
    const { exit, stdout, stderr } = await run(['draft', '-o', at(file)]);
    expect({ exit, stdout }).toEqual({ exit: 5, stdout: '' });
    expect(stderr.replaceAll(/\s+/gu, ' ')).toContain(`error[E503]: -o: ${said}`);
    expect(stderr).toContain('Nothing was written. (exit 5)');
  });

  it('tells everything that is wrong at once', async () => {
    writeFileSync(at('both.yaml'), 'mine\n');
    const { exit, stderr } = await run(['draft', 'integratr', '-o', at('both.yaml')]);
    expect(exit).toBe(2);
    expect(stderr).toContain('error[S104]');
    expect(stderr).toContain('error[C110]');
  });

  it('with --json says where it went, and what', async () => {
    const { stdout } = await run(['draft', 'follower', '--ac', '-o', at('json.yaml'), '--json']);
    expect(JSON.parse(stdout)).toEqual({ schema: 'railfit/draft', schemaVersion: 1, topology: 'follower', coupling: 'ac', file: at('json.yaml'), text: read('json.yaml') });
  });
});

describe('railfit draft --ask without a terminal', () => {
  it('is refused and names the file form', async () => {
    const { exit, stdout, stderr } = await run(['draft', '--ask']);
    expect({ exit, stdout }).toEqual({ exit: 2, stdout: '' });
    expect(stderr).toMatchInlineSnapshot(`
      "error[C111]: --ask asks on a terminal, and this is none
         fix: railfit draft non-inverting -o stage.yaml, then edit the file

      1 problem, nothing was run. (exit 2)
      "
    `);
  });
});
