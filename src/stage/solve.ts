import type { ReferenceSpec, StageSpec, Swing } from '../spec/spec.js';
import { gainForm } from './gain-form.js';
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
  const mapping = mappingOf(spec);
  if (output === undefined || mapping === null) return null;
  const gain = unitySnapped(spec, knownGain ?? (mapping.span === 0 ? Number.NaN : (output.max - output.min) / mapping.span));
  if (!Number.isFinite(gain) || gain <= 0) return null;
  const reference = referenceFor(spec, { gain, input: mapping.centre, output: middle(output) });
  return Number.isFinite(reference) ? { gain, reference } : null;
}

/** A filter of gain 1 passes its input as it is: what rounding leaves of that gain must not ask for a reference. */
function unitySnapped({ topology }: StageSpec, gain: number): number {
  return topology === 'sallen-key-low-pass' && Math.abs(gain - 1) < 1e-9 ? 1 : gain;
}

const middle = (swing: Swing): number => (swing.min + swing.max) / 2;

function mappingOf({ signal, shunt }: StageSpec): Mapping | null {
  if (shunt !== undefined) {
    const volts = { min: shunt.current.min * shunt.resistance.value, max: shunt.current.max * shunt.resistance.value };
    return { span: volts.max - volts.min, centre: (volts.min + volts.max) / 2 };
  }
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

/** The stage's own equation, solved for Vref at the centre of the signal. */
function referenceFor(spec: StageSpec, at: { gain: number; input: number; output: number }): number {
  if (spec.signal.coupling === 'ac') return at.output;
  const { gain, input, output } = at;
  const form = gainForm(spec.topology);
  if (form === 'difference') return output - gain * input;
  if (form === 'inverting') return (output + gain * input) / (1 + gain);
  if (spec.topology === 'sallen-key-low-pass' && gain === 1) return Math.abs(output - input) < 1e-9 * spec.supply.nominal ? 0 : Number.NaN;
  if (form === 'non-inverting') return gain === 1 ? Number.NaN : (output - gain * input) / (1 - gain);
  return 0;
}

/** A solved reference as the rest of the stage reads it: exact, stiff; a residue of rounding at zero is ground. */
export function solvedReference(volts: number, supply: number, text: string): ReferenceSpec {
  if (Math.abs(volts) < 1e-9 * supply) return GROUND;
  return { kind: 'voltage', value: { min: volts, nominal: volts, max: volts, text } };
}
