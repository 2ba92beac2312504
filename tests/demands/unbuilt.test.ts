import { expect, it } from 'vitest';
import { dc, demandsOf, load, stageSpec, value } from '../support/stages.js';

it('every limit whose check is not built is a demand, so that it never passes silently', () => {
  const limits = { phaseMargin: value(45), outputNoise: value(3e-4), distortion: value(3e-4), settling: { within: value(2e-5), to: value(1e-3) } };
  const { unbuilt } = demandsOf(stageSpec('follower', dc(1, 2), { limits, avoid: ['crossover', 'clamp'] }));
  expect(unbuilt.map(({ check, required, sense }) => [check, required, sense])).toEqual([
    ['phase-margin', 45, 'at-least'], ['noise', 3e-4, 'at-most'], ['distortion', 3e-4, 'at-most'], ['settling', 2e-5, 'at-most'],
    ['crossover', null, null], ['clamp', null, null],
  ]);
  expect(demandsOf(stageSpec('follower', dc(1, 2), { limits: { snr: value(3162) } })).unbuilt).toMatchObject([{ check: 'noise', sense: 'at-least' }]);
  // A load capacitance alone is an assumption that is printed, not a limit.
  expect(demandsOf(stageSpec('follower', dc(1, 2), { load: load(1e3, 'ground', 1e-10) })).unbuilt).toEqual([]);
});
