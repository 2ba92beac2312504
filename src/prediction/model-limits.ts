import type { Stage } from '../stage/index.js';

/** What the model does not have: part of every prediction. */
export function modelLimits({ response, coupling }: Stage): string[] {
  return [
    'Predicted, not judged: the checks of railfit explain decide.',
    'The slew limit is hard: the distortion an input pair makes below it is not in the model.',
    'Outside the model: the step where input pairs hand over, input range, phase reversal, input clamps, recovery from overload, common-mode and supply rejection, input currents, self-heating, layout.',
    'An output at its end stays at the head-room for the resistive current there and leaves it without delay; gain does not fall off before it.',
    ...(coupling === 'ac' ? ['Coupling capacitors count as endlessly large: no lower corner, no start-up.'] : []),
    ...(response.kind === 'oscillator' ? [] : ['Components at their nominal values; the worst form takes the output swing of their tolerances.']),
    ...(response.kind === 'oscillator' ? ['Components at their nominal values: their tolerances move the frequency further than the worst form tells.', 'The start from a supply that comes up is not in the model.'] : []),
  ];
}
