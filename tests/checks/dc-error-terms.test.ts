import { describe, expect, it } from 'vitest';
import { biasTerm, commonModeTerm, currentTerms, offsetCurrentTerm, type ErrorTerm } from '../../src/checks/dc-error-terms.js';
import type { DcErrorDemand } from '../../src/demands/index.js';
import type { Figure } from '../../src/parts/figures.js';
import { readingsOf } from '../../src/parts/readings.js';
import type { ClassWorst, Outlook } from '../../src/parts/reading.js';
import { max, under } from '../support/parts.js';

const ASKED: DcErrorDemand = {
  check: 'dc-error', required: 1, unit: 'V', sense: 'at-most', because: '', source: '', noiseGain: 2, kelvin: 0, positive: 1e3, negative: 3e3, tolerance: 0.01,
  commonModeMove: 0, outputMove: 0, sourceSpread: 0, supply: { min: 5, nominal: 5, max: 5 }, temperature: 25, hottest: 25,
};

interface Asked {
  readonly demand?: Partial<DcErrorDemand>;
  readonly outlook?: Outlook;
  readonly classWorst?: ClassWorst;
}

function terms(figures: readonly Figure[], { demand = {}, outlook = 'pessimistic', classWorst }: Asked = {}): ErrorTerm[] {
  const asked = { ...ASKED, ...demand };
  const readings = readingsOf(under(figures, { outlook, classWorst: classWorst ?? null }));
  return currentTerms(asked, {
    bias: () => biasTerm(asked, readings),
    offset: () => offsetCurrentTerm(asked, readings.figure('offsetCurrent'), readings),
    ofClass: () => offsetCurrentTerm(asked, readings.ofClass('offsetCurrent'), readings),
    bounded: () => (worst, best) => readings.bounded(worst, best),
  }, readings);
}

const total = (all: readonly ErrorTerm[]): number => all.reduce((sum, one) => sum + (one.kind === 'value' ? one.term.value : 0), 0);
const missing = (all: readonly ErrorTerm[]): string[] => all.flatMap((one) => (one.kind === 'missing' ? [one.missing.figure] : []));
const IB = max('biasCurrent', 10e-9);
const UNEQUAL = 2e3 + 0.01 * 4e3;

describe('bias and offset current', () => {
  it('are Ib·(|Rp - Rn| + t(Rp + Rn)) + (Ios/2)(Rp + Rn), × noise gain', () => {
    const all = terms([IB, max('offsetCurrent', 4e-9)]);
    expect(total(all)).toBeCloseTo(2 * (10e-9 * UNEQUAL + 2e-9 * 4e3), 15);
  });

  it('with Ios unknown are Ib·(Rp + Rn) instead of both; at best as if Ios were 0', () => {
    expect(total(terms([IB]))).toBeCloseTo(2 * 10e-9 * 4e3, 15);
    expect(total(terms([IB], { outlook: 'optimistic' }))).toBeCloseTo(2 * 10e-9 * UNEQUAL, 15);
  });

  it("with a class are the smaller of that and the class's Ios", () => {
    const small = terms([IB], { classWorst: { offsetCurrent: 1e-9 } });
    expect(total(small)).toBeCloseTo(2 * (10e-9 * UNEQUAL + 0.5e-9 * 4e3), 15);
    expect(small.map((one) => (one.kind === 'value' ? one.term.basis : null))).toEqual(['guaranteed', 'borrowed']);
    const large = terms([IB], { classWorst: { offsetCurrent: 30e-9 } });
    expect(total(large)).toBeCloseTo(2 * 10e-9 * 4e3, 15);
    expect(large).toHaveLength(1);
    expect(total(terms([IB], { classWorst: { offsetCurrent: 1e-9 }, outlook: 'optimistic' }))).toBeCloseTo(2 * 10e-9 * UNEQUAL, 15);
  });

  it('need no figure without any resistance', () => {
    expect(terms([], { demand: { positive: 0, negative: 0 } })).toEqual([]);
  });

  it('need no bias current at matched pins without tolerance when Ios is known', () => {
    const matched = { positive: 2e3, negative: 2e3, tolerance: 0 };
    const known = terms([max('offsetCurrent', 4e-9)], { demand: matched });
    expect([missing(known), total(known)]).toEqual([[], 2 * 2e-9 * 4e3]);
  });

  it('are never nothing when neither is known, not even at matched pins', () => {
    const matched = { positive: 2e3, negative: 2e3, tolerance: 0 };
    expect(missing(terms([]))).toEqual(['biasCurrent']);
    expect(missing(terms([], { demand: matched }))).toEqual(['offsetCurrent']);
    expect(total(terms([], { demand: matched, classWorst: { offsetCurrent: 1e-9 } }))).toBeCloseTo(2 * 0.5e-9 * 4e3, 15);
  });

  it('miss the bias current where only Ios is known and the pins differ', () => {
    expect(missing(terms([max('offsetCurrent', 4e-9)]))).toEqual(['biasCurrent']);
  });

  it('are the one exception to "pessimistic never less than optimistic": one pin without resistance and Ios unknown', () => {
    const follower = { positive: 1e3, negative: 0 };
    // Ib·Rp against Ib·(Rp + t·Rp): the contract's own sentence, not a slip.
    expect(total(terms([IB], { demand: follower }))).toBeCloseTo(2 * 10e-9 * 1e3, 15);
    expect(total(terms([IB], { demand: follower, outlook: 'optimistic' }))).toBeCloseTo(2 * 10e-9 * 1e3 * 1.01, 15);
  });
});

describe('a rejection', () => {
  const term = (commonModeMove: number): ErrorTerm => commonModeTerm({ ...ASKED, commonModeMove }, readingsOf(under([])));

  it('of a move that is only rounding is nothing to charge', () => {
    expect(term(0)).toEqual({ kind: 'nothing' });
    expect(term(4e-16)).toEqual({ kind: 'nothing' });
    expect(term(1e-9).kind).toBe('missing');
  });

  it('missing tells at which value it would turn: NG × move / what is left', () => {
    const one = term(3);
    expect(one.kind === 'missing' ? one.turnsAt(1e-3) : null).toEqual({ figure: 'commonModeRejection', kind: 'min', value: (2 * 3) / 1e-3, unit: 'V/V' });
  });
});
