import type { Condition } from '../parts/figures.js';
import { parseQuantity } from '../quantities/parse.js';
import { readCondition } from './condition.js';

export interface HeaderConditions {
  readonly condition: Condition;
  /** Hz, where one is stated: noise at 1 kHz, rejection at 100 Hz. */
  readonly frequency: number | null;
}

/** Reads the conditions of an ordinary header: `RL = 2k to GND`, `85 °C`, `1 kHz`, `Vs = 5 V`; or says why one cannot be read. */
export function readHeaderConditions(texts: readonly string[]): HeaderConditions | string {
  let condition: Condition = {};
  let frequency: number | null = null;
  for (const piece of texts.flatMap((text) => text.split(/,\s+|;|\s+and\s+/u)).map((text) => text.trim())) {
    if (piece === '') continue;
    const hertz = frequencyOf(piece);
    if (hertz !== null) frequency = hertz;
    else {
      const read = readCondition(canonicalCondition(piece));
      if (!read.ok) return read.reason;
      condition = { ...condition, ...read.condition };
    }
  }
  return { condition, frequency };
}

function frequencyOf(text: string): number | null {
  const result = parseQuantity(text.replace(/^f\s*=\s*/iu, ''), 'frequency');
  return result.ok ? (result.quantity.nominal ?? null) : null;
}

/** The habits of headers in the words of the canonical ones. */
function canonicalCondition(text: string): string {
  const bare = text.replace(/^(?:r\s?l(?:oad)?|load|i\s?l(?:oad)?|i\s?out|v\s?s(?:upply)?|v\s?cc|v\s?dd|v\+|supply|t\s?a?|temp)\s*[=:]?\s*(?=[-+\d])/iu, '').replace(/^(?:at)\s+/iu, '');
  const ends = bare
    .replace(/\s+to\s+(?:gnd|v-|vss|0\s?v)$/iu, ' to ground')
    .replace(/\s+to\s+(?:v\+|vcc|vdd|vs)$/iu, ' to supply')
    .replace(/\s+to\s+(?:v(?:s|cc|dd)\s*\/\s*2|mid|half supply)$/iu, ' to mid-supply');
  if (/^(?:over|full)\s*(?:temp(?:erature)?)?(?:\s*range)?$/iu.test(ends)) return 'over temperature';
  return ends.replace(/^g(?:ain)?\s*=\s*/iu, 'gain ');
}
