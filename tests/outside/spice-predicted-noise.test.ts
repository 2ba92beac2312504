import { beforeAll, describe, expect, it } from 'vitest';
import { generatorLevel, integrated, noiseDensity } from '../support/live-stage.js';
import { figuresOf, numberOf, predicted } from '../support/predicted.js';
import { shown } from '../support/shown.js';
import { SIMULATED } from '../support/spice.js';
import { BENCHES, built } from '../support/twelve.js';

// Source: ngspice 45 (eecircuit-engine), .noise on drawings of our own; the amplifier's white and 1/f noise are the shot and flicker
// noise of a diode, measured in a run of its own. Relation: what `predict` tells as noise at the output, in both outcomes. The
// worst outcome counts the part's white level with its guaranteed figure and the highest ambient temperature.

const CELSIUS = 60;
const LOWEST = 0.1;
const HERTZ = 3e6;
/** Elementary charge, C (SI Brochure, 9th ed. 2019). */
const ELECTRON = 1.602176634e-19;
/** Typical and guaranteed. */
const VOLTAGE = [20e-9, 26e-9] as const;
const CORNER = 3e3;
const CURRENT = 0.6e-12;
const FORMS = [['typical', 0], ['worst', 1]] as const;

let generator = 1;
beforeAll(async () => {
  generator = await generatorLevel(CELSIUS);
}, 60_000);

describe('predicted noise, ngspice 45 (eecircuit-engine), netlist of our own', SIMULATED, () => {
  for (const bench of BENCHES) {
    it(`${bench.topology}, ${bench.name}: typical and worst`, async () => {
      const stage = built(bench, 'outputNoise: 1 Vrms', `temperature: ${CELSIUS}..${CELSIUS} °C`);
      const inputCapacitance = bench.topology === 'transimpedance' ? 5e-12 : 0;
      const answer = predicted(stage, figuresOf({ gainBandwidth: HERTZ, voltageNoise: [VOLTAGE[0], VOLTAGE[1]], noiseCorner: CORNER, currentNoise: CURRENT, inputCapacitance }));
      // The + input lies on a stiff reference: the shot noise of 30 µA can come as current noise of both inputs.
      const shot = bench.topology === 'transimpedance' ? Math.sqrt(2 * ELECTRON * 30e-6) : 0;
      for (const [form, at] of FORMS) {
        const noise = { voltage: VOLTAGE[at], corner: CORNER, current: Math.hypot(CURRENT, shot), generator };
        const amplifier = { gainBandwidth: HERTZ, noise, ...(inputCapacitance === 0 ? {} : { inputCapacitance }) };
        const { frequencies, density } = await noiseDensity({ topology: bench.topology, parts: bench.parts(stage), amplifier, driven: { input: 0 } }, [LOWEST, 1e9], CELSIUS);
        const [ours, simulated] = [numberOf(answer[form], 'noise'), integrated(frequencies, density)];
        shown(`${bench.topology} ${bench.name}, ${form}`, [ours, simulated]);
        expect(Math.abs(ours / simulated - 1)).toBeLessThan(0.001);
      }
    });
  }
});
