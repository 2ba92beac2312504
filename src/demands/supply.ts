import { formatQuantity } from '../quantities/format.js';
import type { Stage } from '../stage/index.js';
import type { NumberDemand } from './demand.js';

const SOURCE = 'M0: the supply at its ends';

export function supplyLow(stage: Stage): NumberDemand {
  const required = stage.supply.min;
  return { check: 'supply-low', required, unit: 'V', sense: 'at-most', because: `lowest supply ${formatQuantity(required, 'V')}`, source: SOURCE };
}

export function supplyHigh(stage: Stage): NumberDemand {
  const required = stage.supply.max;
  return { check: 'supply-high', required, unit: 'V', sense: 'at-least', because: `highest supply ${formatQuantity(required, 'V')}`, source: SOURCE };
}

export function supplyPeak(stage: Stage): NumberDemand {
  const required = stage.supplyPeak;
  return { check: 'supply-peak', required, unit: 'V', sense: 'at-least', because: `supply peak ${formatQuantity(required, 'V')}`, source: SOURCE };
}
