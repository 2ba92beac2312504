import type { HeadroomDemand } from '../demands/index.js';
import type { Check } from './check.js';
import { judgeHeadroom } from './output-headroom.js';

/** Room the stage leaves the output below V+ against what the part loses there at the current it must source. */
export const outputHigh: Check<HeadroomDemand> = {
  id: 'output-high',
  title: 'output high',
  unit: 'V',
  reads: ['outputHighHeadroom', 'offsetVoltage', 'offsetDrift'],
  hasMargin: false,
  asks: (demands) => demands['output-high'],
  judge: (asked, readings) => judgeHeadroom(asked, 'high', readings),
};
