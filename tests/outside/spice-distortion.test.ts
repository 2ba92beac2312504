import { describe, expect, it } from 'vitest';
import { deriveDemands } from '../../src/demands/index.js';
import { closedLoopNoiseGain } from '../../src/formulas/feedback-loop.js';
import { thirdHarmonicBipolar } from '../../src/formulas/input-pair-distortion.js';
import type { Figure } from '../../src/parts/figures.js';
import { verdictOn } from '../support/bench.js';
import { exactFigures } from '../support/exact-part.js';
import { responseAt, settledPeriod, type LiveStage } from '../support/live-stage.js';
import { magnitude } from '../support/nodal.js';
import { networksOf } from '../support/pin-networks.js';
import { shown } from '../support/shown.js';
import { SIMULATED } from '../support/spice.js';
import { BENCHES, built, type Bench } from '../support/twelve.js';
import { harmonic } from '../support/waveforms.js';

// Source: ngspice 45 (eecircuit-engine), transients of drawings of our own whose input pair follows the tanh of two bipolar transistors
// (Solomon, IEEE J. Solid-State Circuits 9(6), 1974, from memory). Relation: third harmonic NG·(f/GBW)·2ρ³/(3r), r = 2π·f·Vp/SR.

/** An output that reaches both rails at any current: nothing is clipped. */
const ENDLESS: readonly Figure[] = (['outputLowHeadroom', 'outputHighHeadroom'] as const).map((parameter) => ({
  parameter, kind: 'max', value: 0, condition: { load: { kind: 'current', amperes: 10 } },
}));

interface Compared {
  /** By the verdict, and by the formula with the closed-loop noise gain at three times the frequency. */
  readonly verdict: number;
  readonly formula: number;
  readonly simulated: number;
}

/**
 * How much faster the loop is than the signal. The relation is of first order in the error between the inputs: at 100 times a
 * transimpedance stage is off by 2.2 %, an integrator by 2.9 % at 0.8 of the slew rate.
 */
function fasterBy({ topology }: Bench): number {
  if (topology === 'transimpedance') return 2000;
  return topology === 'integrator' ? 500 : 100;
}

/** The third harmonic at a share r of the slew rate. */
async function compare(bench: Bench, r: number): Promise<Compared> {
  const stage = built(bench, 'distortion: 50 %');
  const demands = deriveDemands(stage);
  const frequency = stage.frequency!;
  const slewRate = (2 * Math.PI * frequency * stage.outputPeak) / r;
  const gainBandwidth = fasterBy(bench) * frequency * stage.noiseGain.nominal;
  const figures = [...exactFigures({ slewRate, gainBandwidth, offsetVoltage: 0 }), ...ENDLESS];
  const term = verdictOn(demands, 'distortion', figures).terms.find(({ name }) => name === 'slewing')!;
  const linear: LiveStage = { topology: bench.topology, parts: bench.parts(stage), amplifier: { gainBandwidth }, driven: { input: 'dc 0 ac 1' } };
  const input = stage.outputPeak / magnitude(await responseAt(linear, frequency));
  const live: LiveStage = { ...linear, amplifier: { gainBandwidth, slewRate, pair: 'bipolar' }, driven: { input: `sin(0 ${input} ${frequency})`, supply: 0 } };
  const samples = await settledPeriod(live, { frequency, points: 2000, periods: 6 });
  const { re, im } = closedLoopNoiseGain(networksOf(linear), { gainBandwidth }, 3 * frequency);
  const formula = thirdHarmonicBipolar({ ratio: r, frequency, gainBandwidth, noiseGain: Math.max(1, Math.hypot(re, im)) });
  return { verdict: term.value, formula, simulated: harmonic(samples, 3) / harmonic(samples, 1) };
}

describe('distortion below the slew limit, ngspice 45 (eecircuit-engine), netlist of our own', SIMULATED, () => {
  for (const bench of BENCHES.filter(({ name }) => !name.includes('10 µF across'))) {
    const title = `${bench.topology}, ${bench.name}`;

    it(`${title}: third harmonic of a bipolar pair with the noise gain where the harmonic is`, async () => {
      const { formula, simulated } = await compare(bench, 0.5);
      shown(`${title}, formula`, [formula, simulated]);
      expect(Math.abs(formula / simulated - 1)).toBeLessThan(0.02);
    });

    it(`${title}: the verdict's third harmonic at 0.5 and 0.8 of the slew rate`, async () => {
      for (const r of [0.5, 0.8]) {
        const { verdict, simulated } = await compare(bench, r);
        shown(`${title}, r = ${r}`, [verdict, simulated]);
        expect(Math.abs(verdict / simulated - 1), `r = ${r}`).toBeLessThan(0.02);
      }
    });
  }
});
