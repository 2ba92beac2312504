import { findCurrency } from './currencies.js';
import { readAmplitude, readNoise, readQuotient, secondsFromSiemens } from './compound-units.js';
import type { FieldKind } from './kinds.js';
import { readDecibel, readPlain } from './plain-units.js';
import { findPrefix } from './prefixes.js';
import { fixed, noted, type UnitReading } from './unit-reading.js';
import { readTerm } from './unit-terms.js';

/** Reads a unit as engineers type it; null when it is unknown. The kind settles only what letters alone cannot (K, S, F, currencies). */
export function readUnit(typed: string, kind: FieldKind): UnitReading | null {
  const text = typed.replace(/ per (?=\S)/, '/').replaceAll(' ', '');
  const byKind = readForKind(text, kind);
  if (byKind !== null) return byKind;
  return (
    readPlain(text) ??
    readDecibel(text) ??
    readPrefixAlone(text) ??
    readAmplitude(text) ??
    readNoise(text) ??
    readQuotient(text, kind) ??
    readTerm(text)
  );
}

/** Kinds in which K alone is kelvin, not kilo. */
const KELVIN_KINDS = new Set<FieldKind>(['temperature', 'thermal', 'drift', 'tempco']);

function readForKind(text: string, kind: FieldKind): UnitReading | null {
  if (text === 'K' && KELVIN_KINDS.has(kind)) return fixed('K', 'K');
  if (kind === 'temperature' && text === 'k') return { ...fixed('K', 'K'), wrongCase: 'k', alternatives: ['K'] };
  if (kind === 'capacitance' && text === 'f') return { ...fixed('F', 'F'), wrongCase: 'f', alternatives: ['F', 'fF'] };
  if (kind === 'resistance' && text === 'L') return fixed('Ω', 'mΩ', -3);
  if (kind === 'gain' && /^[xX]$/.test(text)) return fixed('V/V', 'V/V');
  if (kind === 'charge' && text.endsWith('C')) return readTerm(text);
  if (kind === 'time') return secondsFromSiemens(readTerm(text));
  if (kind !== 'price') return null;
  const currency = findCurrency(text);
  if (currency === null) return null;
  const unit = fixed('currency', currency.code);
  return currency.wrongCase ? noted(unit, `${text} read as ${currency.code}`) : unit;
}

function readPrefixAlone(text: string): UnitReading | null {
  const prefix = /^(?:[fpnNuµUmkKMGTP]|meg|mega)$/i.test(text) ? findPrefix(text) : null;
  if (prefix === null) return null;
  return {
    dimension: null,
    exponent: prefix.exponent,
    canonical: prefix.symbol,
    prefix: text,
    notes: prefix.note === undefined ? [] : [prefix.note],
    ...(prefix.refused ? { refusedPrefix: true } : {}),
  };
}
