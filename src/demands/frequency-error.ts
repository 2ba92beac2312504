import { oscillatorPeriod, oscillatorThresholds } from '../formulas/oscillator.js';
import { formatPercent, formatQuantity } from '../quantities/format.js';
import type { Stage } from '../stage/index.js';
import type { OscillatorResponse } from '../stage/response.js';
import { cornerGroups } from './corner-groups.js';
import type { FrequencyErrorDemand, OscillatorEnd } from './power-demand.js';

const SOURCE = 'M1: thresholds and period from the levels of the output (Franco, Design with Operational Amplifiers and Analog Integrated Circuits, 3rd ed. 2002, ch. 10, from memory); edges: own algebra';

/** How far the frequency of an oscillator may be off that with an ideal output, fraction. Null without a limit. */
export function frequencyError(stage: Stage): FrequencyErrorDemand | null {
  const limit = stage.asked.limits.frequencyError;
  const { response } = stage;
  if (limit === undefined || response.kind !== 'oscillator') return null;
  const { toSupply, toGround, toOutput, timeConstant } = response;
  const supply = stage.supply.nominal;
  const ideal = oscillatorPeriod({ supply, high: supply, low: 0, toSupply, toGround, toOutput }, timeConstant).frequency;
  return {
    check: 'frequency-error',
    required: limit.value,
    unit: '1',
    sense: 'at-most',
    because: `off ${formatQuantity(ideal, 'Hz', { digits: 4 })} with an ideal output by ${formatPercent(limit.value)} at most; the components may add ${formatPercent(response.spread, { round: 'up' })}, not charged to the part`,
    source: SOURCE,
    toSupply,
    toGround,
    toOutput,
    timeConstant,
    ends: endsOf(stage, response),
  };
}

/** Heaviest currents just after switching, when the capacitor is farthest from the level: timing and threshold resistors and the load. */
function endsOf(stage: Stage, response: OscillatorResponse): OscillatorEnd[] {
  return [...new Map(cornerGroups(stage).map((group) => [group.supply, group])).values()].map(({ supply, vertices }) => {
    const { upper, lower } = oscillatorThresholds({ supply, high: supply, low: 0, ...response });
    const high = Math.max(...vertices.map(({ loadCurrent, output }) => loadCurrent + stage.loadConductance * (supply - output)));
    const low = Math.max(...vertices.map(({ loadCurrent, output }) => stage.loadConductance * output - loadCurrent));
    return {
      supply,
      sourced: (supply - upper) / response.toOutput + (supply - lower) / response.resistance + Math.max(0, high),
      sunk: lower / response.toOutput + upper / response.resistance + Math.max(0, low),
    };
  });
}
