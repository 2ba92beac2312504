import { describe, expect, it } from 'vitest';
import { byCapacitiveLoad } from '../../src/checks/phase-margin-capacitive-load.js';
import type { PhaseMarginDemand } from '../../src/demands/index.js';
import type { Reading } from '../../src/parts/reading.js';
import { secondPoleForPhaseMargin } from '../../src/formulas/two-pole-loop.js';
import { dc, demandsOf, resistors, stageSpec, value } from '../support/stages.js';

function asked(farad: number, degrees?: number): PhaseMarginDemand {
  const limits = degrees === undefined ? {} : { phaseMargin: value(degrees) };
  return demandsOf(stageSpec('non-inverting', dc(0.1, 0.3), { resistors: resistors(70e3, 10e3, 0), load: { to: 'ground', capacitance: value(farad) }, limits }))['phase-margin']!;
}

const stated = (farad: number, slot = 'capacitiveLoad.max'): Reading => ({ value: farad, printed: farad, kind: 'max', basis: 'guaranteed', slot, how: null });
const FREE = { margin: 90, basis: 'guaranteed' } as const;

describe('a stated capacitive load', () => {
  it('grows with the noise gain it is used at', () => {
    expect(byCapacitiveLoad(asked(800e-12), stated(100e-12), FREE)).toMatchObject({ kind: 'numbers', required: 800e-12, offered: expect.closeTo(800e-12, 20) as number, unit: 'F', turnsAt: { figure: 'capacitiveLoad' } });
    expect(byCapacitiveLoad(asked(801e-12), stated(100e-12), FREE)).toBeNull();
  });

  it('starts from the gain it is stated at, where that is not unity', () => {
    expect(byCapacitiveLoad(asked(400e-12), stated(100e-12, 'capacitiveLoad.max@G2'), FREE)?.offered).toBeCloseTo(400e-12, 20);
    // Not less than stated: at a smaller gain than stated nothing is known, and the demand is met or not by the figure itself.
    expect(byCapacitiveLoad(asked(401e-12), stated(100e-12, 'capacitiveLoad.max@V5,G2'), FREE)).toBeNull();
  });

  it('stands for 45° and no more', () => {
    expect(byCapacitiveLoad(asked(1e-12, 46), stated(100e-12), FREE)).toBeNull();
    expect(byCapacitiveLoad(asked(1e-12, 30), stated(100e-12), FREE)).not.toBeNull();
  });

  it('shrinks by what the input-capacitance pole takes of the phase', () => {
    const offered = byCapacitiveLoad(asked(1e-12), stated(100e-12), { margin: 80, basis: 'derated' });
    expect(offered).toMatchObject({ basis: 'derated' });
    expect(offered!.offered / (800e-12 * (secondPoleForPhaseMargin(1, 45) / secondPoleForPhaseMargin(1, 55)))).toBeCloseTo(1, 9);
    expect(byCapacitiveLoad(asked(1e-12), stated(100e-12), { margin: 45, basis: 'derated' })).toBeNull();
  });

  it('decides nothing when it is not known', () => {
    expect(byCapacitiveLoad(asked(1e-12), null, FREE)).toBeNull();
  });
});
