import { normaliseCharacters } from './characters.js';
import type { FieldKind } from './kinds.js';
import { Refusal } from './refusal.js';
import type { UnitReading } from './unit-reading.js';
import { readUnit } from './units.js';

/** Reads the unit of a CSV header; an empty one is none. Throws Refusal Q011 when it is unknown. */
export function readHeader(typed: string, kind: FieldKind): UnitReading | null {
  if (typed.trim() === '') return null;
  const text = normaliseCharacters(typed).text.trim().replace(/^\((.*)\)$/, '$1');
  const unit = readUnit(text, kind);
  if (unit?.dimension == null) throw new Refusal('Q011', `unknown unit ${typed} in the header`, { start: 0, end: 0 });
  return unit;
}
