import { describe } from 'vitest';
import { headroomScale, highestOutput, lowestOutput, peakLoadCurrent } from '../../src/formulas/loading.js';
import { example, refuses } from '../support/examples.js';

describe('output under load', () => {
  const stage = { rail: 5, floor: 0, onResistance: 100, load: 1e3, loadVoltage: 0 };
  example('highestOutput', () => highestOutput(stage), 4.54545);
  example('highestOutput with a floor of 110 mV', () => highestOutput({ ...stage, floor: 0.11 }), 4.44545);
  example('lowestOutput', () => lowestOutput({ ...stage, rail: 0, loadVoltage: 5 }), 0.454545);
  example('lowestOutput with a floor of 110 mV', () => lowestOutput({ ...stage, rail: 0, floor: 0.11 }), 0.1);
  example('headroomScale(5, 1.8)', () => headroomScale(5, 1.8), 3.90909);
  const drive = { peak: 2, frequency: 20e3, resistance: 1e3, capacitance: 100e-9 };
  example('peakLoadCurrent', () => peakLoadCurrent(drive), 25.212e-3);
  refuses(() => highestOutput({ ...stage, load: 0 }), 'highestOutput: load must be finite, above 0, but is 0');
  refuses(() => lowestOutput({ ...stage, floor: -1 }), 'lowestOutput: floor must be finite, at least 0, but is -1');
  refuses(() => headroomScale(5, 0.7), 'headroomScale: used must be finite, above 0.7, but is 0.7');
  refuses(() => peakLoadCurrent({ ...drive, resistance: 0 }), 'peakLoadCurrent: resistance must be finite, above 0, but is 0');
});
