import { expect, it } from 'vitest';
import { dc, demandsOf, stageSpec, value } from '../support/stages.js';

it('supply current is asked per amplifier unless the package is meant, and not without a limit', () => {
  const of = (limits: object): ReturnType<typeof demandsOf>['supply-current'] => demandsOf(stageSpec('follower', dc(1, 2), { limits }))['supply-current'];
  expect(of({})).toBeNull();
  expect(of({ supplyCurrent: value(80e-6) })).toMatchObject({ required: 80e-6, per: 'amplifier', sense: 'at-most' });
  expect(of({ supplyCurrent: value(80e-6), supplyCurrentPer: 'package' })).toMatchObject({ per: 'package', because: 'supply current 80 µA allowed per package' });
});
