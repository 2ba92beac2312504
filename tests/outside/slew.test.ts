import { describe } from 'vitest';
import { edgePeakSlewRate, edgeSlewRate } from '../../src/formulas/edges.js';
import { closedLoopBandwidth } from '../../src/formulas/gain-bandwidth.js';
import { slewMarginForDistortion, thirdHarmonicBipolar } from '../../src/formulas/input-pair-distortion.js';
import { settlingTime, slewRateForSettling } from '../../src/formulas/settling.js';
import {
  effectiveSlewRate,
  fullPowerFrequency,
  slewOnsetStep,
  slewPerGainBandwidthBipolar,
  slewPerGainBandwidthMos,
  slewRateForLinearStep,
  slewRateForSine,
  slewRateForTones,
} from '../../src/formulas/slew-rate.js';
import { slewedDistortion, TRIANGLE_RATIO } from '../../src/formulas/slewed-sine.js';
import { published, rederived, type Given } from '../support/check-values.js';
import { followerWithPair, harmonic, harmonics, integral, slewLimitedSine, steppedSettling } from '../support/waveforms.js';

describe('sines and tones', () => {
  published('SLW-01', (of) => slewRateForSine(of('f_Hz'), of('Vp_V')));
  rederived('SLW-01', { by: 'the steepest piece of a sampled sine', within: 1e-7, value: (of) => steepest([[of('f_Hz'), of('Vp_V')]]) });
  published('SLW-02', (of) => fullPowerFrequency(of('SR_V_per_s'), of('Vp_V')));
  const tones = (of: Given): [number, number][] => of.list('f_Hz').map((f, k) => [f, of.list('Vp_V')[k]!]);
  published('SLW-18', (of) => slewRateForTones(tones(of).map(([frequency, peak]) => ({ frequency, peak }))));
  rederived('SLW-18', { by: 'the steepest piece of the sampled sum', within: 1e-6, value: (of) => steepest(tones(of)) });
});

describe('edges', () => {
  published('SLW-03', (of) => edgeSlewRate(of('Vpp_V'), of('t_rise_s')));
  published('SLW-20', () => edgePeakSlewRate(1, 1, 'singlePole'));
  rederived('SLW-20', {
    by: 'measuring an exponential edge',
    within: 1e-6,
    value: () => peakSlopeTimesRise((t) => (t < 0 ? 0 : -Math.expm1(-t)), [0, 10]),
  });
  published('SLW-21', () => edgePeakSlewRate(1, 1, 'gaussian'));
  rederived('SLW-21', {
    by: 'measuring an integrated Gaussian edge',
    within: 1e-5,
    value: () => {
      const density = (x: number): number => Math.exp((-x * x) / 2) / Math.sqrt(2 * Math.PI);
      return peakSlopeTimesRise((t) => 0.5 + integral(density, [0, t], 60), [0, 5], -5);
    },
  });
});

describe('steps', () => {
  const loop = (of: Given) => ({ step: of('dV_V'), timeConstant: of('tau_s'), tolerance: of('eps') });

  published('SLW-04', (of) => slewOnsetStep(of('SR_V_per_s'), closedLoopBandwidth(of('GBW_Hz'), 1 / of('beta'))));
  published('SLW-05', (of) => settlingTime({ ...loop(of), slewRate: of('SR_V_per_s') }));
  published('SLW-06', (of) => settlingTime({ ...loop(of), slewRate: of('SR_V_per_s') }));
  published('SLW-07', (of) => settlingTime({ ...loop(of), slewRate: of('SR_V_per_s') }));
  published('SLW-08', (of) => settlingTime({ ...loop(of), slewRate: of('SR_V_per_s') }));
  for (const id of ['SLW-05', 'SLW-06', 'SLW-07', 'SLW-08']) {
    const value = (of: Given): number => steppedSettling({ ...loop(of), slewRate: of('SR_V_per_s') });
    rederived(id, { by: 'stepping the loop through time', within: 1e-4, value });
  }
  published('SLW-09', (of) => slewRateForSettling({ ...loop(of), time: of('T_s') }));
  rederived('SLW-09', {
    by: 'bisection on the loop stepped through time',
    within: 2e-4,
    value: (of) => {
      let [low, high] = [of('dV_V') / of('T_s'), of('dV_V') / of('tau_s')];
      for (let halving = 0; halving < 25; halving += 1) {
        const slewRate = (low + high) / 2;
        if (steppedSettling({ ...loop(of), slewRate }) > of('T_s')) low = slewRate;
        else high = slewRate;
      }
      return high;
    },
  });
  published('SLW-25', (of) => slewRateForLinearStep(of('dV_V'), of('f_cl_Hz')));
  published('SLW-24', (of) => effectiveSlewRate({ slewRate: of('SR_V_per_s'), current: of('Isc_A'), capacitance: of('CL_F') }));
});

describe('overdriven sines', () => {
  published('SLW-11', (of) => slewedDistortion(of('SR_over_wVp')));
  published('SLW-14', (of) => slewedDistortion(of('SR_over_wVp')));
  for (const id of ['SLW-11', 'SLW-14']) {
    const value = (of: Given): number => harmonics(slewLimitedSine(of('SR_over_wVp'), 20_000)).distortion;
    rederived(id, { by: 'Fourier sums of a sine stepped through a slew limit', within: 1e-3, value });
  }
  published('SLW-12', () => TRIANGLE_RATIO);
  rederived('SLW-12', {
    by: 'watching when a stepped sine never leaves the slew limit',
    within: 0.01,
    value: () => {
      let [low, high] = [0.4, 0.7];
      for (let halving = 0; halving < 14; halving += 1) {
        const ratio = (low + high) / 2;
        if (freeSteps(ratio) <= 4) low = ratio;
        else high = ratio;
      }
      return high;
    },
  });
});

describe('input pairs', () => {
  published('SLW-16', (of) => {
    return thirdHarmonicBipolar({ ratio: of('r'), frequency: of('f_Hz'), gainBandwidth: of('GBW_Hz'), noiseGain: of('NG') });
  });
  rederived('SLW-16', {
    by: 'Fourier sums of a follower with a tanh input stage, stepped through time',
    within: 0.01,
    value: (of) => harmonicRatio(followerWithPair(Math.tanh, of('GBW_Hz') / of('f_Hz'), of('r')), 3),
  });
  published('SLW-17', (of) => {
    return slewMarginForDistortion({ harmonic: of('HD3'), frequency: of('f_over_GBW'), gainBandwidth: 1, noiseGain: of('NG') });
  });
  rederived('SLW-17', {
    by: 'bisection on Fourier sums of the pair’s input voltage',
    within: 1e-6,
    value: (of) => {
      const points = 4096;
      const third = (r: number): number => {
        const samples = Array.from({ length: points }, (_, k) => Math.atanh(r * Math.cos((2 * Math.PI * k) / points)));
        return (of('NG') * of('f_over_GBW') * harmonic(samples, 3)) / r;
      };
      let [low, high] = [1.01, 10];
      for (let halving = 0; halving < 40; halving += 1) {
        const margin = (low + high) / 2;
        if (third(1 / margin) > of('HD3')) low = margin;
        else high = margin;
      }
      return high;
    },
  });
  published('SLW-26', (of) => slewPerGainBandwidthBipolar(of('T_K')));
  published('SLW-27', (of) => slewPerGainBandwidthMos(of('Vov_V')));
});

/** Largest difference quotient of a sum of sines [f, peak], sampled around the common zero crossing and over a period. */
function steepest(tones: readonly (readonly [number, number])[]): number {
  const slowest = Math.min(...tones.map(([f]) => f));
  const fastest = Math.max(...tones.map(([f]) => f));
  const dt = 1 / fastest / 20_000;
  const value = (t: number): number => tones.reduce((sum, [f, peak]) => sum + peak * Math.sin(2 * Math.PI * f * t), 0);
  let most = 0;
  for (let t = -0.5 / slowest; t < 0.5 / slowest; t += dt) most = Math.max(most, (value(t + dt / 2) - value(t - dt / 2)) / dt);
  return most;
}

/** Steepest slope × 10..90 % time of an edge that runs from 0 to 1; its steepest point and a late time are given. */
function peakSlopeTimesRise(edge: (t: number) => number, [steepestAt, end]: readonly [number, number], start = 0): number {
  const reaches = (level: number): number => {
    let [low, high] = [start, end];
    for (let halving = 0; halving < 60; halving += 1) {
      const middle = (low + high) / 2;
      if (edge(middle) < level) low = middle;
      else high = middle;
    }
    return high;
  };
  const dt = 1e-7;
  return ((edge(steepestAt + dt) - edge(steepestAt)) / dt) * (reaches(0.9) - reaches(0.1));
}

/** Steps of one period that are not at the slew limit. */
function freeSteps(ratio: number): number {
  const points = 20_000;
  const limit = (ratio * 2 * Math.PI) / points;
  const period = slewLimitedSine(ratio, points);
  return period.filter((value, k) => Math.abs(Math.abs(value - period.at(k - 1)!) - limit) > 1e-9 * limit).length;
}

function harmonicRatio(samples: readonly number[], order: number): number {
  return harmonic(samples, order) / harmonic(samples, 1);
}
