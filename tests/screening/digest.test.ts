import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { COUNTS, digests } from '../../src/screening/digest.js';
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
      const kept = digests(5);
      kept.settle(70, () => ({ ...first, outcome: 'fail' }));
      kept.settle(70, () => ({ ...second, outcome: 'pass' }));
      expect(kept.counts[70]).toBe(COUNTS.fail);
      expect(kept.pass(70)).toBeNull();
    }));
  });
});
