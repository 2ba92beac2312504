import { describe, expect, it } from 'vitest';
import { decide, decideBriefly } from '../../src/verdicts/decide.js';
import { standingOf } from '../../src/verdicts/standing.js';
import type { BoundFinding, Finding, NumberFinding, SingleFinding, UndecidedFinding } from '../../src/verdicts/finding.js';

const CHECK = { id: 'dc-error', title: 'DC error', hasMargin: true };
const numbers = (offered: number, more: Partial<NumberFinding> = {}): NumberFinding => ({ kind: 'numbers', required: 10, unit: 'V', sense: 'at-most', offered, basis: 'guaranteed', ...more });
const bound = (known: number, more: Partial<BoundFinding> = {}): BoundFinding => ({
  kind: 'bound', required: 10, unit: 'V', sense: 'at-most', known, basis: 'guaranteed', missing: [{ figure: 'openLoopGain', kind: 'min' }], cause: 'missing-figure', ...more,
});
const open = (more: Partial<UndecidedFinding> = {}): UndecidedFinding => ({ kind: 'undecided', required: 10, unit: 'V', sense: 'at-most', cause: 'missing-figure', missing: [], ...more });
const verdict = (worst: Finding, best: Finding = worst): ReturnType<typeof decide> => decide(CHECK, worst, best);

describe('two readings', () => {
  it('both pass: pass; both fail: fail; otherwise unknown', () => {
    expect(verdict(numbers(9), numbers(8)).outcome).toBe('pass');
    expect(verdict(numbers(12), numbers(11)).outcome).toBe('fail');
    expect(verdict(numbers(12), numbers(8)).outcome).toBe('unknown');
    expect(verdict(open()).outcome).toBe('unknown');
    // Where the best reading is worse than the worst one, neither decides alone.
    expect(verdict(numbers(9), numbers(11)).outcome).toBe('unknown');
  });

  it('met exactly is a pass', () => {
    expect(verdict(numbers(10))).toMatchObject({ outcome: 'pass', margin: 1, spare: 0 });
    expect(verdict(numbers(10 * (1 + 2e-9))).outcome).toBe('fail');
  });

  it('show the pessimistic one for pass and unknown, the optimistic one for fail, and the other beside it', () => {
    expect(verdict(numbers(9), numbers(8))).toMatchObject({ offered: 9, offeredBest: 8, spare: 1 });
    expect(verdict(numbers(12), numbers(8))).toMatchObject({ offered: 12, offeredBest: 8 });
    expect(verdict(numbers(12), numbers(11))).toMatchObject({ offered: 11, offeredBest: 12 });
  });

  it('write the best possible as null', () => {
    expect(verdict(numbers(9), numbers(-Infinity)).offeredBest).toBeNull();
  });
});

describe('basis and reason', () => {
  it('are the basis of the figures for pass and fail, null for unknown', () => {
    expect(verdict(numbers(9, { basis: 'derated' }))).toMatchObject({ basis: 'derated', reason: null });
    expect(verdict(numbers(12, { basis: 'derated' }), numbers(8, { basis: 'derated' }))).toMatchObject({ basis: null, standsOn: 'derated', reason: 'typical-only' });
    expect(verdict(numbers(12, { basis: 'assumed' }), numbers(8, { basis: 'assumed' })).reason).toBe('assumed');
  });

  it('name the cause where a figure is missing, and where it turns', () => {
    const turnsAt = { figure: 'openLoopGain', kind: 'min', value: 3, unit: 'V/V' } as const;
    expect(verdict(open({ cause: 'currency' }))).toMatchObject({ reason: 'currency', offered: null });
    expect(verdict(numbers(12, { turnsAt }), numbers(8, { turnsAt })).decidesAt).toEqual(turnsAt);
    expect(verdict(numbers(9, { turnsAt }))).toMatchObject({ decidesAt: null, turnsAt });
  });
});

describe('a bound', () => {
  it('below the limit leaves it open, telling what is known', () => {
    expect(verdict(bound(4))).toMatchObject({ outcome: 'unknown', offered: null, known: 4, reason: 'missing-figure' });
    expect(verdict(bound(10)).outcome).toBe('unknown');
  });

  it('beyond the limit on the optimistic reading is a fail: offered null, known', () => {
    expect(verdict(bound(12), bound(11))).toMatchObject({ outcome: 'fail', offered: null, known: 11 });
    expect(verdict(bound(12), bound(9)).outcome).toBe('unknown');
  });

  it('that is as good as can be tells nothing of what is known', () => {
    const open = verdict(bound(Infinity, { sense: 'at-least' }));
    expect(open).toMatchObject({ outcome: 'unknown', offered: null, known: null });
    expect(decideBriefly(CHECK, bound(Infinity, { sense: 'at-least' }), bound(Infinity, { sense: 'at-least' })).known).toBeNull();
  });
});

describe('borrowed terms', () => {
  it('may be a tenth of the limit in a pass, exactly that included', () => {
    expect(verdict(numbers(9, { borrowed: 1, basis: 'borrowed' })).outcome).toBe('pass');
    expect(verdict(numbers(9, { borrowed: 1.0001, basis: 'borrowed' }), numbers(8, { borrowed: 0, basis: 'borrowed' }))).toMatchObject({ outcome: 'unknown', reason: 'borrowed' });
  });
});

describe('vertices', () => {
  const vertices = (...findings: SingleFinding[]): Finding => ({ kind: 'vertices', findings });

  it('must all hold; the one of least spare is shown', () => {
    expect(verdict(vertices(numbers(8), numbers(9, { required: 9.5 }))).offered).toBe(9);
    expect(verdict(vertices(numbers(8), numbers(11)))).toMatchObject({ outcome: 'fail', offered: 11 });
  });

  it('have the weakest basis of all', () => {
    expect(verdict(vertices(numbers(9), numbers(2, { basis: 'estimated' }))).basis).toBe('estimated');
  });

  it('show one that decides: a number before a bound, never a passing number for an open vertex', () => {
    expect(verdict(vertices(bound(4), numbers(2)))).toMatchObject({ outcome: 'unknown', offered: null, known: 4 });
    expect(verdict(vertices(bound(12), numbers(11)))).toMatchObject({ outcome: 'fail', offered: 11, known: null });
    expect(verdict(vertices(bound(12), numbers(2)))).toMatchObject({ outcome: 'fail', offered: null, known: 12 });
  });

  it('fail where one fails although another is open', () => {
    expect(standingOf(vertices(open(), numbers(11)))).toBe('fail');
    expect(standingOf(vertices(open(), numbers(9)))).toBe('open');
  });

  it('are refused when there are none', () => {
    expect(() => verdict(vertices())).toThrow(new RangeError('a check over vertices has none'));
  });
});

describe('words', () => {
  const word = (offered: string): Finding => ({ kind: 'words', required: ['SOT-23-5', 'SC-70-5'], offered });

  it('must be one of those required, in any case of letters', () => {
    expect(verdict(word('sc-70-5 '))).toMatchObject({ outcome: 'pass', sense: 'one-of', required: ['SOT-23-5', 'SC-70-5'], offered: 'sc-70-5 ', margin: null, spare: null, basis: 'guaranteed' });
    expect(verdict(word('SOIC-8')).outcome).toBe('fail');
  });
});

describe('margin', () => {
  it('is null where a ratio says nothing; spare is told instead', () => {
    expect(decide({ ...CHECK, hasMargin: false }, numbers(8), numbers(8))).toMatchObject({ margin: null, spare: 2 });
    expect(verdict(numbers(8))).toMatchObject({ margin: 10 / 8, spare: 2 });
  });
});
