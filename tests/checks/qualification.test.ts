import { describe, expect, it } from 'vitest';
import { judgingBy } from '../support/judged.js';
import { dc, stageSpec } from '../support/stages.js';

const judge = judgingBy('qualification');
const SPEC = stageSpec('follower', dc(1, 2), { wishes: { qualification: 'AEC-Q100 grade 1' } });

describe('qualification', () => {
  it.each([['AEC-Q100 grade 0', 'pass'], ['AEC-Q100 grade 1', 'pass'], ['aec-q100 grade 1', 'pass'], ['AEC-Q100 grade 2', 'fail'], ['none', 'fail']])(
    'at least grade 1 against %s: %s',
    (qualification, outcome) => {
      expect(judge(SPEC, [], { identity: { qualification } }).outcome).toBe(outcome);
    },
  );

  it('is undecided where the list has none, and judged of generic sets too', () => {
    expect(judge(SPEC, [])).toMatchObject({ outcome: 'unknown', reason: 'missing-figure' });
    expect(judge(SPEC, [], { identity: { tier: 'generic', qualification: 'none' } }).outcome).toBe('fail');
  });
});
