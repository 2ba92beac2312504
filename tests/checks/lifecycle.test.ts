import { describe, expect, it } from 'vitest';
import { judgingBy, verdictOrNull } from '../support/judged.js';
import { dc, stageSpec } from '../support/stages.js';

const judge = judgingBy('lifecycle');
const SPEC = stageSpec('follower', dc(1, 2), { wishes: { lifecycle: ['active', 'preliminary'] } });

describe('lifecycle', () => {
  it('must be one of those wanted', () => {
    expect(judge(SPEC, [], { identity: { lifecycle: 'active' } })).toMatchObject({ outcome: 'pass', required: ['active', 'preliminary'], offered: 'active', sense: 'one-of' });
    expect(judge(SPEC, [], { identity: { lifecycle: 'obsolete' } })).toMatchObject({ outcome: 'fail', offered: 'obsolete' });
  });

  it('is undecided where the list has none', () => {
    expect(judge(SPEC, [])).toMatchObject({ outcome: 'unknown', reason: 'missing-figure', missing: [{ figure: 'lifecycle', kind: null }] });
  });

  it('is not judged of a generic set: a class, not something to order', () => {
    expect(verdictOrNull('lifecycle', SPEC, [], { identity: { tier: 'generic', lifecycle: 'obsolete' } })).toBeNull();
  });

  it('is not asked unless wished', () => {
    expect(verdictOrNull('lifecycle', stageSpec('follower', dc(1, 2)), [])).toBeNull();
  });
});
