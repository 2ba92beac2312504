import { describe, expect, it } from 'vitest';
import { composed, seal } from '../../src/checks/check.js';
import { dcError } from '../../src/checks/dc-error.js';
import { CHECKS } from '../../src/checks/index.js';
import { outputLow } from '../../src/checks/output-low.js';
import type { Demands } from '../../src/demands/index.js';
import { composedQuestion, type TermQuestion, wholeQuestion } from '../../src/screening/composed-question.js';
import { COUNTS } from '../../src/screening/digest.js';
import { DecisionTree } from '../../src/screening/decision-tree.js';
import { partByPart } from '../../src/screening/part-by-part.js';
import { TRAITS, type Trait } from '../../src/parts/traits.js';
import type { Finding } from '../../src/verdicts/finding.js';

interface Sum {
  readonly required: number;
  readonly because: string;
}

/** Two addends, volts; how often each was added up and held against the limit is counted. */
function sumCheck(asked: Sum) {
  const calls = { whole: 0, finding: 0 };
  const check = composed<Sum, { one: number; two: number }, number>({
    id: 'dc-error', title: 'sum', unit: 'V', reads: [], hasMargin: true,
    asks: () => asked,
    terms: { one: () => 0, two: () => 0 },
    whole: (_, known) => {
      calls.whole += 1;
      return known.one() + known.two();
    },
    finding: ({ required }, offered): Finding => {
      calls.finding += 1;
      return { kind: 'numbers', required, offered, unit: 'V', sense: 'at-most', basis: 'guaranteed' };
    },
  });
  return { calls, sealed: seal(check) };
}

/** A term whose answer is the code of one trait. */
function termOf(trait: number, worst: readonly number[], best: readonly number[]): TermQuestion {
  return {
    worst, best, tree: new DecisionTree(() => worst.length), looksAtTraits: true, codes: (traits) => traits,
    answer: (codeOf, path) => {
      const code = codeOf(trait);
      path.push({ trait, code });
      return code;
    },
  };
}

const DEMANDS = { operating: { coldest: 0, hottest: 50, nominalSupply: 5 } } as Demands;
const PARTS = [[0, 0], [0, 1], [1, 0], [0, 1], [1, 0], [2, 0]] as const;
const ONE = [0.1, 0.2, 0.3];

function answered(check: ReturnType<typeof sumCheck>, terms: readonly TermQuestion[], whole?: TermQuestion) {
  const { composition } = check.sealed;
  if (composition === null) throw new Error('a composed check has a composition');
  const made = whole ?? wholeQuestion(DEMANDS, composition, terms);
  const question = composedQuestion(DEMANDS, check.sealed, made);
  const columns = [0, 1].map((trait) => Int32Array.from(PARTS.map((codes) => codes[trait] ?? 0)));
  const into = new Int32Array(PARTS.length);
  question.classify({ first: 0, count: PARTS.length, codes: (trait) => columns[trait] ?? into }, into);
  into.forEach((answer) => question.settle?.(answer));
  return { made, passes: [...into].map((answer) => question.digests.pass(answer)?.margin ?? null) };
}

describe('a check put together from terms', () => {
  it('is summed once for every combination, and for another limit not again', () => {
    const terms = [termOf(0, ONE, ONE), termOf(1, [0, 0.5], [0, 0.5])];
    const first = sumCheck({ required: 0.4, because: '' });
    const { made, passes } = answered(first, terms);
    expect(passes.map((margin) => margin?.toPrecision(3) ?? null)).toEqual(['4.00', null, '2.00', null, '2.00', '1.33']);
    expect(first.calls).toEqual({ whole: 4, finding: 4 });
    const second = sumCheck({ required: 0.8, because: '' });
    expect(answered(second, terms, made).passes.map((margin) => margin?.toPrecision(3) ?? null)).toEqual(['8.00', '1.33', '4.00', '1.33', '4.00', '2.67']);
    expect(second.calls).toEqual({ whole: 0, finding: 4 });
  });

  it('is summed in both outlooks where a term differs between them', () => {
    const check = sumCheck({ required: 0.15, because: '' });
    const { passes } = answered(check, [termOf(0, ONE, [0.1, 0.1, 0.1]), termOf(1, [0, 0.5], [0, 0.5])]);
    expect(passes.map((margin) => margin !== null)).toEqual([true, false, false, false, false, false]);
    expect(check.calls.whole).toBe(6);
  });

  it('is part by part what it is by combinations', () => {
    const terms = [termOf(0, ONE, [0.1, 0.1, 0.1]), termOf(1, [0, 0.5], [0, 0.5])];
    const check = sumCheck({ required: 0.15, because: '' });
    const codesIn = (trait: number): Int32Array => Int32Array.from(PARTS.map((codes) => codes[trait] ?? 0));
    const view = { size: 2 * PARTS.length, segment: PARTS.length, codes: (trait: string, _: number, into: Int32Array) => into.set(codesIn(TRAITS.indexOf(trait as Trait))) };
    const question = partByPart(DEMANDS, { check: check.sealed, terms, view });
    const columns = [0, 1].map(codesIn);
    const into = new Int32Array(PARTS.length);
    for (const first of [0, PARTS.length]) {
      question.classify({ first, count: PARTS.length, codes: (trait) => columns[trait] ?? into }, into);
      into.forEach((answer) => question.settle?.(answer));
      expect([...into].map((answer) => question.digests.counts[answer])).toEqual([0, COUNTS.fail, COUNTS.unknown, COUNTS.fail, COUNTS.unknown, COUNTS.unknown]);
    }
    // Also of a part in a segment that was not asked about last.
    for (const first of [0, PARTS.length]) expect(PARTS.map((_, at) => question.digests.pass(first + at)?.margin ?? null)).toEqual(answered(sumCheck({ required: 0.15, because: '' }), terms).passes);
    // Settled parts are not added up again; one that passes is, for what it is ranked by.
    const before = check.calls.whole;
    into.forEach((answer) => question.settle?.(answer));
    expect(check.calls.whole).toBe(before);
  });

  it('is what the DC error, both head-rooms and the phase margin are', () => {
    expect(CHECKS.filter(({ composition }) => composition !== null).map(({ id }) => id)).toEqual(['output-low', 'output-high', 'phase-margin', 'dc-error']);
    expect([Object.keys(outputLow.terms), Object.keys(dcError.terms)].map((names) => names.includes('offset'))).toEqual([true, true]);
  });
});
