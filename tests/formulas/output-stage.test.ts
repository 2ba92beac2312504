import { describe } from 'vitest';
import { emitterFollowerCeiling, headroomOfSwing, mosHeadroom, mosSaturationCurrent } from '../../src/formulas/output-stage.js';
import { example, refuses } from '../support/examples.js';

describe('output stage', () => {
  const device = { gain: 2.325581395e-3, overdrive: 4.3 };
  example('mosHeadroom at 10 mA', () => mosHeadroom(device, 10e-3), 1.155163);
  example('mosHeadroom at saturation is the whole overdrive and', () => mosHeadroom(device, mosSaturationCurrent(device)), 4.3);
  example('mosSaturationCurrent', () => mosSaturationCurrent(device), 21.5e-3);
  example('headroomOfSwing(15, -15, 24)', () => headroomOfSwing(15, -15, 24), 3);
  example('emitterFollowerCeiling(5).worst', () => emitterFollowerCeiling(5).worst, 3.5);
  example('emitterFollowerCeiling(5).best', () => emitterFollowerCeiling(5).best, 3.8);

  refuses(
    () => mosHeadroom({ gain: 2, overdrive: 1 }, 1.5),
    'mosHeadroom: current must be finite, at least 0, at most 1, but is 1.5',
  );
  refuses(() => mosSaturationCurrent({ gain: 0, overdrive: 1 }), 'mosSaturationCurrent: gain must be finite, above 0, but is 0');
  refuses(() => headroomOfSwing(5, 0, 6), 'headroomOfSwing: swing must be finite, at least 0, at most 5, but is 6');
  refuses(() => emitterFollowerCeiling(1.5), 'emitterFollowerCeiling: rail must be finite, above 1.5, but is 1.5');
});
