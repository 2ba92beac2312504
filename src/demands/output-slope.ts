import { integratorSlope } from '../formulas/integrator.js';
import { slewRateForSine } from '../formulas/slew-rate.js';
import type { Stage } from '../stage/index.js';
import type { IntegratorResponse } from '../stage/response.js';

/** Steepest slope of the output, V/s, and the bound that gives it: that of the band, or the input current of an integrator. */
export type OutputSlope =
  | { readonly by: 'band'; readonly slope: number }
  /** Largest distance of the input from the reference, V. */
  | { readonly by: 'input'; readonly slope: number; readonly input: number };

/** Both bounds of an integrator hold, whatever its waveform within the band: the smaller one counts. */
export function outputSlope(stage: Stage, frequency: number): OutputSlope {
  const slope = slewRateForSine(frequency, stage.signalPeak);
  if (stage.response.kind !== 'integrator') return { by: 'band', slope };
  const driven = inputSlope(stage, stage.response);
  return driven.slope < slope ? driven : { by: 'band', slope };
}

/** What the input at its largest and the bleed resistor with the output at its farthest send into the smallest capacitor. */
function inputSlope({ vertices, coupling }: Stage, { steepest }: IntegratorResponse): OutputSlope {
  const input = Math.max(...vertices.map(({ inputs, reference }) => Math.abs((inputs['input'] ?? 0) - (coupling === 'ac' ? 0 : reference))));
  const output = Math.max(...vertices.map(({ output: at, reference }) => Math.abs(at - reference)));
  return { by: 'input', slope: integratorSlope({ input, output, ...steepest }), input };
}
