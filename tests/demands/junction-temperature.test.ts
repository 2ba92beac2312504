import { describe, expect, it } from 'vitest';
import { listDemands } from '../../src/demands/index.js';
import { ENTRIES } from '../support/check-values.js';
import { ac, between, dc, demandsOf, load, midSupply, stageSpec, value } from '../support/stages.js';

const expected = (id: string): number => ENTRIES.find((one) => one.id === id)!.expected as number;
const junction = (spec: Parameters<typeof demandsOf>[0]) => demandsOf(spec)['junction-temperature'];

describe('junction temperature asked', () => {
  it('is listed only with a limit that is written', () => {
    const spec = stageSpec('follower', dc(1, 2), { temperature: between(0, 70) });
    expect(junction(spec)).toMatchObject({ required: null, ambient: 70 });
    expect(listDemands(demandsOf(spec)).map(({ check }) => check)).not.toContain('junction-temperature');
    const limited = { ...spec, limits: { junctionTemperature: value(110) } };
    expect(listDemands(demandsOf(limited)).find(({ check }) => check === 'junction-temperature')).toMatchObject({ required: 110, unit: '°C', sense: 'at-most' });
  });

  it('is PWR-02 and PWR-03 for a DC-coupled output that may rest anywhere', () => {
    expect(junction(stageSpec('follower', dc(0, 5), { load: load(1e3) })).output).toBeCloseTo(expected('PWR-02'), 12);
    expect(junction(stageSpec('follower', dc(0, 5), { load: load(1e3, 'reference'), reference: midSupply() })).output).toBeCloseTo(expected('PWR-03'), 12);
    // Only up to 1 V: (5 V - 1 V)·1 mA.
    expect(junction(stageSpec('follower', dc(0, 1), { load: load(1e3) })).output).toBeCloseTo(4e-3, 12);
  });

  it('averages over the worst sine up to the one asked where it is AC-coupled: VS²/(2π²RL) at VS/π (Sedra & Smith, class B)', () => {
    const of = (peak: number) => junction(stageSpec('follower', ac(peak, 1e3), { load: load(1e3, 'reference'), reference: midSupply() })).output;
    expect(of(2.5)).toBeCloseTo(25 / (2 * Math.PI ** 2 * 1e3), 12);
    // Below VS/π the largest amplitude is the worst: VS·Vp/(π·RL) − Vp²/(2RL).
    expect(of(1)).toBeCloseTo(5 / (Math.PI * 1e3) - 1 / 2e3, 12);
  });

  it('is PWR-07 for a capacitive load', () => {
    const spec = stageSpec('follower', dc(0.5, 4.5, 10e3), { load: { to: 'ground', capacitance: value(100e-9) } });
    expect(junction(spec)).toMatchObject({ output: 0 });
    expect(junction(spec).capacitive).toBeCloseTo(expected('PWR-07'), 12);
  });
});
