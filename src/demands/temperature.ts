import { formatQuantity } from '../quantities/format.js';
import type { Stage } from '../stage/index.js';
import type { NumberDemand } from './demand.js';

const SOURCE = 'the ambient range of the stage against the specified range of the part';

export function temperatureLow(stage: Stage): NumberDemand {
  const required = stage.temperature.min;
  return { check: 'temperature-low', required, unit: '°C', sense: 'at-most', because: `lowest temperature ${formatQuantity(required, '°C')}`, source: SOURCE };
}

export function temperatureHigh(stage: Stage): NumberDemand {
  const required = stage.temperature.max;
  return { check: 'temperature-high', required, unit: '°C', sense: 'at-least', because: `highest temperature ${formatQuantity(required, '°C')}`, source: SOURCE };
}
