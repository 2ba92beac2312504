// The example list of README.md, on the example stage of README.md: what a reader pastes first must be decided, and fit.
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, expect, it } from 'vitest';
import { runCommandLine } from '../../src/cli/run.js';
import { ROOT } from '../support/built.js';

const README = readFileSync(join(ROOT, 'README.md'), 'utf8');

/** The first block of a language below a heading. */
function block(heading: string, language: string): string {
  const [, below = ''] = README.split(`\n## ${heading}\n`);
  const [, text] = new RegExp(`\\n\`\`\`${language}\\n([\\s\\S]*?)\`\`\``, 'u').exec(below) ?? [];
  if (text === undefined) throw new Error(`README.md has no ${language} block under "${heading}"`);
  return text;
}

let folder: string;
beforeAll(() => { folder = mkdtempSync(join(tmpdir(), 'railfit-readme-')); });
afterAll(() => { rmSync(folder, { recursive: true, force: true }); });

async function railfit(...words: string[]): Promise<{ exit: number; stdout: string; stderr: string }> {
  const text = { stdout: '', stderr: '' };
  const stream = { isTTY: false, columns: undefined };
  const env = { LANG: 'C.UTF-8', COLUMNS: '100', RAILFIT_CATALOG: join(folder, 'catalog.sqlite') };
  const exit = await runCommandLine(words, { env, stdout: stream, stderr: stream, write: (to, more) => { text[to] += more; } });
  return { exit, ...text };
}

it('the example list of README.md fits the example stage of README.md', { timeout: 60_000 }, async () => {
  const [list, stage] = [join(folder, 'approved.csv'), join(folder, 'stage.yaml')];
  writeFileSync(list, block("Your team's list", 'csv'));
  writeFileSync(stage, block('Your own stage in five minutes', 'yaml'));
  expect(await railfit('import', list)).toMatchObject({ exit: 0, stdout: expect.stringContaining('Imported 1 part from approved.csv') as string });
  const explained = await railfit('explain', 'HOUSE-01', stage);
  expect(explained.stdout).toMatch(/^HOUSE-01 fits: all \d+ checks pass/u);
  expect(explained.exit).toBe(0);
});

it('what `parts --csv` writes is no change, and an import names what it changes and withdraws', { timeout: 60_000 }, async () => {
  const [list, second, copy, errors] = ['first.csv', 'second.csv', 'copy.csv', 'errors.csv'].map((name) => join(folder, name)) as [string, string, string, string];
  const lines = ['id,status,package,slew rate min (V/µs)', 'ORG-1,approved,SO-8,1', 'ORG-2,approved,SO-8,1', ''];
  writeFileSync(list, lines.join('\n'));
  // The list of the test before is gone altogether, and half of this one at the end: both are meant.
  expect((await railfit('import', list, '--accept', 'removed')).exit).toBe(0);
  writeFileSync(copy, (await railfit('parts', '--tier', 'approved', '--csv')).stdout);
  for (const more of [['--dry-run'], []]) expect((await railfit('import', copy, ...more)).stdout).toMatch(/^copy\.csv \(sha256 [0-9a-f]{8}\): no change\. 2 parts, as imported before\.\n$/u);
  writeFileSync(second, 'id,status,package,slew rate min (V/µs)\nORG-1,approved,,2.5\n');
  expect((await railfit('import', second, '--accept', 'removed', '--dry-run')).stdout.split('\n').slice(0, 4)).toEqual([
    expect.stringMatching(/: 1 part; 1 changed, 1 withdrawn\.$/u),
    '  changed  ORG-1: package: SO-8 → empty (C2)',
    '  changed  ORG-1: slew rate min (V/µs): 1 → 2.5 (D2)',
    '  withdrawn  ORG-2',
  ]);
  writeFileSync(second, `id,status,package\n${Array.from({ length: 12 }, (_, index) => `P${index},aproved,SO-8`).join('\n')}\n`);
  const { exit, stderr } = await railfit('import', second, '--errors', errors);
  expect(exit).toBe(3);
  expect(stderr.replaceAll(/\s+/gu, ' ')).toContain(`… and 2 more (all 12 written to ${errors})`);
  expect(readFileSync(errors, 'utf8').trim().split(/\r?\n/u)).toHaveLength(13);
});
