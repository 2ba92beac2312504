// What the built command prints, held byte for byte. After a change that is meant:
//
//     npm run build && UPDATE=1 npx vitest run tests/golden
//
// rewrites every file here; then read the difference, line by line, before it is committed. The lists that are imported
// first (approved.csv, approved-next.csv, approved-short.csv, refused.csv) are invented and written by hand.
import { mkdirSync, readdirSync, readFileSync, statSync, writeFileSync } from 'node:fs';
import { dirname, join, relative } from 'node:path';
import { beforeAll, describe, expect, it } from 'vitest';
import { requireBuilt } from '../support/built.js';
import { makeWorkplace, type Ran, type Workplace } from '../support/railfit.js';
import { COLOUR_CASES, DOCUMENTS, IMPORTS, REPORTS, TEXT_CASES, type GoldenCase } from './cases.js';

const FOLDER = import.meta.dirname;
const UPDATING = process.env['UPDATE'] === '1';
const BY_HAND = ['approved.csv', 'approved-next.csv', 'approved-short.csv', 'refused.csv'];
let place: Workplace;

beforeAll(() => {
  requireBuilt();
  place = makeWorkplace();
  return () => {
    place.remove();
  };
});

async function hold({ file, words, exit, env = {}, stream = 'stdout', told = '' }: GoldenCase): Promise<void> {
  const ran = await place.run(words, { env });
  expect(ran.exit, ran.stderr).toBe(exit);
  const text = ran[stream];
  if (UPDATING) write(join(FOLDER, file), text);
  expect(text).toBe(readFileSync(join(FOLDER, file), 'utf8'));
  expect(other(ran, stream)).toBe(told);
}

const other = (ran: Ran, stream: 'stdout' | 'stderr'): string => ran[stream === 'stdout' ? 'stderr' : 'stdout'];

function write(path: string, text: string): void {
  mkdirSync(dirname(path), { recursive: true });
  writeFileSync(path, text);
}

describe('imports, in order', () => {
  beforeAll(async () => {
    // The note about a new catalog belongs to the first run, whatever it is.
    await place.run(['parts']);
  });
  it.each(IMPORTS)('$file', hold);
});

describe('reports, in order', () => {
  it.each(REPORTS)('$file', hold);
});

describe.concurrent('documents', () => {
  it.each(DOCUMENTS)('$file', hold);
});

describe.concurrent('text', () => {
  it.each(TEXT_CASES)('$file', hold);
});

// Against the plain files, which are not there yet while they are rewritten.
describe.skipIf(UPDATING).concurrent('colour says nothing that the words do not', () => {
  it.each(COLOUR_CASES)('$file', async ({ file, words, env = {} }) => {
    const { stdout } = await place.run(words, { env });
    expect(stdout.replaceAll(/\u001b\[\d+m/gu, '')).toBe(readFileSync(join(FOLDER, file), 'utf8'));
  });
});

it('holds no file that no run writes', () => {
  const known = new Set([...IMPORTS, ...REPORTS, ...DOCUMENTS, ...TEXT_CASES].map(({ file }) => file).concat(BY_HAND));
  // The files in demo/ belong to tests/scenarios/demo-walk.test.ts.
  const found = readdirSync(FOLDER, { recursive: true, encoding: 'utf8' }).filter((name) => statSync(join(FOLDER, name)).isFile() && !name.endsWith('.ts') && !name.startsWith('demo'));
  expect(found.map((name) => relative(FOLDER, join(FOLDER, name)).replaceAll('\\', '/')).filter((name) => !known.has(name))).toEqual([]);
});
