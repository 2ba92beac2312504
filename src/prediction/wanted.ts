import type { Stage } from '../stage/index.js';
import type { Wanted } from './prediction.js';

/** What the stage says of the quantities that are predicted. */
export function wantedOf(stage: Stage, ideal: { readonly gain: number | null }): Wanted {
  const { limits } = stage.asked;
  const { response, outputNominal, edge } = stage;
  const most = (value: number) => ({ value, sense: 'at-most' }) as const;
  const least = (value: number) => ({ value, sense: 'at-least' }) as const;
  const longest = response.kind === 'oscillator' ? response.edge : edge;
  return {
    ...(response.kind === 'low-pass' ? {} : { outputHigh: least(outputNominal.max), outputLow: most(outputNominal.min) }),
    ...(limits.distortion === undefined ? {} : { distortion: most(limits.distortion.value) }),
    ...(ideal.gain === null ? {} : { gain: { value: ideal.gain, sense: 'about' } as const }),
    ...(limits.settling === undefined ? {} : { settling: most(limits.settling.within.value) }),
    ...(longest === null ? {} : { rise: most(longest), fall: most(longest) }),
    ...(limits.outputNoise === undefined ? {} : { noise: most(limits.outputNoise.value) }),
    ...(response.kind === 'oscillator' ? { frequency: { value: response.frequency, sense: 'about' } as const } : {}),
  };
}
