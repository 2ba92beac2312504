import { beforeAll, describe, expect, it } from 'vitest';
import { noiseGrid } from '../../src/formulas/noise-grid.js';
import { outputNoise } from '../../src/formulas/noise-integral.js';
import type { Topology } from '../../src/spec/spec.js';
import type { Parts } from '../support/drawings.js';
import { generatorLevel, integrated, noiseDensity, type LiveStage } from '../support/live-stage.js';
import type { NoiseFigures } from '../support/live-amplifier.js';
import { networksOf } from '../support/pin-networks.js';
import { shown } from '../support/shown.js';
import { SIMULATED } from '../support/spice.js';
import { judgedNumber } from '../support/exact-part.js';
import { BENCHES, built } from '../support/twelve.js';

// Source: ngspice 45 (eecircuit-engine), .noise on drawings of our own. The amplifier's white and 1/f noise come from the shot and
// flicker noise of a diode, measured in a run of its own. Relation: every source at the input times |1/(1/A + β)|², integrated.

const CELSIUS = 60;
const LOWEST = 0.1;
const KELVIN = 273.15;
/** Elementary charge, C (SI Brochure, 9th ed. 2019). */
const ELECTRON = 1.602176634e-19;

type Figures = Omit<NoiseFigures, 'generator'>;
type Row = readonly [name: string, topology: Topology, parts: Parts, gainBandwidth: number, figures: Figures, inputCapacitance?: number];

const BIPOLAR: Figures = { voltage: 8e-9, corner: 20, current: 0.6e-12 };
const MOS: Figures = { voltage: 20e-9, corner: 3e3, current: 0 };

const ROWS: readonly Row[] = [
  ['alone', 'follower', {}, 1e6, { voltage: 10e-9, corner: 0, current: 0 }],
  ['behind 100 kΩ', 'follower', { source: 100e3 }, 1e6, BIPOLAR, 5e-12],
  ['× 8 behind 1 kΩ, 1/f', 'non-inverting', { feedback: 70e3, input: 10e3, source: 1e3 }, 1e6, MOS],
  ['a reference of 5 kΩ, bare', 'non-inverting', { feedback: 27e3, input: 10e3, referenceResistance: 5e3 }, 3e6, BIPOLAR, 5e-12],
  ['a reference of 5 kΩ with 1 µF', 'inverting', { feedback: 27e3, input: 10e3, source: 1e3, referenceResistance: 5e3, bypass: 1e-6 }, 3e6, BIPOLAR],
  ['a reference of 5 kΩ, bare', 'inverting', { feedback: 27e3, input: 10e3, source: 1e3, referenceResistance: 5e3 }, 3e6, BIPOLAR],
  ['a feedback capacitor', 'inverting', { feedback: 270e3, input: 10e3, feedbackCapacitor: 47e-12 }, 10e6, MOS, 8e-12],
  ['three legs', 'summing', { feedback: 30e3, a: 100e3, b: 200e3, c: 100e3, referenceResistance: 5e3, bypass: 10e-6 }, 1e6, BIPOLAR],
  ['bridge of 1.43 kΩ legs', 'difference', { feedback: 200e3, input: 18.7e3, source: 1.43e3 }, 1e6, BIPOLAR],
  ['maximally flat', 'transimpedance', { feedback: 100e3, diode: 50e-12, feedbackCapacitor: 3.986e-12 }, 10e6, { voltage: 20e-9, corner: 1e3, current: 0.01e-12 }],
  ['little damped', 'transimpedance', { feedback: 1.5e6, diode: 80e-12, feedbackCapacitor: 0.2e-12 }, 10e6, MOS],
  ['20 mΩ', 'low-side-sense', { feedback: 195e3, input: 5e3, shunt: 20e-3 }, 1e6, MOS],
  ['attenuating', 'high-side-sense', { feedback: 100e3, input: 250e3, shunt: 50e-3 }, 1e6, BIPOLAR],
  ['unity gain, Q = 1', 'sallen-key-low-pass', { r1: 10e3, r2: 10e3, c1: 3.2e-9, c2: 0.8e-9 }, 1e6, BIPOLAR],
  ['gain of 2, Q = 1', 'sallen-key-low-pass', { r1: 10e3, r2: 10e3, c1: 1.6e-9, c2: 1.6e-9, feedback: 10e3, input: 10e3 }, 1e6, MOS],
  ['gain of −2', 'multiple-feedback-low-pass', { r1: 5e3, r2: 10e3, r3: 3e3, c1: 10e-9, c2: 1e-9 }, 1e6, BIPOLAR],
  ['10 kΩ and 10 nF', 'integrator', { input: 10e3, c: 10e-9 }, 1e6, BIPOLAR],
];

let generator = 1;
beforeAll(async () => {
  generator = await generatorLevel(CELSIUS);
}, 60_000);

function stageOf([, topology, parts, gainBandwidth, figures, inputCapacitance]: Row): LiveStage {
  const amplifier = { gainBandwidth, noise: { ...figures, generator }, ...(inputCapacitance === undefined ? {} : { inputCapacitance }) };
  return { topology, parts, amplifier, driven: { input: 0 } };
}

describe('output noise, ngspice 45 (eecircuit-engine), netlist of our own', SIMULATED, () => {
  for (const row of ROWS) {
    it(`${row[1]}: ${row[0]}; alone, and behind a second-order filter at 10 kHz`, async () => {
      const stage = stageOf(row);
      const { voltage, corner, current } = row[4];
      const amplifier = { gainBandwidth: row[3], voltageNoise: voltage, noiseCorner: corner, currentNoise: current };
      const ours = (following: { corner: number; order: number } | null): number =>
        outputNoise(noiseGrid({ ...networksOf(stage), temperature: KELVIN + CELSIUS, lowest: LOWEST, following }), amplifier).rms;
      const { frequencies, density } = await noiseDensity(stage, [LOWEST, 1e9], CELSIUS);
      const whole = integrated(frequencies, density);
      const filtered = integrated(frequencies, density, (f) => 1 / (1 + (f / 10e3) ** 4));
      shown(`${row[1]} ${row[0]}`, [ours(null), whole], [ours({ corner: 10e3, order: 2 }), filtered]);
      expect(Math.abs(ours(null) / whole - 1)).toBeLessThan(0.002);
      expect(Math.abs(ours({ corner: 10e3, order: 2 }) / filtered - 1)).toBeLessThan(0.002);
    });
  }
});

describe('verdicts on the noise, ngspice 45 (eecircuit-engine), netlist of our own', SIMULATED, () => {
  const hertz = 3e6;
  const warm = `temperature: 0..${CELSIUS} °C`;
  for (const bench of BENCHES) {
    it(`${bench.topology}, ${bench.name}: over all the bandwidth, and behind a filter of order 2 at 10 kHz`, async () => {
      const inputCapacitance = bench.topology === 'transimpedance' ? 5e-12 : 0;
      for (const figures of [BIPOLAR, MOS]) {
        const stage = built(bench, 'outputNoise: 1 Vrms', warm);
        const filtered = built(bench, 'outputNoise: 1 Vrms', warm, 'following: {corner: 10 kHz, order: 2}');
        const part = { gainBandwidth: hertz, voltageNoise: figures.voltage, noiseCorner: figures.corner, currentNoise: figures.current, inputCapacitance };
        // Its + input lies on a stiff reference: the shot noise of 30 µA can come as current noise of both inputs.
        const shot = bench.topology === 'transimpedance' ? Math.sqrt(2 * ELECTRON * 30e-6) : 0;
        const noise = { ...figures, current: Math.hypot(figures.current, shot), generator };
        const amplifier = { gainBandwidth: hertz, noise, ...(inputCapacitance === 0 ? {} : { inputCapacitance }) };
        const { frequencies, density } = await noiseDensity({ topology: bench.topology, parts: bench.parts(stage), amplifier, driven: { input: 0 } }, [LOWEST, 1e9], CELSIUS);
        const found = [integrated(frequencies, density), integrated(frequencies, density, (f) => 1 / (1 + (f / 10e3) ** 4))] as const;
        const ours = [judgedNumber(stage, 'noise', part).offered, judgedNumber(filtered, 'noise', part).offered] as const;
        shown(`${bench.topology} ${bench.name}`, [ours[0], found[0]], [ours[1], found[1]]);
        expect(Math.abs(ours[0] / found[0] - 1)).toBeLessThan(0.02);
        expect(Math.abs(ours[1] / found[1] - 1)).toBeLessThan(0.02);
      }
    });
  }
});
