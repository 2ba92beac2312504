import type { DistortionDemand } from '../demands/index.js';
import { rootSumSquare, worstCaseSum } from '../formulas/dc-error.js';
import { weakest } from '../parts/basis.js';
import type { Readings } from '../parts/readings.js';
import type { BoundFinding, Finding } from '../verdicts/finding.js';
import type { Check } from './check.js';
import { clippingPart } from './clipping.js';
import { crossoverPart } from './input-crossover.js';
import { together } from './distortion-part.js';
import { slewingPart } from './input-pair.js';

/** Slewing, clipping and the step of the input crossover against the distortion allowed: sum of magnitudes (M2, M6, M9). */
export const distortion: Check<DistortionDemand> = {
  id: 'distortion',
  title: 'distortion',
  unit: '1',
  reads: [
    'slewRate', 'gainBandwidth', 'inputCapacitance', 'inputType', 'outputLowHeadroom', 'outputHighHeadroom', 'offsetVoltage', 'offsetDrift', 'inputCrossover', 'inputHighHeadroom',
    'commonModeRejection', 'crossoverFree',
  ],
  hasMargin: true,
  asks: (demands) => demands.distortion,
  judge: judgeDistortion,
};

function judgeDistortion(asked: DistortionDemand, readings: Readings): Finding {
  const { required, unit, sense } = asked;
  const { terms, missing, cautions } = together([slewingPart(asked, readings), clippingPart(asked, readings), crossoverPart(asked, readings)]);
  const known = worstCaseSum(terms.map((term) => term.value));
  const common = { required, unit, sense, terms, cautions, basis: weakest(terms.map((term) => term.basis)) };
  if (missing.length > 0) return { kind: 'bound', ...common, known, missing, cause: 'missing-figure', turnsAt: null } satisfies BoundFinding;
  const borrowed = worstCaseSum(terms.filter((term) => term.basis === 'borrowed').map((term) => term.value));
  return { kind: 'numbers', ...common, offered: known, rss: rootSumSquare(terms.map((term) => term.value)), borrowed };
}
