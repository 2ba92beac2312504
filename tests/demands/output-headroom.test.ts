import { describe, expect, it } from 'vitest';
import type { StageSpec } from '../../src/spec/spec.js';
import { oscillatorStage } from '../support/shaped-stages.js';
import { ac, between, dc, demandsOf, load, midSupply, resistors, stageSpec, value, voltage } from '../support/stages.js';

const follower = (more: Partial<StageSpec> = {}): StageSpec => stageSpec('follower', dc(0.2, 4.5), more);

describe('room at the rails', () => {
  it('is V+ - vo and vo - V-', () => {
    const demands = demandsOf(follower());
    expect(demands['output-high'].required).toBe(0.5);
    expect(demands['output-low'].required).toBe(0.2);
  });

  it('is the least over all vertices', () => {
    expect(demandsOf(stageSpec('follower', dc(0.2, 2.5), { supply: between(3, 4.2) }))['output-high'].required).toBe(0.5);
  });

  it('grows by the swing that may be missing and shrinks by the margin asked', () => {
    const more = { limits: { swingLoss: value(0.1) }, margins: { outputHeadroom: value(0.03) } };
    const demands = demandsOf(follower(more));
    expect(demands['output-high'].required).toBeCloseTo(0.5 + 0.1 - 0.03, 12);
    expect(demands['output-low'].required).toBeCloseTo(0.2 + 0.1 - 0.03, 12);
  });

  it('is below zero where a worst corner goes beyond the rail', () => {
    const spec = stageSpec('non-inverting', dc(0.1, 5 / 8), { resistors: resistors(70e3, 10e3) });
    expect(demandsOf(spec)['output-high'].required).toBeCloseTo(5 - (5 / 8) * (1 + (7 * 1.01) / 0.99), 12);
  });
});

describe('the current at each vertex', () => {
  const currents = (spec: StageSpec, side: 'output-low' | 'output-high'): number[] => demandsOf(spec)[side].vertices.map(({ current }) => current);

  it('counts sourcing for the high side and sinking for the low side, otherwise zero', () => {
    expect(currents(follower({ load: load(1e3) }), 'output-high')).toEqual([0.2 / 1e3, 4.5 / 1e3]);
    expect(currents(follower({ load: load(1e3) }), 'output-low')).toEqual([0, 0]);
    const up = follower({ load: load(1e3, 'supply') });
    expect(currents(up, 'output-low')).toEqual([(5 - 0.2) / 1e3, (5 - 4.5) / 1e3]);
    expect(currents(up, 'output-high')).toEqual([0, 0]);
  });

  it('includes the feedback network', () => {
    const spec = stageSpec('non-inverting', dc(1, 1), { resistors: resistors(30e3, 10e3, 0), reference: voltage(0), load: load(10e3) });
    expect(currents(spec, 'output-high')[0]).toBeCloseTo(4 / 10e3 + 4 / 40e3, 15);
  });

  it('leaves the load capacitance out: its current peaks at mid swing', () => {
    expect(currents(stageSpec('follower', dc(0.2, 4.5, 1e6), { load: load(1e3, 'ground', 1e-6) }), 'output-high')).toEqual([0.2 / 1e3, 4.5 / 1e3]);
  });
});

describe('help from the load', () => {
  const assists = (spec: StageSpec, side: 'output-low' | 'output-high'): (number | null)[] => demandsOf(spec)[side].vertices.map(({ assistingLoad }) => assistingLoad);

  it('is there on the low side with the load to ground, on the high side with it to the supply', () => {
    expect(assists(follower({ load: load(2e3) }), 'output-low')).toEqual([2e3, 2e3]);
    expect(assists(follower({ load: load(2e3) }), 'output-high')).toEqual([null, null]);
    expect(assists(follower({ load: load(2e3, 'supply') }), 'output-high')).toEqual([2e3, 2e3]);
    expect(assists(follower(), 'output-low')).toEqual([null, null]);
  });

  it('is not there at an output of 0 V: no pull; with swing to lose the output stands inside', () => {
    const at = (lowest: number, loss: number): number | null | undefined => assists(stageSpec('follower', dc(lowest, 1), { load: load(1e3), limits: { swingLoss: value(loss) } }), 'output-low')[0];
    expect(at(0, 0)).toBeNull();
    // 1 pA into 1 kΩ is 1 nV.
    expect(at(1e-9, 0)).toBeNull();
    expect(at(1.1e-9, 0)).toBe(1e3);
    expect(at(0, 0.01)).toBe(1e3);
  });

  it('needs the whole current to pull the same way, feedback included', () => {
    // Inverting with a stiff 2 V reference at an output of 0.1 V: the network pulls up with 1.9 V/10 kΩ = 190 µA.
    const spec = (ohms: number): StageSpec => stageSpec('inverting', dc(3.9, 3.9), { resistors: resistors(10e3, 10e3, 0), reference: voltage(2), load: load(ohms) });
    expect(assists(spec(1e3), 'output-low')[0]).toBeNull();
    expect(assists(spec(500), 'output-low')[0]).toBe(500);
  });

  it('goes by the reference of the vertex where the load goes there', () => {
    const spec = stageSpec('inverting', ac(1), { resistors: resistors(10e3, 10e3, 0), reference: midSupply(), load: load(1e3, 'reference') });
    expect(assists(spec, 'output-low').filter((one) => one !== null)).toHaveLength(2);
  });
});

describe('the offset', () => {
  it('is charged at the upper corner of the DC noise gain over the largest distance from 25 °C', () => {
    const spec = stageSpec('non-inverting', dc(0.1, 0.3), { resistors: resistors(70e3, 10e3), temperature: between(-20, 60) });
    expect(demandsOf(spec)['output-low'].noiseGain).toBeCloseTo(1 + (7 * 1.01) / 0.99, 12);
    expect(demandsOf(spec)['output-low'].kelvin).toBe(45);
  });
});

describe('the output of an oscillator', () => {
  it('must reach the levels of the logic it drives, and says so', () => {
    const demands = demandsOf(oscillatorStage(1e3, { supply: between(4, 5) }));
    expect(demands['output-high'].required).toBeCloseTo(0.3 * 4, 12);
    expect(demands['output-low'].required).toBeCloseTo(0.3 * 4, 12);
    expect(demands['output-high'].because).toBe('the high level of the logic it drives, 3.5 V at most, least room on a supply of 4 V');
    expect(demands['output-low'].because).toMatch(/^the low level of the logic it drives, 1\.2 V at least/u);
  });
});
