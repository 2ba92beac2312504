import { describe, expect, it } from 'vitest';
import { judgingBy, verdictOrNull } from '../support/judged.js';
import { dc, stageSpec } from '../support/stages.js';

const judge = judgingBy('status');
const SPEC = stageSpec('follower', dc(1, 2), { wishes: { status: ['approved', 'conditional'] } });

describe('status', () => {
  it('must be one of those wanted', () => {
    expect(judge(SPEC, [], { identity: { status: 'approved' } })).toMatchObject({ outcome: 'pass', required: ['approved', 'conditional'], offered: 'approved', sense: 'one-of' });
    expect(judge(SPEC, [], { identity: { status: 'restricted' } })).toMatchObject({ outcome: 'fail', offered: 'restricted' });
  });

  it('is undecided where the list has none', () => {
    expect(judge(SPEC, [])).toMatchObject({ outcome: 'unknown', reason: 'missing-figure', missing: [{ figure: 'status', kind: null }] });
  });

  it('is not judged of a generic set: a class, not something to order', () => {
    expect(verdictOrNull('status', SPEC, [], { identity: { tier: 'generic', status: 'restricted' } })).toBeNull();
  });

  it('is not asked unless wished', () => {
    expect(verdictOrNull('status', stageSpec('follower', dc(1, 2)), [])).toBeNull();
  });
});
