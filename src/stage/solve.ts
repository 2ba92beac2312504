import type { ReferenceSpec, SignalSpec, StageSpec, Swing, Topology } from '../spec/spec.js';
import { GROUND } from './reference.js';

/** Gain (magnitude) and reference that map the wanted input onto the wanted output; null when they cannot. */
export interface Solution {
  readonly gain: number;
  readonly reference: number;
}

interface Mapping {
  /** Span and centre of what the gain multiplies. */
  readonly span: number;
  readonly centre: number;
}

/** Solves gain and reference from `signal.output`; a `gain` already known (from resistors) is kept. */
export function solveFromOutput(spec: StageSpec, knownGain: number | null): Solution | null {
  const output = spec.signal.output;
  const mapping = mappingOf(spec.signal);
  if (output === undefined || mapping === null) return null;
  const gain = knownGain ?? (mapping.span === 0 ? Number.NaN : (output.max - output.min) / mapping.span);
  if (!Number.isFinite(gain) || gain <= 0) return null;
  const reference = referenceFor(spec, { gain, input: mapping.centre, output: middle(output) });
  return Number.isFinite(reference) ? { gain, reference } : null;
}

const middle = (swing: Swing): number => (swing.min + swing.max) / 2;

function mappingOf(signal: SignalSpec): Mapping | null {
  if (signal.coupling === 'ac' && signal.amplitude !== undefined) return { span: 2 * signal.amplitude.value, centre: 0 };
  if (signal.input !== undefined) return { span: signal.input.max - signal.input.min, centre: middle(signal.input) };
  if (signal.differential !== undefined) {
    return { span: signal.differential.max - signal.differential.min, centre: middle(signal.differential) };
  }
  if (signal.positive === undefined || signal.negative === undefined) return null;
  const least = signal.positive.min - signal.negative.max;
  const most = signal.positive.max - signal.negative.min;
  return { span: most - least, centre: (least + most) / 2 };
}

/** method.md 1, solved for Vref at the centre of the signal. */
function referenceFor(spec: StageSpec, at: { gain: number; input: number; output: number }): number {
  if (spec.signal.coupling === 'ac') return at.output;
  const forms: Record<Topology, () => number> = {
    follower: () => 0,
    'non-inverting': () => (at.gain === 1 ? Number.NaN : (at.output - at.gain * at.input) / (1 - at.gain)),
    inverting: () => (at.output + at.gain * at.input) / (1 + at.gain),
    difference: () => at.output - at.gain * at.input,
  };
  return forms[spec.topology]();
}

/** A solved reference as the rest of the stage reads it: exact, stiff; a residue of rounding at zero is ground. */
export function solvedReference(volts: number, supply: number, text: string): ReferenceSpec {
  if (Math.abs(volts) < 1e-9 * supply) return GROUND;
  return { kind: 'voltage', value: { min: volts, nominal: volts, max: volts, text } };
}
