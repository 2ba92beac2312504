import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { beforeAll, describe, expect, it } from 'vitest';
import { CODE_PAGES } from '../../src/cli/code-pages.js';
import { TOPICS } from '../../src/cli/help-topics.js';
import { TOOL_VERSION } from '../../src/cli/version.js';
import { requireBuilt, ROOT } from '../support/built.js';
import { makeWorkplace, type Workplace } from '../support/railfit.js';

let place: Workplace;
beforeAll(() => {
  requireBuilt();
  place = makeWorkplace();
  return () => { place.remove(); };
});

/** Where pages are written; everywhere else a code is one that a message carries. */
const PAGES = ['src/cli/code-pages.ts', 'src/spec/codes.ts', 'src/intake/codes.ts'];

function codesInSource(): Map<string, string> {
  const files = readdirSync(join(ROOT, 'src'), { recursive: true, encoding: 'utf8' }).map((name) => `src/${name.replaceAll('\\', '/')}`);
  const found = new Map<string, string>();
  for (const file of files.filter((name) => name.endsWith('.ts') && !PAGES.includes(name))) {
    for (const [, quoted, bracketed] of readFileSync(join(ROOT, file), 'utf8').matchAll(/['"`]([A-Z]\d{3})['"`]|error\[([A-Z]\d{3})\]/gu)) found.set(quoted ?? bracketed ?? '', file);
  }
  return found;
}

describe('message codes', () => {
  const codes = codesInSource();

  it('are found in the source', () => {
    expect(codes.size).toBeGreaterThan(80);
    expect([...codes.keys()]).toEqual(expect.arrayContaining(['Q002', 'S101', 'S201', 'I502', 'C101', 'E501', 'E504']));
  });

  it('each have a page, and each page a message; edit src/cli/code-pages.ts or the codes.ts of the room', () => {
    const pages = CODE_PAGES.map(({ code }) => code);
    expect(new Set(pages).size, 'one page each').toBe(pages.length);
    expect([...codes].filter(([code]) => !pages.includes(code)).map(([code, file]) => `${code} of ${file} has no page`)).toEqual([]);
    expect(pages.filter((code) => !codes.has(code)).map((code) => `${code} has a page and no message`)).toEqual([]);
  });

  it('have pages that say why, show what is refused and what is written instead', () => {
    for (const { code, title, why, refused, accepted } of CODE_PAGES) {
      for (const text of [title, why, refused, accepted]) expect(text.length, code).toBeGreaterThan(0);
      expect(refused, code).not.toBe(accepted);
      expect(`${title} ${why}`, code).not.toMatch(/\b(?:please|oops)\b|!/iu);
    }
  });

  it('are printed by railfit help CODE, in either case', async () => {
    const { stdout, exit } = await place.run(['help', 'q002']);
    expect(exit).toBe(0);
    expect(stdout).toMatchInlineSnapshot(`
      "Q002: m or M without a unit

      SI reads M as mega, circuit simulators read it as milli: a factor of a thousand million.

        refused  load: 10M
        instead  load: 10 MΩ, 10meg or 10 mΩ
      "
    `);
  });

  it('are all listed', async () => {
    const { stdout } = await place.run(['help', 'codes']);
    for (const { code } of CODE_PAGES) expect(stdout).toContain(`\n  ${code}`.slice(code === CODE_PAGES[0]?.code ? 1 : 0));
  });
});

describe('topics', () => {
  it.each(Object.keys(TOPICS))('%s: within the width, and ASCII when asked', async (topic) => {
    const ran = await place.run(['help', topic, '--ascii'], { env: { COLUMNS: '80' } });
    expect(ran).toMatchObject({ exit: 0, stderr: '' });
    expect(ran.stdout).toMatch(/^[\n\u0020-\u007e]+$/u);
    const wide = ran.stdout.split('\n').filter((line) => line.length > 80 && !line.startsWith('    '));
    expect(wide).toEqual([]);
  });

  it('tell the frozen exit codes and where judgement of people is needed', async () => {
    expect((await place.run(['help', 'exit-codes'])).stdout).toMatch(/ 0 [^]* 1 [^]* 2 [^]* 3 [^]* 4 [^]* 5 [^]* 70 [^]* 130 /u);
    expect((await place.run(['help', 'cautions'])).stdout).toContain('qualified review');
    expect((await place.run(['help', 'quantities'])).stdout).toContain('in a shell < and > need quotes');
  });
});

describe('version', () => {
  it('is that of the package', async () => {
    const { version } = JSON.parse(readFileSync(join(ROOT, 'package.json'), 'utf8')) as { version: string };
    expect(TOOL_VERSION).toBe(version);
    for (const option of ['--version', '-V']) expect((await place.run([option])).stdout).toBe(`railfit ${version} (rules 1)\n`);
  });
});
