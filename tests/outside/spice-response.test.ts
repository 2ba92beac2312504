import { describe, expect, it } from 'vitest';
import { closedLoopGain } from '../../src/formulas/feedback-loop.js';
import { multipleFeedback, sallenKey } from '../../src/formulas/filters.js';
import { closedLoopBandwidth } from '../../src/formulas/gain-bandwidth.js';
import { halfPowerFrequency, peakOf } from '../../src/formulas/low-pass-response.js';
import { secondOrderPeak } from '../../src/formulas/second-order.js';
import { transimpedanceResponse } from '../../src/formulas/transimpedance.js';
import type { Topology } from '../../src/spec/spec.js';
import type { Parts } from '../support/drawings.js';
import { halfPower, peaking, response, responseAt, type LiveStage } from '../support/live-stage.js';
import { magnitude } from '../support/nodal.js';
import { networksOf } from '../support/pin-networks.js';
import { shown } from '../support/shown.js';
import { SIMULATED } from '../support/spice.js';

// Source: ngspice 45 (eecircuit-engine), small signal, drawings of our own with a one-pole amplifier.
// Relations: f(−3 dB) = GBW/NG; the cubics of both filters; the quadratic of the transimpedance stage; (a+ − a−)/(1/A + β).

/** −3 dB in Hz and the largest gain over that at the lowest frequencies. */
interface Expected {
  readonly bandwidth: number;
  readonly peak: number;
}

type Row = readonly [name: string, topology: Topology, parts: Parts, gainBandwidth: number, expected: Expected];

const flat = (gainBandwidth: number, noiseGain: number): Expected => ({ bandwidth: closedLoopBandwidth(gainBandwidth, noiseGain), peak: 1 });

function amplifierRow(topology: Topology, parts: Parts, noiseGain: number): Row {
  return [`noise gain ${noiseGain}`, topology, parts, 1e6, flat(1e6, noiseGain)];
}

function transimpedanceRow(feedbackCapacitor: number, gainBandwidth: number): Row {
  const { bandwidth, q } = transimpedanceResponse({ feedback: 100e3, inputCapacitance: 50e-12, feedbackCapacitance: feedbackCapacitor, gainBandwidth });
  return [`Cf ${feedbackCapacitor}`, 'transimpedance', { feedback: 100e3, diode: 50e-12, feedbackCapacitor }, gainBandwidth, { bandwidth, peak: secondOrderPeak(q) }];
}

function sallenKeyRow(parts: { r1: number; r2: number; c1: number; c2: number }, gain: number, gainBandwidth: number): Row {
  const exact = sallenKey({ ...parts, gain }, gainBandwidth);
  const loop = gain === 1 ? {} : { feedback: (gain - 1) * 10e3, input: 10e3 };
  return [`gain ${gain}, ${gainBandwidth} Hz`, 'sallen-key-low-pass', { ...parts, ...loop }, gainBandwidth, { bandwidth: halfPowerFrequency(exact), peak: peakOf(exact).gain / gain }];
}

function multipleFeedbackRow(parts: { r1: number; r2: number; r3: number; c1: number; c2: number }, gainBandwidth: number): Row {
  const exact = multipleFeedback(parts, gainBandwidth);
  return [`${gainBandwidth} Hz`, 'multiple-feedback-low-pass', parts, gainBandwidth, { bandwidth: halfPowerFrequency(exact), peak: (peakOf(exact).gain * parts.r1) / parts.r2 }];
}

const UNITY = { r1: 10e3, r2: 10e3, c1: 3.2e-9, c2: 0.8e-9 };
const EQUAL = { r1: 10e3, r2: 10e3, c1: 1.6e-9, c2: 1.6e-9 };
const TWICE = { r1: 5e3, r2: 10e3, r3: 3e3, c1: 10e-9, c2: 1e-9 };

const ROWS: readonly Row[] = [
  amplifierRow('follower', { source: 10e3 }, 1),
  amplifierRow('non-inverting', { feedback: 70e3, input: 10e3, source: 1e3 }, 8),
  amplifierRow('inverting', { feedback: 27e3, input: 8e3, source: 1e3, referenceResistance: 5e3 }, 4),
  amplifierRow('summing', { feedback: 30e3, a: 100e3, b: 200e3, c: 100e3 }, 1.75),
  amplifierRow('difference', { feedback: 200e3, input: 18e3, source: 2e3 }, 11),
  amplifierRow('low-side-sense', { feedback: 195e3, input: 5e3, shunt: 20e-3 }, 40),
  amplifierRow('high-side-sense', { feedback: 100e3, input: 250e3, shunt: 50e-3 }, 1.4),
  transimpedanceRow(3.986e-12, 10e6),
  transimpedanceRow(1e-12, 10e6),
  transimpedanceRow(30e-12, 1e6),
  sallenKeyRow(UNITY, 1, 10e6),
  sallenKeyRow(UNITY, 1, 200e3),
  sallenKeyRow(EQUAL, 2, 10e6),
  sallenKeyRow(EQUAL, 2.8, 500e3),
  multipleFeedbackRow(TWICE, 10e6),
  multipleFeedbackRow(TWICE, 300e3),
];

const stageOf = (topology: Topology, parts: Parts, gainBandwidth: number): LiveStage => ({ topology, parts, amplifier: { gainBandwidth }, driven: { input: 'dc 0 ac 1' } });

describe('small-signal response, ngspice 45 (eecircuit-engine), netlist of our own', SIMULATED, () => {
  for (const [name, topology, parts, gainBandwidth, expected] of ROWS) {
    it(`${topology}, ${name}: −3 dB and peaking`, async () => {
      const curve = await response(stageOf(topology, parts, gainBandwidth), [expected.bandwidth * 1e-3, expected.bandwidth * 10]);
      const found = { bandwidth: halfPower(curve), peak: peaking(curve) };
      shown(`${topology} ${name}`, [expected.bandwidth, found.bandwidth], [expected.peak, found.peak]);
      expect(Math.abs(found.bandwidth / expected.bandwidth - 1)).toBeLessThan(0.001);
      expect(Math.abs(found.peak / expected.peak - 1)).toBeLessThan(0.001);
    });
  }

  const voltageDriven = ROWS.filter(([, topology]) => !['transimpedance', 'low-side-sense', 'high-side-sense'].includes(topology));
  const integrators: Row[] = [['10 kΩ and 10 nF', 'integrator', { input: 10e3, c: 10e-9 }, 1e6, { bandwidth: 1.6e3, peak: 1 }]];
  for (const [name, topology, parts, gainBandwidth, { bandwidth }] of [...voltageDriven, ...integrators]) {
    it(`${topology}, ${name}: size and angle from the network, a decade to both sides of the corner`, async () => {
      const stage = stageOf(topology, parts, gainBandwidth);
      for (const frequency of [bandwidth / 10, bandwidth, bandwidth * 10]) {
        const { re, im } = closedLoopGain(networksOf(stage), { gainBandwidth }, frequency);
        const found = await responseAt(stage, frequency);
        expect(magnitude([re - found[0], im - found[1]]) / magnitude(found), `at ${frequency} Hz`).toBeLessThan(1e-5);
      }
    });
  }
});
