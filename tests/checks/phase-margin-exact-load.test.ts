import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { loadedFactor } from '../../src/checks/phase-margin-exact-load.js';
import { marginAt } from '../../src/checks/phase-margin-loop.js';
import { magnitude } from '../../src/formulas/complex.js';
import { feedbackFactor } from '../../src/formulas/feedback-loop.js';
import type { PinNetwork } from '../../src/formulas/pin-network.js';
import { measuredPhaseMargin } from '../support/loops.js';
import { GROUND, type Element } from '../support/nodal.js';

/** Unity-gain Sallen-Key: source at AC ground, C1 from the inner node to the output. */
const sallenKey = (r: number, c1: number, c2: number): PinNetwork => ({
  pin: 'pin',
  elements: [
    { name: 'R1', kind: 'resistor', value: r, between: ['input', 'inner'] },
    { name: 'R2', kind: 'resistor', value: r, between: ['inner', 'pin'] },
    { name: 'C1', kind: 'capacitor', value: c1, between: ['inner', 'output'] },
    { name: 'C2', kind: 'capacitor', value: c2, between: ['pin', 'ground'] },
  ],
});
const FOLLOWING: PinNetwork = { elements: [], pin: 'output' };

describe('a network that loads the output resistance', () => {
  it('gives the margin of the opened circuit, solved node by node with Ro, Riso, RL and CL in it', () => {
    const within = (min: number, max: number) => fc.double({ min, max, noNaN: true });
    fc.assert(
      fc.property(within(1e3, 50e3), within(0.2e-9, 5e-9), within(20, 500), within(1, 100), within(10e-12, 2e-9), (r, c2, ro, riso, cl) => {
        const [c1, gainBandwidth, rl] = [4 * c2, 2e6, 5e3];
        const load = { outputResistance: ro, isolation: riso, resistance: rl, capacitance: cl };
        const ours = marginAt({ network: { plus: sallenKey(r, c1, c2), minus: FOLLOWING }, open: null, inputCapacitance: 0, ownPole: Infinity, load }, gainBandwidth);
        // As printed under the load resistance: the bare amplifier is faster by what the divider takes.
        const opened: Element[] = [
          { plus: 'in', minus: GROUND, output: 'first', gainBandwidth: (gainBandwidth * (rl + riso + ro)) / (rl + riso) },
          { r: ro, between: ['first', 'out'] },
          { r: riso, between: ['out', 'end'] },
          { r: rl, between: ['end', GROUND] },
          { c: cl, between: ['end', GROUND] },
          { r, between: [GROUND, 'inner'] },
          { r, between: ['inner', 'pin'] },
          { c: c1, between: ['inner', 'out'] },
          { c: c2, between: ['pin', GROUND] },
          // v− − v+ as one node, so that the returned signal can be read.
          { plus: 'out', minus: 'copy', output: 'copy' },
          { plus: 'pin', minus: 'held', output: 'held' },
          { r: 1e6, between: ['held', 'sum'] },
          { r: 1e6, between: ['sum', 'back'] },
          { r: 1e6, between: ['copy', 'half'] },
          { r: 1e6, between: ['half', GROUND] },
          { plus: 'half', minus: 'sum', output: 'back' },
        ];
        // The measurement cannot tell 190° of lag from 170°.
        if (ours > 0) expect(ours).toBeCloseTo(measuredPhaseMargin(opened, 'back'), 4);
      }),
      { seed: 5, numRuns: 25 },
    );
  });

  it('is β alone behind no resistance to speak of, and β with the load\'s divider where the network takes nothing', () => {
    const networks = { plus: sallenKey(10e3, 4e-9, 1e-9), minus: FOLLOWING, minusCapacitance: 0 };
    const bare = feedbackFactor(networks);
    for (const frequency of [1e3, 1e5, 1e7]) {
      const stiff = loadedFactor(networks, { outputResistance: 1e-6, isolation: 0, resistance: null, capacitance: 1e-12 })(frequency);
      expect(magnitude(stiff) / magnitude(bare(frequency))).toBeCloseTo(1, 6);
      const light = loadedFactor({ plus: { elements: [], pin: 'ground' }, minus: FOLLOWING, minusCapacitance: 0 }, { outputResistance: 200, isolation: 0, resistance: 300, capacitance: 1e-9 })(frequency);
      expect(magnitude(light) * Math.hypot(1, 2 * Math.PI * frequency * 120 * 1e-9)).toBeCloseTo(1, 9);
    }
  });
});
