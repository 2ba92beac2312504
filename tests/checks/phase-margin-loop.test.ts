import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { marginAt, phaseParts, worstMargin, type Loop } from '../../src/checks/phase-margin-loop.js';
import type { PinNetwork } from '../../src/formulas/pin-network.js';
import { intersectionCapacitor } from '../../src/formulas/transimpedance.js';
import { published, type Given } from '../support/check-values.js';
import { measuredPhaseMargin } from '../support/loops.js';
import { GROUND, type Element } from '../support/nodal.js';

const GROUNDED: PinNetwork = { elements: [], pin: 'ground' };
const FOLLOWING: PinNetwork = { elements: [], pin: 'output' };

/** Rf from the output, the other resistor to ground. */
function divider(feedback: number, input: number): PinNetwork {
  return {
    pin: 'pin',
    elements: [
      { name: 'feedback', kind: 'resistor', value: feedback, between: ['output', 'pin'] },
      { name: 'input', kind: 'resistor', value: input, between: ['pin', 'ground'] },
    ],
  };
}

const loop = (minus: PinNetwork, more: Partial<Loop> = {}): Loop => ({ network: { plus: GROUNDED, minus }, open: null, inputCapacitance: 0, ownPole: Infinity, load: null, ...more });
const loaded = (outputResistance: number, capacitance: number, isolation = 0, resistance: number | null = null): Partial<Loop> => ({ load: { outputResistance, capacitance, isolation, resistance } });

describe('somebody else\'s margins', () => {
  published('STB-01', (of) => marginAt(loop(FOLLOWING, loaded(of('Ro_ohm'), of('CL_F'))), of('GBW_Hz')));
  published('STB-06', (of) => marginAt(loop(FOLLOWING, loaded(of('Ro_ohm'), of('CL_F'), of('Riso_ohm'))), of('GBW_Hz')));

  // The largest load for a margin leaves just that margin.
  for (const id of ['STB-02', 'STB-03']) {
    published(id, (of) => {
      const [least, most] = [1e-12, 1e-6];
      let [low, high] = [least, most];
      while (high / low > 1 + 1e-9) {
        const middle = Math.sqrt(low * high);
        if (marginAt(loop(FOLLOWING, loaded(of('Ro_ohm'), middle)), of('GBW_Hz')) > of('PM_deg')) low = middle;
        else high = middle;
      }
      return low;
    });
  }

  const transimpedance = (of: Given, capacitor: number): Loop =>
    loop({
      pin: 'pin',
      elements: [
        { name: 'feedback', kind: 'resistor', value: of('Rf_ohm'), between: ['output', 'pin'] },
        { name: 'feedback capacitor', kind: 'capacitor', value: capacitor, between: ['output', 'pin'] },
        { name: 'photodiode', kind: 'capacitor', value: of('Cin_F'), between: ['pin', 'ground'] },
      ],
    });
  published('TIA-04', (of) => marginAt(transimpedance(of, intersectionCapacitor({ feedback: of('Rf_ohm'), inputCapacitance: of('Cin_F'), gainBandwidth: of('GBW_Hz') })), of('GBW_Hz')));
  // The capacitor left to the part is the maximally flat one of its gain bandwidth.
  published('TIA-05', (of) => marginAt({ ...transimpedance(of, 1e-12), open: { feedback: of('Rf_ohm'), inputCapacitance: of('Cin_F') } }, of('GBW_Hz')));
});

describe('the opened circuit', () => {
  it('agrees, solved node by node, with load, isolation, input capacitance and a pole of the part', () => {
    const ohms = fc.double({ min: 500, max: 200e3, noNaN: true });
    fc.assert(
      fc.property(ohms, ohms, fc.double({ min: 0.1e-12, max: 20e-12, noNaN: true }), fc.tuple(fc.double({ min: 10, max: 500, noNaN: true }), fc.double({ min: 1, max: 200, noNaN: true }), fc.double({ min: 10e-12, max: 10e-9, noNaN: true })), (rf, rg, cin, [ro, riso, cl]) => {
        const gainBandwidth = 2e6;
        const ownPole = 4e6;
        const ours = marginAt(loop(divider(rf, rg), { inputCapacitance: cin, ownPole, ...loaded(ro, cl, riso) }), gainBandwidth);
        // A buffer keeps the feedback network from loading the output resistance, as our model has it.
        const opened: Element[] = [
          { plus: 'in', minus: GROUND, output: 'first', gainBandwidth },
          { r: 1e3, between: ['first', 'second'] },
          { c: 1 / (2 * Math.PI * 1e3 * ownPole), between: ['second', GROUND] },
          { plus: 'second', minus: 'buffered', output: 'buffered' },
          { r: ro, between: ['buffered', 'out'] },
          { r: riso, between: ['out', 'end'] },
          { c: cl, between: ['end', GROUND] },
          { plus: 'out', minus: 'copy', output: 'copy' },
          { r: rf, between: ['copy', 'pin'] },
          { r: rg, between: ['pin', GROUND] },
          { c: cin, between: ['pin', GROUND] },
        ];
        // The measurement cannot tell 190° of lag from 170°.
        if (ours > 0) expect(ours).toBeCloseTo(measuredPhaseMargin(opened, 'pin'), 4);
      }),
      { seed: 3, numRuns: 25 },
    );
  });

  it('counts of a load resistance what it does to the pole: (Ro||RL)·CL', () => {
    const withLoad = marginAt(loop(FOLLOWING, loaded(200, 1e-9, 0, 300)), 1e6);
    const equivalent = marginAt(loop(FOLLOWING, loaded(120, 1e-9)), 1e6);
    expect(withLoad).toBeCloseTo(equivalent, 6);
  });
});

describe('the worst margin of a part', () => {
  it('stands at its most bandwidth for a lag and at its least for a transimpedance lead', () => {
    const lag = worstMargin(loop(FOLLOWING, loaded(200, 1e-9)), { least: 0.6e6, most: 1e6 });
    expect(lag).toEqual({ margin: marginAt(loop(FOLLOWING, loaded(200, 1e-9)), 1e6), gainBandwidth: 1e6 });
    const lead = { ...loop(FOLLOWING), network: { plus: GROUNDED, minus: leading() } };
    expect(worstMargin(lead, { least: 6e6, most: 10e6 }).gainBandwidth).toBe(6e6);
  });

  it('stands in between for a lead-lag: Riso leaves its least phase in the middle', () => {
    const lagging = loop(FOLLOWING, loaded(200, 10e-9, 50));
    const { margin, gainBandwidth } = worstMargin(lagging, { least: 0.05e6, most: 5e6 });
    // 90° − asin((m−1)/(m+1)), m = 1 + Ro/Riso.
    expect(margin).toBeCloseTo(90 - (Math.asin(4 / 6) * 180) / Math.PI, 6);
    expect(gainBandwidth > 0.05e6 && gainBandwidth < 5e6).toBe(true);
  });

  function leading(): PinNetwork {
    return {
      pin: 'pin',
      elements: [
        { name: 'feedback', kind: 'resistor', value: 100e3, between: ['output', 'pin'] },
        { name: 'feedback capacitor', kind: 'capacitor', value: 4e-12, between: ['output', 'pin'] },
        { name: 'photodiode', kind: 'capacitor', value: 50e-12, between: ['pin', 'ground'] },
      ],
    };
  }
});

describe('where the phase goes', () => {
  it('adds up to the margin', () => {
    const whole = loop(divider(100e3, 100e3), { inputCapacitance: 3e-12, ownPole: 5e6, ...loaded(200, 300e-12, 20, 2e3) });
    const { feedback, load, own } = phaseParts(whole, 1e6)!;
    expect(90 + feedback + load + own).toBeCloseTo(marginAt(whole, 1e6), 6);
    expect(Math.max(feedback, load, own)).toBeLessThan(0);
  });

  it('is nowhere without a crossover: a part too slow for its integrator has nothing to oscillate with', () => {
    const integrator: PinNetwork = {
      pin: 'pin',
      elements: [
        { name: 'integrating', kind: 'capacitor', value: 1e-12, between: ['output', 'pin'] },
        { name: 'input', kind: 'resistor', value: 1e3, between: ['pin', 'ground'] },
      ],
    };
    expect(marginAt(loop(integrator), 1e3)).toBe(180);
    expect(phaseParts(loop(integrator), 1e3)).toBeNull();
  });
});
