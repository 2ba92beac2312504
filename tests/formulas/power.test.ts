import { describe } from 'vitest';
import {
  batteryLife,
  capacitiveLoadPower,
  junctionTemperature,
  quiescentPower,
  sineDissipation,
  worstStaticDissipation,
} from '../../src/formulas/power.js';
import { example, refuses } from '../support/examples.js';

describe('power', () => {
  example('quiescentPower(5.25, 1.2e-3, 2)', () => quiescentPower(5.25, 1.2e-3, 2), 12.6e-3);
  example("worstStaticDissipation(5, 1e3, 'rail')", () => worstStaticDissipation(5, 1e3, 'rail'), 6.25e-3);
  example("worstStaticDissipation(5, 1e3, 'middle')", () => worstStaticDissipation(5, 1e3, 'middle'), 1.5625e-3);
  const sine = { supply: 5, level: 2.5, peak: 1, load: 1e3 };
  example('sineDissipation', () => sineDissipation(sine), 5.75e-3);
  const load = { frequency: 10e3, capacitance: 100e-9, peakToPeak: 4, supply: 5 };
  example('capacitiveLoadPower', () => capacitiveLoadPower(load), 20e-3);
  example('junctionTemperature(85, 200, 0.05066)', () => junctionTemperature(85, 200, 0.05066), 95.132);
  example('batteryLife(0.22, 0.85, 40e-6)', () => batteryLife(0.22, 0.85, 40e-6), 4675);
  refuses(() => quiescentPower(5, 1, 0), 'quiescentPower: amplifiers must be finite, at least 1, but is 0');
  refuses(() => worstStaticDissipation(5, 0, 'rail'), 'worstStaticDissipation: load must be finite, above 0, but is 0');
  refuses(() => sineDissipation({ ...sine, level: 4.5 }), 'sineDissipation: level must be finite, at least 1, at most 4, but is 4.5');
  refuses(
    () => capacitiveLoadPower({ ...load, capacitance: -1 }),
    'capacitiveLoadPower: capacitance must be finite, at least 0, but is -1',
  );
  refuses(() => junctionTemperature(-300, 1, 1), 'junctionTemperature: ambient must be finite, above -273.15, but is -300');
  refuses(() => batteryLife(1, 1.5, 1), 'batteryLife: usable must be finite, above 0, at most 1, but is 1.5');
});
