import type { HeadroomDemand } from '../demands/index.js';
import type { VertexFindings } from '../verdicts/finding.js';
import { composed } from './check.js';
import { HEADROOM_NUMBERS } from './output-headroom-numbers.js';
import { headroomFinding, headroomTerms, type HeadroomFound } from './output-headroom.js';

/** Room the stage leaves the output above V- against what the part loses there at the current it must sink. */
export const outputLow = composed<HeadroomDemand, HeadroomFound, VertexFindings>({
  id: 'output-low',
  title: 'output low',
  unit: 'V',
  reads: ['outputLowHeadroom', 'offsetVoltage', 'offsetDrift'],
  hasMargin: false,
  asks: (demands) => demands['output-low'],
  terms: headroomTerms('low'),
  // The rooms are the stage's own: there is no limit beside them.
  whole: (asked, found, told) => headroomFinding(asked, found, { side: 'low', brief: told.brief }),
  finding: (_, findings) => findings,
  inNumbers: HEADROOM_NUMBERS,
});
