import { describe, expect, it } from 'vitest';
import type { PhotodiodeSpec, StageSpec } from '../../src/spec/spec.js';
import { buildStage, type Stage } from '../../src/stage/index.js';
import type { TransimpedanceResponse } from '../../src/stage/response.js';
import { between, contradictionCodes, midSupply, stageOf, stageSpec, swing, value, voltage } from '../support/stages.js';

const SIGNAL = { coupling: 'dc', shape: 'band-limited' } as const;
const diode = (more: Partial<PhotodiodeSpec> = {}): PhotodiodeSpec => ({ current: swing(0, 10e-6), direction: 'out-of-node', capacitance: value(50e-12), ...more });
const spec = (photodiode = diode(), more: Partial<StageSpec> = {}): StageSpec =>
  stageSpec('transimpedance', SIGNAL, { photodiode, resistors: { feedback: value(200e3), tolerance: value(0) }, reference: voltage(0.1), ...more });
const stage = (...from: Parameters<typeof spec>): Stage => stageOf(spec(...from));
const responseOf = (of: Stage): TransimpedanceResponse => of.response as TransimpedanceResponse;

describe('transimpedance stage', () => {
  it('rises by i·Rf with a current pulled out of the node and falls with one pushed in (Graeme, ch. 2)', () => {
    expect(stage().output).toEqual({ min: 0.1, max: expect.closeTo(2.1, 12) as number });
    const falling = stage(diode({ direction: 'into-node' }), { reference: voltage(2.5) });
    expect(falling.output).toEqual({ min: expect.closeTo(0.5, 12) as number, max: 2.5 });
    expect([falling.gain, falling.gainUnit, stage().gain]).toEqual([-200e3, 'V/A', 200e3]);
  });

  it('is asked below ground by a current into the node with a low reference: −1.9 V for 10 µA, 200 kΩ, 0.1 V', () => {
    expect(contradictionCodes(spec(diode({ direction: 'into-node' })))).toEqual(['S201']);
    expect(() => stage(diode({ direction: 'into-node' }))).toThrow('-1.9 V..100 mV');
  });

  it('rests both pins at the reference, noise gain 1 at DC, the feedback current from the output', () => {
    const one = stage();
    expect([one.commonMode, one.noiseGain.nominal, one.dcNoiseGain.nominal]).toEqual([{ min: 0.1, max: 0.1 }, 1, 1]);
    expect([one.seriesPositive, one.seriesNegative]).toEqual([0, 200e3]);
    for (const at of one.vertices) expect(at.networkCurrent).toBeCloseTo((at.output - 0.1) / 200e3, 15);
  });

  it('counts ambient light and the dark current, doubled per 10 K, in the largest current', () => {
    const one = stage(diode({ dark: value(1e-9), ambient: swing(1e-6, 2e-6) }), { temperature: between(-10, 65) });
    expect(responseOf(one).largestCurrent).toBeCloseTo(10e-6 + 2e-6 + 16e-9, 15);
    expect(one.output.min).toBeCloseTo(0.1 + 0.2, 12);
    expect(one.output.max).toBeCloseTo(0.1 + 200e3 * 12.016e-6, 12);
  });

  it('puts diode and feedback capacitor into its networks and its response', () => {
    const one = stage(diode(), { capacitors: { feedback: value(4e-12) } });
    expect(one.network?.minus.elements.map(({ name, value: size }) => [name, size])).toEqual([['feedback', 200e3], ['feedback capacitor', 4e-12], ['photodiode', 50e-12]]);
    expect(responseOf(one)).toMatchObject({ feedback: 200e3, inputCapacitance: 50e-12, feedbackCapacitance: 4e-12 });
    expect(responseOf(stage()).feedbackCapacitance).toBeNull();
  });

  it('solves feedback resistor (E96) and reference from signal.output, least current included', () => {
    const of = (direction: PhotodiodeSpec['direction'], current = swing(0, 10e-6)): Stage =>
      stageOf(stageSpec('transimpedance', { ...SIGNAL, output: swing(0.2, 2.2) }, { photodiode: diode({ direction, current }) }));
    expect(responseOf(of('out-of-node')).feedback).toBe(200e3);
    expect(of('out-of-node').vertices[0]?.reference).toBeCloseTo(0.2, 12);
    expect(of('into-node').vertices[0]?.reference).toBeCloseTo(2.2, 12);
    const lifted = of('out-of-node', swing(1e-6, 11e-6));
    expect(lifted.vertices[0]?.reference).toBe(0);
    expect(lifted.outputNominal.max).toBeCloseTo(2.2, 12);
    expect(of('out-of-node', swing(0, 9e-6)).gain).toBe(221e3);
  });

  it('takes signal.output beside a written resistor as a cross-check', () => {
    const of = (max: number): string[] => contradictionCodes({ ...spec(), signal: { ...SIGNAL, output: swing(0.1, max) } });
    expect([of(2.1), of(2.3)]).toEqual([[], ['S202']]);
  });

  it('offers a smaller feedback resistor when the swing is too large', () => {
    const bright = diode({ current: swing(0, 60e-6) });
    expect(contradictionCodes(spec(bright))).toEqual(['S201']);
    expect(fixOf(spec(bright))).toBe('write resistors.feedback: 78.7 kΩ');
    expect(contradictionCodes(spec(bright, { resistors: { feedback: value(78.7e3) } }))).toEqual([]);
  });

  it('does not speak of a source or of coupling, and not of a bypass that counts', () => {
    const one = stage(diode(), { reference: { ...midSupply(0, 5e3), bypass: value(1e-6) }, photodiode: diode({ current: swing(0, 1e-6) }) });
    expect(one.assumptions.filter((line) => /source|coupling|bypass/u.test(line))).toEqual([]);
  });
});

function fixOf(from: StageSpec): string | undefined {
  const built = buildStage(from);
  return built.ok ? undefined : built.problems[0]?.fix;
}
