import type { ReferenceSpec, StageSpec } from '../spec/spec.js';
import type { Surroundings } from './circuit.js';

/** Series resistances and coupling of a stage as its topology folds them in. */
export function surroundingsOf(spec: StageSpec, reference: ReferenceSpec): Surroundings {
  return {
    ac: spec.signal.coupling === 'ac',
    sourceResistance: spec.source?.resistance.value ?? 0,
    sourceTolerance: spec.source?.tolerance?.value ?? 0,
    referenceResistance: reference.resistance?.value ?? 0,
    referenceBypass: reference.bypass?.value ?? 0,
    signalResistance: signalResistance(spec, reference),
    feedbackCapacitance: spec.capacitors?.feedback?.value ?? 0,
  };
}

/**
 * Real part of R in parallel with the bypass at the top frequency, R/(1 + (2πfRC)²), Ω: a leg of it is never longer than R + jX, so
 * that the gain through it is never taken too small (own algebra). Edges, and signals of no stated frequency, see no resistance.
 */
function signalResistance({ signal }: StageSpec, { resistance, bypass }: ReferenceSpec): number {
  const ohms = resistance?.value ?? 0;
  if (bypass === undefined || bypass.value === 0) return ohms;
  const isEdge = signal.shape === 'step' || signal.shape === 'pulse';
  const top = signal.frequency?.top;
  return isEdge || top === undefined ? 0 : ohms / (1 + (2 * Math.PI * top * ohms * bypass.value) ** 2);
}
