import { expect, it } from 'vitest';
import { CHECK_IDS, listDemands } from '../../src/demands/index.js';
import { dc, demandsOf, stageSpec, value } from '../support/stages.js';

it('demands are listed in the order of the checks, those not built among them', () => {
  const limits = { dcError: value(0.02), supplyCurrent: value(8e-5), phaseMargin: value(45), settling: { within: value(2e-5), to: value(1e-3) } };
  const listed = listDemands(demandsOf(stageSpec('follower', dc(1, 2, 1e3), { limits, wishes: { channels: 1 } }))).map(({ check }) => check);
  expect(listed).toEqual([
    'supply-low', 'supply-high', 'supply-peak', 'input-low', 'input-high', 'output-low', 'output-high', 'output-current', 'slew-rate', 'gain-bandwidth',
    'stable-gain', 'phase-margin', 'dc-error', 'settling', 'supply-current', 'temperature-low', 'temperature-high', 'channels',
  ]);
  expect(listed).toEqual(CHECK_IDS.filter((id) => listed.includes(id)));
});
