import type { Dimension } from './dimensions.js';
import { fixed, noted, type UnitReading } from './unit-reading.js';

/** Units without SI prefixes: fractions, degrees of an angle. */
export const PLAIN = new Map<string, UnitReading>([
  ['%', fixed('1', '%', -2)],
  ['percent', fixed('1', '%', -2)],
  ['‰', fixed('1', '‰', -3)],
  ['ppm', fixed('1', 'ppm', -6)],
  ['PPM', noted(fixed('1', 'ppm', -6), 'PPM read as ppm')],
  ['ppb', fixed('1', 'ppb', -9)],
  ['°', fixed('°', '°')],
  ['deg', fixed('°', '°')],
  ['degree', fixed('°', '°')],
  ['degrees', fixed('°', '°')],
]);

/** Fractions, angles and temperatures; null for anything else. */
export function readPlain(text: string): UnitReading | null {
  const plain = PLAIN.get(text);
  if (plain !== undefined) return plain;
  if (/^(?:°|deg|degrees?)?(?:C|[cC]elsius)$/.test(text)) return fixed('°C', '°C');
  if (/^(?:°|deg)?c$/.test(text)) return noted(fixed('°C', '°C'), 'c read as C');
  if (text === '°K' || /^[kK]elvins?$/.test(text)) return fixed('K', 'K');
  return null;
}

const DECIBEL = new Map<string, Dimension>([['dB', 'dB'], ['dBV', 'dBV'], ['dBu', 'dBu']]);

/** dB, dBV and dBu; null for any other decibel. */
export function readDecibel(text: string): UnitReading | null {
  const dimension = DECIBEL.get(text);
  if (dimension !== undefined) return fixed(dimension, text);
  if (/^db$/i.test(text)) return noted(fixed('dB', 'dB'), `${text} read as dB`);
  return null;
}
