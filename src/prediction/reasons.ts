import { PARAMETERS, type Parameter } from '../parts/figures.js';

/** Why a number is not there. */
export const words = {
  missing: (parameters: readonly Parameter[]): string => `${parameters.map((parameter) => PARAMETERS[parameter].words).join(', ')} not known`,
  noCurrent: 'the load takes all the current the output has: none is left to charge its capacitance',
  unstable: 'with these figures the loop oscillates',
  noPassBand: 'an integrator has no pass band',
  neverFalls: 'the gain does not fall by 3 dB within the model',
  noRest: 'the output of this stage does not rest at a steady signal',
  clipped: 'the step runs into the end of the output swing',
  never: 'it does not settle within the model',
  notPeriodic: 'it does not come to repeat itself',
  noOscillation: 'with these figures it does not oscillate',
} as const;
