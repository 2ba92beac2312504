import type { Figure } from '../parts/figures.js';
import type { RailSense } from './terms.js';

/** What words say about the rails. Outputs to the rails have no number: only a class can lend one. */
export interface RailWords {
  readonly inputs: 'both' | 'ground' | null;
  readonly outputs: boolean;
}

const NOTHING: RailWords = { inputs: null, outputs: false };
const NO = /^(?:no|none|n|false|0|not?)$/iu;
const YES = /^(?:yes|y|true|x|✓|1)$/iu;

/** Reads a cell of a rail-to-rail column; null when it cannot be told which rails, or which side, is meant. */
export function readRailCell(cell: string, sense: RailSense): RailWords | null {
  const text = cell.trim();
  if (NO.test(text)) return NOTHING;
  if (YES.test(text)) return sense === 'words' ? null : SENSES[sense];
  return railWordsOf(text) ?? (sense === 'words' ? sideWords(text) : null);
}

const SENSES: Readonly<Record<Exclude<RailSense, 'words'>, RailWords>> = {
  input: { inputs: 'both', outputs: false },
  output: { inputs: null, outputs: true },
  both: { inputs: 'both', outputs: true },
  ground: { inputs: 'ground', outputs: false },
};

/** `in/out`, `in`, `out`, `both` under "Rail-to-rail". */
function sideWords(text: string): RailWords | null {
  const words = text.toLowerCase().replace(/[^a-z]+/gu, ' ').trim();
  if (/^(?:in(?:put)? (?:and )?out(?:put)?|i o|both|io)$/u.test(words)) return SENSES.both;
  if (/^in(?:put)?s?$/u.test(words)) return SENSES.input;
  if (/^out(?:put)?s?$/u.test(words)) return SENSES.output;
  return /^(?:gnd|ground|v|inputs? to (?:gnd|ground))$/u.test(words) ? SENSES.ground : null;
}

/** The words of the trade in a running text (`1 MHz CMOS, rail-to-rail in/out`); null when there are none. */
export function railWordsOf(text: string): RailWords | null {
  const ground = /\b(?:ground[- ]sensing|inputs? (?:to|include|includes|incl\.?) (?:gnd|ground|v-))\b|\binputs? to V-/iu.test(text);
  const both = /\bRRIO\b|\brail[- ]to[- ]rail (?:in(?:put)?s?\s*(?:\/|and|&)\s*out(?:put)?s?|i\s*\/\s*o)\b/iu.test(text);
  const inputs = both || /\bRRI\b|\brail[- ]to[- ]rail in(?:put)?s?\b|\bRR[- ]in(?:put)?\b/iu.test(text);
  const outputs = both || /\bRRO\b|\brail[- ]to[- ]rail out(?:put)?s?\b|\bRR[- ]out(?:put)?\b/iu.test(text);
  if (!ground && !inputs && !outputs) return null;
  return { inputs: inputs ? 'both' : ground ? 'ground' : null, outputs };
}

/**
 * What the words say as figures: 0 V from both rails, or from V- alone. Typical and assumed, because no number was printed and no
 * supply stated; a figure of the list itself always stands before them.
 */
export function railFigures({ inputs }: RailWords): Figure[] {
  if (inputs === null) return [];
  const low: Figure = { parameter: 'inputLowHeadroom', kind: 'typ', value: 0, condition: {}, assumed: true };
  return inputs === 'ground' ? [low] : [low, { ...low, parameter: 'inputHighHeadroom' }];
}
