import { formatPercent, formatQuantity } from '../quantities/format.js';
import type { Stage } from '../stage/index.js';
import { closedLoopOf, settledStep } from './closed-loop.js';
import type { ChargedLoad, SettlingDemand } from './speed-demand.js';

const EXACT = 'M2: slewing and settling of one pole, exact (Franco, Design with Operational Amplifiers and Analog Integrated Circuits, 3rd ed. 2002, ex. 6.7, from memory; own algebra)';
const MARCHED = 'M2: the poles with a slew-limited amplifier, carried on exactly from one change of the limit to the next (own algebra)';

/** Time the output may take to its final value, s. Null without a limit, and of stages that follow no step. */
export function settling(stage: Stage): SettlingDemand | null {
  const limit = stage.asked.limits.settling;
  const closedLoop = closedLoopOf(stage);
  if (limit === undefined || closedLoop === null) return null;
  return {
    check: 'settling',
    required: limit.within.value,
    unit: 's',
    sense: 'at-most',
    because: `${formatQuantity(settledStep(stage), 'V', { digits: 4 })} to within ${formatPercent(limit.to.value)} of it`,
    source: closedLoop.form === 'one-pole' ? EXACT : MARCHED,
    step: settledStep(stage),
    tolerance: limit.to.value,
    closedLoop,
    load: loadOf(stage),
  };
}

function loadOf({ load, vertices, supply }: Stage): ChargedLoad | null {
  if (load === null || load.capacitance === 0) return null;
  const resistiveCurrent = Math.max(...vertices.map(({ loadCurrent, networkCurrent }) => Math.abs(loadCurrent + networkCurrent)));
  return { capacitance: load.capacitance, resistiveCurrent, supply: supply.min };
}
