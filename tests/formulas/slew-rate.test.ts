import { describe } from 'vitest';
import {
  effectiveSlewRate,
  fullPowerFrequency,
  slewOnsetStep,
  slewPerGainBandwidthBipolar,
  slewPerGainBandwidthMos,
  slewRateForLinearStep,
  slewRateForSine,
  slewRateForTones,
  slewRateForTriangle,
} from '../../src/formulas/slew-rate.js';
import { example, refuses } from '../support/examples.js';

describe('slew rate', () => {
  example('slewRateForSine(20e3, 2)', () => slewRateForSine(20e3, 2), 251_327);
  example('slewRateForSine(20e3, 0), a signal that does not move,', () => slewRateForSine(20e3, 0), 0);
  example('fullPowerFrequency(0.5e6, 5)', () => fullPowerFrequency(0.5e6, 5), 15_915);
  const tones = [{ frequency: 1e3, peak: 1 }, { frequency: 10e3, peak: 0.5 }];
  example('slewRateForTones of 1 V at 1 kHz and 0.5 V at 10 kHz', () => slewRateForTones(tones), 37_699);
  example('slewRateForTriangle(1e3, 2)', () => slewRateForTriangle(1e3, 2), 4000);
  example('slewRateForLinearStep(4, 1e6)', () => slewRateForLinearStep(4, 1e6), 25.13e6);
  example('slewOnsetStep(633e3, 200e3)', () => slewOnsetStep(633e3, 200e3), 0.5037);
  const load = { slewRate: 5e6, current: 5e-3, capacitance: 10e-9 };
  example('effectiveSlewRate of 5 mA into 10 nF', () => effectiveSlewRate(load), 0.5e6);
  example('effectiveSlewRate with 2 mA gone into a resistor', () => effectiveSlewRate({ ...load, resistiveCurrent: 2e-3 }), 0.3e6);
  example('effectiveSlewRate into 100 pF, where the amplifier limits,', () => effectiveSlewRate({ ...load, capacitance: 1e-10 }), 5e6);
  example('slewPerGainBandwidthBipolar(300)', () => slewPerGainBandwidthBipolar(300), 0.32487);
  example('slewPerGainBandwidthMos(0.2)', () => slewPerGainBandwidthMos(0.2), 1.25664);

  refuses(() => slewRateForSine(-1, 2), 'slewRateForSine: frequency must be finite, at least 0, but is -1');
  refuses(() => slewRateForSine(1, NaN), 'slewRateForSine: peak must be finite, at least 0, but is NaN');
  refuses(() => fullPowerFrequency(1, 0), 'fullPowerFrequency: peak must be finite, above 0, but is 0');
  refuses(() => slewRateForTriangle(1, -2), 'slewRateForTriangle: peakToPeak must be finite, at least 0, but is -2');
  refuses(() => slewRateForLinearStep(-4, 1), 'slewRateForLinearStep: step must be finite, at least 0, but is -4');
  refuses(() => slewOnsetStep(1, 0), 'slewOnsetStep: bandwidth must be finite, above 0, but is 0');
  refuses(
    () => effectiveSlewRate({ ...load, resistiveCurrent: 6e-3 }),
    'effectiveSlewRate: resistiveCurrent must be finite, at least 0, at most 0.005, but is 0.006',
  );
  refuses(() => slewPerGainBandwidthMos(0), 'slewPerGainBandwidthMos: overdrive must be finite, above 0, but is 0');
});
