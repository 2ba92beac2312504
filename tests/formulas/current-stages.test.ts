import { describe } from 'vitest';
import { highSideMirror, highSideSense, lowSideSense, transimpedance } from '../../src/formulas/current-stages.js';
import { example, refuses } from '../support/examples.js';

describe('where a stage driven by a current stands', () => {
  const diode = { current: 10e-6, feedback: 200e3, reference: 0.1, direction: 'into-node' } as const;
  example('transimpedance, current into the node', () => transimpedance(diode).output, -1.9);
  example('transimpedance, current out of it', () => transimpedance({ ...diode, direction: 'out-of-node' }).output, 2.1);
  const low = { current: 2, shunt: 0.01, gain: 50, reference: 0 };
  example('lowSideSense, output', () => lowSideSense(low).output, 1);
  example('lowSideSense, inputs', () => lowSideSense(low).commonMode, 0.02);
  const high = { current: 5, shunt: 0.01, gain: 10, bus: 12, reference: 0 };
  example('highSideSense, output', () => highSideSense(high).output, 0.5);
  example('highSideSense, inputs', () => highSideSense(high).commonMode, 10.909);
  const mirror = { current: 5, shunt: 0.01, sense: 100, load: 2e3, bus: 12 };
  example('highSideMirror, output', () => highSideMirror(mirror).output, 1);
  example('highSideMirror, inputs', () => highSideMirror(mirror).commonMode, 11.95);

  refuses(() => transimpedance({ ...diode, current: -1 }), 'transimpedance: current must be finite, at least 0, but is -1');
  refuses(() => lowSideSense({ ...low, gain: 0.5 }), 'lowSideSense: gain must be finite, at least 1, but is 0.5');
  refuses(() => highSideSense({ ...high, shunt: 0 }), 'highSideSense: shunt must be finite, above 0, but is 0');
  refuses(() => highSideMirror({ ...mirror, sense: 0 }), 'highSideMirror: sense must be finite, above 0, but is 0');
});
