import type { HeadroomDemand } from '../demands/index.js';
import type { Check } from './check.js';
import { judgeHeadroom } from './output-headroom.js';

/** Room the stage leaves the output above V- against what the part loses there at the current it must sink. */
export const outputLow: Check<HeadroomDemand> = {
  id: 'output-low',
  title: 'output low',
  unit: 'V',
  reads: ['outputLowHeadroom', 'offsetVoltage', 'offsetDrift'],
  hasMargin: false,
  asks: (demands) => demands['output-low'],
  judge: (asked, readings) => judgeHeadroom(asked, 'low', readings),
};
