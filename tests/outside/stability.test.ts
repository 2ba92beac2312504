import { describe } from 'vitest';
import { secondOrderOvershoot, secondOrderPeak } from '../../src/formulas/second-order.js';
import {
  capacitanceForPhaseMargin,
  isolationGainError,
  isolationResistance,
  leadLagPhaseMargin,
  neutralCapacitor,
  poleFrequency,
} from '../../src/formulas/stability.js';
import { qOfPhaseMargin, twoPolePhaseMargin, twoPoleQ } from '../../src/formulas/two-pole-loop.js';
import { published, rederived, type Given } from '../support/check-values.js';
import { measuredPhaseMargin, solveFor } from '../support/loops.js';
import { GROUND, highest, magnitude, solve, summit, type Element } from '../support/nodal.js';

const OPENED = 'nodal analysis of the opened loop';

describe('capacitive load', () => {
  const opened = (of: Given, cl: number): Element[] => [amplifier(of), { c: cl, between: ['out', GROUND] }];

  published('STB-01', (of) => twoPolePhaseMargin(of('GBW_Hz') / of('NG'), poleFrequency(of('Ro_ohm'), of('CL_F'))));
  rederived('STB-01', { by: OPENED, within: 1e-6, value: (of) => measuredPhaseMargin(opened(of, of('CL_F')), 'out') });

  published('STB-02', (of) => capacitanceForPhaseMargin(of('GBW_Hz'), of('Ro_ohm'), of('PM_deg')));
  published('STB-03', (of) => capacitanceForPhaseMargin(of('GBW_Hz'), of('Ro_ohm'), of('PM_deg')));
  for (const id of ['STB-02', 'STB-03']) {
    const value = (of: Given): number => solveFor((cl) => measuredPhaseMargin(opened(of, cl), 'out'), of('PM_deg'), [1e-11, 1e-8]);
    rederived(id, { by: `bisection on ${OPENED}`, within: 1e-6, value });
  }

  published('STB-11', (of) => secondOrderPeak(twoPoleQ(of('GBW_Hz'), poleFrequency(of('Ro_ohm'), of('CL_F')))));
  rederived('STB-11', {
    by: 'nodal analysis of the closed loop',
    within: 1e-6,
    value: (of) => {
      const elements: Element[] = [
        { volts: 1, at: 'in' },
        { c: of('CL_F'), between: ['out', GROUND] },
        { plus: 'in', minus: 'out', output: 'out', gainBandwidth: of('GBW_Hz'), outputResistance: of('Ro_ohm') },
      ];
      return highest((f) => magnitude(solve(elements, f)('out')), 1e4, 1e7);
    },
  });

  published('STB-10', (of) => secondOrderOvershoot(qOfPhaseMargin(of('PM_deg'))));
  rederived('STB-10', {
    by: 'stepping a loop whose measured phase margin is that one',
    within: 1e-4,
    value: (of) => {
      const ratio = solveFor((x) => measuredPhaseMargin(twoPoles(x), 'out'), of('PM_deg'), [0.01, 100]);
      return steppedOvershoot(ratio);
    },
  });
});

describe('isolation resistor', () => {
  const opened = (of: Given, [riso, cl]: readonly [number, number]): Element[] => [
    amplifier(of),
    { r: riso, between: ['out', 'load'] },
    { c: cl, between: ['load', GROUND] },
  ];
  published('STB-04', (of) => isolationResistance(of('Ro_ohm'), of('PM_deg')));
  rederived('STB-04', {
    by: `the worst load in a search over ${OPENED}`,
    within: 1e-4,
    value: (of) => {
      const given = Object.assign((key: string) => (key === 'GBW_Hz' ? 1e6 : of(key)), { list: of.list, raw: of.raw });
      const worst = (riso: number): number => {
        const margin = (cl: number): number => measuredPhaseMargin(opened(given, [riso, cl]), 'out');
        return margin(summit((cl) => -margin(cl), [1e-10, 1e-6], 30));
      };
      return solveFor(worst, of('PM_deg'), [30, 60, 1e-6]);
    },
  });
  published('STB-06', (of) => {
    const zero = poleFrequency(of('Riso_ohm'), of('CL_F'));
    const pole = poleFrequency(of('Riso_ohm') + of('Ro_ohm'), of('CL_F'));
    return leadLagPhaseMargin({ asymptote: of('GBW_Hz'), zero, pole });
  });
  rederived('STB-06', { by: OPENED, within: 1e-6, value: (of) => measuredPhaseMargin(opened(of, [of('Riso_ohm'), of('CL_F')]), 'out') });

  published('STB-12', (of) => isolationGainError(of('Riso_ohm'), of('RL_ohm')));
  rederived('STB-12', {
    by: 'nodal analysis of the divider',
    within: 1e-9,
    value: (of) => {
      const elements: Element[] = [
        { volts: 1, at: 'out' },
        { r: of('Riso_ohm'), between: ['out', 'load'] },
        { r: of('RL_ohm'), between: ['load', GROUND] },
      ];
      return solve(elements, 0)('load')[0] - 1;
    },
  });
});

describe('input capacitance', () => {
  published('STB-08', (of) => neutralCapacitor(of('Cin_F'), of('Rf_ohm'), of('Rg_ohm')));
  rederived('STB-08', {
    by: 'the capacitor that makes the feedback divider the same at 1 GHz as at direct current',
    within: 1e-6,
    value: (of) => {
      const share = (cf: number, frequency: number): number => {
        const elements: Element[] = [
          { volts: 1, at: 'out' },
          { r: of('Rf_ohm'), between: ['out', 'n'] },
          { c: cf, between: ['out', 'n'] },
          { r: of('Rg_ohm'), between: ['n', GROUND] },
          { c: of('Cin_F'), between: ['n', GROUND] },
        ];
        return magnitude(solve(elements, frequency)('n'));
      };
      return solveFor((cf) => share(cf, 1e9), share(1e-12, 0), [1e-13, 1e-9]);
    },
  });
});

function amplifier(of: Given): Element {
  return { plus: 'in', minus: GROUND, output: 'out', gainBandwidth: of('GBW_Hz'), outputResistance: of('Ro_ohm') };
}

/** An opened loop with fc = 1 MHz and f2 = ratio·fc. */
function twoPoles(ratio: number): Element[] {
  return [
    { plus: 'in', minus: GROUND, output: 'out', gainBandwidth: 1e6, outputResistance: 100 },
    { c: 1 / (2 * Math.PI * 100 * ratio * 1e6), between: ['out', GROUND] },
  ];
}

/** Overshoot of an integrator and a lag in a loop, stepped through time in units of 1/(2π·fc). */
function steppedOvershoot(ratio: number): number {
  const dt = 2e-5;
  let [integrator, output, top] = [0, 0, 0];
  for (let k = 0; k < 12 / dt; k += 1) {
    const half = integrator + (dt / 2) * (1 - output);
    output += ratio * dt * (half - (output + (ratio * dt * (half - output)) / 2));
    integrator = half + (dt / 2) * (1 - output);
    top = Math.max(top, output);
  }
  return top - 1;
}
