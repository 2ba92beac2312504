import { describe, expect, it } from 'vitest';
import { max } from '../support/parts.js';
import { judgingBy } from '../support/judged.js';
import { dc, resistors, stageSpec } from '../support/stages.js';

const judge = judgingBy('stable-gain');
const SPEC = stageSpec('non-inverting', dc(0.1, 0.3), { resistors: resistors(70e3, 10e3) });
const LOWER = 1 + (7 * 0.99) / 1.01;

describe('minimum stable gain', () => {
  it.each([[LOWER - 0.001, 'pass'], [LOWER, 'pass'], [LOWER + 0.001, 'fail']])('noise gain 7.861 at its lower corner against %f: %s', (gain, outcome) => {
    const verdict = judge(SPEC, [max('minimumStableGain', gain)]);
    expect(verdict).toMatchObject({ outcome, offered: gain, sense: 'at-most', basis: 'guaranteed' });
    expect(verdict.required).toBeCloseTo(LOWER, 12);
  });

  it('is unity where none is known: assumed, and it passes a follower exactly', () => {
    expect(judge(stageSpec('follower', dc(1, 2)), [])).toMatchObject({ outcome: 'pass', required: 1, offered: 1, basis: 'assumed' });
  });
});
