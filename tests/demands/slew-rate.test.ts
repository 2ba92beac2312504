import { describe, expect, it } from 'vitest';
import { coupled, dc, demandsOf, fourResistors, midSupply, resistors, stageSpec, swing } from '../support/stages.js';

describe('slew rate asked', () => {
  const spec = stageSpec('non-inverting', dc(0.1, 0.3, 2e3), { resistors: resistors(70e3, 10e3) });
  const peak = 0.1 * (1 + (7 * 1.01) / 0.99);

  it('is 2π·f·Vp: half the output span at one corner, gain at its upper tolerance', () => {
    expect(demandsOf(spec)['slew-rate']!.required).toBeCloseTo(2 * Math.PI * 2e3 * peak, 8);
  });

  it('is multiplied by the margin of the team', () => {
    expect(demandsOf({ ...spec, margins: { slewRate: 1.5 } })['slew-rate']!.required).toBeCloseTo(1.5 * 2 * Math.PI * 2e3 * peak, 8);
  });

  it('is not asked without a frequency, and 0 of a signal that does not move', () => {
    expect(demandsOf(stageSpec('follower', dc(1, 2)))['slew-rate']).toBeNull();
    expect(demandsOf(stageSpec('follower', dc(1, 1, 1e3)))['slew-rate']!.required).toBe(0);
  });

  it('is the largest half span over the resistor corners of a difference stage', () => {
    const t = 0.01;
    const of = stageSpec('difference', coupled(swing(-0.2, 0.2), swing(2, 3), 1e3), { resistors: fourResistors({ r1: 1e4, r2: 1e4, r3: 1e4, r4: 1e4 }, t), reference: midSupply() });
    const ends = [(1 - t) / (1 + t), (1 + t) / (1 - t)];
    const spans = ends.flatMap((rho) =>
      ends.map((k) => {
        const out = (d: number, c: number): number => ((c + d / 2) * k * (1 + rho)) / (1 + k) - (c - d / 2) * rho;
        const all = [out(-0.2, 2), out(-0.2, 3), out(0.2, 2), out(0.2, 3)];
        return (Math.max(...all) - Math.min(...all)) / 2;
      }),
    );
    expect(demandsOf(of)['slew-rate']!.required).toBeCloseTo(2 * Math.PI * 1e3 * Math.max(...spans), 8);
  });
});
