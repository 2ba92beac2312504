import { describe, expect, it } from 'vitest';
import { pulseExcursion } from '../../src/formulas/coupling.js';
import { decibels, ratioOfDecibels } from '../../src/formulas/decibel.js';
import { integratorDrift } from '../../src/formulas/integrator.js';
import { oscillatorDifferentialInput, oscillatorPeriod, type RelaxationOscillator } from '../../src/formulas/oscillator.js';
import { difference, differenceSourceLimit, inverting, nonInverting, summing } from '../../src/formulas/ranges.js';
import { transimpedance } from '../../src/formulas/current-stages.js';
import { combinedRejection, leakThrough, rejectionOfResistors, resistorLimitedRejection } from '../../src/formulas/rejection.js';
import { secondOrderOvershoot, secondOrderPeak } from '../../src/formulas/second-order.js';
import { leastReadableCurrent, offsetAsCurrent } from '../../src/formulas/shunt.js';
import { fractionCorners, ratioCorners } from '../../src/formulas/tolerances.js';
import { published, rederived, type Given } from '../support/check-values.js';
import { corners } from '../support/corners.js';
import { GROUND, highest, magnitude, solve, type Element } from '../support/nodal.js';

const CIRCUIT = 'nodal analysis of the circuit';
const CORNERS = 'nodal analysis at every corner of the resistors';

describe('non-inverting', () => {
  const circuit = (input: number, reference: number, [rf, rg]: readonly [number, number]): Element[] => [
    { volts: input, at: 'in' },
    { volts: reference, at: 'ref' },
    { r: rg, between: ['ref', 'x'] },
    { r: rf, between: ['x', 'out'] },
    { plus: 'in', minus: 'x', output: 'out' },
  ];
  const output = (elements: Element[]): number => solve(elements, 0)('out')[0];

  published('RNG-01', (of) => nonInverting({ input: of('vi_V'), reference: of('Vref_V'), ratio: of('Rf_ohm') / of('Rg_ohm') }).output);
  rederived('RNG-01', {
    by: CIRCUIT,
    within: 1e-9,
    value: (of) => output(circuit(of('vi_V'), of('Vref_V'), [of('Rf_ohm'), of('Rg_ohm')])),
  });

  published('RNG-02', (of) => {
    const reference = of('Vcc_nom_V') * (1 + of('Vcc_tol')) * fractionCorners(0.5, of('divider_R_tol')).max;
    const ratio = ratioCorners(of('Rf_ohm') / of('Rg_ohm'), of('R_tol')).max;
    return nonInverting({ input: reference + of('vac_peak_V'), reference, ratio }).output;
  });
  rederived('RNG-02', {
    by: CORNERS,
    within: 1e-9,
    value: (of) => {
      const outputs = corners(5).map(([supply, ra, rb, f, g]) => {
        const top = of('Vcc_nom_V') * (1 + supply! * of('Vcc_tol'));
        const divider: Element[] = [
          { volts: top, at: 'top' },
          { r: 1 + ra! * of('divider_R_tol'), between: ['top', 'ref'] },
          { r: 1 + rb! * of('divider_R_tol'), between: ['ref', GROUND] },
        ];
        const reference = solve(divider, 0)('ref')[0];
        const resistors = [of('Rf_ohm') * (1 + f! * of('R_tol')), of('Rg_ohm') * (1 + g! * of('R_tol'))] as const;
        return output(circuit(reference + of('vac_peak_V'), reference, resistors));
      });
      return Math.max(...outputs);
    },
  });

  published('RNG-03', (of) => fractionCorners(0.5, of('t')).max);
  rederived('RNG-03', {
    by: 'all corners of the two resistors',
    within: 1e-9,
    value: (of) => Math.max(...corners(2).map(([a, b]) => (1 + b! * of('t')) / (2 + a! * of('t') + b! * of('t')))),
  });

  // With a capacitor in the gain leg no direct current flows there: the ratio counts as zero.
  published('RNG-25', (of) => nonInverting({ input: of('Vbias_V'), reference: 0, ratio: 0 }).output);
  rederived('RNG-25', {
    by: CIRCUIT,
    within: 1e-9,
    value: (of) =>
      output([
        { volts: of('Vbias_V'), at: 'in' },
        { c: 1e-6, between: [GROUND, 'g'] },
        { r: of('Rg_ohm'), between: ['g', 'x'] },
        { r: of('Rf_ohm'), between: ['x', 'out'] },
        { plus: 'in', minus: 'x', output: 'out' },
      ]),
  });
  published('RNG-26', (of) => nonInverting({ input: of('Vbias_V'), reference: 0, ratio: of('Rf_ohm') / of('Rg_ohm') }).output);
  rederived('RNG-26', { by: CIRCUIT, within: 1e-9, value: (of) => output(circuit(of('Vbias_V'), 0, [of('Rf_ohm'), of('Rg_ohm')])) });
});

describe('inverting and summing', () => {
  const circuit = (inputs: readonly number[], rf: number, legs: readonly number[]): Element[] => [
    ...inputs.map((volts, k): Element => ({ volts, at: `in${k}` })),
    ...legs.map((r, k): Element => ({ r, between: [`in${k}`, 'x'] })),
    { r: rf, between: ['x', 'out'] },
  ];
  const output = (elements: Element[], reference: number): number =>
    solve([...elements, { volts: reference, at: 'ref' }, { plus: 'ref', minus: 'x', output: 'out' }], 0)('out')[0];
  const ratios = (of: Given): number[] => of.list('R_ohm').map((r) => of('Rf_ohm') / r);

  published('RNG-04', (of) => inverting({ input: of('vi_V'), reference: of('Vref_V'), ratio: of('Rf_ohm') / of('Rin_ohm') }).output);
  rederived('RNG-04', {
    by: CIRCUIT,
    within: 1e-9,
    value: (of) => output(circuit([of('vi_V')], of('Rf_ohm'), [of('Rin_ohm')]), of('Vref_V')),
  });

  published('RNG-19', (of) => -summing({ legs: ratios(of).map((ratio) => ({ ratio, input: of('vpk_V') })), reference: 0 }).output);
  rederived('RNG-19', {
    by: 'nodal analysis at every sign of the inputs',
    within: 1e-9,
    value: (of) => {
      const drives = corners(3).map((signs) => signs.map((sign) => sign * of('vpk_V')));
      return Math.max(...drives.map((inputs) => Math.abs(output(circuit(inputs, of('Rf_ohm'), of.list('R_ohm')), 0))));
    },
  });

  published('RNG-20', (of) => summing({ legs: ratios(of).map((ratio) => ({ ratio, input: 0 })), reference: 0 }).noiseGain);
  rederived('RNG-20', {
    by: 'the output for one volt at the + input',
    within: 1e-9,
    value: (of) => output(circuit([0, 0, 0], of('Rf_ohm'), of.list('R_ohm')), 1),
  });
});

describe('difference', () => {
  const transfer = (drives: readonly [number, number], [r1, r2, r3, r4]: readonly number[]): number => {
    const elements: Element[] = [
      { volts: drives[0], at: 'a' },
      { volts: drives[1], at: 'b' },
      { r: r1!, between: ['a', 'n'] },
      { r: r2!, between: ['n', 'out'] },
      { r: r3!, between: ['b', 'p'] },
      { r: r4!, between: ['p', GROUND] },
      { plus: 'p', minus: 'n', output: 'out' },
    ];
    return solve(elements, 0)('out')[0];
  };
  const worstRejection = (of: Given): number => {
    const resistors = corners(4).map((signs) => signs.map((sign, k) => (k % 2 === 1 ? of('G') : 1) * (1 + sign * of('R_tol'))));
    return Math.min(...resistors.map((rs) => Math.abs(transfer([-0.5, 0.5], rs) / transfer([1, 1], rs))));
  };

  published('RNG-07', (of) => differenceSourceLimit(of('Vcm_max_V'), of('Vref_V'), of('G')));
  rederived('RNG-07', {
    by: 'the pins of the stage at that common mode, scaled',
    within: 1e-9,
    value: (of) => {
      const pins = difference({ positive: 1, negative: 1, reference: of('Vref_V'), negativeRatio: of('G'), positiveRatio: of('G') });
      return of('Vcm_max_V') / pins.commonMode;
    },
  });

  for (const id of ['RNG-09', 'RNG-10']) {
    rederived(id, { by: CORNERS, within: 2e-4, value: (of) => decibels(worstRejection(of)) });
  }
  published('RNG-09', (of) => decibels(resistorLimitedRejection(of('G'), of('R_tol'))));
  published('RNG-10', (of) => decibels(resistorLimitedRejection(of('G'), of('R_tol'))));
  it('states the rejection of given resistors as nodal analysis does (Pallàs-Areny & Webster 1991)', () => {
    const [r1, r2, r3, r4] = [1.01, 9.7, 0.98, 10.2] as const;
    const measured = Math.abs(transfer([-0.5, 0.5], [r1, r2, r3, r4]) / transfer([1, 1], [r1, r2, r3, r4]));
    expect(rejectionOfResistors({ r1, r2, r3, r4 })).toBeCloseTo(measured, 9);
  });

  const together = (of: Given): number =>
    combinedRejection([ratioOfDecibels(of('CMRR_opamp_dB')), resistorLimitedRejection(of('G'), of('R_tol'))]);
  published('RNG-27', (of) => decibels(together(of)));
  published('RNG-28', (of) => leakThrough(of('Vcm_V'), together(of)));
  rederived('RNG-28', {
    by: 'nodal analysis at every corner, the amplifier’s own error added at its pins',
    within: 2e-3,
    value: (of) => {
      const resistors = corners(4).map((signs) => signs.map((sign) => 1 + sign * of('R_tol')));
      const errors = resistors.map(([r1, r2, r3, r4]) => {
        const drawn = Math.abs(transfer([of('Vcm_V'), of('Vcm_V')], [r1!, r2!, r3!, r4!]));
        const pins = (of('Vcm_V') * r4!) / (r3! + r4!);
        return drawn + (pins / ratioOfDecibels(of('CMRR_opamp_dB'))) * (1 + r2! / r1!);
      });
      return Math.max(...errors) / of('G');
    },
  });
});

describe('coupling and peaking', () => {
  published('RNG-12', (of) => pulseExcursion(of('Vpp_V'), of('duty')).above);
  rederived('RNG-12', {
    by: 'stepping an RC high-pass through thousands of periods',
    within: 2e-3,
    value: (of) => {
      const slowness = 300;
      let stored = 0;
      let peak = 0;
      for (let period = 0; period < 20 * slowness; period += 1) {
        peak = of('Vpp_V') - stored;
        stored += peak * (1 - Math.exp(-of('duty') / slowness));
        stored *= Math.exp(-(1 - of('duty')) / slowness);
      }
      return peak;
    },
  });

  published('RNG-13', (of) => of('K') * of('Vp_in_V') * secondOrderPeak(of('Q')));
  rederived('RNG-13', {
    by: 'searching the response of a Sallen-Key circuit',
    within: 1e-8,
    value: (of) => {
      // Unity gain, R = 1 Ω, ω0 = 1: C1 = 2Q, C2 = 1/(2Q).
      const elements: Element[] = [
        { volts: of('Vp_in_V'), at: 'in' },
        { r: 1, between: ['in', 'x'] },
        { r: 1, between: ['x', 'p'] },
        { c: 2 * of('Q'), between: ['x', 'out'] },
        { c: 1 / (2 * of('Q')), between: ['p', GROUND] },
        { plus: 'p', minus: 'out', output: 'out' },
      ];
      return highest((f) => magnitude(solve(elements, f)('out')), 0.05, 0.3);
    },
  });

  published('RNG-14', (of) => secondOrderOvershoot(of('Q')));
  rederived('RNG-14', {
    by: 'stepping the differential equation',
    within: 1e-5,
    value: (of) => {
      const dt = 1e-4;
      let [y, v, top] = [0, 0, 0];
      for (let k = 0; k < 6 / dt; k += 1) {
        const half = v + (dt / 2) * (1 - y - v / of('Q'));
        y += dt * half;
        v = (half + (dt / 2) * (1 - y)) / (1 + dt / (2 * of('Q')));
        top = Math.max(top, y);
      }
      return top - 1;
    },
  });
});

describe('currents', () => {
  published('RNG-16', (of) => {
    return transimpedance({ current: of('i_A'), feedback: of('Rf_ohm'), reference: of('Vref_V'), direction: 'into-node' }).output;
  });
  rederived('RNG-16', {
    by: CIRCUIT,
    within: 1e-9,
    value: (of) => {
      const elements: Element[] = [
        { volts: of('Vref_V'), at: 'ref' },
        { amps: of('i_A'), between: [GROUND, 'x'] },
        { r: of('Rf_ohm'), between: ['x', 'out'] },
        { plus: 'ref', minus: 'x', output: 'out' },
      ];
      return solve(elements, 0)('out')[0];
    },
  });
  published('RNG-17', (of) => leastReadableCurrent(of('VOL_V'), of('G'), of('Rshunt_ohm')));
  published('RNG-18', (of) => offsetAsCurrent(of('Vos_V'), of('Rshunt_ohm')));
  published('RNG-21', (of) => {
    return integratorDrift({ offset: of('Vos_V'), biasCurrent: 0, resistance: of('R_ohm'), capacitance: of('C_F') });
  });
  rederived('RNG-21', {
    by: 'the slope of the circuit’s response to a slow offset',
    within: 1e-6,
    value: (of) => {
      const f = 1e-3;
      const elements: Element[] = [
        { volts: of('Vos_V'), at: 'p' },
        { r: of('R_ohm'), between: [GROUND, 'x'] },
        { c: of('C_F'), between: ['x', 'out'] },
        { plus: 'p', minus: 'x', output: 'out' },
      ];
      return 2 * Math.PI * f * magnitude(solve(elements, f)('out'));
    },
  });
});

describe('relaxation oscillator', () => {
  const stage = (of: Given): RelaxationOscillator => {
    return { supply: of('Vcc_V'), high: of('VOH_V'), low: of('VOL_V'), toSupply: 1, toGround: 1, toOutput: 1 };
  };
  const threshold = (supply: number, level: number): number => {
    const elements: Element[] = [
      { volts: supply, at: 'top' },
      { volts: level, at: 'out' },
      { r: 1, between: ['top', 'p'] },
      { r: 1, between: ['p', GROUND] },
      { r: 1, between: ['p', 'out'] },
    ];
    return solve(elements, 0)('p')[0];
  };

  published('RNG-23', (of) => oscillatorDifferentialInput(stage(of)));
  rederived('RNG-23', {
    by: 'nodal analysis of the hysteresis network',
    within: 1e-9,
    value: (of) => threshold(of('Vcc_V'), of('VOH_V')) - threshold(of('Vcc_V'), of('VOL_V')),
  });

  published('RNG-29', (of) => oscillatorPeriod(stage(of), of('R_ohm') * of('C_F')).frequency);
  rederived('RNG-29', {
    by: 'stepping the oscillator through time',
    within: 1e-4,
    value: (of) => {
      const levels = { high: of('VOH_V'), low: of('VOL_V') };
      const limits = { high: threshold(of('Vcc_V'), levels.high), low: threshold(of('Vcc_V'), levels.low) };
      const step = 1e-5;
      let state: 'high' | 'low' = 'high';
      const marks: number[] = [];
      let [charge, time] = [limits.low, 0];
      while (marks.length < 5) {
        const middle = charge + (step / 2) * (levels[state] - charge);
        charge += step * (levels[state] - middle);
        time += step;
        if (state === 'high' ? charge < limits.high : charge > limits.low) continue;
        state = state === 'high' ? 'low' : 'high';
        marks.push(time);
      }
      return 2 / ((marks[4]! - marks[0]!) * of('R_ohm') * of('C_F'));
    },
  });
});
