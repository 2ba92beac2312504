import { formatQuantity } from '../quantities/format.js';
import type { Stage } from '../stage/index.js';
import type { OverdriveDemand } from './hazard-demand.js';
import { inputReach } from './input-reach.js';
import { reachText } from './phase-reversal.js';

const SOURCE = 'M9: an input beyond a rail against its rating, or the current a series resistance lets through (common practice; Ohm’s law)';

/** How far beyond a rail the input of the stage is taken, by overdrive or with the supply off, V. */
export function overdrive(stage: Stage): OverdriveDemand {
  const reach = inputReach(stage);
  const { beyond, unpowered, series } = reach;
  const required = beyond === null && unpowered === null ? null : Math.max(beyond ?? 0, unpowered ?? 0);
  const through = series > 0 && required !== null && required > 0 ? `, through ${formatQuantity(series, 'Ω')}` : '';
  return {
    check: 'overdrive',
    required,
    unit: 'V',
    sense: 'at-least',
    because: `${reachText({ ...reach, still: false })}${through}, and the file says avoid`,
    source: SOURCE,
    avoided: stage.asked.avoid.includes('overdrive'),
    reach,
  };
}
