import { describe, expect, it } from 'vitest';
import { worstMargin, type Loop } from '../../src/checks/phase-margin-loop.js';
import { phaseMarginRemedies, type ShortLoop } from '../../src/checks/phase-margin-remedies.js';
import { withFeedbackCapacitor, type PhaseMarginDemand } from '../../src/demands/index.js';
import { published } from '../support/check-values.js';
import { dc, demandsOf, resistors, stageSpec, value } from '../support/stages.js';

const ENDS = { least: 0.6e6, most: 1e6 };

function asked(required: number, frequency?: number): PhaseMarginDemand {
  const spec = stageSpec('non-inverting', dc(0.1, 0.3, frequency), { resistors: resistors(100e3, 100e3), limits: { phaseMargin: value(required) } });
  return demandsOf(spec)['phase-margin']!;
}

function short(required: number, more: Partial<Loop>, frequency?: number): ShortLoop {
  const question = asked(required, frequency);
  return { asked: question, ends: ENDS, loop: { network: question.network, open: null, inputCapacitance: 0, ownPole: Infinity, load: null, ...more } };
}

const load = (outputResistance: number, capacitance: number, resistance: number | null = null) => ({ load: { outputResistance, capacitance, resistance, isolation: 0 } });

describe('an isolation resistor', () => {
  it('is the next E24 value above the one that suffices for any load: 43 Ω for 45° behind 200 Ω', () => {
    const of = short(45, load(200, 100e-9));
    const [remedy] = phaseMarginRemedies(of, true);
    expect(remedy).toMatchObject({ path: 'load.isolation', text: '43 Ω' });
    expect(remedy!.offered >= 45).toBe(true);
  });

  // That resistor itself, by somebody else: the next value below it would not do.
  published('STB-04', (of) => {
    const ohms = of('PM_deg') === 45 ? of('Ro_ohm') * 0.5 * (Math.SQRT2 - 1) : Number.NaN;
    const at = (isolation: number): number => worstMargin({ ...short(45, {}).loop, load: { outputResistance: of('Ro_ohm'), capacitance: 20e-9, resistance: null, isolation } }, { least: 1e4, most: 1e8 }).margin;
    expect(at(ohms * 1.001)).toBeGreaterThan(of('PM_deg'));
    expect(at(ohms * 0.999)).toBeLessThan(of('PM_deg'));
    return ohms;
  });

  it('tells its cost: gain into a resistive load, and the pole at the load', () => {
    const [remedy] = phaseMarginRemedies(short(45, load(200, 100e-9, 1e3)), true);
    expect(remedy!.cost).toContain('gain error -4.12 %');
    expect(remedy!.cost).toContain('a pole at 37 kHz');
    const [bare] = phaseMarginRemedies(short(45, load(200, 100e-9)), true);
    expect(bare!.cost).not.toContain('gain error');
  });

  it('is larger where a pole of the part takes its share, and none where that alone is too much', () => {
    expect(phaseMarginRemedies(short(60, load(200, 4e-9)), true)[0]!.text).toBe('100 Ω');
    const [remedy] = phaseMarginRemedies(short(60, { ...load(200, 4e-9), ownPole: 1e6 }), true);
    expect(Number(remedy!.text.split(' ')[0])).toBeGreaterThan(110);
    expect(phaseMarginRemedies(short(60, { ...load(200, 100e-9), ownPole: 0.1e6 }), true)).toEqual([]);
  });

  it('is not offered where the load is hardly what takes the margin: it would be large, and only cost', () => {
    expect(phaseMarginRemedies(short(75, { ...load(200, 30e-12), inputCapacitance: 1.74e-12 }), false)).toEqual([]);
  });

  it('is not offered without a load', () => {
    expect(phaseMarginRemedies(short(60, { inputCapacitance: 300e-12 }, 100e3), true)).toEqual([]);
  });
});

describe('a feedback capacitor', () => {
  const LEAD = { inputCapacitance: 30e-12 };

  it('is the smallest of E24 that suffices', () => {
    const of = short(75, LEAD);
    const [remedy] = phaseMarginRemedies(of, true);
    expect(remedy!.path).toBe('capacitors.feedback');
    const picofarads = Number(remedy!.text.split(' ')[0]);
    const margin = (farad: number): number => worstMargin({ ...of.loop, network: withFeedbackCapacitor(of.loop.network, farad) }, ENDS).margin;
    expect(margin(picofarads * 1e-12)).toBeCloseTo(remedy!.offered, 9);
    expect([margin(picofarads * 1e-12) >= 75, margin(picofarads * 0.9e-12) >= 75]).toEqual([true, false]);
    expect(remedy!.cost).toContain('the gain falls from');
  });

  it('is none where the part is not stable at unity, or the band leaves no room for it', () => {
    expect(phaseMarginRemedies(short(75, LEAD), false)).toEqual([]);
    expect(phaseMarginRemedies(short(75, LEAD, 100e3), true)).toEqual([]);
  });
});
