import { describe } from 'vitest';
import {
  batteryLife,
  capacitiveLoadPower,
  junctionTemperature,
  quiescentPower,
  sineDissipation,
  worstStaticDissipation,
} from '../../src/formulas/power.js';
import { published, rederived, type Given } from '../support/check-values.js';

const SCAN = 'a scan over the output voltage';

describe('power', () => {
  published('PWR-01', (of) => quiescentPower(of('VS_V'), of('IQ_per_ch_A'), of('n')));
  published('PWR-02', (of) => worstStaticDissipation(of('VS_V'), of('RL_ohm'), 'rail'));
  rederived('PWR-02', { by: SCAN, within: 1e-6, value: (of) => scanned(of, 0) });
  published('PWR-03', (of) => worstStaticDissipation(of('VS_V'), of('RL_ohm'), 'middle'));
  rederived('PWR-03', { by: SCAN, within: 1e-6, value: (of) => scanned(of, of('VS_V') / 2) });
  published('PWR-05', (of) => junctionTemperature(of('TA_C'), of('theta_JA_K_per_W'), of('P_W')));
  published('PWR-06', (of) => batteryLife(of('Q_Ah'), of('usable'), of('I_A')));
  published('PWR-07', (of) => {
    return capacitiveLoadPower({ frequency: of('f_Hz'), capacitance: of('CL_F'), peakToPeak: of('Vpp_V'), supply: of('VS_V') });
  });
  rederived('PWR-07', {
    by: 'the supply current averaged over a period, drawn only while the output rises',
    within: 1e-6,
    value: (of) => {
      const current = (angle: number): number => Math.PI * of('f_Hz') * of('CL_F') * of('Vpp_V') * Math.cos(angle);
      return mean((angle) => of('VS_V') * Math.max(0, current(angle)));
    },
  });
  published('PWR-09', (of) => {
    return sineDissipation({ supply: of('VS_V'), level: of('Vdc_V'), peak: of('Vp_V'), load: of('RL_ohm') });
  });
  rederived('PWR-09', {
    by: 'voltage times current averaged over a period',
    within: 1e-6,
    value: (of) => {
      const output = (angle: number): number => of('Vdc_V') + of('Vp_V') * Math.sin(angle);
      return mean((angle) => ((of('VS_V') - output(angle)) * output(angle)) / of('RL_ohm'));
    },
  });
});

/** Most that the conducting output device takes, whichever side it is on, with the load to a voltage. */
function scanned(of: Given, loadVoltage: number): number {
  const taken = Array.from({ length: 10_001 }, (_, k) => {
    const output = (of('VS_V') * k) / 10_000;
    const current = (output - loadVoltage) / of('RL_ohm');
    return current > 0 ? (of('VS_V') - output) * current : -output * current;
  });
  return Math.max(...taken);
}

function mean(curve: (angle: number) => number): number {
  const points = 100_000;
  let sum = 0;
  for (let k = 0; k < points; k += 1) sum += curve((2 * Math.PI * k) / points);
  return sum / points;
}
