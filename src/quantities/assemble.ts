import type { Measured } from './measure.js';
import { unitOf } from './outcome.js';
import type { Quantity } from './quantity.js';
import type { Reading } from './reading.js';
import { Refusal } from './refusal.js';
import { readSingle } from './single-value.js';
import type { Phrase } from './syntax.js';
import { combine } from './worded-figures.js';

/** Turns a read phrase into a quantity of the kind: shares units, converts, orders, checks size, and echoes. Throws Refusal. */
export function assemble(phrase: Phrase, reading: Reading, typed: string): Quantity {
  const [segment, ...more] = phrase.segments;
  if (segment === undefined) throw new Refusal('Q020', 'empty: there is no value', { start: 0, end: phrase.end });
  const { measured, ...outcome } = more.length > 0 ? combine(phrase.segments, reading) : readSingle(segment, reading);
  const unit = unitOf(measured, reading);
  const notes = [...new Set([...measured.flatMap((one) => one.notes), ...headerNote(measured, reading)])];
  const quantity = { kind: reading.kind, ...outcome, unit, text: typed };
  return notes.length === 0 ? quantity : { ...quantity, note: notes.join('; ') };
}

/** A cell's own unit wins over the header's; that is worth a note when they differ. */
function headerNote(measured: readonly Measured[], { header }: Reading): string[] {
  const own = measured.find((one) => one.figure.unit !== null || one.figure.number.type === 'code')?.unit.canonical;
  return header === null || own === undefined || own === header.canonical ? [] : [`the cell's own unit ${own} taken, not ${header.canonical} of the header`];
}
