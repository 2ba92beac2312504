import { describe, expect, it } from 'vitest';
import { bandwidthForSettling, riseTime, settlingTime, slewRateForSettling } from '../../src/formulas/settling.js';
import type { Topology } from '../../src/spec/spec.js';
import type { Parts } from '../support/drawings.js';
import { settlesAt, transient, type LiveStage } from '../support/live-stage.js';
import { shown } from '../support/shown.js';
import { SIMULATED } from '../support/spice.js';
import { deriveDemands } from '../../src/demands/index.js';
import { judgedNumber } from '../support/exact-part.js';
import { responseAt } from '../support/live-stage.js';
import { magnitude } from '../support/nodal.js';
import { BENCHES, built, type Bench } from '../support/twelve.js';

// Source: ngspice 45 (eecircuit-engine), transients of drawings of our own: one pole with a hard limit of its slope, driven by a step.
// Relation: slewing until the error is SR·τ, then exponential (Franco, 3rd ed. 2002, ex. 6.7, onset; own algebra).

/** Step of the source in its own unit, and what it makes at the output, V. */
type Row = readonly [topology: Topology, parts: Parts, noiseGain: number, step: number, gain: number];

const ROWS: readonly Row[] = [
  ['follower', { source: 10e3 }, 1, 2, 1],
  ['non-inverting', { feedback: 70e3, input: 10e3, source: 1e3 }, 8, 0.25, 8],
  ['inverting', { feedback: 27e3, input: 8e3, source: 1e3 }, 4, 0.6, -3],
  ['summing', { feedback: 30e3, a: 100e3, b: 200e3, c: 100e3 }, 1.75, 5, -0.3],
  ['difference', { feedback: 200e3, input: 18e3, source: 2e3 }, 11, 0.2, 10],
  ['low-side-sense', { feedback: 195e3, input: 5e3, shunt: 20e-3 }, 40, 3, 0.8],
  ['high-side-sense', { feedback: 100e3, input: 250e3, shunt: 50e-3 }, 1.4, 50, 0.02],
];

const BANDWIDTH = 100e3;
const TIME_CONSTANT = 1 / (2 * Math.PI * BANDWIDTH);
const TOLERANCE = 1e-3;

/** The step leaves after a microsecond, rises in a nanosecond. */
const START = 1e-6;

async function stepped([topology, parts, noiseGain, step, gain]: Row, slewRate: number, duration: number) {
  const amplifier = { gainBandwidth: noiseGain * BANDWIDTH, slewRate };
  const stage: LiveStage = { topology, parts, amplifier, driven: { input: `pwl(0 0 ${START} 0 ${START + 1e-9} ${step})`, supply: 0 } };
  const wave = await transient(stage, START + duration, 4000);
  const height = Math.abs(gain * step);
  const output = wave.output.map((value) => value * Math.sign(gain));
  const reach = (share: number): number => settlesAt({ times: wave.times, output }, height, (1 - share) * height) - START;
  return { settles: reach(1 - TOLERANCE), rises: reach(0.9) - reach(0.1), height };
}

describe('a step through a hard slew limit, ngspice 45 (eecircuit-engine), netlist of our own', SIMULATED, () => {
  for (const row of ROWS) {
    it(`${row[0]}: time to 0.1 % and 10..90 %, slewing all the way, half the way and not at all`, async () => {
      const step = Math.abs(row[3] * row[4]);
      for (const slewing of [0.05, 0.4, 2]) {
        const slewRate = (slewing * step) / TIME_CONSTANT;
        const ours = settlingTime({ step, slewRate, timeConstant: TIME_CONSTANT, tolerance: TOLERANCE });
        const rise = riseTime({ step, slewRate, timeConstant: TIME_CONSTANT });
        const found = await stepped(row, slewRate, 1.3 * ours);
        shown(`${row[0]} SR·τ = ${slewing} ΔV`, [ours, found.settles], [rise, found.rises]);
        expect(Math.abs(ours / found.settles - 1)).toBeLessThan(0.01);
        expect(Math.abs(rise / found.rises - 1)).toBeLessThan(0.01);
      }
    });

    it(`${row[0]}: at the least slew rate and the least bandwidth it settles when it is asked to`, async () => {
      const step = Math.abs(row[3] * row[4]);
      const least = bandwidthForSettling(12e-6, TOLERANCE);
      expect(least).toBeLessThan(BANDWIDTH);
      const slewRate = slewRateForSettling({ step, time: 20e-6, timeConstant: TIME_CONSTANT, tolerance: TOLERANCE });
      const found = await stepped(row, slewRate, 26e-6);
      shown(`${row[0]} SR for 20 µs`, [20e-6, found.settles]);
      expect(Math.abs(20e-6 / found.settles - 1)).toBeLessThan(0.01);
    });
  }
});

/** The same stage asked for a step; those whose bypass moves the gain in the long run, and the integrator, follow none. */
const STEPPED: readonly Bench[] = BENCHES.filter(({ topology, name }) => topology !== 'integrator' && !name.includes('10 µF across') && !name.includes('AC-coupled')).map((bench) => ({
  ...bench,
  file: bench.file.replace(/frequency: [0-9]+ kHz/, 'shape: step'),
}));

interface Stepping {
  readonly gainBandwidth: number;
  readonly slewRate: number;
  readonly step: number;
  readonly parts: Parts;
}

/** A step of the stage's own size at its output (V, upwards), through an amplifier of these figures. */
async function steppedBench(bench: Bench, { gainBandwidth, slewRate, step, parts }: Stepping, duration: number) {
  const resting: LiveStage = { topology: bench.topology, parts, amplifier: { gainBandwidth }, driven: { input: 'dc 0 ac 1' } };
  const gain = await responseAt(resting, 1e-3);
  const input = step / magnitude(gain);
  const driven = { input: `pwl(0 0 ${START} 0 ${START + 1e-9} ${input})`, supply: 0 };
  const wave = await transient({ ...resting, amplifier: { gainBandwidth, slewRate }, driven }, START + duration, 6000);
  return { times: wave.times, output: wave.output.map((value) => value * Math.sign(gain[0])) };
}

/** When it stays within the tolerance, s. */
async function simulatedSettling(bench: Bench, stepping: Stepping, duration: number): Promise<number> {
  return settlesAt(await steppedBench(bench, stepping, duration), stepping.step, TOLERANCE * stepping.step) - START;
}

/** 10 % to 90 %, s, of a curve that only rises. */
async function simulatedRise(bench: Bench, stepping: Stepping, duration: number): Promise<number> {
  const wave = await steppedBench(bench, stepping, duration);
  return settlesAt(wave, stepping.step, 0.1 * stepping.step) - settlesAt(wave, stepping.step, 0.9 * stepping.step);
}

/** Closed-loop bandwidth of BANDWIDTH where one pole makes it; far above that of a filter. */
function bandwidthFor({ topology }: Bench, noiseGain: number): number {
  if (topology.endsWith('low-pass')) return 2e6;
  return noiseGain * BANDWIDTH * (topology === 'transimpedance' ? 50 : 1);
}

describe('verdicts on settling, ngspice 45 (eecircuit-engine), netlist of our own', SIMULATED, () => {
  for (const bench of STEPPED) {
    const stage = built(bench, 'settling: {within: 1 s, to: 0.1 %}');
    const { step, closedLoop } = deriveDemands(stage).settling!;
    const gainBandwidth = bandwidthFor(bench, stage.noiseGain.nominal);
    const linear = judgedNumber(stage, 'settling', { gainBandwidth, slewRate: 1e12 }).offered;
    const simulated = (slewRate: number, duration: number): Promise<number> => simulatedSettling(bench, { gainBandwidth, slewRate, step, parts: bench.parts(stage) }, duration);

    it(`${bench.topology}, ${bench.name}: to 0.1 %`, async () => {
      for (const slewing of closedLoop.form === 'one-pole' ? [0.05, 0.4, 2] : [1e6]) {
        const slewRate = (slewing * step) / TIME_CONSTANT;
        const { offered } = judgedNumber(stage, 'settling', { gainBandwidth, slewRate });
        const found = await simulated(slewRate, 1.4 * Math.max(offered, linear));
        shown(`${bench.topology} ${bench.name}, SR·τ = ${slewing} ΔV`, [offered, found]);
        expect(Math.abs(offered / found - 1)).toBeLessThan(0.05);
      }
    });

    if (closedLoop.form === 'one-pole') {
      it(`${bench.topology}, ${bench.name}: the least slew rate for an edge makes that edge`, async () => {
        const edge = 6e-6;
        const wanted = built({ ...bench, file: bench.file.replace('shape: step', `shape: step, edge: ${edge * 1e6} µs`) }, 'settling: {within: 1 s, to: 0.1 %}');
        const required = judgedNumber(wanted, 'slew-rate', { gainBandwidth, slewRate: 1e12 }).verdict.required as number;
        const rises = await simulatedRise(bench, { gainBandwidth, slewRate: required, step, parts: bench.parts(stage) }, 6 * edge);
        shown(`${bench.topology} ${bench.name}, edge at the least slew rate`, [edge, rises]);
        expect(Math.abs(edge / rises - 1)).toBeLessThan(0.01);
      });
      continue;
    }
    for (const share of [0.3, 1, 3]) {
      it(`${bench.topology}, ${bench.name}: slewing for ${share} of its time`, async () => {
        const slewRate = step / (share * linear);
        const { verdict, offered } = judgedNumber(stage, 'settling', { gainBandwidth, slewRate });
        const found = await simulated(slewRate, (3 + 2 * share) * linear);
        shown(`${bench.topology} ${bench.name}, slewing for ${share} of it`, [offered, found]);
        expect(Math.abs(offered / found - 1)).toBeLessThan(0.05);
        expect(verdict.basis).not.toBe('estimated');
      });
    }
  }
});
