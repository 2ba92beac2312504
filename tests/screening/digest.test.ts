import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { COUNTS, digests, digestsByPart } from '../../src/screening/digest.js';
import type { BriefVerdict } from '../../src/verdicts/decide.js';

const number = fc.option(fc.double({ noNaN: true, noDefaultInfinity: true }));
const verdict: fc.Arbitrary<BriefVerdict> = fc.record({
  check: fc.constant('dc-error'),
  outcome: fc.constantFrom('pass', 'fail', 'unknown'),
  required: fc.constant(1),
  offered: number,
  unit: fc.constant('V'),
  margin: number,
  spare: number,
  basis: fc.constantFrom('guaranteed', 'derated', 'estimated', null),
  standsOn: fc.constantFrom('guaranteed', 'derated', 'estimated', null),
  known: number,
});

describe('digests in columns', () => {
  it('give back of every pass what the order needs, and of nothing else', () => {
    fc.assert(fc.property(fc.array(fc.option(verdict), { maxLength: 200 }), (all) => {
      const kept = digests(5);
      const answers = all.map((one) => kept.add(one));
      all.forEach((one, at) => {
        const answer = answers[at] ?? -1;
        const pass = kept.pass(answer);
        if (one?.outcome !== 'pass') expect(pass).toBeNull();
        else expect(pass).toEqual({ check: one.check, outcome: one.outcome, basis: one.basis, standsOn: one.standsOn, margin: one.margin, spare: one.spare });
        expect(kept.pass(answer)).toBe(pass);
        const added = one === null ? 0 : one.outcome === 'fail' ? COUNTS.fail : one.outcome === 'unknown' ? COUNTS.unknown : one.basis === 'guaranteed' ? 0 : COUNTS.weak;
        expect(kept.counts[answer]).toBe(added);
      });
    }));
  });

  it('keep the verdict an answer has', () => {
    fc.assert(fc.property(verdict, verdict, (first, second) => {
      const judged = [{ ...first, outcome: 'fail' }, { ...second, outcome: 'pass' }] as const;
      let asked = 0;
      const kept = digests(5, () => judged[asked++] ?? null);
      kept.settle(70);
      kept.settle(70);
      expect(asked).toBe(1);
      expect(kept.counts[70]).toBe(COUNTS.fail);
      expect(kept.pass(70)).toBeNull();
    }));
  });

  it('are the same of answers that each belong to a part', () => {
    fc.assert(fc.property(fc.array(fc.option(verdict), { minLength: 1, maxLength: 100 }), (all) => {
      const kept = digests(5);
      for (const one of all) kept.add(one);
      const byPart = digestsByPart(all.length, { nominalSupply: 5, verdictOf: (answer) => all[answer] ?? null });
      for (const at of all.keys()) {
        byPart.settle(at);
        expect([byPart.counts[at], byPart.pass(at)]).toEqual([kept.counts[at], kept.pass(at)]);
        expect(byPart.pass(at)).toBe(byPart.pass(at));
        expect(byPart.distance(at)).toBe(kept.distance(at));
        expect(kept.distance(at)).toBe(all[at]?.outcome === 'fail' ? kept.distances?.[at] : 0);
      }
    }));
  });
});
