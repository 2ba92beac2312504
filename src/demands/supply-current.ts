import { formatQuantity } from '../quantities/format.js';
import type { Stage } from '../stage/index.js';
import type { SupplyCurrentDemand } from './demand.js';

/** Supply current the stage allows, A, per amplifier or for the whole package with its idle sections. Null without a limit. */
export function supplyCurrent(stage: Stage): SupplyCurrentDemand | null {
  const { supplyCurrent: limit, supplyCurrentPer } = stage.asked.limits;
  if (limit === undefined) return null;
  const per = supplyCurrentPer ?? 'amplifier';
  return {
    check: 'supply-current',
    required: limit.value,
    unit: 'A',
    sense: 'at-most',
    because: `supply current ${formatQuantity(limit.value, 'A')} allowed per ${per}`,
    source: 'M8: quiescent current',
    per,
  };
}
