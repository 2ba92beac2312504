import { readdirSync, readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { ENTRIES } from '../support/check-values.js';

/** Entries without a test, each with the reason. An entry leaves this list when its test is written. */
const NOT_COVERED: Readonly<Record<string, string>> = {};

describe('check values', () => {
  const folder = new URL('./', import.meta.url);
  const tested = readdirSync(folder)
    .filter((name) => name.endsWith('.test.ts'))
    .flatMap((name) => [...readFileSync(new URL(name, folder), 'utf8').matchAll(/^ *published\('([A-Z0-9-]+)'/gm)])
    .map((match) => match[1]!);
  const ids = ENTRIES.map(({ id }) => id);

  it('are each tested exactly once, or listed in NOT_COVERED with a reason (tests/outside/coverage.test.ts)', () => {
    expect([...tested, ...Object.keys(NOT_COVERED)].sort()).toEqual([...ids].sort());
  });

  it('cover the topics the product decides with', () => {
    const topics = [...new Set(ENTRIES.map(({ topic }) => topic))].sort();
    expect(topics).toEqual(
      ['dc', 'gbw', 'headroom', 'input', 'noise', 'power', 'practice', 'ranges', 'ranking', 'slew', 'stability', 'standards', 'tia'],
    );
  });
});
