import { averageSourced } from '../formulas/dissipation.js';
import { batteryLife } from '../formulas/power.js';
import type { Stage } from '../stage/index.js';
import { hasEdge } from './bandwidth-criteria.js';
import { cornerGroups, currentOut } from './corner-groups.js';
import type { BatteryBudget } from './power-demand.js';

const SECONDS_PER_HOUR = 3600;

/** What the stage draws from its battery beside the amplifier itself; null without a battery. */
export function batteryBudget(stage: Stage): BatteryBudget | null {
  const { battery } = stage.asked;
  if (battery === null) return null;
  const ampereHours = battery.capacity.value / SECONDS_PER_HOUR;
  const usable = battery.usable?.value ?? 1;
  return {
    network: Math.max(0, ...cornerGroups(stage).map((group) => networkCurrent(stage, group))),
    others: battery.others?.value ?? 0,
    hoursAt: (current) => (current > 0 ? batteryLife(ampereHours, usable, current) : Number.POSITIVE_INFINITY),
  };
}

/**
 * Average current from the supply through load and feedback network, A: what the output sources, and what a load to the supply takes
 * by itself. A pulse may rest at the end that takes most; an oscillator spends half its time at either.
 */
function networkCurrent(stage: Stage, group: ReturnType<typeof cornerGroups>[number]): number {
  const currents = group.vertices.map(currentOut);
  const ends = [Math.min(...currents), Math.max(...currents)].map((current) => Math.max(0, current));
  const direct = stage.load?.to === 'supply' ? mean(group.vertices.map(({ loadCurrent }) => Math.max(0, -loadCurrent))) : 0;
  if (stage.response.kind === 'oscillator') return mean(ends) + direct;
  if (hasEdge(stage)) return Math.max(...ends) + direct;
  const peak = stage.peaks.find(({ supply, reference }) => supply === group.supply && reference === group.reference);
  return (peak === undefined ? Math.max(...ends) : averageSourced(peak.centre, peak.swing)) + direct;
}

const mean = (values: readonly number[]): number => values.reduce((sum, value) => sum + value, 0) / values.length;
