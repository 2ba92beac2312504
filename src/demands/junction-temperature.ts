import { worstRestingDissipation, worstSineDissipation } from '../formulas/dissipation.js';
import { capacitiveLoadPower } from '../formulas/power.js';
import { formatQuantity } from '../quantities/format.js';
import type { Stage } from '../stage/index.js';
import { hasEdge } from './bandwidth-criteria.js';
import { cornerGroups, currentOut, endsOf, type CornerGroup } from './corner-groups.js';
import type { JunctionDemand } from './power-demand.js';

const SOURCE = 'M8: TA + θJA·P (JEDEC JESD51, 1995); dissipation by signal kind (Sedra & Smith, Microelectronic Circuits, class B, from memory; own algebra)';

/** Highest junction temperature the stage writes, °C, with the worst dissipation of the output. */
export function junctionTemperature(stage: Stage): JunctionDemand {
  const limit = stage.asked.limits.junctionTemperature;
  const output = Math.max(0, ...cornerGroups(stage).map((group) => outputPower(stage, group)));
  const capacitive = capacitivePower(stage);
  return {
    check: 'junction-temperature',
    required: limit?.value ?? null,
    unit: '°C',
    sense: 'at-most',
    because: `ambient up to ${formatQuantity(stage.temperature.max, '°C')}, up to ${formatQuantity(output, 'W')} in the output ${restsAnywhere(stage) ? 'resting at its worst point' : 'averaged over a sine of the worst amplitude'}${capacitiveNote(stage, capacitive)}`,
    source: SOURCE,
    ambient: stage.temperature.max,
    supply: stage.supply.max,
    output,
    capacitive,
  };
}

/** A DC-coupled output may rest anywhere in its swing, a pulse at its ends for long; a sine about its bias only averages. */
function restsAnywhere(stage: Stage): boolean {
  return stage.coupling === 'dc' || hasEdge(stage) || stage.response.kind === 'oscillator';
}

function outputPower(stage: Stage, group: CornerGroup): number {
  const [low, high] = endsOf(group.vertices, ({ output }) => output);
  if (restsAnywhere(stage)) {
    return worstRestingDissipation(group.supply, { volts: low.output, amperes: currentOut(low) }, { volts: high.output, amperes: currentOut(high) });
  }
  const load = {
    supply: group.supply,
    level: (low.output + high.output) / 2,
    current: (currentOut(low) + currentOut(high)) / 2,
    conductance: stage.loadConductance + stage.networkConductance,
  };
  return worstSineDissipation(load, (high.output - low.output) / 2);
}

function capacitivePower(stage: Stage): number {
  const { load, response } = stage;
  const frequency = response.kind === 'oscillator' ? response.frequency : (stage.frequency ?? 0);
  return capacitiveLoadPower({ frequency, capacitance: load?.capacitance ?? 0, peakToPeak: stage.outputStep, supply: stage.supply.max });
}

function capacitiveNote({ load, frequency, response }: Stage, watts: number): string {
  if (watts > 0) return `, ${formatQuantity(watts, 'W')} for the load capacitance`;
  return (load?.capacitance ?? 0) > 0 && frequency === null && response.kind !== 'oscillator' ? '; no frequency, so the load capacitance is left out' : '';
}
