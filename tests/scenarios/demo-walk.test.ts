// The demo as a user meets it: the README's walk, word for word, with the built command, and what is printed on the five
// stages, held byte for byte in tests/golden/demo. After a change that is meant, of the catalog or of the wording:
//
//     npm run build && UPDATE_GOLDEN=1 npx vitest run tests/scenarios/demo-walk.test.ts
//
// rewrites every file there (UPDATE=1, which rewrites tests/golden, does it too); then read the difference before it is
// committed. What the README shows is corrected by hand.
import { copyFileSync, cpSync, existsSync, mkdirSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { runCommandLine } from '../../src/cli/run.js';
import { requireBuilt, ROOT } from '../support/built.js';
import { makeWorkplace, type Ran, type Workplace } from '../support/railfit.js';
import { readmeWalk } from '../support/readme-walk.js';
import { AFTER, BEFORE, IMPORT, WIDTHS, type DemoCase } from './demo-cases.js';

const FOLDER = join(ROOT, 'tests', 'golden', 'demo');
const UPDATING = process.env['UPDATE_GOLDEN'] === '1' || process.env['UPDATE'] === '1';
const COLOURS = ['plain', 'colour'] as const;
type Colour = (typeof COLOURS)[number];

/** The folder of a reader: the catalog folder beside them, as in the checkout. */
function makeReader(): Workplace {
  const place = makeWorkplace();
  cpSync(join(ROOT, 'catalog'), join(place.folder, 'catalog'), { recursive: true });
  return place;
}

const closedUp = (text: string): string => text.replaceAll(/\s+/gu, ' ').trim();

beforeAll(requireBuilt);

describe('the walk of the README', () => {
  const steps = readmeWalk();
  let place: Workplace;
  beforeAll(() => { place = makeReader(); });
  afterAll(() => { place.remove(); });

  it('goes from shortlist over import and explain to a what-if, on a catalog of its own', () => {
    expect(steps.map(({ words }) => words[0])).toEqual(['shortlist', 'import', 'shortlist', 'explain', 'explain', 'explain', 'explain', 'shortlist']);
    for (const { words } of steps) expect(words.slice(-2), words.join(' ')).toEqual(['--catalog', 'demo.sqlite']);
    expect(steps.map(({ exit }) => exit)).toEqual([0, 0, 0, 0, 1, 4, 0, 0]);
    expect(steps.flatMap(({ shown }) => shown).length).toBeGreaterThan(5);
  });

  it.each(steps.map((step) => [step.words.join(' '), step] as const))('railfit %s', async (_, { words, exit, shown }) => {
    const ran = await place.run(words, { env: { COLUMNS: '100' } });
    expect(ran.exit, ran.stderr).toBe(exit);
    for (const line of shown) expect(closedUp(ran.stdout), 'shown in README.md').toContain(closedUp(line));
  });

  it('leaves the catalog of the reader alone', () => {
    expect(existsSync(place.catalog)).toBe(false);
    expect(existsSync(join(place.folder, 'demo.sqlite'))).toBe(true);
  });
});

describe('what the demo prints', () => {
  let place: Workplace;
  const catalog = (name: string): string => join(place.folder, name);
  beforeAll(async () => {
    place = makeReader();
    if (UPDATING) rmSync(FOLDER, { recursive: true, force: true });
    mkdirSync(FOLDER, { recursive: true });
    await inProcess(['parts'], { RAILFIT_CATALOG: catalog('before.sqlite') });
    copyFileSync(catalog('before.sqlite'), catalog('after.sqlite'));
    await inProcess(IMPORT.words, { RAILFIT_CATALOG: catalog('after.sqlite') });
  });
  afterAll(() => { place.remove(); });

  /** One case at the three widths, one below the other, held against its file. */
  async function hold(one: DemoCase, colour: Colour, catalogAt: (width: number) => string): Promise<void> {
    const texts: string[] = [];
    for (const width of WIDTHS) {
      const ran = await inProcess([...one.words, COLOUR_OPTION[colour]], { COLUMNS: String(width), RAILFIT_CATALOG: catalogAt(width) });
      expect([ran.exit, ran.stderr], `${width} columns`).toEqual([one.exit, '']);
      texts.push(rendition(width, ran.stdout));
    }
    const file = join(FOLDER, fileOf(one, colour));
    if (UPDATING) writeFileSync(file, texts.join('\n'));
    expect(texts.join('\n')).toBe(readFileSync(file, 'utf8'));
  }

  describe.each(COLOURS)('in %s', (colour) => {
    it.each(BEFORE)('$name', (one) => hold(one, colour, () => catalog('before.sqlite')));
    it.each(AFTER)('$name', (one) => hold(one, colour, () => catalog('after.sqlite')));

    it(IMPORT.name, () =>
      hold(IMPORT, colour, (width) => {
        const fresh = catalog(`import-${width}-${colour}.sqlite`);
        copyFileSync(catalog('before.sqlite'), fresh);
        return fresh;
      }));
  });

  // A process takes its time, so the files are written in this one; that the built command prints the same is tried on some.
  it.each(AFTER.filter(({ name }) => name.startsWith('soil-moisture-probe')))('and the built command prints the same: $name', async (one) => {
    for (const [colour, width] of [['plain', 80], ['colour', 120]] as const) {
      const ran = await place.run([...one.words, COLOUR_OPTION[colour]], { env: { COLUMNS: String(width), RAILFIT_CATALOG: catalog('after.sqlite') } });
      expect([ran.exit, ran.stderr]).toEqual([one.exit, '']);
      expect(readFileSync(join(FOLDER, fileOf(one, colour)), 'utf8')).toContain(rendition(width, ran.stdout));
    }
  });

  it('is held in no file that no case writes', () => {
    const known = [...BEFORE, IMPORT, ...AFTER].flatMap((one) => COLOURS.map((colour) => fileOf(one, colour)));
    expect(readdirSync(FOLDER).sort()).toEqual(known.sort());
  });
});

const COLOUR_OPTION: Readonly<Record<Colour, string>> = { plain: '--color=never', colour: '--color=always' };

const rendition = (width: number, text: string): string => `===== ${width} columns =====\n${text}`;

const fileOf = ({ name }: DemoCase, colour: Colour): string => (colour === 'plain' ? `${name}.txt` : `${name}.colour.txt`);

/** The command line in this process, from the top of the checkout, so that stages are named as the README names them. */
async function inProcess(words: readonly string[], env: Readonly<Record<string, string>>): Promise<Ran> {
  expect(process.cwd()).toBe(ROOT);
  const text = { stdout: '', stderr: '' };
  const stream = { isTTY: false, columns: undefined };
  const exit = await runCommandLine(words, { env: { LANG: 'C.UTF-8', ...env }, stdout: stream, stderr: stream, write: (to, more) => { text[to] += more; } });
  return { exit, ...text };
}
