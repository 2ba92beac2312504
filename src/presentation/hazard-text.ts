import { formatQuantity } from '../quantities/format.js';
import type { PartHazard } from '../screening/index.js';

/** A hazard as a caution to the reader. */
export function hazardText(hazard: PartHazard): string {
  const volts = (value: number): string => formatQuantity(value, 'V');
  switch (hazard.kind) {
    case 'phase-reversal':
      return 'reverses its phase: when an input leaves its range, at overload or power-up, the output jumps to the other rail';
    case 'clamp':
      return 'diodes join the inputs: from about 0.7 V between them, at steps or with the output at its rail, current flows through the source';
    case 'crossover': {
      const { region, inputs } = hazard;
      return `the input pairs hand over ${volts(region.min)}..${volts(region.max)} below V+, where this stage takes them (${volts(inputs.min)}..${volts(inputs.max)} below V+): the offset steps there`;
    }
    case 'sink-limit':
      return `near V- the output sinks ${formatQuantity(hazard.current, 'A', { round: 'down' })} at most; with more it stays ${volts(hazard.beyond)} above V- instead of ${volts(hazard.within)}`;
  }
}
