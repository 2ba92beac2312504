import { describe } from 'vitest';
import { BOLTZMANN, ELEMENTARY_CHARGE, thermalVoltage } from '../../src/formulas/constants.js';
import { idealConverterSignalToNoise } from '../../src/formulas/signal-to-noise.js';
import { resistorNoise } from '../../src/formulas/noise.js';
import { AEC_Q100_AMBIENT, COMMON_SUPPLIES } from '../../src/formulas/standards.js';
import { published, rederived } from '../support/check-values.js';

describe('SI constants', () => {
  published('STD-01', () => BOLTZMANN);
  published('STD-02', () => ELEMENTARY_CHARGE);
  published('STD-03', (of) => thermalVoltage(of('T_K')));
  published('STD-04', (of) => resistorNoise(of('R_ohm'), of('T_K')));
});

describe('ranges set by others', () => {
  published('STD-10', () => AEC_Q100_AMBIENT.map(({ min, max }) => [min, max]));
  published('STD-13', () => [COMMON_SUPPLIES.usbHighPowerPort.min, COMMON_SUPPLIES.usbHighPowerPort.max]);
  published('STD-14', () => COMMON_SUPPLIES.usbLowPowerPort.min);
  published('STD-15', () => [COMMON_SUPPLIES.lithiumCell.min, COMMON_SUPPLIES.lithiumCell.max]);
});

describe('converters', () => {
  published('STD-11', (of) => idealConverterSignalToNoise(of('bits')));
  published('STD-12', (of) => idealConverterSignalToNoise(of('bits')));
  for (const [id, within] of [['STD-11', 1e-3], ['STD-12', 1e-4]] as const) {
    rederived(id, {
      by: 'quantising a full-scale sine',
      within,
      value: (of) => {
        const levels = 2 ** of('bits');
        const points = 500_009;
        let error = 0;
        for (let k = 0; k < points; k += 1) {
          const value = ((levels / 2) - 0.5) * Math.sin((2 * Math.PI * 7919 * k) / points);
          error += (value - (Math.floor(value) + 0.5)) ** 2;
        }
        return 10 * Math.log10((levels / 2) ** 2 / 2 / (error / points));
      },
    });
  }
});
