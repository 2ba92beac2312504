import { describe, expect, it } from 'vitest';
import { loopCrossover, loopPhaseMargin } from '../../src/formulas/feedback-loop.js';
import type { Topology } from '../../src/spec/spec.js';
import type { Parts } from '../support/drawings.js';
import type { LiveAmplifier, LiveLoad } from '../support/live-amplifier.js';
import { openedLoop, type LiveStage } from '../support/live-stage.js';
import { networksOf } from '../support/pin-networks.js';
import { shown } from '../support/shown.js';
import { SIMULATED } from '../support/spice.js';
import { judgedNumber } from '../support/exact-part.js';
import { BENCHES, built, type Bench } from '../support/twelve.js';
import { maximallyFlatCapacitor } from '../../src/formulas/transimpedance.js';

// Source: ngspice 45 (eecircuit-engine), drawings of our own; the loop opened by a voltage at the amplifier's own output
// (Middlebrook, Int. J. Electronics 38(4), 1975, from memory). Relation: 180° + arg(A·β) at the true crossover, everything counted.

type Row = readonly [name: string, topology: Topology, parts: Parts, amplifier: LiveAmplifier, load?: LiveLoad];

const TEN_MEGAHERTZ: LiveAmplifier = { gainBandwidth: 10e6, inputCapacitance: 5e-12, outputResistance: 150 };
const ONE_MEGAHERTZ: LiveAmplifier = { gainBandwidth: 1e6, inputCapacitance: 8e-12, outputResistance: 200 };
const CABLE: LiveLoad = { resistance: 10e3, capacitance: 330e-12 };
const ISOLATED: LiveLoad = { resistance: 10e3, capacitance: 10e-9, isolation: 50 };

const ROWS: readonly Row[] = [
  ['load capacitance alone', 'follower', {}, { gainBandwidth: 1e6, outputResistance: 200 }, { capacitance: 1e-9 }],
  ['isolation resistor', 'follower', {}, { gainBandwidth: 1e6, outputResistance: 200 }, { capacitance: 10e-9, isolation: 50 }],
  ['all at once, behind a source', 'follower', { source: 10e3 }, { ...ONE_MEGAHERTZ, poles: [3e6] }, ISOLATED],
  ['input capacitance alone', 'inverting', { feedback: 100e3, input: 100e3 }, { gainBandwidth: 10e6, inputCapacitance: 10e-12 }],
  ['neutral feedback capacitor', 'inverting', { feedback: 100e3, input: 100e3, feedbackCapacitor: 10e-12 }, { gainBandwidth: 10e6, inputCapacitance: 10e-12 }],
  ['load and input capacitance', 'inverting', { feedback: 47e3, input: 10e3, source: 1e3, referenceResistance: 5e3 }, TEN_MEGAHERTZ, CABLE],
  ['load and input capacitance', 'non-inverting', { feedback: 70e3, input: 10e3, source: 1e3 }, TEN_MEGAHERTZ, CABLE],
  ['reference of 5 kΩ with a bypass', 'non-inverting', { feedback: 27e3, input: 10e3, referenceResistance: 5e3, bypass: 100e-9 }, TEN_MEGAHERTZ, CABLE],
  ['three legs', 'summing', { feedback: 30e3, a: 100e3, b: 200e3, c: 100e3, referenceResistance: 5e3, bypass: 10e-6 }, TEN_MEGAHERTZ, CABLE],
  ['load and input capacitance', 'difference', { feedback: 200e3, input: 18.7e3, source: 1.43e3 }, TEN_MEGAHERTZ, CABLE],
  ['maximally flat', 'transimpedance', { feedback: 100e3, diode: 50e-12, feedbackCapacitor: 3.986e-12 }, { gainBandwidth: 10e6 }],
  ['with everything', 'transimpedance', { feedback: 100e3, diode: 45e-12, feedbackCapacitor: 3.986e-12 }, { ...TEN_MEGAHERTZ, poles: [15e6] }, ISOLATED],
  ['without a capacitor', 'transimpedance', { feedback: 100e3, diode: 50e-12 }, { gainBandwidth: 10e6 }],
  ['isolated', 'low-side-sense', { feedback: 195e3, input: 5e3, shunt: 20e-3 }, { gainBandwidth: 20e6, outputResistance: 300, inputCapacitance: 5e-12, poles: [8e6] }, { resistance: 10e3, capacitance: 1e-9, isolation: 220 }],
  ['attenuating', 'high-side-sense', { feedback: 100e3, input: 250e3, shunt: 50e-3 }, ONE_MEGAHERTZ, CABLE],
  ['unity gain, Q = 1', 'sallen-key-low-pass', { r1: 10e3, r2: 10e3, c1: 3.2e-9, c2: 0.8e-9 }, ONE_MEGAHERTZ, CABLE],
  ['gain of 2, Q = 1, low bandwidth', 'sallen-key-low-pass', { r1: 10e3, r2: 10e3, c1: 1.6e-9, c2: 1.6e-9, feedback: 10e3, input: 10e3 }, { gainBandwidth: 100e3, outputResistance: 1e3 }, { capacitance: 2.2e-9 }],
  ['gain of −2', 'multiple-feedback-low-pass', { r1: 5e3, r2: 10e3, r3: 3e3, c1: 10e-9, c2: 1e-9 }, ONE_MEGAHERTZ, CABLE],
  ['10 kΩ and 10 nF', 'integrator', { input: 10e3, c: 10e-9 }, ONE_MEGAHERTZ, { capacitance: 4.7e-9 }],
];

const stageOf = ([, topology, parts, amplifier, load]: Row): LiveStage => ({ topology, parts, amplifier, driven: { input: 0 }, ...(load === undefined ? {} : { load }) });

describe('loop opened in ngspice 45 (eecircuit-engine), netlist of our own: crossover and phase margin', SIMULATED, () => {
  for (const row of ROWS) {
    it(`${row[1]}: ${row[0]}`, async () => {
      const stage = stageOf(row);
      const { gainBandwidth, poles } = stage.amplifier;
      const loop = { gainBandwidth, ...(poles === undefined ? {} : { poles }) };
      const simulated = await openedLoop(stage, [1e3, 1e9]);
      expect(Math.abs(loopCrossover(networksOf(stage), loop) / simulated.crossover - 1)).toBeLessThan(0.001);
      const margin = loopPhaseMargin(networksOf(stage), loop);
      shown(`${row[1]} ${row[0]}`, [margin, simulated.margin]);
      expect(Math.abs(margin - simulated.margin), `${margin}° against ${simulated.margin}°`).toBeLessThan(0.05);
    });
  }
});

const FIGURES = { gainBandwidth: 10e6, inputCapacitance: 5e-12, outputResistance: 150, phaseMargin: 65, unityCrossover: 8e6 } as const;

const LOADS: readonly (readonly [text: string, load: LiveLoad])[] = [
  ['load: {resistance: 10 kΩ, to: ground, capacitance: 330 pF}', { resistance: 10e3, capacitance: 330e-12 }],
  ['load: {resistance: 10 kΩ, to: ground, capacitance: 10 nF, isolation: 50 Ω}', { resistance: 10e3, capacitance: 10e-9, isolation: 50 }],
];

/** The part of FIGURES: its second pole from its own margin at its own crossover, its gain bandwidth printed under this load. */
function partUnder({ resistance = Infinity, isolation = 0 }: LiveLoad): LiveAmplifier {
  const { gainBandwidth, inputCapacitance, outputResistance, phaseMargin, unityCrossover } = FIGURES;
  const loaded = (resistance + isolation) / (resistance + isolation + outputResistance);
  return { gainBandwidth: gainBandwidth / loaded, inputCapacitance, outputResistance, poles: [unityCrossover * Math.tan((phaseMargin * Math.PI) / 180)] };
}

describe('verdicts on the phase margin, ngspice 45 (eecircuit-engine), netlist of our own', SIMULATED, () => {
  const agrees = async (bench: Bench, [text, load]: (typeof LOADS)[number], parts = bench.parts(built(bench, 'phaseMargin: 45°', text))): Promise<void> => {
    const stage = built(bench, 'phaseMargin: 45°', text);
    const { verdict, offered } = judgedNumber(stage, 'phase-margin', FIGURES);
    const simulated = await openedLoop({ topology: bench.topology, parts, amplifier: partUnder(load), driven: { input: 0 }, load }, [1e3, 1e9]);
    shown(`${bench.topology} ${bench.name}, ${text}`, [offered, simulated.margin]);
    expect(Math.abs(offered - simulated.margin), `${text}: ${offered}° against ${simulated.margin}°`).toBeLessThan(1);
    expect(verdict.outcome).toBe(simulated.margin >= 45 ? 'pass' : 'fail');
  };

  for (const bench of BENCHES) {
    it(`${bench.topology}, ${bench.name}: with a cable, and with 10 nF behind 50 Ω`, async () => {
      for (const load of LOADS) await agrees(bench, load);
    });
  }

  it('transimpedance with the maximally flat capacitor of the part', async () => {
    const bench = BENCHES.find(({ topology }) => topology === 'transimpedance')!;
    const open: Bench = { ...bench, name: 'open', file: bench.file.replace('capacitors: {feedback: 5 pF}\n', '') };
    const { gainBandwidth, inputCapacitance } = FIGURES;
    const feedbackCapacitor = maximallyFlatCapacitor({ feedback: 100e3, inputCapacitance: 50e-12 + inputCapacitance, gainBandwidth });
    for (const load of LOADS) await agrees(open, load, { feedback: 100e3, diode: 50e-12, feedbackCapacitor });
  });
});
