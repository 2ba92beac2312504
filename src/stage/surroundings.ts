import type { ReferenceSpec, StageSpec } from '../spec/spec.js';
import type { Surroundings } from './circuit.js';

/** Series resistances and coupling of a stage as its topology folds them in. */
export function surroundingsOf(spec: StageSpec, reference: ReferenceSpec): Surroundings {
  return {
    ac: spec.signal.coupling === 'ac',
    sourceResistance: spec.source?.resistance.value ?? 0,
    sourceTolerance: spec.source?.tolerance?.value ?? 0,
    referenceResistance: reference.resistance?.value ?? 0,
  };
}
