import { expect, it } from 'vitest';
import type { Finding } from '../../src/verdicts/finding.js';
import { outcomeOf, standingOf } from '../../src/verdicts/standing.js';

const LIMIT = { required: 10, unit: 'V', sense: 'at-most', basis: 'guaranteed' } as const;
const numbers = (offered: number, borrowed?: number): Finding => ({ kind: 'numbers', ...LIMIT, offered, ...(borrowed === undefined ? {} : { borrowed }) });
const bound = (known: number): Finding => ({ kind: 'bound', ...LIMIT, known, missing: [], cause: 'missing-figure' });

it('a number stands by its limit, and is open where more than a tenth of the limit is borrowed', () => {
  expect([numbers(10), numbers(10.1), numbers(9, 1), numbers(9, 1.1), numbers(11, 1.1)].map(standingOf)).toEqual(['pass', 'fail', 'pass', 'open', 'fail']);
});

it('a bound never passes', () => {
  expect([bound(1), bound(11)].map(standingOf)).toEqual(['open', 'fail']);
});

it('of several vertices one that fails decides, then one that is open', () => {
  const at = (...findings: Finding[]): Finding => ({ kind: 'vertices', findings } as Finding);
  expect([at(numbers(1), bound(1)), at(bound(1), numbers(11)), at(numbers(1), numbers(2))].map(standingOf)).toEqual(['open', 'fail', 'pass']);
});

it('both readings together: pass on both, fail on the best, else unknown', () => {
  const [good, bad, open] = [numbers(1), numbers(11), bound(1)];
  expect([outcomeOf(good, good), outcomeOf(bad, bad), outcomeOf(open, bad), outcomeOf(bad, good), outcomeOf(open, good), outcomeOf(good, bad)]).toEqual(['pass', 'fail', 'fail', 'unknown', 'unknown', 'unknown']);
});
