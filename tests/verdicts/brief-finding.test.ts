import { expect, it } from 'vitest';
import { BriefBound, BriefNumbers } from '../../src/verdicts/brief-finding.js';
import { decideBriefly } from '../../src/verdicts/decide.js';

const CHECK = { id: 'dc-error', title: 'DC error', hasMargin: true };
const LIMIT = { required: 2, unit: 'V', sense: 'at-most' } as const;

it('findings of nothing but numbers are decided as any others', () => {
  const numbers = { kind: 'numbers', ...LIMIT, basis: 'derated', offered: 1.5, borrowed: 0.1 } as const;
  const bound = { kind: 'bound', ...LIMIT, basis: 'guaranteed', known: 2.5, missing: [], cause: 'missing-figure' } as const;
  expect(new BriefNumbers(LIMIT, 'derated', { offered: 1.5, borrowed: 0.1 })).toMatchObject(numbers);
  expect(new BriefBound(LIMIT, 'guaranteed', 2.5)).toMatchObject(bound);
  expect(decideBriefly(CHECK, new BriefNumbers(LIMIT, 'derated', { offered: 1.5, borrowed: 0.1 }), numbers)).toMatchObject({ outcome: 'pass', margin: 2 / 1.5, basis: 'derated' });
  expect(decideBriefly(CHECK, bound, new BriefBound(LIMIT, 'guaranteed', 2.5))).toMatchObject({ outcome: 'fail', known: 2.5 });
});

it('more than a tenth of the limit borrowed is not a pass', () => {
  const borrowed = new BriefNumbers(LIMIT, 'borrowed', { offered: 1, borrowed: 0.21 });
  expect(decideBriefly(CHECK, borrowed, borrowed).outcome).toBe('unknown');
});
