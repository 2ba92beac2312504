import { expect, it } from 'vitest';
import { oscillatorStage } from '../support/shaped-stages.js';
import { dc, demandsOf, load, stageSpec, value } from '../support/stages.js';

it('every limit whose check is not built, or not for this topology, is a demand, so that it never passes silently', () => {
  const limits = { distortion: value(3e-4), settling: { within: value(2e-5), to: value(1e-3) }, frequencyError: value(0.01) };
  const of = (spec: Parameters<typeof demandsOf>[0]) => demandsOf(spec).unbuilt.map(({ check, required, sense }) => [check, required, sense]);
  expect(of(oscillatorStage(1e3, { limits }))).toEqual([['distortion', 3e-4, 'at-most'], ['settling', 2e-5, 'at-most']]);
  expect(of(oscillatorStage(1e3, { limits: { phaseMargin: value(45), outputNoise: value(3e-4) } }))).toEqual([['phase-margin', 45, 'at-least'], ['noise', 3e-4, 'at-most']]);
  expect(of(oscillatorStage(1e3, { limits: { snr: value(3162) } }))).toEqual([['noise', 3162, 'at-least']]);
  expect(of(stageSpec('follower', dc(1, 2), { limits, avoid: ['crossover', 'clamp'] }))).toEqual([['frequency-error', 0.01, 'at-most']]);
  // A load capacitance alone is an assumption that is printed, not a limit.
  expect(of(stageSpec('follower', dc(1, 2), { load: load(1e3, 'ground', 1e-10) }))).toEqual([]);
});
