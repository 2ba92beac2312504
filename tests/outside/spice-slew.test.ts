import { describe, expect, it } from 'vitest';
import { slewedDistortion } from '../../src/formulas/slewed-sine.js';
import { slewing } from '../support/amplifiers.js';
import { demandsOf, verdictOn, type Asked } from '../support/bench.js';
import type { Bench, Circuit } from '../support/netlists.js';
import { settledPeriods, sine } from '../support/settled.js';
import { SIMULATED } from '../support/spice.js';
import { harmonics } from '../support/waveforms.js';

// Source: ngspice 45 (eecircuit-engine), netlist of our own, one pole with a hard limit of its slewing current.
// Relation: SR = 2π·f·Vp at the output, largest corner of the resistors; over-driven sine of method section 2.

const FREQUENCY = 1e3;
const SAMPLING = { frequency: FREQUENCY, points: 4000 };
const TOLERANCE = 0.01;
/** So fast that the loop itself takes nothing from the sine. */
const GAIN_BANDWIDTH_PER_NOISE_GAIN = 500 * FREQUENCY;

interface Case {
  readonly name: string;
  readonly bench: Bench;
  /** The same with all ratios at their upper end: written by hand. */
  readonly largest: Bench;
  readonly asked: Asked;
  /** Volts: middle and half span of each input. */
  readonly inputs: Readonly<Record<string, readonly [number, number]>>;
  readonly noiseGain: number;
}

const up = (ohms: number): number => ohms * (1 + TOLERANCE);
const down = (ohms: number): number => ohms * (1 - TOLERANCE);

const CASES: readonly Case[] = [
  {
    name: 'follower',
    bench: { topology: 'follower', source: 1e3 },
    largest: { topology: 'follower', source: 1e3 },
    asked: { supply: '5 V', signal: 'input: 0.5..4.5 V, frequency: 1 kHz' },
    inputs: { input: [2.5, 2] },
    noiseGain: 1,
  },
  {
    name: 'non-inverting',
    bench: { topology: 'non-inverting', feedback: 70e3, input: 10e3 },
    largest: { topology: 'non-inverting', feedback: up(70e3), input: down(10e3) },
    asked: { supply: '5 V', signal: 'input: 25 mV..330 mV, frequency: 1 kHz', tolerance: 1 },
    inputs: { input: [0.1775, 0.1525] },
    noiseGain: 8,
  },
  {
    name: 'inverting before a source resistance',
    bench: { topology: 'inverting', feedback: 47e3, input: 22e3, source: 1e3 },
    largest: { topology: 'inverting', feedback: up(47e3), input: down(22e3), source: 1e3 },
    asked: { supply: '5 V', reference: '2.5 V', signal: 'input: 1.7..3.1 V, frequency: 1 kHz', tolerance: 1 },
    inputs: { input: [2.4, 0.7] },
    noiseGain: 3,
  },
  {
    name: 'difference, legs swinging against each other',
    bench: { topology: 'difference', feedback: 40e3, input: 20e3, positiveInput: 20e3, toReference: 40e3 },
    largest: { topology: 'difference', feedback: up(40e3), input: down(20e3), positiveInput: down(20e3), toReference: up(40e3) },
    asked: { supply: '5 V', reference: '2.5 V', signal: 'positive: 0.9..1.5 V, negative: 1..1.4 V, frequency: 1 kHz', tolerance: 1 },
    inputs: { positive: [1.2, 0.3], negative: [1.2, -0.2] },
    noiseGain: 3,
  },
];

interface Wave {
  readonly peak: number;
  readonly distortion: number;
}

/** The settled third period of a stage whose amplifier slews at most `slewRate` V/s. */
async function settled(one: Case, slewRate: number): Promise<Wave> {
  const inputs = Object.fromEntries(Object.entries(one.inputs).map(([name, [middle, half]]) => [name, sine(middle, half, SAMPLING)]));
  const amplifier = slewing(GAIN_BANDWIDTH_PER_NOISE_GAIN * one.noiseGain, slewRate);
  const circuit: Circuit = { name: 'a', bench: one.largest, amplifier, drive: { supply: 5, reference: 2.5 * Number(one.asked.reference !== undefined), inputs } };
  const [samples = []] = await settledPeriods([circuit], SAMPLING);
  return { peak: (Math.max(...samples) - Math.min(...samples)) / 2, distortion: harmonics(samples).distortion };
}

const required = (one: Case): number => demandsOf(one.bench, one.asked)['slew-rate']!.required;
const judged = (one: Case, slewRate: number): string =>
  verdictOn(demandsOf(one.bench, one.asked), 'slew-rate', [{ parameter: 'slewRate', kind: 'min', value: slewRate, condition: {} }]).outcome;

describe('hard slew limit, ngspice 45 (eecircuit-engine), netlist of our own', SIMULATED, () => {
  for (const one of CASES) {
    it(`${one.name}: a full sine at the least slew rate is clean at the largest corner`, async () => {
      const least = required(one);
      const clean = await settled(one, least);
      const unlimited = await settled(one, 100 * least);
      expect(clean.distortion).toBeLessThan(2e-4);
      expect(Math.abs(clean.peak / unlimited.peak - 1)).toBeLessThan(1e-4);
      // The steepest slope of the simulated sine is the demand: the corner is the largest one, not a larger.
      expect(Math.abs((2 * Math.PI * FREQUENCY * unlimited.peak) / least - 1)).toBeLessThan(1e-4);
      expect(judged(one, least)).toBe('pass');
    });

    it(`${one.name}: at 0.9 × it slews, with the peak still there`, async () => {
      const least = required(one);
      const slewed = await settled(one, 0.9 * least);
      const full = await settled(one, 100 * least);
      expect(slewed.distortion).toBeGreaterThan(0.0235);
      expect(slewed.distortion).toBeLessThan(0.0245);
      expect(Math.abs(slewed.distortion / slewedDistortion(0.9) - 1)).toBeLessThan(0.01);
      expect(Math.abs(slewed.peak / full.peak - 1)).toBeLessThan(1e-3);
      expect(judged(one, 0.9 * least)).toBe('fail');
    });
  }
});
