import { describe } from 'vitest';
import {
  butterworthNoiseBandwidth,
  realPolesNoiseBandwidth,
  secondOrderNoiseBandwidth,
  transimpedanceVoltageNoiseRoot,
} from '../../src/formulas/noise-bandwidth.js';
import { example, refuses } from '../support/examples.js';

describe('noise bandwidth', () => {
  for (const [poles, expected] of [[1, 1.5708], [2, 1.2203], [3, 1.1554], [4, 1.1287], [5, 1.1138]] as const) {
    example(`realPolesNoiseBandwidth(${poles})`, () => realPolesNoiseBandwidth(poles), expected);
  }
  for (const [order, expected] of [[1, 1.5708], [2, 1.1107], [3, 1.0472], [4, 1.0262], [5, 1.0166]] as const) {
    example(`butterworthNoiseBandwidth(${order})`, () => butterworthNoiseBandwidth(order), expected);
  }
  example('secondOrderNoiseBandwidth(1e3, 1)', () => secondOrderNoiseBandwidth(1e3, 1), 1570.8);
  const stage = { feedback: 10e6, inputCapacitance: 45e-12, feedbackCapacitance: 0.5e-12, gainBandwidth: 16e6 };
  example('transimpedanceVoltageNoiseRoot × 4.5 nV', () => 4.5e-9 * transimpedanceVoltageNoiseRoot(stage), 214.994e-6);
  refuses(() => realPolesNoiseBandwidth(0), 'cascadeShrinkage: stages must be finite, at least 1, but is 0');
  refuses(() => butterworthNoiseBandwidth(0), 'butterworthNoiseBandwidth: order must be finite, at least 1, but is 0');
  refuses(() => secondOrderNoiseBandwidth(1, 0), 'secondOrderNoiseBandwidth: q must be finite, above 0, but is 0');
  refuses(
    () => transimpedanceVoltageNoiseRoot({ ...stage, feedback: 0 }),
    'transimpedanceResponse: feedback must be finite, above 0, but is 0',
  );
});
