import { normaliseCharacters } from './characters.js';
import type { FieldKind } from './kinds.js';
import { Refusal } from './refusal.js';
import type { UnitReading } from './unit-reading.js';
import { readUnit } from './units.js';

/** Reads the unit of a CSV header; an empty one is none. Throws Refusal Q011 when it is unknown. */
export function readHeader(typed: string, kind: FieldKind): UnitReading | null {
  const key = `${kind} ${typed}`;
  const earlier = KNOWN.get(key);
  if (earlier !== undefined) return earlier;
  const unit = unitOfHeader(typed, kind);
  if (KNOWN.size < MOST_KNOWN) KNOWN.set(key, unit);
  return unit;
}

/** A list asks for the unit of its header again at every cell. */
const KNOWN = new Map<string, UnitReading | null>();
const MOST_KNOWN = 1000;

function unitOfHeader(typed: string, kind: FieldKind): UnitReading | null {
  if (typed.trim() === '') return null;
  const text = normaliseCharacters(typed).text.trim().replace(/^\((.*)\)$/, '$1');
  const unit = readUnit(text, kind);
  if (unit?.dimension == null) throw new Refusal('Q011', `unknown unit ${typed} in the header`, { start: 0, end: 0 });
  return unit;
}
