import { describe } from 'vitest';
import { closedLoopBandwidth } from '../../src/formulas/gain-bandwidth.js';
import { gaussianExceedance, peakToPeakNoise, shotSignalToNoise, signalToNoise } from '../../src/formulas/signal-to-noise.js';
import { noiseThroughPole, outputNoiseDensity, referenceRippleGain, resistorNoise } from '../../src/formulas/noise.js';
import {
  butterworthNoiseBandwidth,
  realPolesNoiseBandwidth,
  secondOrderNoiseBandwidth,
  transimpedanceVoltageNoiseRoot,
} from '../../src/formulas/noise-bandwidth.js';
import { transimpedanceResponse } from '../../src/formulas/transimpedance.js';
import { published, rederived, type Given } from '../support/check-values.js';
import { GROUND, magnitude, solve, type Element } from '../support/nodal.js';
import { integral } from '../support/waveforms.js';

const NUMERIC = 'numeric integration over the frequency';

describe('densities', () => {
  published('NOI-01', (of) => {
    return outputNoiseDensity({
      noiseGain: of('NG'),
      voltage: of('en_V_rtHz'),
      current: of('in_A_rtHz'),
      plus: of('Rp_ohm'),
      minus: (of('Rf_ohm') * of('Rg_ohm')) / (of('Rf_ohm') + of('Rg_ohm')),
      temperature: of('T_K'),
    });
  });
  rederived('NOI-01', {
    by: 'nodal analysis with one noise source at a time',
    within: 1e-6,
    value: (of) => {
      const [rp, rf, rg, en, current] = [of('Rp_ohm'), of('Rf_ohm'), of('Rg_ohm'), of('en_V_rtHz'), of('in_A_rtHz')];
      const output = (source: Element): number => {
        const elements: Element[] = [
          { r: rp, between: [GROUND, 'p'] },
          { r: rg, between: [GROUND, 'n'] },
          { r: rf, between: ['n', 'out'] },
          { plus: 'p', minus: 'n', output: 'out' },
        ];
        return magnitude(solve([...elements, source], 0)('out'));
      };
      const thermal = (r: number): number => resistorNoise(r, of('T_K')) / r;
      const amps = (value: number, between: readonly [string, string]): number => output({ amps: value, between });
      return Math.hypot(
        // The amplifier's voltage noise as a current into Rp, where it makes the same voltage.
        amps(en / rp, [GROUND, 'p']),
        amps(current, [GROUND, 'p']),
        amps(current, [GROUND, 'n']),
        amps(thermal(rp), [GROUND, 'p']),
        amps(thermal(rg), [GROUND, 'n']),
        amps(thermal(rf), ['n', 'out']),
      );
    },
  });
  published('NOI-19', (of) => of('NG') * resistorNoise((of('Ra_ohm') * of('Rb_ohm')) / (of('Ra_ohm') + of('Rb_ohm')), of('T_K')));
  published('NOI-20', (of) => {
    return referenceRippleGain({
      upper: of('Ra_ohm'),
      lower: of('Rb_ohm'),
      capacitance: of('C_F'),
      frequency: of('f_Hz'),
      noiseGain: of('NG'),
    });
  });
  rederived('NOI-20', {
    by: 'nodal analysis of the circuit',
    within: 1e-9,
    value: (of) => {
      const elements: Element[] = [
        { volts: 1, at: 'top' },
        { r: of('Ra_ohm'), between: ['top', 'p'] },
        { r: of('Rb_ohm'), between: ['p', GROUND] },
        { c: of('C_F'), between: ['p', GROUND] },
        { r: 1e3, between: [GROUND, 'n'] },
        { r: (of('NG') - 1) * 1e3, between: ['n', 'out'] },
        { plus: 'p', minus: 'n', output: 'out' },
      ];
      return magnitude(solve(elements, of('f_Hz'))('out'));
    },
  });
});

describe('noise bandwidth', () => {
  published('NOI-04', (of) => realPolesNoiseBandwidth(of('n')));
  published('NOI-05', (of) => realPolesNoiseBandwidth(of('n')));
  published('NOI-06', (of) => butterworthNoiseBandwidth(of('n')));
  published('NOI-07', (of) => butterworthNoiseBandwidth(of('n')));
  for (const id of ['NOI-04', 'NOI-05']) {
    const value = (of: Given): number => area((f) => (1 + f * f * (2 ** (1 / of('n')) - 1)) ** -of('n'));
    rederived(id, { by: NUMERIC, within: 1e-6, value });
  }
  for (const id of ['NOI-06', 'NOI-07']) {
    rederived(id, { by: NUMERIC, within: 1e-6, value: (of) => area((f) => 1 / (1 + f ** (2 * of('n')))) });
  }
});

describe('totals', () => {
  const gain = (of: Given): number => 1 + of('R2_ohm') / of('R1_ohm');
  const minus = (of: Given): number => (of('R1_ohm') * of('R2_ohm')) / (of('R1_ohm') + of('R2_ohm'));

  published('NOI-08', (of) => {
    const band = { lowest: of('fL_Hz'), pole: closedLoopBandwidth(of('GBW_Hz'), gain(of)) };
    const current = noiseThroughPole({ ...band, density: of('in_A_rtHz'), corner: of('fci_Hz') });
    const terms = [
      noiseThroughPole({ ...band, density: of('en_V_rtHz'), corner: of('fce_Hz') }),
      current * of('R3_ohm'),
      current * minus(of),
      noiseThroughPole({ ...band, density: resistorNoise(of('R3_ohm') + minus(of), of('T_K')), corner: 0 }),
    ];
    return gain(of) * Math.hypot(...terms);
  });
  rederived('NOI-08', {
    by: NUMERIC,
    within: 1e-4,
    value: (of) => {
      const pole = of('GBW_Hz') / gain(of);
      const square = (f: number): number => {
        const voltage = of('en_V_rtHz') ** 2 * (1 + of('fce_Hz') / f);
        const current = of('in_A_rtHz') ** 2 * (1 + of('fci_Hz') / f) * (of('R3_ohm') ** 2 + minus(of) ** 2);
        return (voltage + current + resistorNoise(of('R3_ohm') + minus(of), of('T_K')) ** 2) / (1 + (f / pole) ** 2);
      };
      return gain(of) * Math.sqrt(area(square, [of('fL_Hz'), pole * 1e6]));
    },
  });
  published('NOI-09', (of) => peakToPeakNoise(of('rms_V')));
  published('NOI-12', (of) => {
    const pole = closedLoopBandwidth(of('GBW_Hz'), of('NG'));
    return of('NG') * of('en_V_rtHz') * Math.sqrt(pole * realPolesNoiseBandwidth(1));
  });
  published('NOI-15', (of) => shotSignalToNoise(of('I_A'), of('B_Hz')));
  published('NOI-16', (of) => signalToNoise(of('Vpp_V'), of('noise_rms_V')));
  published('NOI-18', (of) => gaussianExceedance(of('k')));
  rederived('NOI-18', {
    by: 'numeric integration of the Gaussian tails',
    within: 1e-6,
    value: (of) => 2 * integral((x) => Math.exp((-x * x) / 2) / Math.sqrt(2 * Math.PI), [of('k') / 2, 40], 20_000),
  });
});

describe('transimpedance', () => {
  const stage = (of: Given) => {
    return { feedback: of('Rf_ohm'), inputCapacitance: of('Cin_F'), feedbackCapacitance: of('Cf_F'), gainBandwidth: of('GBW_Hz') };
  };
  const circuit = (of: Given): Element[] => [
    { r: of('Rf_ohm'), between: ['n', 'out'] },
    { c: of('Cf_F'), between: ['n', 'out'] },
    { c: of('Cin_F'), between: ['n', GROUND] },
    { plus: 'p', minus: 'n', output: 'out', gainBandwidth: of('GBW_Hz') },
  ];
  const noise = (of: Given, source: Element): number => {
    const resting: Element[] = 'at' in source ? [] : [{ volts: 0, at: 'p' }];
    const square = (f: number): number => magnitude(solve([...circuit(of), ...resting, source], f)('out')) ** 2;
    return Math.sqrt(area(square, [1, 1e12], 3000));
  };

  published('NOI-13', (of) => of('en_V_rtHz') * transimpedanceVoltageNoiseRoot(stage(of)));
  rederived('NOI-13', {
    by: `nodal analysis and ${NUMERIC}`,
    within: 1e-4,
    value: (of) => noise(of, { volts: of('en_V_rtHz'), at: 'p' }),
  });
  published('NOI-14', (of) => {
    const { naturalFrequency, q } = transimpedanceResponse(stage(of));
    return resistorNoise(of('Rf_ohm'), of('T_K')) * Math.sqrt(secondOrderNoiseBandwidth(naturalFrequency, q));
  });
  rederived('NOI-14', {
    by: `nodal analysis and ${NUMERIC}`,
    within: 1e-4,
    value: (of) => noise(of, { amps: resistorNoise(of('Rf_ohm'), of('T_K')) / of('Rf_ohm'), between: ['n', 'out'] }),
  });
});

/** Area under a curve of the frequency, integrated over its logarithm. */
function area(curve: (frequency: number) => number, [from, to] = [1e-9, 1e9], pieces = 20_000): number {
  return integral((x) => curve(Math.exp(x)) * Math.exp(x), [Math.log(from), Math.log(to)], pieces);
}
