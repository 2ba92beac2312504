import type { Draft } from './draft.js';
import { present } from './present.js';
import type { LoadSpec, ResistorsSpec, StageSpec } from './spec.js';
import { isUnder } from './tree.js';
import { refuseAbsent } from './refuse.js';
import { readValue } from './value.js';
import { readChoice } from './words.js';

/** The gain network as far as it is written. Ohm; tolerance as a fraction. */
export function readResistors(draft: Draft): ResistorsSpec | undefined {
  if (!isWritten(draft, 'resistors')) return undefined;
  return present({
    feedback: readValue(draft, 'resistors.feedback'),
    input: readValue(draft, 'resistors.input'),
    positiveInput: readValue(draft, 'resistors.positiveInput'),
    toReference: readValue(draft, 'resistors.toReference'),
    tolerance: readValue(draft, 'resistors.tolerance'),
  });
}

/** What drives the stage. Ohm; tolerance as a fraction. */
export function readSource(draft: Draft): StageSpec['source'] | undefined {
  const tolerance = readValue(draft, 'source.tolerance');
  const resistance = readValue(draft, 'source.resistance');
  if (isWritten(draft, 'source') && !draft.fields.has('source.resistance')) refuseAbsent(draft, 'source.resistance');
  return resistance === undefined ? undefined : present({ resistance, tolerance });
}

/** What hangs on the output. Ohm and farad; a resistance that does not say where it goes goes to ground, which is told. */
export function readLoad(draft: Draft): LoadSpec | undefined {
  if (!isWritten(draft, 'load')) return undefined;
  const resistance = readValue(draft, 'load.resistance');
  const capacitance = readValue(draft, 'load.capacitance');
  const to = readChoice<LoadSpec['to']>(draft, 'load.to');
  const [hasResistance, hasTo] = [draft.fields.has('load.resistance'), draft.fields.has('load.to')];
  if (!hasResistance && (hasTo || !draft.fields.has('load.capacitance'))) refuseAbsent(draft, 'load.resistance');
  if (resistance !== undefined && !hasTo) draft.notes.push(`load ${resistance.text} taken to ground`);
  return present({ resistance, to: to ?? 'ground', capacitance, isolation: readValue(draft, 'load.isolation') });
}

function isWritten(draft: Draft, path: string): boolean {
  return [...draft.fields.keys()].some((written) => isUnder(written, path));
}
