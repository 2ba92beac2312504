import fc from 'fast-check';
import { expect, it } from 'vitest';
import { STANDS, type AnyNumbers } from '../../src/checks/index.js';
import type { TermQuestion } from '../../src/screening/composed-question.js';
import { DecisionTree } from '../../src/screening/decision-tree.js';
import { numberTables } from '../../src/screening/number-tables.js';
import { BriefNumbers } from '../../src/verdicts/brief-finding.js';

type Pair = readonly [number, number];

/** A check that adds up what both its terms write: the first one number, the second two. */
const ADDING: AnyNumbers = {
  terms: [
    { width: 1, write: (one, { row, at }) => void (row[at] = one as number) },
    { width: 2, write: (one, { row, at }) => row.set(one as Pair, at) },
  ],
  finding: (row) => (Number.isNaN(row[0]) ? null : new BriefNumbers({ required: 1, unit: 'V', sense: 'at-most' }, 'guaranteed', { offered: (row[0] ?? 0) + (row[1] ?? 0) * (row[2] ?? 0), borrowed: 0 })),
  stands: (row) => (Number.isNaN(row[0]) ? STANDS.untold : (row[0] ?? 0) + (row[1] ?? 0) * (row[2] ?? 0) <= 1 ? STANDS.passes : STANDS.fails),
};

function question(worst: unknown[], best: unknown[]): TermQuestion {
  const never = (): never => { throw new Error('not asked here'); };
  return { worst, best, tree: new DecisionTree(() => null), looksAtTraits: false, codes: never, answer: never };
}

it('the numbers of a part are those of its answers, in either outlook, also of answers that came later', () => {
  const singles = fc.array(fc.tuple(fc.integer(), fc.boolean()), { minLength: 1, maxLength: 200 });
  const pairs = fc.array(fc.tuple(fc.integer({ max: 1000 }), fc.integer({ max: 1000 }), fc.boolean()), { minLength: 1, maxLength: 200 });
  fc.assert(fc.property(singles, pairs, fc.array(fc.tuple(fc.nat(), fc.nat()), { minLength: 1, maxLength: 50 }), (ones, twos, parts) => {
    const first = question([], []);
    const second = question([], []);
    const tables = numberTables(ADDING, [first, second]);
    const columns = [Int32Array.from(parts, ([one]) => one % ones.length), Int32Array.from(parts, ([, two]) => two % twos.length)];
    parts.forEach((_, place) => {
      // Answers are there only when a part has them.
      const [a, b] = [columns[0]?.[place] ?? 0, columns[1]?.[place] ?? 0];
      for (let at = first.worst.length; at <= a; at += 1) push(first, ones[at]![0], ones[at]![1] ? ones[at]![0] : ones[at]![0] + 1);
      for (let at = second.worst.length; at <= b; at += 1) {
        const pair: Pair = [twos[at]![0], twos[at]![1]];
        push(second, pair, twos[at]![2] ? pair : [pair[0], pair[1] + 1]);
      }
      const found = tables.findings(columns, place);
      const [[one, same], [x, y, alike]] = [ones[a]!, twos[b]!];
      expect(found?.pessimistic).toMatchObject({ offered: one + x * y });
      expect(found?.optimistic).toMatchObject({ offered: (same ? one : one + 1) + x * (alike ? y : y + 1) });
      expect(found?.optimistic === found?.pessimistic).toBe(same && alike);
      const standing = (offered: number): number => (offered <= 1 ? STANDS.passes : STANDS.fails);
      expect(tables.stands(columns, place)).toEqual({ worst: standing(one + x * y), best: standing((same ? one : one + 1) + x * (alike ? y : y + 1)) });
    });
  }));
});

it('a part that numbers do not tell has none, in either outlook', () => {
  const tables = numberTables(ADDING, [question([NaN, 1], [1, NaN]), question([[0, 0]], [[0, 0]])]);
  const columns = [Int32Array.of(0, 1), Int32Array.of(0, 0)];
  for (const place of [0, 1]) {
    expect(tables.findings(columns, place)).toBeNull();
    expect(tables.stands(columns, place).worst).toBe(STANDS.untold);
  }
});

function push({ worst, best }: TermQuestion, low: unknown, high: unknown): void {
  (worst as unknown[]).push(low);
  (best as unknown[]).push(high);
}
