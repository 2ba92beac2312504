import type { Dimension } from './dimensions.js';
import type { FieldKind } from './kinds.js';
import { PLAIN } from './plain-units.js';
import { fixed, noted, type UnitReading } from './unit-reading.js';
import { readTerm, type UnitTerm } from './unit-terms.js';

/** S is siemens; where only a time makes sense it is read as s and noted, with m or M it is refused like any wrong case. */
export function secondsFromSiemens(term: UnitTerm | null): UnitTerm | null {
  if (term?.symbol !== 'S') return null;
  const canonical = term.canonical.replace('S', 's');
  return { ...term, dimension: 's', symbol: 's', canonical, wrongCase: 'S' };
}

const SUFFIXES: readonly [RegExp, 'Vpk' | 'Vpp' | 'Vrms' | 'V'][] = [
  [/(?:pk-?pk|p-?p|peak-?to-?peak)$/i, 'Vpp'],
  [/(?:pk|peak|p)$/i, 'Vpk'],
  [/rms$/i, 'Vrms'],
  [/dc$/i, 'V'],
];

/** Volts with a word after them: pk, pp, rms; dc says nothing new and is dropped. */
export function readAmplitude(text: string): UnitReading | null {
  for (const [suffix, dimension] of SUFFIXES) {
    const match = suffix.exec(text);
    const term = match === null ? null : readTerm(text.slice(0, match.index));
    if (term?.symbol === 'V') return { ...term, dimension, canonical: term.canonical.replace('V', dimension) };
  }
  return null;
}

const ROOT_HERTZ = /^(.+?)\/(?:(?:√|rt|sqrt|root)(?:(Hz)|\((Hz)\))|(Hz)(?:\^\(?(?:0?\.5|1\/2|½)\)?|½))$/i;
const HERTZ_TO_MINUS_HALF = /^(.+?)[·*]?(?:√)?(Hz)(?:\^\(?-(?:0?\.5|1\/2|½)\)?|⁻½)$/i;

/** Noise densities (rule Q-16); null for anything else. */
export function readNoise(text: string): UnitReading | null {
  const match = ROOT_HERTZ.exec(text) ?? HERTZ_TO_MINUS_HALF.exec(text);
  const term = match === null ? null : readTerm(match[1] ?? '');
  if (match === null || (term?.symbol !== 'V' && term?.symbol !== 'A')) return null;
  const hertz = match.slice(2).find(Boolean) ?? 'Hz';
  const unit: UnitReading = { ...term, dimension: `${term.symbol}/√Hz`, canonical: `${term.canonical}/√Hz` };
  return hertz === 'Hz' || term.wrongCase !== undefined ? unit : { ...unit, wrongCase: hertz };
}

const SECONDS_TO_MINUS_ONE = /[·*]?((?<=[·*])[fpnuµm]?s|s)\^?\(?(?:-1|⁻¹)\)?$/;

/** Units with one slash or an exponent of minus one; null for anything else. */
export function readQuotient(text: string, kind: FieldKind): UnitReading | null {
  const [above = '', below = '', ...more] = text.replace(SECONDS_TO_MINUS_ONE, '/$1').split('/');
  if (below === '' || more.length > 0) return null;
  const perDegree = /^(?:°|deg)?(C|K)$/i.exec(below);
  if (perDegree !== null) return overDegree(above, perDegree[1] ?? 'K');
  if (/^w$/i.test(below)) return /^(?:K|(?:°|deg)?C)$/.test(above) ? fixed('K/W', 'K/W') : null;
  const numerator = readTerm(above);
  if (numerator === null) return null;
  if (/^(?:ch|chan|channel|amp|amplifier)$/i.test(below)) return numerator.symbol === 'A' ? numerator : null;
  return overTerm(numerator, below, kind);
}

function overDegree(above: string, degree: string): UnitReading | null {
  const fraction = PLAIN.get(above);
  const term = readTerm(above);
  const unit: UnitReading | null =
    fraction?.dimension === '1'
      ? { ...fraction, dimension: '1/K', canonical: `${fraction.canonical}/°C` }
      : term?.symbol === 'V'
        ? { ...term, dimension: 'V/K', canonical: `${term.canonical}/°C` }
        : null;
  if (unit === null || degree === degree.toUpperCase()) return unit;
  return noted(unit, `${degree} read as ${degree.toUpperCase()}`);
}

function overTerm(above: UnitTerm, typed: string, kind: FieldKind): UnitReading | null {
  const below = secondsFromSiemens(readTerm(typed)) ?? readTerm(typed);
  if (below === null) return null;
  const dimension = quotientDimension(above.symbol, below.symbol);
  if (dimension === null) return null;
  const wrongCase = above.wrongCase ?? below.wrongCase;
  const siemens = below.wrongCase === 'S' && kind === 'slew' ? ['S read as seconds, not siemens'] : [];
  return {
    dimension,
    exponent: above.exponent - below.exponent,
    canonical: `${above.canonical}/${below.canonical}`,
    prefix: mOrM(above.prefix) ? above.prefix : mOrM(below.prefix) ? below.prefix : above.prefix,
    notes: [...above.notes, ...below.notes, ...siemens],
    ...(wrongCase === undefined ? {} : { wrongCase }),
    ...(below.wrongCase !== undefined && mOrM(below.prefix) ? { alternatives: [`${above.canonical}/${below.canonical}`] } : {}),
    ...(above.refusedPrefix || below.refusedPrefix ? { refusedPrefix: true } : {}),
  };
}

function quotientDimension(above: string, below: string): Dimension | null {
  if (below === 's' && above === 'V') return 'V/s';
  if (below === 'Hz' && (above === 'V' || above === 'A')) return `${above}/Hz`;
  if (below === above && above === 'V') return 'V/V';
  return null;
}

const mOrM = (prefix: string): boolean => prefix === 'm' || prefix === 'M';
