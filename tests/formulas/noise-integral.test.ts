import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { BOLTZMANN } from '../../src/formulas/constants.js';
import { loopPhaseMargin, type FeedbackNetworks } from '../../src/formulas/feedback-loop.js';
import { multipleFeedback, sallenKey } from '../../src/formulas/filters.js';
import { magnitudeAt } from '../../src/formulas/low-pass-response.js';
import { butterworthNoiseBandwidth, secondOrderNoiseBandwidth, transimpedanceVoltageNoiseRoot } from '../../src/formulas/noise-bandwidth.js';
import { noiseGrid, type NoiseStage } from '../../src/formulas/noise-grid.js';
import { outputNoise, type NoisyAmplifier } from '../../src/formulas/noise-integral.js';
import { noiseThroughPole, resistorNoise } from '../../src/formulas/noise.js';
import { butterworthPower } from '../../src/formulas/panel-axis.js';
import { pinResponses } from '../../src/formulas/pin-network.js';
import { transimpedanceResponse } from '../../src/formulas/transimpedance.js';
import { expectWithin, published } from '../support/check-values.js';
import { refuses } from '../support/examples.js';
import { GROUND, magnitude, solve, type Element } from '../support/nodal.js';
import { anyStage, capacitor, decades, divider, DRIVEN, FOLLOWING, GROUNDED, multipleFeedbackNetworks, resistor, sallenKeyNetworks, transimpedance } from './networks.js';

const SILENT = { voltageNoise: 0, noiseCorner: 0, currentNoise: 0 };
const band = { temperature: 300, lowest: 1e-3, following: null };

describe('output noise', () => {
  it('is 12.53 µV for the follower of the example', () => {
    const grid = noiseGrid({ plus: DRIVEN, minus: FOLLOWING, ...band });
    const { rms, terms } = outputNoise(grid, { ...SILENT, voltageNoise: 10e-9, gainBandwidth: 1e6 });
    expectWithin(rms, 10e-9 * Math.sqrt((Math.PI / 2) * 1e6), 1e-8);
    expect(terms.map(({ name }) => name)).toEqual(['amplifier voltage noise', 'amplifier current noise, + input', 'amplifier current noise, − input']);
  });
  it('adds its terms as squares', () => {
    fc.assert(
      fc.property(anyStage, decades(1e5, 1e9), (stage, gainBandwidth) => {
        const { rms, terms } = outputNoise(noiseGrid({ ...stage, ...band }), { voltageNoise: 5e-9, noiseCorner: 1e3, currentNoise: 1e-13, gainBandwidth });
        expectWithin(Math.hypot(...terms.map((term) => term.rms)), rms, 1e-12);
      }),
      { numRuns: 20 },
    );
  });
  it('has white and 1/f noise through one pole as the closed form', () => {
    const asked = { corner: decades(1, 1e6), lowest: decades(1e-3, 100), gainBandwidth: decades(1e3, 1e9), ratio: decades(1, 1e3) };
    fc.assert(
      fc.property(fc.record(asked), ({ corner, lowest, gainBandwidth, ratio }) => {
        const plus = { elements: [resistor('Rs', 1e4, ['input', 'p'])], pin: 'p' };
        const grid = noiseGrid({ plus, minus: divider(ratio * 1e3, 1e3), temperature: 300, lowest, following: null });
        const { terms } = outputNoise(grid, { voltageNoise: 2e-8, noiseCorner: corner, currentNoise: 1e-12, currentCorner: corner / 2, gainBandwidth });
        const noiseGain = 1 + ratio;
        const pole = gainBandwidth / noiseGain;
        const through = (density: number, flicker: number): number => noiseGain * noiseThroughPole({ density, corner: flicker, lowest, pole });
        const rf = (ratio * 1e3) / noiseGain;
        expectWithin(terms[0]!.rms, through(2e-8, corner), 1e-7);
        expectWithin(terms[1]!.rms, through(1e-12 * 1e4, corner / 2), 1e-7);
        expectWithin(terms[2]!.rms, through(1e-12 * rf, corner / 2), 1e-7);
        expectWithin(terms[3]!.rms, through(resistorNoise(1e4, 300), 0), 1e-7);
        expectWithin(Math.hypot(terms[4]!.rms, terms[5]!.rms), through(resistorNoise(rf, 300), 0), 1e-7);
      }),
      { numRuns: 50 },
    );
  });
  it('is √(kT/C) at a follower with a capacitor at its input, whatever the resistor', () => {
    for (const r of [1e3, 1e5, 1e7]) {
      const plus = { elements: [resistor('Rs', r, ['input', 'p']), capacitor('C', 1e-9, ['p', 'ground'])], pin: 'p' };
      const { terms } = outputNoise(noiseGrid({ plus, minus: FOLLOWING, ...band }), { ...SILENT, gainBandwidth: 1e13 });
      // From 1 mHz instead of 0 and at 1e13 Hz instead of at once: both below 1e-4 of the whole even for 10 MΩ.
      expectWithin(terms[3]!.rms, Math.sqrt((BOLTZMANN * 300) / 1e-9), 2e-4);
      if (r === 1e5) expectWithin(terms[3]!.rms, Math.sqrt((BOLTZMANN * 300) / 1e-9), 1e-6);
    }
  });
  it('has the closed forms of a transimpedance stage', () => {
    const asked = { rf: decades(1e4, 1e8), cin: decades(1e-12, 1e-9), cf: decades(1e-13, 1e-11), gbw: decades(1e6, 1e9) };
    fc.assert(
      fc.property(fc.record(asked), ({ rf, cin, cf, gbw }) => {
        const closed = { feedback: rf, inputCapacitance: cin, feedbackCapacitance: cf, gainBandwidth: gbw };
        const { naturalFrequency, q } = transimpedanceResponse(closed);
        fc.pre(q < 20);
        const { terms } = outputNoise(noiseGrid({ ...transimpedance(rf, cf, cin), ...band, lowest: 1e-6 }), {
          ...SILENT,
          voltageNoise: 5e-9,
          gainBandwidth: gbw,
        });
        expectWithin(terms[0]!.rms, 5e-9 * transimpedanceVoltageNoiseRoot(closed), 1e-6);
        expectWithin(terms[3]!.rms, resistorNoise(rf, 300) * Math.sqrt(secondOrderNoiseBandwidth(naturalFrequency, q)), 1e-6);
      }),
      { numRuns: 50 },
    );
  });
  it('passes the noise of a source resistor through (π/2)·f0·Q of an ideal filter', () => {
    fc.assert(
      fc.property(decades(0.5, 20), decades(1e2, 1e5), (q, f0) => {
        const c = 1 / (2 * Math.PI * 1e4 * f0);
        const networks = sallenKeyNetworks([1e4, 1e4, 2 * q * c, c / (2 * q)], 1);
        const { terms } = outputNoise(noiseGrid({ ...networks, ...band }), { ...SILENT, gainBandwidth: 1e13 });
        expectWithin(terms.find(({ name }) => name === 'R1')!.rms, resistorNoise(1e4, 300) * Math.sqrt(secondOrderNoiseBandwidth(f0, q)), 1e-5);
      }),
      { numRuns: 30 },
    );
  });
  it('passes it through the closed form of a filter with a slow amplifier', () => {
    const sk = { r1: 10e3, r2: 22e3, c1: 47e-9, c2: 1e-9 };
    const mfb = { r1: 10e3, r2: 22e3, r3: 4.7e3, c1: 47e-9, c2: 1e-9 };
    const cases = [
      { networks: sallenKeyNetworks([sk.r1, sk.r2, sk.c1, sk.c2], 1.02), response: sallenKey({ ...sk, gain: 1.02 }, 3e5), gbw: 3e5 },
      { networks: multipleFeedbackNetworks([mfb.r1, mfb.r2, mfb.r3], [mfb.c1, mfb.c2]), response: multipleFeedback(mfb, 3e5), gbw: 3e5 },
    ];
    for (const { networks, response, gbw } of cases) {
      const { terms } = outputNoise(noiseGrid({ ...networks, ...band }), { ...SILENT, gainBandwidth: gbw });
      const square = integralOverLog((f) => magnitudeAt(response, f) ** 2, [1e-3, 1e12]);
      expectWithin(terms.find(({ name }) => name === 'R1')!.rms, resistorNoise(10e3, 300) * Math.sqrt(square), 1e-7);
    }
  });
  it('ends at the noise bandwidth of a following Butterworth filter', () => {
    for (const order of [1, 2, 3, 5, 8]) {
      const grid = noiseGrid({ plus: DRIVEN, minus: FOLLOWING, ...band, following: { corner: 20e3, order } });
      const { rms } = outputNoise(grid, { ...SILENT, voltageNoise: 1e-8, gainBandwidth: 1e12 });
      expectWithin(rms, 1e-8 * Math.sqrt(20e3 * butterworthNoiseBandwidth(order)), 1e-7);
    }
  });
  it('agrees with adaptive quadrature of the same integrand, for any stage, amplifier and filter', () => {
    const amplifier = { gainBandwidth: decades(1e4, 1e9), ratio: decades(0.05, 100), noiseCorner: decades(1, 1e5), currentNoise: decades(1e-15, 1e-11) };
    const filter = fc.option(fc.record({ corner: decades(1e2, 1e7), order: fc.integer({ min: 1, max: 6 }) }), { nil: null });
    fc.assert(
      fc.property(anyStage, fc.record(amplifier), filter, (networks, { gainBandwidth, ratio, ...noise }, following) => {
        const noisy = { ...noise, voltageNoise: 1e-8, gainBandwidth, poles: [gainBandwidth * ratio] };
        fc.pre(loopPhaseMargin(networks, noisy) > 3);
        const stage = { ...networks, temperature: 300, lowest: 0.1, following };
        expectWithin(outputNoise(noiseGrid(stage), noisy).rms, byQuadrature(stage, noisy), 1e-7);
      }),
      { numRuns: 60 },
    );
  }, 60_000);
  it('agrees with nodal analysis of a whole circuit, source by source', () => {
    const [rf, cf, cin, gbw] = [100e3, 1e-12, 50e-12, 10e6];
    const noise = { voltageNoise: 8e-9, noiseCorner: 0, currentNoise: 1e-13, gainBandwidth: gbw };
    const { terms } = outputNoise(noiseGrid({ ...transimpedance(rf, cf, cin), ...band }), noise);
    const circuit: Element[] = [
      { r: rf, between: ['n', 'out'] },
      { c: cf, between: ['n', 'out'] },
      { c: cin, between: ['n', GROUND] },
      { plus: 'p', minus: 'n', output: 'out', gainBandwidth: gbw },
    ];
    const from = (source: Element): number => {
      const rest: Element[] = 'at' in source ? [] : [{ volts: 0, at: 'p' }];
      return Math.sqrt(integralOverLog((f) => magnitude(solve([...circuit, ...rest, source], f)('out')) ** 2, [1e-3, 1e14]));
    };
    expectWithin(terms[0]!.rms, from({ volts: 8e-9, at: 'p' }), 1e-6);
    expectWithin(terms[2]!.rms, from({ amps: 1e-13, between: [GROUND, 'n'] }), 1e-6);
    expectWithin(terms[3]!.rms, from({ amps: resistorNoise(rf, 300) / rf, between: ['out', 'n'] }), 1e-6);
  });

  published('NOI-08', (of) => {
    const plus = { elements: [resistor('R3', of('R3_ohm'), ['ground', 'p'])], pin: 'p' };
    const grid = noiseGrid({ plus, minus: divider(of('R2_ohm'), of('R1_ohm')), temperature: of('T_K'), lowest: of('fL_Hz'), following: null });
    return outputNoise(grid, {
      voltageNoise: of('en_V_rtHz'),
      noiseCorner: of('fce_Hz'),
      currentNoise: of('in_A_rtHz'),
      currentCorner: of('fci_Hz'),
      gainBandwidth: of('GBW_Hz'),
    }).rms;
  });
  published('NOI-12', (of) => {
    const grid = noiseGrid({ plus: GROUNDED, minus: divider(of('NG') - 1, 1), ...band });
    return outputNoise(grid, { ...SILENT, voltageNoise: of('en_V_rtHz'), gainBandwidth: of('GBW_Hz') }).terms[0]!.rms;
  });
  published('NOI-13', (of) => {
    const grid = noiseGrid({ ...transimpedance(of('Rf_ohm'), of('Cf_F'), of('Cin_F')), ...band });
    return outputNoise(grid, { ...SILENT, voltageNoise: of('en_V_rtHz'), gainBandwidth: of('GBW_Hz') }).terms[0]!.rms;
  });
  published('NOI-14', (of) => {
    const grid = noiseGrid({ ...transimpedance(of('Rf_ohm'), of('Cf_F'), of('Cin_F')), ...band, temperature: of('T_K') });
    return outputNoise(grid, { ...SILENT, gainBandwidth: of('GBW_Hz') }).terms[3]!.rms;
  });

  const grid = noiseGrid({ plus: DRIVEN, minus: FOLLOWING, ...band });
  refuses(() => outputNoise(grid, { ...SILENT, gainBandwidth: 0 }), 'outputNoise: gainBandwidth must be finite, above 0, but is 0');
  refuses(() => outputNoise(grid, { ...SILENT, voltageNoise: -1, gainBandwidth: 1 }), 'outputNoise: voltageNoise must be finite, at least 0, but is -1');
  refuses(() => outputNoise(grid, { ...SILENT, gainBandwidth: 1, poles: [0] }), 'outputNoise: pole must be finite, above 0, but is 0');
});

/** ∫ density df over the whole axis by adaptive Simpson, from the networks and not from the grid. */
function byQuadrature(stage: NoiseStage, amplifier: NoisyAmplifier): number {
  const density = outputDensity(stage, amplifier);
  return Math.sqrt(integralOverLog((f) => butterworthPower(f, stage.following) * density(f), [stage.lowest, 1e22]));
}

function outputDensity({ plus, minus, plusCapacitance, minusCapacitance, temperature }: FeedbackNetworks & { temperature: number }, amplifier: NoisyAmplifier) {
  const [p, m] = [pinResponses(plus, plusCapacitance), pinResponses(minus, minusCapacitance)];
  const { voltageNoise, noiseCorner, currentNoise, gainBandwidth, poles = [] } = amplifier;
  return (f: number): number => {
    const [atPlus, atMinus] = [p(f), m(f)];
    const x = f / (poles[0] ?? Infinity);
    const re = atMinus.fromOutput.re - atPlus.fromOutput.re - (f / gainBandwidth) * x;
    const im = atMinus.fromOutput.im - atPlus.fromOutput.im + f / gainBandwidth;
    const impedances = atPlus.impedance.re ** 2 + atPlus.impedance.im ** 2 + atMinus.impedance.re ** 2 + atMinus.impedance.im ** 2;
    const thermal = [...atPlus.thermal, ...atMinus.thermal].reduce((sum, { transfer }) => sum + 4 * BOLTZMANN * temperature * transfer, 0);
    return (voltageNoise ** 2 * (1 + noiseCorner / f) + currentNoise ** 2 * impedances + thermal) / (re * re + im * im);
  };
}

/** Adaptive Simpson over ln f: halved until the two levels agree to 1e-9 of the whole, with Richardson's correction. */
function integralOverLog(curve: (frequency: number) => number, [from, to]: readonly [number, number]): number {
  const f = (u: number): number => Math.exp(u) * curve(Math.exp(u));
  const [start, end] = [Math.log(from), Math.log(to)];
  const pieces = 400;
  const step = (end - start) / pieces;
  const coarse = Array.from({ length: pieces }, (_, k) => step * f(start + (k + 0.5) * step)).reduce((sum, part) => sum + part, 0);
  const piece = (a: number, b: number, [fa, fm, fb]: readonly [number, number, number], depth: number): number => {
    const whole = ((b - a) / 6) * (fa + 4 * fm + fb);
    const m = (a + b) / 2;
    const [fl, fr] = [f((a + m) / 2), f((m + b) / 2)];
    const halves = ((b - a) / 12) * (fa + 4 * fl + 2 * fm + 4 * fr + fb);
    if (Math.abs(halves - whole) < 1e-10 * coarse || depth > 20) return halves + (halves - whole) / 15;
    return piece(a, m, [fa, fl, fm], depth + 1) + piece(m, b, [fm, fr, fb], depth + 1);
  };
  let sum = 0;
  for (let k = 0; k < pieces; k += 1) {
    const [a, b] = [start + k * step, start + (k + 1) * step];
    sum += piece(a, b, [f(a), f((a + b) / 2), f(b)], 0);
  }
  return sum;
}
