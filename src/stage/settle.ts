import { formatQuantity } from '../quantities/format.js';
import type { Problem } from '../quantities/problem.js';
import { contradiction } from '../spec/contradiction.js';
import type { StageSpec, Topology } from '../spec/spec.js';
import { writtenGain } from './fitted.js';
import { gainForm } from './gain-form.js';
import type { Settled } from './making.js';
import { GROUND } from './reference.js';
import { solvedReference, solveFromOutput } from './solve.js';
import { transimpedanceReference } from './transimpedance.js';

/** Gain and reference: as written, or solved from the wanted output. */
export function settle(spec: StageSpec): Settled | { readonly problem: Problem } {
  if (GAINLESS.includes(spec.topology)) return { gain: 1, ...restingAt(spec) };
  const known = spec.topology === 'follower' ? 1 : (spec.gain?.value ?? writtenGain(spec) ?? impliedGain(spec));
  const reference = spec.reference ?? GROUND;
  const solvable = spec.signal.output !== undefined && spec.gain === undefined && spec.topology !== 'follower';
  if (!solvable) return known === null ? { problem: noGain(spec) } : { gain: known, reference, notes: [] };
  const solution = solveFromOutput(spec, known);
  if (solution === null || outsideSupply(spec, solution.reference)) return { problem: noSolution(spec, solution?.reference) };
  const gain = solution.gain;
  if (gainForm(spec.topology) === 'non-inverting' && gain < 1) return { problem: noSolution(spec, undefined) };
  const solvedGain = `gain ${formatQuantity(gain, 'V/V', { digits: 5 })} solved from signal.output`;
  const gainNote = known === null ? [solvedGain] : [];
  if (spec.reference !== undefined) return { gain, reference, notes: gainNote };
  const text = formatQuantity(solution.reference, 'V', { digits: 4 });
  const solved = solvedReference(solution.reference, spec.supply.nominal, text);
  // A unity-gain filter passes its input whatever the reference.
  if (spec.topology === 'sallen-key-low-pass' && gain === 1) return { gain, reference: GROUND, notes: gainNote };
  return { gain, reference: solved, notes: [...gainNote, `reference ${solved.kind === 'ground' ? 'ground' : text} solved from signal.output`] };
}

/** Stages whose components say all: no gain of one pair of resistors. */
const GAINLESS: readonly Topology[] = ['summing', 'transimpedance', 'integrator', 'relaxation-oscillator'];

function restingAt(spec: StageSpec): Pick<Settled, 'reference' | 'notes'> {
  const solved = spec.topology === 'transimpedance' ? transimpedanceReference(spec) : null;
  if (solved === null) return { reference: spec.reference ?? GROUND, notes: [] };
  return { reference: solved, notes: [`reference ${solved.kind === 'ground' ? 'ground' : solved.value.text} taken from signal.output: where the output stands with no current`] };
}

/** A filter without a gain has one of 1; written filter resistors of a multiple-feedback stage say it. */
function impliedGain({ topology, filter, signal }: StageSpec): number | null {
  const { r1, r2 } = filter ?? {};
  if (topology === 'multiple-feedback-low-pass' && r1 !== undefined && r2 !== undefined) return r2.value / r1.value;
  const isFilter = topology === 'sallen-key-low-pass' || topology === 'multiple-feedback-low-pass';
  return isFilter && signal.output === undefined ? 1 : null;
}

function outsideSupply(spec: StageSpec, reference: number): boolean {
  return spec.reference === undefined && (reference < -1e-9 * spec.supply.nominal || reference > spec.supply.nominal);
}

function noGain(spec: StageSpec): Problem {
  return contradiction(spec, {
    code: 'S208',
    paths: ['topology'],
    message: `the gain of the ${spec.topology} stage is not given`,
    fix: 'write gain: 8, or resistors: {feedback: 70 kΩ, input: 10 kΩ}, or signal.output to have gain and reference solved',
  });
}

function noSolution(spec: StageSpec, reference: number | undefined): Problem {
  const why =
    reference === undefined ? 'no gain of this topology does it' : `it would need a reference of ${formatQuantity(reference, 'V', { digits: 4 })}, outside the supply`;
  return contradiction(spec, {
    code: 'S205',
    paths: ['signal.output', 'signal.input', 'signal.amplitude', 'signal.differential', 'signal.positive', 'shunt'],
    message: `no ${spec.topology} stage maps this ${spec.shunt === undefined ? 'input' : 'current'} onto output ${spec.signal.output?.text ?? ''}: ${why}`,
    fix: 'write the gain and the reference, or another output range',
  });
}
