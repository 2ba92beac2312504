import { describe, expect, it } from 'vitest';
import { deriveDemands } from '../../src/demands/index.js';
import { maximallyFlatCapacitor } from '../../src/formulas/transimpedance.js';
import { halfPower, response, type Curve, type LiveStage } from '../support/live-stage.js';
import { magnitude, type Complex } from '../support/nodal.js';
import { shown } from '../support/shown.js';
import { SIMULATED } from '../support/spice.js';
import { BENCHES, built, type Bench } from '../support/twelve.js';

// Source: ngspice 45 (eecircuit-engine), small signal, drawings of our own with an amplifier of exactly the gain bandwidth demanded.
// Relation: the gain error the stage allows is what that amplifier makes of it, against the same drawing with an endless one.

const ENDLESS = 1e15;

type Kind = 'magnitude' | 'vector';

function deviation(actual: Complex, ideal: Complex, kind: Kind): number {
  if (kind === 'magnitude') return Math.abs(magnitude(actual) / magnitude(ideal) - 1);
  return magnitude([actual[0] - ideal[0], actual[1] - ideal[1]]) / magnitude(ideal);
}

/** The largest deviation of one curve from the other up to its last frequency. */
const largest = (actual: Curve, ideal: Curve, kind: Kind): number => Math.max(...actual.values.map((value, k) => deviation(value, ideal.values[k]!, kind)));

const CASES = [
  ['gainError: 1 %', 'magnitude', 0.01],
  ['gainError: 0.2 %', 'magnitude', 0.002],
  ['gainError: 1 %, gainErrorKind: vector', 'vector', 0.01],
] as const;

interface Asked {
  readonly required: number;
  readonly frequency: number;
  at(gainBandwidth: number): LiveStage;
}

function asked(bench: Bench, limits: string): Asked {
  const stage = built(bench, limits);
  const required = deriveDemands(stage)['gain-bandwidth']!.required;
  const common = { topology: bench.topology, parts: bench.parts(stage), driven: { input: 'dc 0 ac 1' } };
  return { required, frequency: stage.frequency!, at: (gainBandwidth) => ({ ...common, amplifier: { gainBandwidth } }) };
}

describe('gain bandwidth as demanded, ngspice 45 (eecircuit-engine), netlist of our own', SIMULATED, () => {
  for (const bench of BENCHES) {
    it(`${bench.topology}, ${bench.name}: the gain error up to the top frequency is the limit, and beyond it with a tenth less`, async () => {
      for (const [limits, kind, error] of CASES) {
        const { required, frequency, at } = asked(bench, limits);
        const band = [frequency / 100, frequency] as const;
        const [ideal, just, less] = [await response(at(ENDLESS), band, 100), await response(at(required), band, 100), await response(at(0.9 * required), band, 100)];
        const found = largest(just, ideal, kind);
        shown(`${bench.topology} ${bench.name}, ${limits}: ${required.toPrecision(5)} Hz`, [error, found]);
        expect(Math.abs(found / error - 1), limits).toBeLessThan(0.01);
        expect(largest(less, ideal, kind), `${limits}, a tenth less`).toBeGreaterThan(1.05 * error);
      }
    });
  }

  for (const bench of BENCHES.filter(({ topology }) => topology.endsWith('low-pass'))) {
    it(`${bench.topology}, ${bench.name}: the −3 dB frequency is off by what the stage allows`, async () => {
      for (const error of [0.01, 0.05]) {
        const { required, at } = asked(bench, `gainError: ${100 * error} %, gainErrorKind: corner`);
        const corner = async (hertz: number): Promise<number> => halfPower(await response(at(hertz), [100, 100e3], 400));
        const ideal = await corner(ENDLESS);
        const [off, more] = [Math.abs((await corner(required)) / ideal - 1), Math.abs((await corner(0.8 * required)) / ideal - 1)];
        shown(`${bench.topology} ${bench.name}, corner off by ${error}: ${required.toPrecision(5)} Hz`, [error, off]);
        expect(Math.abs(off / error - 1)).toBeLessThan(0.01);
        expect(more).toBeGreaterThan(1.05 * error);
      }
    });
  }

  for (const bench of BENCHES.filter(({ half }) => half !== undefined)) {
    it(`${bench.topology}, ${bench.name}: the slew rate is 2π·f of the largest output the band makes`, async () => {
      const stage = built(bench, 'gainError: 1 %');
      const { at, frequency } = asked(bench, 'gainError: 1 %');
      const { values } = await response(at(ENDLESS), [frequency / 100, frequency], 200);
      const largestPeak = Math.max(...values.map(magnitude)) * bench.half!;
      const required = deriveDemands(stage)['slew-rate']!.required;
      shown(`${bench.topology} ${bench.name}, slew rate`, [required, 2 * Math.PI * frequency * largestPeak]);
      expect(Math.abs(required / (2 * Math.PI * frequency * largestPeak) - 1)).toBeLessThan(0.01);
    });
  }

  it('difference against a bypassed reference: the slew rate goes by the larger gain of its + leg, that of DC', async () => {
    const bench = BENCHES.find(({ topology, name }) => topology === 'difference' && name.includes('across'))!;
    const stage = built(bench, 'gainError: 1 %');
    const frequency = stage.frequency!;
    const common = { topology: bench.topology, parts: bench.parts(stage), amplifier: { gainBandwidth: ENDLESS } };
    const gains = async (at: number): Promise<number> => {
      const legs: LiveStage[] = [{ ...common, driven: { input: 'dc 0 ac 1' } }, { ...common, driven: { input: 0, other: 'dc 0 ac 1' } }];
      const [positive, negative] = [await response(legs[0]!, [at, 2 * at], 2), await response(legs[1]!, [at, 2 * at], 2)];
      return (magnitude(positive.values[0]!) + magnitude(negative.values[0]!)) / 2;
    };
    const [direct, signal] = [await gains(1e-3), await gains(frequency)];
    const slope = deriveDemands(stage)['slew-rate']!.required / (2 * Math.PI * frequency * 0.3);
    shown('difference with a bypass, gain for the slew rate', [slope, direct], [slope, signal]);
    expect(Math.abs(slope / direct - 1)).toBeLessThan(0.001);
    expect(slope / signal).toBeGreaterThan(1.01);
  });

  it('transimpedance with the maximally flat capacitor of the part: −3 dB where it is asked, 1 % where it is asked', async () => {
    const bench: Bench = {
      name: 'open',
      topology: 'transimpedance',
      file: 'supply: 5 V\nresistors: {feedback: 100 kΩ, tolerance: 0 %}\nreference: 500 mV\nphotodiode: {current: 0..30 µA, direction: out-of-node, capacitance: 50 pF}\nsignal: {frequency: 100 kHz}',
      parts: () => ({}),
    };
    for (const error of [0.01, 1 - Math.SQRT1_2]) {
      const { required, frequency } = asked(bench, `gainError: ${100 * error} %`);
      const feedbackCapacitor = maximallyFlatCapacitor({ feedback: 100e3, inputCapacitance: 50e-12, gainBandwidth: required });
      const stage: LiveStage = { topology: 'transimpedance', parts: { feedback: 100e3, diode: 50e-12, feedbackCapacitor }, driven: { input: 'dc 0 ac 1' }, amplifier: { gainBandwidth: required } };
      const { values } = await response(stage, [frequency / 1000, frequency], 100);
      const found = 1 - magnitude(values.at(-1)!) / 100e3;
      shown(`transimpedance, maximally flat, ${error}: ${required.toPrecision(5)} Hz`, [error, found]);
      expect(Math.abs(found / error - 1)).toBeLessThan(0.01);
    }
  });
});
