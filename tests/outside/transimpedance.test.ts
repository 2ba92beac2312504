import { describe } from 'vitest';
import { secondOrderPeak } from '../../src/formulas/second-order.js';
import { leadLagPhaseMargin } from '../../src/formulas/stability.js';
import {
  gainBandwidthForTransimpedance,
  highFrequencyNoiseGain,
  intersectionCapacitor,
  maximallyFlatCapacitor,
  transimpedanceResponse,
} from '../../src/formulas/transimpedance.js';
import { published, rederived, type Given } from '../support/check-values.js';
import { measuredBandwidth } from '../support/filter-circuits.js';
import { measuredPhaseMargin, solveFor } from '../support/loops.js';
import { GROUND, highest, magnitude, solve, type Element } from '../support/nodal.js';

const bare = (of: Given) => ({ feedback: of('Rf_ohm'), inputCapacitance: of('Cin_F'), gainBandwidth: of('GBW_Hz') });

describe('feedback capacitor', () => {
  published('TIA-01', (of) => maximallyFlatCapacitor(bare(of)));
  rederived('TIA-01', {
    by: 'the capacitor at which the circuit’s peak just vanishes',
    within: 3e-3,
    value: (of) => solveFor((cf) => peaking(of, cf), 1 + 1e-7, [1e-12, 1e-11]),
  });
  published('TIA-03', (of) => intersectionCapacitor(bare(of)));
  rederived('TIA-03', {
    by: 'the meeting of 1/β with the amplifier’s gain where they are drawn as straight lines',
    within: 1e-9,
    // f·(Cin+Cf)·2π·Rf = GBW/f at f = 1/(2π·Rf·Cf).
    value: (of) => {
      const excess = (cf: number): number => (of('Cin_F') + cf) / cf - of('GBW_Hz') * 2 * Math.PI * of('Rf_ohm') * cf;
      return solveFor(excess, 0, [1e-13, 1e-10]);
    },
  });
  published('TIA-09', (of) => highFrequencyNoiseGain(of('Cin_F'), of('Cf_F')));
  rederived('TIA-09', {
    by: 'the network’s divider at 1 THz',
    within: 1e-6,
    value: (of) => 1 / magnitude(solve([{ volts: 1, at: 'out' }, ...network(of, of('Cf_F'))], 1e12)('n')),
  });
});

describe('loop', () => {
  const margin = (of: Given): number => {
    const pole = (capacitance: number): number => 1 / (2 * Math.PI * of('Rf_ohm') * capacitance);
    return leadLagPhaseMargin({ asymptote: of('GBW_Hz'), zero: pole(of('Cf_F')), pole: pole(of('Cin_F') + of('Cf_F')) });
  };
  published('TIA-04', margin);
  published('TIA-05', margin);
  for (const id of ['TIA-04', 'TIA-05']) {
    const value = (of: Given): number => {
      const amplifier: Element = { plus: 'in', minus: GROUND, output: 'out', gainBandwidth: of('GBW_Hz') };
      return measuredPhaseMargin([amplifier, ...network(of, of('Cf_F'))], 'n');
    };
    rederived(id, { by: 'nodal analysis of the opened loop', within: 1e-6, value });
  }
  published('TIA-07', (of) => secondOrderPeak(transimpedanceResponse({ ...bare(of), feedbackCapacitance: of('Cf_F') }).q));
  rederived('TIA-07', { by: 'nodal analysis of the closed loop', within: 1e-6, value: (of) => peaking(of, of('Cf_F')) });
});

describe('gain-bandwidth', () => {
  published('TIA-08', (of) => gainBandwidthForTransimpedance(of('B_Hz'), of('Rf_ohm'), of('Cin_F')));
  rederived('TIA-08', {
    by: 'bisection on the measured bandwidth of circuits with their flattest capacitor',
    within: 1e-6,
    value: (of) => {
      const bandwidth = (gainBandwidth: number): number => {
        const parts = { feedback: of('Rf_ohm'), inputCapacitance: of('Cin_F'), gainBandwidth };
        const capacitor = maximallyFlatCapacitor(parts);
        return measuredBandwidth(closed([of('Rf_ohm'), of('Cin_F'), capacitor], gainBandwidth), 1e5);
      };
      return solveFor(bandwidth, of('B_Hz'), [1e7, 2e7]);
    },
  });
});

function network(of: Given, cf: number): Element[] {
  return feedback([of('Rf_ohm'), of('Cin_F'), cf]);
}

function feedback([rf, cin, cf]: readonly [number, number, number]): Element[] {
  return [
    { r: rf, between: ['out', 'n'] },
    { c: cf, between: ['out', 'n'] },
    { c: cin, between: ['n', GROUND] },
  ];
}

/** The closed loop, driven so that it gives 1 V at low frequency. */
function closed(parts: readonly [number, number, number], gainBandwidth: number): Element[] {
  const drive: Element = { amps: 1 / parts[0], between: ['n', GROUND] };
  return [...feedback(parts), drive, { plus: GROUND, minus: 'n', output: 'out', gainBandwidth }];
}

function peaking(of: Given, cf: number): number {
  const circuit = closed([of('Rf_ohm'), of('Cin_F'), cf], of('GBW_Hz'));
  return highest((f) => magnitude(solve(circuit, f)('out')), 1e3, 2e6);
}
