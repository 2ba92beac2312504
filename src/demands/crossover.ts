import { formatQuantity } from '../quantities/format.js';
import type { Stage } from '../stage/index.js';
import { inputSwings } from './distortion.js';
import type { CrossoverDemand } from './hazard-demand.js';

const SOURCE = 'M9: hand-over of two input pairs (common practice); size and distortion of the step own algebra';

/** The inputs must not cross from one pair to the other. A word: the region is reached or not. */
export function crossover(stage: Stage): CrossoverDemand {
  const below = stage.vertices.map(({ supply, commonMode }) => supply - commonMode);
  const inputs = { min: Math.min(...below), max: Math.max(...below) };
  const oscillates = stage.response.kind === 'oscillator';
  const swings = inputSwings(stage);
  const volts = (value: number): string => formatQuantity(value, 'V');
  return {
    check: 'crossover',
    required: ['not reached'],
    unit: null,
    sense: 'one-of',
    because: `the stage takes the inputs ${volts(inputs.min)}..${volts(inputs.max)} below V+, and the file says avoid`,
    source: SOURCE,
    avoided: stage.asked.avoid.includes('crossover'),
    inputs,
    swings: oscillates ? [] : swings,
    moves: oscillates || swings.length > 0,
    frequency: stage.response.kind === 'oscillator' ? stage.response.frequency : stage.frequency,
    supply: stage.supply.max,
  };
}
