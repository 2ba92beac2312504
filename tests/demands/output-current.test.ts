import { describe, expect, it } from 'vitest';
import type { StageSpec } from '../../src/spec/spec.js';
import { BUTTERWORTH, filterStage, step } from '../support/shaped-stages.js';
import { between, dc, demandsOf, load, midSupply, resistors, stageSpec, ac } from '../support/stages.js';

describe('peak output current', () => {
  it('is the DC current at the centre plus the phasor sum of the AC ones', () => {
    const demand = demandsOf(stageSpec('follower', dc(1, 4, 100e3), { load: load(1e3, 'ground', 10e-9) }))['output-current'];
    expect(demand.required).toBeCloseTo(2.5 / 1e3 + Math.hypot(1.5 / 1e3, 2 * Math.PI * 100e3 * 10e-9 * 1.5), 12);
    expect(demand).toMatchObject({ sense: 'at-least', unit: 'A' });
  });

  it('is asked by each direction: sourced DC + AC, sunk AC - DC', () => {
    const { peaks } = demandsOf(stageSpec('follower', dc(1, 4, 1e6), { load: load(1e3, 'ground', 10e-9) }))['output-current'];
    const swing = Math.hypot(1.5 / 1e3, 2 * Math.PI * 1e6 * 10e-9 * 1.5);
    expect(peaks.map(({ side }) => side)).toEqual(['high', 'low']);
    expect(peaks[0]?.amperes).toBeCloseTo(swing + 2.5e-3, 12);
    expect(peaks[1]?.amperes).toBeCloseTo(swing - 2.5e-3, 12);
  });

  it('has no direction in which nothing flows', () => {
    expect(demandsOf(stageSpec('follower', dc(1, 4), { load: load(1e3) }))['output-current'].peaks.map(({ side }) => side)).toEqual(['high']);
    expect(demandsOf(stageSpec('follower', dc(1, 4)))['output-current']).toMatchObject({ required: 0, peaks: [] });
  });

  it('is taken at nominal resistors, at every supply and reference', () => {
    const demand = demandsOf(stageSpec('inverting', ac(0.5), { supply: between(4, 6), resistors: resistors(20e3, 10e3), reference: midSupply(), load: load(1e3) }))['output-current'];
    // Highest at 6 V: 3 V + 1 V into 1 kΩ and 1 V into the 20 kΩ of feedback.
    expect(demand.required).toBeCloseTo(4 / 1e3 + 1 / 20e3, 12);
    expect(demand.corner).toEqual({ supply: 6, reference: 3 });
  });

  it('says when the capacitance is left out for want of a frequency', () => {
    expect(demandsOf(stageSpec('follower', dc(1, 4), { load: load(1e3, 'ground', 1e-9) }))['output-current'].because).toBe(
      '4 mA out of the output at the peak, feedback network included, resistors nominal; neither frequency nor edge, so the load capacitance is left out',
    );
  });

  it('says whether what C1 of a Sallen-Key filter takes is counted', () => {
    const because = (signal: StageSpec['signal']): string => demandsOf(filterStage('sallen-key-low-pass', BUTTERWORTH, { signal }))['output-current'].because;
    expect(because(dc(2, 3, 1e3))).toMatch(/what C1 takes at the top frequency too/u);
    expect(because(dc(2, 3))).toMatch(/no frequency, so what C1 takes is left out/u);
    expect(because(step(2, 3))).toMatch(/what C1 takes during the edge is left out/u);
  });
});
