import { describe, expect, it } from 'vitest';
import { knownOf } from '../../src/checks/check.js';
import { countedTerms, currentTerms } from '../../src/checks/dc-error-counted.js';
import { dcError } from '../../src/checks/dc-error.js';
import { totalOf } from '../../src/checks/dc-error-sum.js';
import type { ErrorTerm } from '../../src/checks/dc-error-terms.js';
import { rowOf } from '../../src/checks/in-numbers.js';
import type { DcErrorDemand } from '../../src/demands/index.js';
import type { Figure } from '../../src/parts/figures.js';
import { readingsOf } from '../../src/parts/readings.js';
import type { ClassWorst, Outlook } from '../../src/parts/reading.js';
import { max, min, under } from '../support/parts.js';

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
  const found = knownOf(dcError.terms, { asked, readings: readingsOf(under(figures, { outlook, classWorst: classWorst ?? null })) });
  return currentTerms(asked, found, rowOf(dcError.inNumbers!, asked, found));
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

describe('the terms that count', () => {
  const all = [max('offsetVoltage', 1e-3), max('offsetDrift', 5e-6), IB, max('offsetCurrent', 4e-9), min('commonModeRejection', 1e4), min('supplyRejection', 1e4), min('openLoopGain', 1e5)];
  const whole = { kelvin: 60, commonModeMove: 1, outputMove: 2, supply: { min: 4.5, nominal: 5, max: 5.5 } };

  function counted(figures: readonly Figure[]): { readonly names: string[]; readonly sum: number; readonly known: number } {
    const asked = { ...ASKED, ...whole };
    const found = knownOf(dcError.terms, { asked, readings: readingsOf(under(figures, { outlook: 'pessimistic', classWorst: null })) });
    const row = rowOf(dcError.inNumbers!, asked, found);
    const told = countedTerms(asked, found, row);
    return { names: told.map((one) => (one.kind === 'value' ? one.term.name : one.kind)), sum: total(told), known: totalOf(asked, row).known };
  }

  it('are told in the order they are added up, and are the sum', () => {
    const { names, sum, known } = counted(all);
    expect(names).toEqual(['offset', 'offset drift', 'bias current', 'offset current', 'common mode', 'supply', 'open-loop gain']);
    expect(sum).toBe(known);
  });

  it('leave the drift out beside an offset rated over temperature', () => {
    const over = counted([max('offsetVoltage', 1e-3, { temperature: 'over' }), ...all.slice(1)]);
    expect(over.names).not.toContain('offset drift');
    expect(over.sum).toBe(over.known);
  });
});
