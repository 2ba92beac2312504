import { describe, expect, it } from 'vitest';
import { slewedDistortion, slewedPeak } from '../../src/formulas/slewed-sine.js';
import type { Topology } from '../../src/spec/spec.js';
import type { Parts } from '../support/drawings.js';
import { responseAt, settledPeriod, type LiveStage } from '../support/live-stage.js';
import { magnitude } from '../support/nodal.js';
import { shown } from '../support/shown.js';
import { SIMULATED } from '../support/spice.js';
import { harmonics } from '../support/waveforms.js';

// Source: ngspice 45 (eecircuit-engine), transients of drawings of our own whose amplifier has a hard limit of its slope.
// Relation: the sine left where its slope is exceeded and met again (own algebra); s = SR/(2π·f·Vp).

const FREQUENCY = 1e3;
const RATIOS = [0.9, 0.75, 0.6, 0.4];

type Row = readonly [topology: Topology, parts: Parts, gainBandwidth: number];

/** Loops so fast that they take nothing from the sine themselves. */
const RESISTIVE: readonly Row[] = [
  ['follower', { source: 10e3 }, 500e3],
  ['non-inverting', { feedback: 70e3, input: 10e3, source: 1e3 }, 4e6],
  ['inverting', { feedback: 27e3, input: 8e3, source: 1e3 }, 2e6],
  ['summing', { feedback: 30e3, a: 100e3, b: 200e3, c: 100e3 }, 1e6],
  ['difference', { feedback: 200e3, input: 18e3, source: 2e3 }, 6e6],
  // Longer than a hundredth of a radian, Rf·(Cin + Cf) remembers too: 100 kΩ here would move the peak by 1.9 %.
  ['transimpedance', { feedback: 20e3, diode: 50e-12, feedbackCapacitor: 8e-12 }, 10e6],
  ['low-side-sense', { feedback: 195e3, input: 5e3, shunt: 20e-3 }, 20e6],
  ['high-side-sense', { feedback: 100e3, input: 250e3, shunt: 50e-3 }, 1e6],
];

/** Their capacitors remember the slewing, so that the sine is not met again where the closed form has it. */
const REMEMBERING: readonly Row[] = [
  ['sallen-key-low-pass', { r1: 10e3, r2: 10e3, c1: 3.2e-9, c2: 0.8e-9 }, 500e3],
  ['multiple-feedback-low-pass', { r1: 5e3, r2: 10e3, r3: 3e3, c1: 10e-9, c2: 1e-9 }, 2e6],
  ['integrator', { input: 10e3, c: 10e-9 }, 1e6],
];

interface Wave {
  readonly peak: number;
  readonly distortion: number;
}

/** A sine of 1 V at the output, through an amplifier that does at most `ratio` of its slope. */
async function slewed([topology, parts, gainBandwidth]: Row, ratio: number): Promise<Wave> {
  const linear: LiveStage = { topology, parts, amplifier: { gainBandwidth }, driven: { input: 'dc 0 ac 1' } };
  const gain = magnitude(await responseAt(linear, FREQUENCY));
  const amplifier = { gainBandwidth, slewRate: ratio * 2 * Math.PI * FREQUENCY };
  const driven = { input: `sin(0 ${1 / gain} ${FREQUENCY})`, supply: 0 };
  const samples = await settledPeriod({ topology, parts, amplifier, driven }, { frequency: FREQUENCY, points: 4000, periods: 4 });
  const wave = { peak: (Math.max(...samples) - Math.min(...samples)) / 2, distortion: harmonics(samples).distortion };
  shown(`${topology} ${ratio}`, [slewedPeak(ratio), wave.peak], [slewedDistortion(ratio), wave.distortion]);
  return wave;
}

describe('sine through a hard slew limit, ngspice 45 (eecircuit-engine), netlist of our own', SIMULATED, () => {
  for (const row of RESISTIVE) {
    it(`${row[0]}: peak and distortion`, async () => {
      for (const ratio of RATIOS) {
        const found = await slewed(row, ratio);
        expect(Math.abs(found.peak / slewedPeak(ratio) - 1), `peak at ${ratio}`).toBeLessThan(0.02);
        expect(Math.abs(found.distortion / slewedDistortion(ratio) - 1), `distortion at ${ratio}`).toBeLessThan(0.02);
      }
    });
  }

  for (const row of REMEMBERING) {
    it(`${row[0]}: clean at 2π·f·Vp, not at 0.95 of it; a triangle far below`, async () => {
      expect((await slewed(row, 1.01)).distortion).toBeLessThan(2e-4);
      expect((await slewed(row, 0.95)).distortion).toBeGreaterThan(2e-3);
      const triangle = await slewed(row, 0.25);
      expect(Math.abs(triangle.peak / slewedPeak(0.25) - 1)).toBeLessThan(0.02);
      expect(Math.abs(triangle.distortion / slewedDistortion(0.25) - 1)).toBeLessThan(0.02);
    });
  }
});
