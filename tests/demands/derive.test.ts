import { expect, it } from 'vitest';
import { listDemands } from '../../src/demands/index.js';
import { dc, demandsOf, stageSpec } from '../support/stages.js';

it('a stage that writes no limit asks what every stage asks, each with its figures and its source', () => {
  const demands = demandsOf(stageSpec('follower', dc(1, 2)));
  const listed = listDemands(demands);
  expect(listed.map(({ check }) => check)).toEqual([
    'supply-low', 'supply-high', 'supply-peak', 'input-low', 'input-high', 'output-low', 'output-high', 'output-current', 'stable-gain', 'temperature-low', 'temperature-high',
  ]);
  for (const { because, source } of listed) expect([because.length > 0, source.length > 0]).toEqual([true, true]);
  expect(demands.operating).toEqual({ coldest: 25, hottest: 25, nominalSupply: 5 });
});
