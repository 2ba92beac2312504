import { readdirSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { CHECKS } from '../../src/checks/index.js';
import { CHECK_IDS } from '../../src/demands/index.js';

const stems = (folder: string, end: string): string[] => readdirSync(folder).filter((name) => name.endsWith(end)).map((name) => name.slice(0, -end.length)).sort();
const SRC = stems(join(import.meta.dirname, '../../src/checks'), '.ts');
const TESTS = stems(import.meta.dirname, '.test.ts').filter((stem) => stem !== 'properties');

describe('the list of checks', () => {
  it('stands in the order of the contract', () => {
    expect(CHECKS.map(({ id }) => id)).toEqual(CHECK_IDS.filter((id) => CHECKS.some((check) => check.id === id)));
  });

  it('has each check in a file of its name: src/checks', () => {
    for (const { id } of CHECKS) expect(SRC, `add src/checks/${id}.ts`).toContain(id);
  });

  it('has a test file for each source file: tests/checks', () => {
    expect(TESTS).toEqual(SRC);
  });

  it('names figures it reads and a title', () => {
    for (const { reads, title } of CHECKS) expect([reads.length > 0, title.length > 0]).toEqual([true, true]);
  });
});
