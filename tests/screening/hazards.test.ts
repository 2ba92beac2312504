import { describe, expect, it } from 'vitest';
import type { Figure } from '../../src/parts/figures.js';
import { hazardsOf } from '../../src/screening/hazards.js';
import type { PartHazard } from '../../src/screening/index.js';
import type { StageSpec } from '../../src/spec/spec.js';
import { genericSet } from '../support/generic-list.js';
import { amperes, FULL, max, min, ohms, partOf, typ } from '../support/parts.js';
import { between, dc, demandsOf, midSupply, resistors, stageSpec, value } from '../support/stages.js';

// Follower on 3..4.2 V, 1..2 V at its input: 1 V to 3.2 V below V+.
const FOLLOWER = stageSpec('follower', dc(1, 2), { supply: between(3, 4.2) });
const SINKING = { ...FOLLOWER, load: { resistance: value(10e3), to: 'supply' as const } };
const SOURCING = { ...FOLLOWER, load: { resistance: value(10e3), to: 'ground' as const } };

const hazards = (spec: StageSpec, figures: readonly Figure[], words: Parameters<typeof partOf>[1] = {}): PartHazard[] => hazardsOf(partOf(figures, words), demandsOf(spec));
const crossing = (nearer: number, farther: number, spec = FOLLOWER): PartHazard[] => hazards(spec, [min('inputCrossover', nearer), max('inputCrossover', farther)]);

describe('words', () => {
  it('raise a hazard only when they say yes', () => {
    expect(hazards(FOLLOWER, FULL, { phaseReversal: true, inputClamp: true })).toEqual([{ kind: 'phase-reversal' }, { kind: 'clamp' }]);
    expect(hazards(FOLLOWER, FULL, { phaseReversal: false, inputClamp: false })).toEqual([]);
    expect(hazards(FOLLOWER, FULL)).toEqual([]);
  });

  it('raise no phase reversal where the pins rest at the reference; diodes conduct there too', () => {
    const inverting = stageSpec('inverting', dc(1, 2), { resistors: resistors(1e4, 1e4, 0), reference: midSupply() });
    const quirks = { phaseReversal: true, inputClamp: true };
    expect(hazards(inverting, FULL, quirks)).toEqual([{ kind: 'clamp' }]);
    const nonInverting = stageSpec('non-inverting', dc(1, 2), { resistors: resistors(1e4, 1e4, 0) });
    expect(hazards(nonInverting, FULL, quirks)).toEqual([{ kind: 'phase-reversal' }, { kind: 'clamp' }]);
  });
});

describe('crossover', () => {
  it('is told with both distances below V+, as the corners have them', () => {
    expect(crossing(0.8, 1.3)).toEqual([{ kind: 'crossover', region: { min: 0.8, max: 1.3 }, inputs: { min: 1, max: 3.2 }, moves: true, frequency: null, step: null }]);
  });

  it('starts where the inputs enter the region, and not at its edge', () => {
    expect(crossing(0.5, 0.999)).toEqual([]);
    expect(crossing(0.5, 1)).toEqual([]);
    expect(crossing(0.5, 1.001)).toHaveLength(1);
    expect(crossing(3.199, 3.5)).toHaveLength(1);
    expect(crossing(3.2, 3.5)).toEqual([]);
  });

  it('counts the reference of an inverting stage, which stands still', () => {
    const inverting = stageSpec('inverting', dc(1, 2), { resistors: resistors(1e4, 1e4, 0), reference: midSupply() });
    expect(crossing(0.8, 1.3, inverting)).toEqual([]);
    expect(crossing(2.4, 2.6, inverting)).toMatchObject([{ kind: 'crossover', inputs: { min: 2.5, max: 2.5 } }]);
  });

  it('needs both ends', () => expect(hazards(FOLLOWER, [min('inputCrossover', 1.1)])).toEqual([]));
});

describe('sink limit', () => {
  const CLIFF = [max('outputLowHeadroom', 0.02, amperes(30e-6, 5)), max('outputLowHeadroom', 0.9, amperes(50e-6, 5)), max('outputLowHeadroom', 0.95, amperes(10e-3, 5))];

  it('is the row before a step that no resistance makes', () => {
    expect(hazards(SINKING, CLIFF)).toEqual([{ kind: 'sink-limit', current: 30e-6, within: 0.02, beyond: 0.9 }]);
  });

  it('is no hazard where the load pulls down or nothing flows', () => {
    expect(hazards(SOURCING, CLIFF)).toEqual([]);
    expect(hazards(FOLLOWER, CLIFF)).toEqual([]);
  });

  it('is not seen in an output that loses with its current', () => {
    expect(hazards(SINKING, FULL)).toEqual([]);
    const [light, heavy] = [max('outputLowHeadroom', 0.02, amperes(1e-4, 5)), (volts: number) => max('outputLowHeadroom', volts, amperes(1e-3, 5))];
    expect(hazards(SINKING, [light, heavy(0.6)])).toEqual([]);
    expect(hazards(SINKING, [light, heavy(0.601)])).toHaveLength(1);
  });

  it('leaves rows out whose load helps, and reads the supply nearest to the stage', () => {
    const helped = max('outputLowHeadroom', 0.001, ohms(10e3, 'ground', 5));
    const far = [typ('outputLowHeadroom', 0.01, amperes(10e-6, 30)), typ('outputLowHeadroom', 2, amperes(11e-6, 30))];
    expect(hazards(SINKING, [helped, ...CLIFF, ...far])).toEqual([{ kind: 'sink-limit', current: 30e-6, within: 0.02, beyond: 0.9 }]);
  });
});

describe('generic sets', () => {
  const kinds = (id: string, spec: StageSpec): string[] => hazardsOf(genericSet(id), demandsOf(spec)).map(({ kind }) => kind);
  it.each([
    ['GX-BIP-GS', ['phase-reversal', 'sink-limit']],
    ['GX-BIP-GS-FINE', ['sink-limit']],
    ['GX-BIP-GS-ECO', ['phase-reversal', 'sink-limit']],
    ['GX-BIP-MICRO', ['clamp', 'crossover']],
    ['GX-CMOS-1M-RRIO', ['crossover']],
    ['GX-CMOS-1M-GS', []],
    ['GX-CMOS-20M-NX', []],
  ])('%s brings its quirks to a stage that meets them', (id, expected) => expect(kinds(id, SINKING)).toEqual(expected));

  it('have a step at the bottom only in the ground-sensing bipolars', () => {
    const parts = ['GX-BIP-CONV', 'GX-HV-CMOS', 'GX-HV-ZD', 'GX-CMOS-10M-RRIO', 'GX-NANO', 'GX-BIP-LN', 'GX-DRIVE', 'GX-CMOS-MICRO-1V2'];
    for (const id of parts) expect(kinds(id, SINKING), id).not.toContain('sink-limit');
  });
});
