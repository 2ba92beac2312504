import { describe, expect, it } from 'vitest';
import { ac, dc, demandsOf, fourResistors, legs, midSupply, resistors, stageSpec, swing, value } from '../support/stages.js';

describe('gain bandwidth asked', () => {
  const spec = stageSpec('non-inverting', dc(0.1, 0.3, 2e3), { resistors: resistors(70e3, 10e3) });

  it('is NG·f/√((1-ε)⁻²-1) at nominal resistors, ε 1 % by default: 7.018 NG f', () => {
    const required = demandsOf(spec)['gain-bandwidth']!.required;
    expect(required).toBeCloseTo((8 * 2e3) / Math.sqrt(0.99 ** -2 - 1), 6);
    expect(required / (8 * 2e3)).toBeCloseTo(7.018, 3);
  });

  it('follows the limit, and the vector criterion where it is asked', () => {
    const limited = (limits: object): number => demandsOf({ ...spec, limits })['gain-bandwidth']!.required;
    expect(limited({ gainError: value(0.001) })).toBeCloseTo((8 * 2e3) / Math.sqrt(0.999 ** -2 - 1), 6);
    expect(limited({ gainErrorKind: 'vector' })).toBeCloseTo(8 * 2e3 * Math.sqrt(0.01 ** -2 - 1), 6);
  });

  it('is multiplied by the margin of the team and not asked without a frequency', () => {
    expect(demandsOf({ ...spec, margins: { gainBandwidth: 2 } })['gain-bandwidth']!.required).toBeCloseTo((2 * 8 * 2e3) / Math.sqrt(0.99 ** -2 - 1), 6);
    expect(demandsOf(stageSpec('follower', dc(1, 2)))['gain-bandwidth']).toBeNull();
  });

  it('goes by the noise gain, never by |G|: a unity inverter counts 2, AC-coupled too', () => {
    const unity = stageSpec('inverting', ac(0.5, 1e3), { resistors: resistors(1e4, 1e4), reference: midSupply() });
    expect(demandsOf(unity)['gain-bandwidth']!.required).toBeCloseTo((2 * 1e3) / Math.sqrt(0.99 ** -2 - 1), 6);
  });

  it('tells of a difference stage what the vector error does to its common-mode rejection', () => {
    const of = stageSpec('difference', legs(swing(1, 2), swing(1, 2), 1e3), { resistors: fourResistors({ r1: 1e4, r2: 1e4, r3: 1e4, r4: 1e4 }), reference: midSupply() });
    expect(demandsOf(of)['gain-bandwidth']!.because).toMatch(/vector error of 14\.1 % .*common-mode rejection/u);
  });
});
