import { describe, expect, it } from 'vitest';
import { judgingBy, verdictOrNull } from '../support/judged.js';
import { dc, stageSpec } from '../support/stages.js';

const judge = judgingBy('package');
const SPEC = stageSpec('follower', dc(1, 2), { wishes: { package: ['SOT-23-5', 'SC-70-5'] } });

describe('package', () => {
  it('must be one of those wanted', () => {
    expect(judge(SPEC, [], { identity: { package: 'SOT-23-5' } })).toMatchObject({ outcome: 'pass', required: ['SOT-23-5', 'SC-70-5'], offered: 'SOT-23-5', sense: 'one-of' });
    expect(judge(SPEC, [], { identity: { package: 'SOIC-8' } })).toMatchObject({ outcome: 'fail', offered: 'SOIC-8' });
  });

  it('is undecided where the list has none', () => {
    expect(judge(SPEC, [])).toMatchObject({ outcome: 'unknown', reason: 'missing-figure', missing: [{ figure: 'package', kind: null }] });
  });

  it('is not judged of a generic set: a class, not something to order', () => {
    expect(verdictOrNull('package', SPEC, [], { identity: { tier: 'generic', package: 'SOIC-8' } })).toBeNull();
  });

  it('is not asked unless wished', () => {
    expect(verdictOrNull('package', stageSpec('follower', dc(1, 2)), [])).toBeNull();
  });
});
