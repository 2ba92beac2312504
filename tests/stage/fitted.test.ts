import { describe, expect, it } from 'vitest';
import { contradictionCodes, dc, fourResistors, legs, midSupply, resistors, source, stageOf, stageSpec, swing, value } from '../support/stages.js';

const fitted = (spec: Parameters<typeof stageOf>[0]): { feedback: number; input: number } => stageOf(spec).resistors!;

describe('resistors as fitted', () => {
  it('are those written, and they rule the gain', () => {
    const stage = stageOf(stageSpec('non-inverting', dc(0.1, 0.2), { gain: value(8), resistors: resistors(69.8e3, 10e3) }));
    expect(stage.gain).toBeCloseTo(7.98, 12);
  });

  it('are derived exactly from the one written and the gain', () => {
    expect(fitted(stageSpec('non-inverting', dc(0.1, 0.2), { gain: value(8), resistors: { feedback: value(70e3) } })).input).toBe(10e3);
    expect(fitted(stageSpec('inverting', dc(2.4, 2.5), { gain: value(8), reference: midSupply(), resistors: { input: value(10e3) } })).feedback).toBe(80e3);
  });

  it('are chosen from E96 when none is written; the resulting gain rules and is said', () => {
    const stage = stageOf(stageSpec('inverting', dc(2.4, 2.6), { gain: value(1), reference: midSupply() }));
    expect(stage.resistors).toMatchObject({ feedback: 100e3, input: 100e3, tolerance: 0.01 });
    expect(stage.assumptions).toContain('resistors chosen from E96: feedback 100 kΩ, input 100 kΩ, gain 1 V/V');
  });

  it('keep the resistor to the reference after a change of gain; its own leg follows', () => {
    const spec = stageSpec('difference', legs(swing(2.4, 2.5), swing(2.4, 2.5)), {
      gain: value(4), keepFeedback: true, reference: midSupply(), resistors: { feedback: value(40e3), toReference: value(80e3) },
    });
    expect(stageOf(spec).resistors).toMatchObject({ feedback: 40e3, input: 10e3, toReference: 80e3, positiveInput: 20e3 });
  });
});

describe('gain and resistors both written', () => {
  const spec = (gain: number): Parameters<typeof stageOf>[0] =>
    stageSpec('inverting', dc(2.45, 2.55), { gain: value(gain), reference: midSupply(), resistors: resistors(10e3, 1e3, 0.01) });

  it('may differ by the tolerance, not by more', () => {
    expect(contradictionCodes(spec(10 / 1.0099))).toEqual([]);
    expect(contradictionCodes(spec(10 / 1.01))).toEqual([]);
    expect(contradictionCodes(spec(10 / 1.0101))).toEqual(['S203']);
  });

  it('are compared before series resistances are added', () => {
    expect(contradictionCodes({ ...spec(10), source: source(1e3) })).toEqual([]);
    expect(stageOf({ ...spec(10), source: source(1e3) }).gain).toBeCloseTo(-10 / 2, 12);
  });

  it('are refused for any topology with resistors', () => {
    const difference = stageSpec('difference', legs(swing(1, 2), swing(1, 2)), { gain: value(3), reference: midSupply(), resistors: fourResistors({ r1: 1e4, r2: 2e4, r3: 1e4, r4: 2e4 }) });
    expect(contradictionCodes(difference)).toEqual(['S203']);
  });
});
