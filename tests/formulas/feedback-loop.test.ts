import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { magnitude, multiply, phase } from '../../src/formulas/complex.js';
import {
  closedLoopGain,
  closedLoopNoiseGain,
  excessPole,
  feedbackFactor,
  highFrequencyNoiseGain,
  loopCrossover,
  loopPhaseMargin,
  type FeedbackNetworks,
  type LoopAmplifier,
} from '../../src/formulas/feedback-loop.js';
import { multipleFeedback, sallenKey } from '../../src/formulas/filters.js';
import { magnitudeAt } from '../../src/formulas/low-pass-response.js';
import { pinResponse, type PinNetwork } from '../../src/formulas/pin-network.js';
import { secondOrderPeak } from '../../src/formulas/second-order.js';
import { leadLagCrossover, leadLagPhaseMargin, poleFrequency } from '../../src/formulas/stability.js';
import { twoPoleCrossover, twoPolePhaseMargin, twoPoleQ } from '../../src/formulas/two-pole-loop.js';
import { published, type Given } from '../support/check-values.js';
import { example, refuses } from '../support/examples.js';
import { highest } from '../support/nodal.js';
import {
  anyStage,
  capacitor,
  decades,
  divider,
  DRIVEN,
  FOLLOWING,
  GROUNDED,
  multipleFeedbackNetworks,
  resistor,
  sallenKeyNetworks,
  transimpedance,
} from './networks.js';

const follower = { plus: DRIVEN, minus: FOLLOWING };
const tenfold = { plus: DRIVEN, minus: divider(9e3, 1e3) };

describe('feedback loop', () => {
  example('feedbackFactor(tenfold)', () => feedbackFactor(tenfold)(1e3).re, 0.1);
  it('closedLoopNoiseGain and closedLoopGain at the bandwidth are 5 − 5j', () => {
    for (const gain of [closedLoopNoiseGain(tenfold, { gainBandwidth: 1e6 }, 100e3), closedLoopGain(tenfold, { gainBandwidth: 1e6 }, 100e3)]) {
      expect(gain.re).toBeCloseTo(5, 12);
      expect(gain.im).toBeCloseTo(-5, 12);
    }
  });
  example('loopCrossover(follower, f2 = 2 MHz)', () => loopCrossover(follower, { gainBandwidth: 1e6, poles: [2e6] }), 910_180);
  example('loopPhaseMargin(follower, f2 = 2 MHz)', () => loopPhaseMargin(follower, { gainBandwidth: 1e6, poles: [2e6] }), 65.5302);
  example('highFrequencyNoiseGain', () => highFrequencyNoiseGain(transimpedance(100e3, 3.986247e-12, 50e-12)), 13.5431);
  example('excessPole(1e6, 60)', () => excessPole(1e6, 60), 1.73205e6);

  it('has the margin of a two-pole loop behind any divider', () => {
    const asked = { gbw: decades(1e3, 1e10), rf: decades(1e2, 1e6), rg: decades(1e2, 1e6), ratio: decades(1e-3, 1e3) };
    fc.assert(
      fc.property(fc.record(asked), ({ gbw, rf, rg, ratio }) => {
        const asymptote = (gbw * rg) / (rf + rg);
        const pole = ratio * asymptote;
        const networks = { plus: GROUNDED, minus: divider(rf, rg) };
        const amplifier = { gainBandwidth: gbw, poles: [pole, Infinity] };
        expect(loopCrossover(networks, amplifier) / twoPoleCrossover(asymptote, pole)).toBeCloseTo(1, 11);
        expect(Math.abs(loopPhaseMargin(networks, amplifier) - twoPolePhaseMargin(asymptote, pole))).toBeLessThan(1e-9);
        // The same pole made by the input capacitance.
        const cin = (rf + rg) / (2 * Math.PI * rf * rg * pole);
        const loaded = loopPhaseMargin({ ...networks, minusCapacitance: cin }, { gainBandwidth: gbw });
        expect(Math.abs(loaded - twoPolePhaseMargin(asymptote, pole))).toBeLessThan(1e-9);
      }),
    );
  });
  it('has the margin of a lead-lag loop in a transimpedance stage', () => {
    const asked = { gbw: decades(1e4, 1e10), rf: decades(1e2, 1e8), cf: decades(1e-13, 1e-10), cin: decades(1e-12, 1e-9) };
    fc.assert(
      fc.property(fc.record(asked), ({ gbw, rf, cf, cin }) => {
        const loop = { asymptote: gbw, zero: poleFrequency(rf, cf), pole: poleFrequency(rf, cin + cf) };
        const networks = transimpedance(rf, cf, cin);
        expect(loopCrossover(networks, { gainBandwidth: gbw }) / leadLagCrossover(loop)).toBeCloseTo(1, 11);
        expect(Math.abs(loopPhaseMargin(networks, { gainBandwidth: gbw }) - leadLagPhaseMargin(loop))).toBeLessThan(1e-9);
        expect(highFrequencyNoiseGain(networks) / (1 + cin / cf)).toBeCloseTo(1, 12);
      }),
    );
  });
  it('stands at a loop gain of 1 with none above, and its margin at the angle there, in any stage', () => {
    fc.assert(
      fc.property(anyStage, decades(1e4, 1e9), decades(0.1, 100), (networks, gainBandwidth, ratio) => {
        const amplifier = { gainBandwidth, poles: [ratio * gainBandwidth] };
        const crossover = loopCrossover(networks, amplifier);
        expect(loopGain(networks, amplifier, crossover)).toBeCloseTo(1, 10);
        const above = Array.from({ length: 200 }, (_, k) => loopGain(networks, amplifier, crossover * 1.05 ** (k + 1)));
        expect(Math.max(...above)).toBeLessThan(1);
        const own = multiply({ re: 0, im: -1 }, { re: 1, im: -crossover / (ratio * gainBandwidth) });
        const angle = phase(multiply(own, feedbackFactor(networks)(crossover)));
        const off = loopPhaseMargin(networks, amplifier) - 180 - angle;
        expect(Math.abs(off - 360 * Math.round(off / 360))).toBeLessThan(1e-9);
      }),
      { numRuns: 50 },
    );
  });
  it('takes the highest of several crossovers', () => {
    // A bridged-T in the feedback path: its notch takes the loop gain below 1 and gives it back above.
    const elements = [
      capacitor('C1', 100e-9, ['output', 'x']),
      capacitor('C2', 100e-9, ['x', 'n']),
      resistor('R1', 10, ['x', 'ground']),
      resistor('R2', 1e6, ['output', 'n']),
    ];
    const networks = { plus: GROUNDED, minus: { elements, pin: 'n' }, minusCapacitance: 1e-12 };
    const amplifier = { gainBandwidth: 400e3 };
    const notch = 1 / (2 * Math.PI * 100e-9 * Math.sqrt(10 * 1e6));
    expect(loopGain(networks, amplifier, notch / 1000)).toBeGreaterThan(1);
    expect(loopGain(networks, amplifier, notch)).toBeLessThan(1);
    expect(loopGain(networks, amplifier, 30e3)).toBeGreaterThan(1);
    const crossover = loopCrossover(networks, amplifier);
    expect(crossover).toBeGreaterThan(30e3);
    expect(loopGain(networks, amplifier, crossover)).toBeCloseTo(1, 11);
  });
  it('never takes lag beyond a full turn for margin, and tells positive feedback as negative margin', () => {
    expect(loopPhaseMargin(follower, { gainBandwidth: 1e6, poles: [1e2, 1e2, 1e2, 1e2, 1e2] })).toBe(-180);
    expect(loopPhaseMargin({ plus: FOLLOWING, minus: GROUNDED }, { gainBandwidth: 1e6 })).toBeCloseTo(-90, 9);
  });
  it('finds no finite noise gain where nothing comes back at high frequencies', () => {
    expect(highFrequencyNoiseGain({ ...tenfold, minusCapacitance: 1e-12 })).toBe(Infinity);
    expect(highFrequencyNoiseGain({ plus: GROUNDED, minus: GROUNDED })).toBe(Infinity);
    expect(highFrequencyNoiseGain(tenfold)).toBeCloseTo(10, 12);
  });
  it('sees no excess phase from 90° on', () => {
    expect([90, 120].map((margin) => excessPole(1e6, margin))).toEqual([Infinity, Infinity]);
  });

  it('responds as the closed form of a Sallen-Key', () => {
    const parts = { r1: 10e3, r2: 22e3, c1: 4.7e-9, c2: 1e-9 };
    for (const gain of [1, 1.6]) {
      const networks = sallenKeyNetworks([parts.r1, parts.r2, parts.c1, parts.c2], gain);
      for (const f of [0, 1, 1e3, 7e3, 30e3, 1e6]) {
        const closed = magnitudeAt(sallenKey({ ...parts, gain }, 3e5), f);
        expect(magnitude(closedLoopGain(networks, { gainBandwidth: 3e5 }, f)) / closed).toBeCloseTo(1, 11);
      }
    }
  });
  it('responds as the closed form of a multiple-feedback filter, with any amplifier', () => {
    const parts = { r1: 10e3, r2: 22e3, r3: 4.7e3, c1: 4.7e-9, c2: 1e-9 };
    const networks = multipleFeedbackNetworks([parts.r1, parts.r2, parts.r3], [parts.c1, parts.c2]);
    for (const gainBandwidth of [1e4, 1e6, Infinity]) {
      for (const f of [0, 1e3, 7e3, 30e3, 1e6]) {
        const closed = magnitudeAt(multipleFeedback(parts, gainBandwidth), f);
        expect(magnitude(closedLoopGain(networks, { gainBandwidth }, f)) / closed).toBeCloseTo(1, 11);
      }
    }
  });

  published('GBW-15', (of) => marginBeside(of));
  published('GBW-16', (of) => marginBeside(of));
  published('GBW-17', (of) => marginBeside(of));
  published('STB-01', (of) => loopPhaseMargin({ plus: DRIVEN, minus: loaded(of, 0) }, { gainBandwidth: of('GBW_Hz') }));
  published('STB-06', (of) => loopPhaseMargin({ plus: DRIVEN, minus: loaded(of, of('Riso_ohm')) }, { gainBandwidth: of('GBW_Hz') }));
  published('STB-11', (of) => {
    const networks = { plus: DRIVEN, minus: loaded(of, 0) };
    const amplifier = { gainBandwidth: of('GBW_Hz') };
    // The load's voltage is behind Ro: β of the voltage that the amplifier makes.
    const peak = highest((f) => magnitude(multiply(closedLoopGain(networks, amplifier, f), feedbackFactor(networks)(f))), 1e4, 1e7);
    expect(peak / secondOrderPeak(twoPoleQ(of('GBW_Hz'), poleFrequency(of('Ro_ohm'), of('CL_F'))))).toBeCloseTo(1, 9);
    return peak;
  });
  published('TIA-04', (of) => loopPhaseMargin(stage(of), { gainBandwidth: of('GBW_Hz') }));
  published('TIA-05', (of) => loopPhaseMargin(stage(of), { gainBandwidth: of('GBW_Hz') }));
  published('TIA-07', (of) => {
    const networks = stage(of);
    return highest((f) => {
      const { impedance } = pinResponse(networks.minus, f, of('Cin_F'));
      return magnitude(multiply(impedance, closedLoopNoiseGain(networks, { gainBandwidth: of('GBW_Hz') }, f))) / of('Rf_ohm');
    }, 1e4, 1e7);
  });
  published('TIA-09', (of) => highFrequencyNoiseGain(stage(of)));

  refuses(() => loopCrossover(follower, { gainBandwidth: 0 }), 'loopCrossover: gainBandwidth must be finite, above 0, but is 0');
  refuses(() => loopPhaseMargin(follower, { gainBandwidth: 1, poles: [-1] }), 'loopCrossover: pole must be finite, above 0, but is -1');
  refuses(() => closedLoopGain(follower, { gainBandwidth: 1 }, -1), 'closedLoopNoiseGain: frequency must be finite, at least 0, but is -1');
  refuses(() => excessPole(1e6, 0), 'excessPole: phaseMargin must be finite, above 0, at most 180, but is 0');
  it('refuses a loop without feedback', () => {
    expect(() => loopCrossover({ plus: GROUNDED, minus: GROUNDED }, { gainBandwidth: 1e6 })).toThrow(/^loopCrossover: the loop gain is below 1 from .* feeds too little back$/u);
  });
});

function loopGain(networks: FeedbackNetworks, { gainBandwidth, poles = [] }: LoopAmplifier, frequency: number): number {
  const open = poles.reduce((gain, pole) => gain / Math.hypot(1, frequency / pole), gainBandwidth / frequency);
  return open * magnitude(feedbackFactor(networks)(frequency));
}

function marginBeside(of: Given): number {
  return loopPhaseMargin(follower, { gainBandwidth: of('fc_Hz'), poles: [of('f2_Hz')] });
}

/** Ro belongs to the network here: the reserved output is the voltage that the amplifier makes inside. */
function loaded(of: Given, isolation: number): PinNetwork {
  const toLoad = isolation === 0 ? [] : [resistor('Riso', isolation, ['pin', 'load'])];
  return {
    elements: [resistor('Ro', of('Ro_ohm'), ['output', 'pin']), ...toLoad, capacitor('CL', of('CL_F'), [isolation === 0 ? 'pin' : 'load', 'ground'])],
    pin: 'pin',
  };
}

function stage(of: Given): FeedbackNetworks {
  return transimpedance(of('Rf_ohm'), of('Cf_F'), of('Cin_F'));
}
