import { formatQuantity } from '../quantities/format.js';
import type { Stage } from '../stage/index.js';
import type { StartUpDemand } from './hazard-demand.js';

const SOURCE = 'start-up, and recovery from overload after it, added (common practice)';

/** From switching on to a usable output, s. Null for a stage that is always on and has no limit. */
export function startUp(stage: Stage): StartUpDemand | null {
  const { dutyCycle, limits, sequencing, overdrive } = stage.asked;
  const limit = limits.startUp;
  if (dutyCycle === null && limit === undefined) return null;
  const on = dutyCycle === null ? '' : `on for ${dutyCycle.on.text} of every ${dutyCycle.every.text}, `;
  const overloaded = sequencing === 'signal-first' || (overdrive?.value ?? 0) > 0;
  return {
    check: 'start-up',
    required: limit?.value ?? null,
    unit: 's',
    sense: 'at-most',
    because: `${on}${limit === undefined ? 'no limit' : `usable within ${formatQuantity(limit.value, 's')}`}${overloaded ? ', from an overload' : ''}`,
    source: SOURCE,
    on: dutyCycle?.on.value ?? null,
    overloaded,
  };
}
