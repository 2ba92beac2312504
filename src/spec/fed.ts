import type { Draft } from './draft.js';
import { readLegs } from './legs.js';
import { readPhotodiode, readShunt } from './sensing.js';
import { readIntegrator } from './shaping.js';
import { readSignal } from './signal.js';
import type { StageSpec } from './spec.js';

type Fed = Pick<StageSpec, 'signal'> & { readonly [Key in 'legs' | 'photodiode' | 'shunt' | 'integrator']: StageSpec[Key] | undefined };

/** What drives the stage, in the way of its topology. */
export function readFed(draft: Draft): Fed {
  const signal = readSignal(draft);
  return { signal, legs: readLegs(draft), photodiode: readPhotodiode(draft), shunt: readShunt(draft), integrator: readIntegrator(draft, signal) };
}
