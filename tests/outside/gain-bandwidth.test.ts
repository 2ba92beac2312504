import { describe } from 'vitest';
import { cascadeShrinkage, gainBandwidthPerStage } from '../../src/formulas/cascade.js';
import {
  closedLoopBandwidth,
  gainBandwidthForMagnitudeError,
  gainBandwidthForPhaseError,
  gainBandwidthForVectorError,
  magnitudeErrorAt,
} from '../../src/formulas/gain-bandwidth.js';
import { difference, inverting, nonInverting, summing } from '../../src/formulas/ranges.js';
import { secondOrderPeak } from '../../src/formulas/second-order.js';
import { twoPolePhaseMargin, twoPoleQ } from '../../src/formulas/two-pole-loop.js';
import { published, rederived, type Given } from '../support/check-values.js';
import { measuredBandwidth } from '../support/filter-circuits.js';
import { measuredPhaseMargin, solveFor } from '../support/loops.js';
import { GROUND, highest, magnitude, solve, type Complex, type Element } from '../support/nodal.js';

const CIRCUIT = 'nodal analysis of the circuit';

describe('closed-loop bandwidth', () => {
  const noiseGains: Record<string, number> = {
    'GBW-02': nonInverting({ input: 0, reference: 0, ratio: 9 }).noiseGain,
    'GBW-03': inverting({ input: 0, reference: 0, ratio: 1 }).noiseGain,
    'GBW-04': inverting({ input: 0, reference: 0, ratio: 10 }).noiseGain,
    'GBW-05': summing({ legs: [1, 1, 1].map((ratio) => ({ ratio, input: 0 })), reference: 0 }).noiseGain,
    'GBW-06': difference({ positive: 0, negative: 0, reference: 0, negativeRatio: 4, positiveRatio: 4 }).noiseGain,
  };
  const networks: Record<string, Element[]> = {
    'GBW-02': [...legs([[GROUND, 1e3]], 9e3), { r: 1e-3, between: ['in', 'p'] }],
    'GBW-03': [...legs([['in', 1e4]], 1e4), { r: 1, between: ['p', GROUND] }],
    'GBW-04': [...legs([['in', 1e3]], 1e4), { r: 1, between: ['p', GROUND] }],
    'GBW-05': [...legs([['in', 1e4], [GROUND, 1e4], [GROUND, 1e4]], 1e4), { r: 1, between: ['p', GROUND] }],
    'GBW-06': [...legs([[GROUND, 1e3]], 4e3), { r: 1e3, between: ['in', 'p'] }, { r: 4e3, between: ['p', GROUND] }],
  };
  const bandwidth = (id: string) => (of: Given): number => closedLoopBandwidth(of('GBW_Hz'), noiseGains[id]!);
  published('GBW-02', bandwidth('GBW-02'));
  published('GBW-03', bandwidth('GBW-03'));
  published('GBW-04', bandwidth('GBW-04'));
  published('GBW-05', bandwidth('GBW-05'));
  published('GBW-06', bandwidth('GBW-06'));
  for (const [id, network] of Object.entries(networks)) {
    const value = (of: Given): number => {
      const amplifier: Element = { plus: 'p', minus: 'n', output: 'out', gainBandwidth: of('GBW_Hz') };
      return measuredBandwidth([{ volts: 1, at: 'in' }, ...network, amplifier], 1e4);
    };
    rederived(id, { by: CIRCUIT, within: 1e-6, value });
  }
});

describe('error at the top frequency', () => {
  const transfer = (of: Given, gainBandwidth: number): Complex => {
    const network = [...legs([[GROUND, 1e3]], (of('NG') - 1) * 1e3), { volts: 1 / of('NG'), at: 'p' } as const];
    return solve([...network, { plus: 'p', minus: 'n', output: 'out', gainBandwidth }], of('f_Hz'))('out');
  };
  const amplitudeError = (h: Complex): number => 1 - magnitude(h);
  const lag = ([re, im]: Complex): number => (Math.atan2(-im, re) * 180) / Math.PI;
  const vectorError = ([re, im]: Complex): number => Math.hypot(1 - re, im);

  const forMagnitude = (of: Given): number => gainBandwidthForMagnitudeError(of('NG'), of('f_Hz'), of('eps'));
  published('GBW-07', forMagnitude);
  published('GBW-08', forMagnitude);
  published('GBW-09', forMagnitude);
  for (const id of ['GBW-07', 'GBW-08', 'GBW-09']) {
    const value = (of: Given): number => solveFor((gbw) => amplitudeError(transfer(of, gbw)), of('eps'), [1e5, 1e9]);
    rederived(id, { by: `bisection on ${CIRCUIT}`, within: 1e-6, value });
  }
  published('GBW-10', (of) => gainBandwidthForPhaseError(of('NG'), of('f_Hz'), of('phase_deg')));
  rederived('GBW-10', {
    by: `bisection on ${CIRCUIT}`,
    within: 1e-9,
    value: (of) => solveFor((gbw) => lag(transfer(of, gbw)), of('phase_deg'), [1e5, 1e9]),
  });
  published('GBW-11', (of) => gainBandwidthForVectorError(of('NG'), of('f_Hz'), of('eps')));
  rederived('GBW-11', {
    by: `bisection on ${CIRCUIT}`,
    within: 1e-9,
    value: (of) => solveFor((gbw) => vectorError(transfer(of, gbw)), of('eps'), [1e5, 1e9]),
  });
  published('GBW-12', (of) => magnitudeErrorAt(1, 1, of('GBW_over_NGf')));
  rederived('GBW-12', {
    by: 'nodal analysis of a follower',
    within: 1e-9,
    value: (of) => {
      const elements: Element[] = [
        { volts: 1, at: 'in' },
        { r: 1, between: ['out', 'n'] },
        { plus: 'in', minus: 'n', output: 'out', gainBandwidth: of('GBW_over_NGf') },
      ];
      return amplitudeError(solve(elements, 1)('out'));
    },
  });
});

describe('cascades', () => {
  published('GBW-13', (of) => closedLoopBandwidth(of('GBW_Hz'), of('G_each')) * cascadeShrinkage(of('n')));
  rederived('GBW-13', {
    by: 'nodal analysis of the three stages in a row',
    within: 1e-6,
    value: (of) => measuredBandwidth(chain(of('n'), of('G_each'), of('GBW_Hz')), 1e3),
  });
  published('GBW-32', (of) => gainBandwidthPerStage(of('G_total'), of('f3_Hz'), of('n')));
  rederived('GBW-32', {
    by: 'nodal analysis of the stages in a row, scaled',
    within: 1e-6,
    value: (of) => (1e6 * of('f3_Hz')) / measuredBandwidth(chain(of('n'), of('G_total') ** (1 / of('n')), 1e6), 1e3),
  });
});

describe('a second pole', () => {
  const opened = (of: Given): Element[] => [
    { plus: 'in', minus: GROUND, output: 'a', gainBandwidth: of('fc_Hz'), outputResistance: 100 },
    { c: 1 / (2 * Math.PI * 100 * of('f2_Hz')), between: ['a', GROUND] },
  ];
  const margin = (of: Given): number => twoPolePhaseMargin(of('fc_Hz'), of('f2_Hz'));
  published('GBW-15', margin);
  published('GBW-16', margin);
  published('GBW-17', margin);
  for (const id of ['GBW-15', 'GBW-16', 'GBW-17']) {
    rederived(id, { by: 'nodal analysis of the opened loop', within: 1e-6, value: (of) => measuredPhaseMargin(opened(of), 'a') });
  }
  published('GBW-18', (of) => secondOrderPeak(twoPoleQ(of('fc_Hz'), of('f2_Hz'))));
  rederived('GBW-18', {
    by: 'nodal analysis of the closed loop',
    within: 1e-8,
    value: (of) => {
      const elements: Element[] = [
        { volts: 1, at: 'in' },
        { c: 1 / (2 * Math.PI * 100 * of('f2_Hz')), between: ['out', GROUND] },
        { plus: 'in', minus: 'out', output: 'out', gainBandwidth: of('fc_Hz'), outputResistance: 100 },
      ];
      return highest((f) => magnitude(solve(elements, f)('out')), 1e5, 1e7);
    },
  });
});

/** Input legs into the − node and the feedback resistor around the amplifier. */
function legs(inputs: readonly (readonly [string, number])[], rf: number): Element[] {
  return [...inputs.map(([node, r]): Element => ({ r, between: [node, 'n'] })), { r: rf, between: ['n', 'out'] }];
}

/** Equal non-inverting stages in a row, driven with 1 V, the last one's output named `out`. */
function chain(stages: number, gain: number, gainBandwidth: number): Element[] {
  const stage = (k: number): Element[] => {
    const [input, output, n] = [k === 0 ? 'in' : `s${k}`, k === stages - 1 ? 'out' : `s${k + 1}`, `n${k}`];
    return [
      { r: 1e3, between: [GROUND, n] },
      { r: (gain - 1) * 1e3, between: [n, output] },
      { plus: input, minus: n, output, gainBandwidth },
    ];
  };
  return [{ volts: 1, at: 'in' }, ...Array.from({ length: stages }, (_, k) => stage(k)).flat()];
}
