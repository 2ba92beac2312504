import type { Dimension } from './dimensions.js';
import { findPrefix } from './prefixes.js';

/** One prefixed unit without quotient: `mV`, `kOhms`, `MHZ`. */
export interface UnitTerm {
  readonly dimension: Dimension;
  /** Power of ten of the prefix. */
  readonly exponent: number;
  /** SI spelling. */
  readonly canonical: string;
  readonly symbol: string;
  /** The prefix as typed. */
  readonly prefix: string;
  /** The unit as typed, when its letter case is wrong (rule Q-7). */
  readonly wrongCase?: string;
  readonly refusedPrefix?: true;
  readonly notes: readonly string[];
}

interface Spelling {
  readonly text: string;
  readonly symbol: string;
  readonly dimension: Dimension;
}

const spell = (dimension: Dimension, symbol: string, texts: string): Spelling[] =>
  texts.split(' ').map((text) => ({ text, symbol, dimension }));

/** Longest first, so that `ohms` is not read as `s` with a prefix. */
const SPELLINGS: readonly Spelling[] = [
  ...spell('V', 'V', 'V volt volts Volt Volts'),
  ...spell('A', 'A', 'A amp amps ampere amperes Amp Amps Ampere Amperes'),
  ...spell('Ω', 'Ω', 'Ω R ohm ohms Ohm Ohms'),
  ...spell('F', 'F', 'F farad farads Farad'),
  ...spell('Hz', 'Hz', 'Hz hertz Hertz'),
  ...spell('s', 's', 's sec secs second seconds'),
  ...spell('W', 'W', 'W watt watts'),
  ...spell('H', 'H', 'H henry'),
  ...spell('S', 'S', 'S siemens'),
  ...spell('J', 'J', 'J joule joules'),
  ...spell('Ah', 'Ah', 'Ah A·h'),
  ...spell('C', 'C', 'C As A·s coulomb coulombs'),
].sort((a, b) => b.text.length - a.text.length);

/** Reads a prefixed unit; null when it is none. Exact spelling first, then with the letter case ignored. */
export function readTerm(text: string): UnitTerm | null {
  return search(text, false) ?? search(text, true);
}

function search(text: string, foldCase: boolean): UnitTerm | null {
  for (const spelling of SPELLINGS) {
    // h is an hour, j a current density and c a Celsius to others; only units that are read anywhere are recognised in the wrong case.
    if (foldCase && /^[HJC]$/.test(spelling.symbol)) continue;
    const typed = text.slice(Math.max(0, text.length - spelling.text.length));
    // Only capital omega lower-cases to ω; every other letter here is ASCII.
    const same = foldCase ? typed.toLowerCase() === spelling.text.toLowerCase() : typed === spelling.text;
    const prefix = same ? findPrefix(text.slice(0, text.length - typed.length)) : null;
    if (prefix !== null) return build(text, typed, { spelling, foldCase });
  }
  return null;
}

function build(text: string, typed: string, found: { spelling: Spelling; foldCase: boolean }): UnitTerm {
  const { symbol, dimension } = found.spelling;
  const letters = text.slice(0, text.length - typed.length);
  const prefix = findPrefix(letters);
  const notes = prefix?.note === undefined ? [] : [prefix.note];
  return {
    dimension,
    symbol,
    exponent: prefix?.exponent ?? 0,
    canonical: (prefix?.symbol ?? '') + symbol,
    prefix: letters,
    notes,
    ...(found.foldCase ? { wrongCase: typed } : {}),
    ...(prefix?.refused ? { refusedPrefix: true } : {}),
  };
}
