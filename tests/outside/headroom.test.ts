import { describe } from 'vitest';
import { clippingDistortion, clippingRatio } from '../../src/formulas/clipping.js';
import { emitterFollowerCeiling, headroomOfSwing, mosHeadroom, mosSaturationCurrent } from '../../src/formulas/output-stage.js';
import { highestOutput, lowestOutput, peakLoadCurrent } from '../../src/formulas/loading.js';
import { published, rederived, type Given } from '../support/check-values.js';
import { solveFor } from '../support/loops.js';
import { GROUND, solve, type Element } from '../support/nodal.js';
import { harmonics } from '../support/waveforms.js';

describe('resistive output into a load', () => {
  const stage = (of: Given, rail: number) => {
    return { rail, floor: 0, onResistance: of('Ron_ohm'), load: of('RL_ohm'), loadVoltage: of('Vt_V') };
  };
  const measured = (of: Given, rail: number): number => {
    const elements: Element[] = [
      { volts: rail, at: 'rail' },
      { volts: of('Vt_V'), at: 't' },
      { r: of('Ron_ohm'), between: ['rail', 'out'] },
      { r: of('RL_ohm'), between: ['out', 't'] },
      { r: 1e15, between: ['out', GROUND] },
    ];
    return solve(elements, 0)('out')[0];
  };
  published('HDR-01', (of) => highestOutput(stage(of, of('Vcc_V'))));
  published('HDR-02', (of) => highestOutput(stage(of, of('Vcc_V'))));
  published('HDR-03', (of) => lowestOutput(stage(of, 0)));
  for (const id of ['HDR-01', 'HDR-02', 'HDR-03']) {
    const value = (of: Given): number => measured(of, id === 'HDR-03' ? 0 : of('Vcc_V'));
    rederived(id, { by: 'nodal analysis of the divider', within: 1e-6, value });
  }
});

describe('MOS output', () => {
  const triode = (of: Given, overdrive: number) => (v: number): number => of('k_A_V2') * (overdrive * v - (v * v) / 2);
  const device = (of: Given) => ({ gain: of('k_A_V2'), overdrive: of('Vov_V') });

  published('HDR-04', (of) => mosHeadroom(device(of), of('I_A')));
  rederived('HDR-04', {
    by: 'bisection on the triode law',
    within: 1e-9,
    value: (of) => solveFor(triode(of, of('Vov_V')), of('I_A'), [1e-6, of('Vov_V')]),
  });
  published('HDR-05', (of) => mosSaturationCurrent(device(of)));
  rederived('HDR-05', {
    by: 'the highest current of a scan over the triode law',
    within: 1e-6,
    value: (of) => Math.max(...Array.from({ length: 100_000 }, (_, k) => triode(of, of('Vov_V'))((k * of('Vov_V')) / 50_000))),
  });
  const headroom = (of: Given, supply: number): number => {
    return mosHeadroom({ gain: of('k_A_V2'), overdrive: supply - of('Vth_V') }, of('I_A'));
  };
  published('HDR-06', (of) => headroom(of, 1.8) / headroom(of, 5));
  rederived('HDR-06', {
    by: 'bisection on the triode law',
    within: 1e-9,
    value: (of) => {
      const at = (overdrive: number): number => solveFor(triode(of, overdrive), of('I_A'), [1e-6, overdrive]);
      return at(1.8 - of('Vth_V')) / at(5 - of('Vth_V'));
    },
  });
});

describe('load current and clipping', () => {
  published('HDR-08', (of) => {
    return peakLoadCurrent({ peak: of('Vp_V'), frequency: of('f_Hz'), resistance: of('R_ohm'), capacitance: of('C_F') });
  });
  rederived('HDR-08', {
    by: 'the highest sample of the two currents added in time',
    within: 1e-6,
    value: (of) => {
      const rate = 2 * Math.PI * of('f_Hz');
      const current = (angle: number): number =>
        of('Vp_V') * (Math.sin(angle) / of('R_ohm') + rate * of('C_F') * Math.cos(angle));
      return Math.max(...Array.from({ length: 10_000 }, (_, k) => current((2 * Math.PI * k) / 10_000)));
    },
  });
  published('HDR-10', (of) => clippingDistortion(of('clip_ratio')));
  rederived('HDR-10', { by: 'Fourier sums of a clipped sine', within: 1e-5, value: (of) => clippedSine(of('clip_ratio')) });
  published('HDR-11', (of) => clippingRatio(of('THD')));
  rederived('HDR-11', {
    by: 'bisection on Fourier sums of a clipped sine',
    within: 1e-6,
    value: (of) => solveFor(clippedSine, of('THD'), [0.9, 0.9999]),
  });
});

describe('common practice', () => {
  published('STD-16', (of) => headroomOfSwing(of('V_pos_V'), of('V_neg_V'), of('Vout_pp_V')));
  published('STD-17', (of) => emitterFollowerCeiling(of('Vcc_V')).best);
});

function clippedSine(ratio: number): number {
  const points = 40_000;
  const clip = (v: number): number => Math.max(-ratio, Math.min(ratio, v));
  return harmonics(Array.from({ length: points }, (_, k) => clip(Math.sin((2 * Math.PI * (k + 0.5)) / points)))).distortion;
}
