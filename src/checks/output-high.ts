import type { HeadroomDemand } from '../demands/index.js';
import type { VertexFindings } from '../verdicts/finding.js';
import { composed } from './check.js';
import { HEADROOM_NUMBERS } from './output-headroom-numbers.js';
import { headroomFinding, headroomTerms, type HeadroomFound } from './output-headroom.js';

/** Room the stage leaves the output below V+ against what the part loses there at the current it must source. */
export const outputHigh = composed<HeadroomDemand, HeadroomFound, VertexFindings>({
  id: 'output-high',
  title: 'output high',
  unit: 'V',
  reads: ['outputHighHeadroom', 'offsetVoltage', 'offsetDrift'],
  hasMargin: false,
  asks: (demands) => demands['output-high'],
  terms: headroomTerms('high'),
  // The rooms are the stage's own: there is no limit beside them.
  whole: (asked, found, told) => headroomFinding(asked, found, { side: 'high', brief: told.brief }),
  finding: (_, findings) => findings,
  inNumbers: HEADROOM_NUMBERS,
});
