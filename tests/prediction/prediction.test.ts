import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { clippedSineDistortion } from '../../src/formulas/clipping.js';
import { oscillatorPeriod } from '../../src/formulas/oscillator.js';
import { settlingTime } from '../../src/formulas/settling.js';
import { slewedDistortion, slewedPeak } from '../../src/formulas/slewed-sine.js';
import { transimpedanceResponse } from '../../src/formulas/transimpedance.js';
import type { Figure } from '../../src/parts/figures.js';
import { typicalPart } from '../../src/prediction/typical-part.js';
import { buildStage, type Stage } from '../../src/stage/index.js';
import { partWith } from '../support/bench.js';
import { figuresOf, headroomPoints, numberOf, predicted, type Figures } from '../support/predicted.js';
import { specOf } from '../support/stage-file.js';
import { BENCHES, built } from '../support/twelve.js';

const SUPPLY = 5;

function stageOf(text: string): Stage {
  const result = buildStage(specOf(text));
  if (!result.ok) throw new Error(result.problems.map(({ message }) => message).join('\n'));
  return result.stage;
}

const FOLLOWER = stageOf('topology: follower\nsupply: 5 V\nsignal: {input: 0.5..4.5 V, shape: sine, frequency: 1 kHz}\nlimits: {settling: {within: 1 s, to: 0.1 %}}\n');

/** Nothing but a gain bandwidth and a slew rate, one pole, the whole supply to swing in. */
const bare = (figures: Figures, top = 0, bottom = 0): Figure[] => [
  ...figuresOf({ phaseMargin: 90, offsetVoltage: 0, ...figures }),
  ...headroomPoints('outputHighHeadroom', [[top, top, 1e-3]], SUPPLY),
  ...headroomPoints('outputLowHeadroom', [[bottom, bottom, 1e-3]], SUPPLY),
];

describe('prediction against relations of its own', { timeout: 60_000 }, () => {
  it('says so where the load takes all the output current, and does not run for ever', () => {
    const stage = stageOf('topology: follower\nsupply: 5 V\nload: {resistance: 1 kΩ, to: ground, capacitance: 1 nF}\nsignal: {input: 0.5..4.5 V, shape: sine, frequency: 1 kHz}\n');
    const { typical } = predicted(stage, bare({ gainBandwidth: 1e6, slewRate: 1e6, outputResistance: 100, outputCurrent: 1e-3 }));
    for (const name of ['outputHigh', 'clipped', 'distortion', 'settling', 'rise'] as const) {
      expect(typical.results[name], name).toMatchObject({ value: null, reason: expect.stringContaining('takes all the current') as string });
    }
  });

  it('an amplifier without limits is the ideal stage, whatever the topology', () => {
    const endless: Figures = { gainBandwidth: 1e10, slewRate: 1e12, inputCapacitance: 1e-18, voltageNoise: 1e-9, noiseCorner: 1, currentNoise: 0 };
    const seen = new Set<string>();
    for (const bench of BENCHES) {
      const stage = built(bench, '');
      const { waveform } = predicted(stage, bare(endless));
      expect(waveform?.typical, bench.name).not.toBeNull();
      seen.add(bench.topology);
      // A low end of 0 V is never quite reached; 1 mV of the swing for the gain that is not endless.
      waveform?.ideal.forEach((ideal, at) => { expect(Math.abs(waveform.typical![at]! - ideal), `${bench.topology} ${bench.name}`).toBeLessThan(1e-3 * stage.outputPeak); });
    }
    expect(seen.size).toBe(11);
  });

  it.each([0.9, 0.75, 0.6, 0.4])('a sine beyond the slew limit by %d: peak and distortion of the closed form', (ratio) => {
    const { typical, worst } = predicted(FOLLOWER, bare({ gainBandwidth: 1e8, slewRate: ratio * 2 * Math.PI * 1e3 * 2 }));
    for (const form of [typical, worst]) {
      const peak = (numberOf(form, 'outputHigh') - numberOf(form, 'outputLow')) / 2;
      expect(Math.abs(peak / 2 / slewedPeak(ratio) - 1)).toBeLessThan(1e-3);
      expect(Math.abs(numberOf(form, 'distortion') / slewedDistortion(ratio) - 1)).toBeLessThan(2e-3);
    }
  });

  it('a step that ends beyond an end of the output is clipped for most of the time told, one within is not', () => {
    const stage = stageOf('topology: follower\nsupply: 5 V\nsignal: {input: 0.5..4.5 V, shape: step, edge: 100 µs}\n');
    const free = predicted(stage, bare({ gainBandwidth: 1e6, slewRate: 1e6 })).typical;
    expect(numberOf(free, 'clipped')).toBe(0);
    const cut = predicted(stage, bare({ gainBandwidth: 1e6, slewRate: 1e6 }, 1)).typical;
    expect(numberOf(cut, 'clipped')).toBeGreaterThan(0.5);
    expect(numberOf(cut, 'outputHigh')).toBeCloseTo(4, 3);
  });

  it.each([0.95, 0.8, 0.5])('a sine cut off at %d of its peak: share of the time and distortion of the closed form', (left) => {
    const top = SUPPLY - (2.5 + left * 2);
    const { typical } = predicted(FOLLOWER, bare({ gainBandwidth: 1e8, slewRate: 1e9 }, top));
    expect(Math.abs(numberOf(typical, 'clipped') / (Math.acos(left) / Math.PI) - 1)).toBeLessThan(2e-3);
    expect(Math.abs(numberOf(typical, 'distortion') / clippedSineDistortion({ top: left, bottom: 1 }) - 1)).toBeLessThan(2e-3);
    expect(numberOf(typical, 'outputHigh')).toBeCloseTo(SUPPLY - top, 6);
  });

  it('settling of one pole with a slew limit is the exact form', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.02, max: 5, noNaN: true }), (share) => {
        const timeConstant = 1 / (2 * Math.PI * 1e5);
        const slewRate = (share * 4) / timeConstant;
        const { typical } = predicted(FOLLOWER, bare({ gainBandwidth: 1e5, slewRate }));
        const exact = settlingTime({ step: 4, slewRate, timeConstant, tolerance: 1e-3 });
        expect(Math.abs(numberOf(typical, 'settling') / exact - 1)).toBeLessThan(2e-3);
      }),
      { numRuns: 12, seed: 7 },
    );
  });

  it('one pole: −3 dB at the gain bandwidth, no peaking, edges of 2.2 τ', () => {
    const { typical } = predicted(FOLLOWER, bare({ gainBandwidth: 1e5, slewRate: 1e12 }));
    expect(numberOf(typical, 'bandwidth')).toBeCloseTo(1e5, 0);
    expect(numberOf(typical, 'peaking')).toBe(0);
    expect(Math.abs(numberOf(typical, 'rise') / (Math.log(9) / (2 * Math.PI * 1e5)) - 1)).toBeLessThan(2e-3);
    expect(numberOf(typical, 'gain')).toBeCloseTo(1 / Math.hypot(1, 0.01), 9);
    expect(numberOf(typical, 'phase')).toBeCloseTo((-Math.atan(0.01) * 180) / Math.PI, 6);
  });

  it('two poles: the peaking of their Q, for Q² = f1/f2', () => {
    const figures = bare({ gainBandwidth: 1e6, slewRate: 1e12, unityCrossover: 1e6, phaseMargin: 45 });
    const { typical } = predicted(FOLLOWER, figures);
    // f2 = fu·tan 45° = 1e6 = GBW: Q = 1, peak Q/√(1 − 1/(4Q²)).
    expect(numberOf(typical, 'peaking')).toBeCloseTo(20 * Math.log10(1 / Math.sqrt(0.75)), 6);
  });

  it('transimpedance: bandwidth of the exact quadratic, with the capacitor chosen for the part', () => {
    const stage = stageOf('topology: transimpedance\nsupply: 5 V\nphotodiode: {current: 0..20 µA, direction: out-of-node, capacitance: 50 pF}\nreference: 0.5 V\nresistors: {feedback: 100 kΩ}\nsignal: {frequency: 10 kHz}\n');
    const { typical } = predicted(stage, bare({ gainBandwidth: 10e6, slewRate: 1e12, inputCapacitance: 1e-18 }));
    const chosen = 3.98623e-12;
    const exact = transimpedanceResponse({ feedback: 100e3, inputCapacitance: 50e-12, feedbackCapacitance: chosen, gainBandwidth: 10e6 });
    expect(Math.abs(numberOf(typical, 'bandwidth') / exact.bandwidth - 1)).toBeLessThan(1e-3);
    expect(typical.notes.join()).toContain('feedback capacitor 3.99 pF');
  });

  it('oscillator: the period of the closed form with edges that take no time', () => {
    const stage = stageOf('topology: relaxation-oscillator\nsupply: 5 V\noscillator: {frequency: 1 kHz}\n');
    if (stage.response.kind !== 'oscillator') throw new Error('no oscillator');
    const { typical } = predicted(stage, bare({ gainBandwidth: 1e8, slewRate: 1e10 }, 0.4, 0.1));
    const exact = oscillatorPeriod({ supply: 5, high: 4.6, low: 0.1, ...stage.response }, stage.response.timeConstant);
    expect(Math.abs(numberOf(typical, 'frequency') / exact.frequency - 1)).toBeLessThan(1e-3);
    expect(Math.abs(numberOf(typical, 'duty') - exact.duty)).toBeLessThan(1e-3);
  });

  it('what is symmetric stays symmetric: rise and fall, and both ends about the middle', () => {
    fc.assert(
      fc.property(fc.record({ speed: fc.double({ min: 2e3, max: 1e6, noNaN: true }), share: fc.double({ min: 0.2, max: 3, noNaN: true }), room: fc.double({ min: 0, max: 1, noNaN: true }) }), ({ speed, share, room }) => {
        const { typical } = predicted(FOLLOWER, bare({ gainBandwidth: speed, slewRate: share * 2 * Math.PI * 1e3 * 2 }, room, room));
        expect(numberOf(typical, 'outputHigh') + numberOf(typical, 'outputLow')).toBeCloseTo(SUPPLY, 5);
        const [rise, fall] = [typical.results.rise, typical.results.fall];
        expect(rise?.value == null).toBe(fall?.value == null);
        if (rise?.value != null) expect(Math.abs(rise.value / numberOf(typical, 'fall') - 1)).toBeLessThan(1e-6);
      }),
      { numRuns: 10, seed: 7 },
    );
  });
});

describe('what is not known', { timeout: 60_000 }, () => {
  const all: Figures = { gainBandwidth: 1e6, slewRate: 1e6, voltageNoise: 10e-9, noiseCorner: 100 };

  it('no gain bandwidth: nothing of the response, with the reason', () => {
    const { gainBandwidth: _gone, ...others } = all;
    const { typical, worst, waveform, response } = predicted(FOLLOWER, bare(others));
    for (const form of [typical, worst]) expect(form.results.bandwidth).toEqual({ value: null, reason: 'gain bandwidth not known' });
    expect([waveform, response]).toEqual([null, null]);
  });

  it('no slew rate: waves and settling are gone, the small-signal response stays', () => {
    const { slewRate: _gone, ...others } = all;
    const { worst } = predicted(FOLLOWER, bare(others));
    for (const quantity of ['outputHigh', 'distortion', 'settling', 'rise'] as const) expect(worst.results[quantity]).toEqual({ value: null, reason: 'slew rate not known' });
    expect(numberOf(worst, 'bandwidth')).toBeGreaterThan(9e5);
    expect(numberOf(worst, 'noise')).toBeGreaterThan(0);
  });

  it('no head-room: levels are gone, settling stays', () => {
    const { typical } = predicted(FOLLOWER, figuresOf({ ...all, phaseMargin: 60 }));
    expect(typical.results.outputHigh).toEqual({ value: null, reason: 'output low headroom, output high headroom not known' });
    expect(numberOf(typical, 'settling')).toBeGreaterThan(0);
  });

  it('no phase margin: no peaking of an amplifier stage, said in the notes', () => {
    const { typical } = predicted(FOLLOWER, figuresOf(all));
    expect(typical.results.peaking).toEqual({ value: null, reason: 'phase margin not known' });
    expect(typical.notes).toContain('phase margin not known: no second pole of its own counted');
  });

  it('a load capacitance without an output resistance: no peaking, no settling', () => {
    const stage = stageOf('topology: follower\nsupply: 5 V\nsignal: {input: 1..4 V, frequency: 1 kHz}\nload: {resistance: 10 kΩ, to: ground, capacitance: 100 pF}\n');
    const { typical } = predicted(stage, bare({ ...all, outputCurrent: 0.01 }));
    for (const quantity of ['peaking', 'settling'] as const) expect(typical.results[quantity]).toEqual({ value: null, reason: 'output resistance not known' });
  });

  it('a loop that oscillates is told as such', () => {
    const stage = stageOf('topology: follower\nsupply: 5 V\nsignal: {input: 1..4 V, frequency: 1 kHz}\nload: {resistance: 10 kΩ, to: ground, capacitance: 1 µF}\n');
    const { typical, waveform } = predicted(stage, bare({ ...all, gainBandwidth: 1e7, outputResistance: 1e3, outputCurrent: 0.01, unityCrossover: 1e7, phaseMargin: 30 }));
    expect(typical.results.bandwidth).toEqual({ value: null, reason: 'with these figures the loop oscillates' });
    expect(waveform).toBeNull();
  });
});

describe('readings', () => {
  it('typical takes what is printed as typical, the guaranteed worst takes the limit', () => {
    const { typical, worst } = predicted(FOLLOWER, bare({ gainBandwidth: [2e6, 1e6], slewRate: [1e6, 4e5] }));
    const figure = (form: typeof typical, wanted: string): number | undefined => form.figures.find(({ parameter }) => parameter === wanted)?.value;
    expect([figure(typical, 'gainBandwidth'), figure(worst, 'gainBandwidth')]).toEqual([2e6, 1e6]);
    expect([figure(typical, 'slewRate'), figure(worst, 'slewRate')]).toEqual([1e6, 4e5]);
  });

  it('a typical alone is derated in the guaranteed worst', () => {
    const { worst } = predicted(FOLLOWER, [{ parameter: 'gainBandwidth', kind: 'typ', value: 1e6, condition: {} }]);
    expect(worst.figures.find(({ parameter }) => parameter === 'gainBandwidth')).toEqual({ parameter: 'gainBandwidth', value: 6e5, how: 'typical × 0.6' });
  });

  it('of a head-room a typical takes the place of the limit at its own load alone', () => {
    const [light, heavy] = [1e-4, 1e-3].map((amperes) => ({ load: { kind: 'current', amperes } }) as const) as [Figure['condition'], Figure['condition']];
    const figures: Figure[] = [
      { parameter: 'outputLowHeadroom', kind: 'max', value: 0.03, condition: light },
      { parameter: 'outputLowHeadroom', kind: 'max', value: 0.2, condition: heavy },
      { parameter: 'outputLowHeadroom', kind: 'typ', value: 0.1, condition: heavy },
    ];
    expect(typicalPart(partWith(figures)).figures.map(({ value }) => value)).toEqual([0.03, 0.1]);
  });

  it('limits of what has a typical are left out, ranges stay', () => {
    const figures: Figure[] = [
      { parameter: 'slewRate', kind: 'min', value: 1, condition: {} },
      { parameter: 'slewRate', kind: 'typ', value: 2, condition: {} },
      { parameter: 'supplyVoltage', kind: 'max', value: 5, condition: {} },
      { parameter: 'gainBandwidth', kind: 'min', value: 3, condition: {} },
    ];
    expect(typicalPart(partWith(figures)).figures.map(({ parameter, kind }) => `${parameter}.${kind}`)).toEqual(['slewRate.typ', 'supplyVoltage.max', 'gainBandwidth.min']);
  });
});
