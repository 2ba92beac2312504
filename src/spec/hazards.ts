import type { Draft } from './draft.js';
import { present } from './present.js';
import type { DutyCycleSpec, RippleSpec, Sequence, StageSpec } from './spec.js';
import { readValue } from './value.js';
import { readChoice } from './words.js';

/** What can happen to the stage beside its signal: volts, hertz, seconds. */
export function readHazards(draft: Draft): Pick<StageSpec, 'overdrive' | 'sequencing' | 'supplyRipple' | 'dutyCycle'> {
  return present({
    overdrive: readValue(draft, 'overdrive'),
    sequencing: readChoice<Sequence>(draft, 'sequencing'),
    supplyRipple: readRipple(draft),
    dutyCycle: readDutyCycle(draft),
  });
}

function readRipple(draft: Draft): RippleSpec | undefined {
  const amplitude = readValue(draft, 'supplyRipple.amplitude');
  const frequency = readValue(draft, 'supplyRipple.frequency');
  return amplitude === undefined || frequency === undefined ? undefined : { amplitude, frequency };
}

function readDutyCycle(draft: Draft): DutyCycleSpec | undefined {
  const on = readValue(draft, 'dutyCycle.on');
  const every = readValue(draft, 'dutyCycle.every');
  return on === undefined || every === undefined ? undefined : { on, every };
}
