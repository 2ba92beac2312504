import { describe, expect, it } from 'vitest';
import type { Figure } from '../../src/parts/figures.js';
import { hazardsOf } from '../../src/screening/hazards.js';
import type { PartHazard } from '../../src/screening/index.js';
import type { StageSpec } from '../../src/spec/spec.js';
import { FULL, max, min, partOf, replacing } from '../support/parts.js';
import { judged } from '../support/judged.js';
import { between, dc, demandsOf, midSupply, resistors, stageSpec, value } from '../support/stages.js';

const hazards = (spec: StageSpec, figures: readonly Figure[] = FULL, words: Parameters<typeof partOf>[1] = {}): PartHazard[] => hazardsOf(partOf(figures, words), demandsOf(spec));
const follower = (more: Partial<StageSpec> = {}): StageSpec => stageSpec('follower', dc(1, 2), more);
const kinds = (...of: Parameters<typeof hazards>): string[] => hazards(...of).map(({ kind }) => kind);

describe('an input that can leave the rails', () => {
  const driven = follower({ overdrive: value(0.5) });
  it('is told with what the inputs endure, and how long the output needs to recover', () => {
    expect(hazards(driven, [...FULL, max('inputOverdrive', 0.3), max('overloadRecovery', 1e-5)], { phaseReversal: false })).toEqual([
      { kind: 'overdrive', beyond: 0.5, endures: 0.3 },
      { kind: 'recovery', time: 1e-5 },
    ]);
    expect(kinds(driven, [...FULL, max('inputOverdrive', 0.5)], { phaseReversal: false })).toEqual(['recovery']);
  });

  it('names what is not known', () => {
    expect(hazards(driven)).toEqual([{ kind: 'reversal-unknown' }, { kind: 'overdrive', beyond: 0.5, endures: null }, { kind: 'recovery', time: null }]);
  });

  it('reverses no phase where the pins rest', () => {
    const inverting = stageSpec('inverting', dc(1, 2), { resistors: resistors(1e4, 1e4, 0), reference: midSupply(), overdrive: value(0.5) });
    expect(kinds(inverting)).not.toContain('reversal-unknown');
  });

  it('ends the caution of phase reversal where the stage rules it out', () => {
    const safe = follower({ overdrive: value(0), sequencing: 'supply-first' });
    expect(kinds(safe, FULL, { phaseReversal: true })).toEqual([]);
    expect(kinds(follower(), FULL, { phaseReversal: true })).toEqual(['phase-reversal']);
  });
});

describe('what the stage avoids', () => {
  const figures = [...FULL, min('inputCrossover', 0.8), max('inputCrossover', 1.3)];
  const quirks = { phaseReversal: true, inputClamp: true };
  const spec = follower({ supply: between(3, 4.2), overdrive: value(0.5) });

  it('is a verdict and no caution', () => {
    const avoiding = { ...spec, avoid: ['crossover', 'phase-reversal', 'clamp', 'overdrive'] as const };
    expect(kinds(avoiding, figures, quirks)).toEqual(['recovery']);
    expect(judged(avoiding, figures, { identity: quirks }).outcome).toBe('does-not-fit');
  });

  it('decides nothing when it is not avoided', () => {
    expect(kinds(spec, figures, quirks)).toEqual(['phase-reversal', 'clamp', 'crossover', 'overdrive', 'recovery']);
    const { verdicts } = judged(spec, figures, { identity: quirks });
    expect(verdicts.map(({ check }) => check).filter((check) => ['crossover', 'phase-reversal', 'clamp', 'overdrive'].includes(check))).toEqual([]);
  });
});

describe('a step', () => {
  const stepping = stageSpec('follower', { ...dc(1, 2), shape: 'step' });
  it('takes the inputs apart: told where it is not known whether diodes join them', () => {
    expect(hazards(stepping)).toEqual([{ kind: 'clamp-unknown', apart: 1 }]);
    expect(hazards(stepping, FULL, { inputClamp: false })).toEqual([]);
    expect(hazards(stepping, [...FULL, max('differentialInput', 5)])).toEqual([]);
    expect(hazards(follower())).toEqual([]);
  });
});

describe('ripple on the supply', () => {
  const rippling = (limit?: number): StageSpec => follower({ supplyRipple: { amplitude: value(0.01), frequency: value(1e3) }, limits: limit === undefined ? {} : { supplyRipple: value(limit) } });
  it('is told with what reaches the output, or what is missing', () => {
    const [told] = hazards(rippling(), [...FULL, min('supplyRejectionCorner', 1e6)]);
    expect(told).toMatchObject({ kind: 'ripple', frequency: 1e3 });
    expect(told?.kind === 'ripple' ? told.output : null).toBeCloseTo(1e-6, 10);
    expect(hazards(rippling(), replacing('supplyRejection'))).toMatchObject([{ kind: 'ripple', output: null, missing: [{ figure: 'supplyRejection' }] }]);
  });
  it('is judged instead with a limit', () => expect(kinds(rippling(1e-3))).toEqual([]));
});

describe('a stage that is switched off', () => {
  const sleeping = follower({ dutyCycle: { on: value(2e-3), every: value(1) } });
  it('is told what of its time the part needs to start, or that it is not known', () => {
    expect(hazards(sleeping, [...FULL, max('startUpTime', 1e-4)])).toEqual([{ kind: 'start-up', time: 1e-4, on: 2e-3, missing: [] }]);
    expect(hazards(sleeping)).toMatchObject([{ kind: 'start-up', time: null, on: 2e-3, missing: [{ figure: 'startUpTime' }] }]);
  });
  it('is judged instead with a limit', () => expect(kinds({ ...sleeping, limits: { startUp: value(1e-3) } })).toEqual([]));
});
