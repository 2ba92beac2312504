import { expect, it } from 'vitest';
import { seal } from '../../src/checks/check.js';
import { slewRate } from '../../src/checks/slew-rate.js';
import { readingsOf } from '../../src/parts/readings.js';
import { under } from '../support/parts.js';
import { dc, demandsOf, stageSpec } from '../support/stages.js';

it('a sealed check asks its own question and has no finding when the stage asks nothing', () => {
  const sealed = seal(slewRate);
  const silent = demandsOf(stageSpec('follower', dc(1, 2)));
  expect([sealed.isAsked(silent), sealed.judge(silent, readingsOf(under([])))]).toEqual([false, null]);
  const asking = demandsOf(stageSpec('follower', dc(1, 2, 1e3)));
  expect(sealed.isAsked(asking)).toBe(true);
  expect(sealed.judge(asking, readingsOf(under([])))).toMatchObject({ kind: 'undecided', cause: 'missing-figure' });
});
