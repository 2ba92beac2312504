import type { Condition, LimitKind, Parameter } from '../parts/figures.js';
import { PARAMETERS } from '../parts/figures.js';
import { parseQuantity } from '../quantities/parse.js';
import { suggest } from '../quantities/suggest.js';
import type { ColumnReading, HeaderReading, MeasuredReading, Target } from './column-reading.js';
import { readHeaderConditions } from './header-condition.js';
import type { HeaderParts } from './header-parts.js';
import { headerParts } from './header-parts.js';
import { targetParameter } from './target.js';
import type { Special, Term } from './terms.js';
import { allPhrases, termOf } from './terms.js';
import { unitFault } from './unit-fault.js';

/** Reads a header as hardware lists write it; null when no word of the trade is recognised. */
export function readOrdinaryHeader(header: string): HeaderReading | null {
  const all = headerParts(header);
  let first: HeaderReading | null = null;
  for (const parts of all) {
    const term = termFor(parts);
    if (term === null) continue;
    const reading = readTerm(term, parts);
    if (reading.kind !== 'problem') return reading;
    first ??= reading;
  }
  return first;
}

/** The nearest phrase of the vocabulary, to be offered for a header nobody knows. */
export function nearPhrase(header: string): string | null {
  const words = headerParts(header)[0]?.words ?? '';
  // A slip of the hand leaves the first letter and most of the length.
  const near = allPhrases().filter((phrase) => phrase.startsWith(words.charAt(0)) && Math.abs(phrase.length - words.length) <= 3);
  return words.length < 4 ? null : (suggest(words, near)[0] ?? null);
}

/** `Rload min` is a load the part can drive, `Rload` the one it was measured at: the limit is part of the name. */
function termFor({ words, limit }: HeaderParts): Term | null {
  if (words === '') return null;
  return (limit === 'min' ? termOf(`${words} minimum`) : null) ?? termOf(words);
}

function readTerm(term: Term, parts: HeaderParts): HeaderReading {
  switch (term.kind) {
    case 'identity': return term;
    case 'statement': return term;
    case 'rail': return { kind: 'rail', sense: term.sense };
    case 'known': return { kind: 'known', field: term.field, unit: parts.unit };
    case 'load': return unitFault(parts.unit, 'resistance', 'load') ?? { kind: 'load', unit: parts.unit };
    case 'price': return price(parts);
    case 'special': return special(term.special, parts);
    case 'figure': return measured(term.parameter, parts);
  }
}

function price({ unit, conditions }: HeaderParts): HeaderReading {
  const [stated] = conditions;
  const currency = unit === null ? null : currencyOf(unit);
  if (unit !== null && currency === null) return { kind: 'problem', reason: `"${unit}" is not a currency code of ISO 4217`, fix: 'price (EUR) @ 1000' };
  if (stated === undefined) return { kind: 'price', currency, quantity: null };
  const match = /^(\d+(?:[.,]\d)?)\s*(k)?\s*(?:pcs|pieces|units|off|u)?\.?$/iu.exec(stated);
  const quantity = match === null ? null : Number((match[1] ?? '').replace(',', '.')) * (match[2] === undefined ? 1 : 1000);
  if (quantity === null || !Number.isInteger(quantity) || quantity < 1) return { kind: 'problem', reason: `"${stated}" is not a quantity of pieces`, fix: `price (${currency ?? 'EUR'}) @ 1000` };
  return { kind: 'price', currency, quantity };
}

function currencyOf(unit: string): string | null {
  const result = parseQuantity('1', 'price', { headerUnit: unit });
  return result.ok ? result.quantity.unit : null;
}

/** `Supply min` is one end of the range that `Supply` is. */
function special(meaning: Special, parts: HeaderParts): HeaderReading {
  const { limit, order } = parts;
  if (meaning === 'supplyRange' && limit !== null) return limit === 'typ' ? { kind: 'known', field: 'voltage', unit: parts.unit } : measured('supplyVoltage', parts);
  if (meaning === 'temperatureRange' && limit !== null) return limit === 'typ' ? { kind: 'known', field: null, unit: parts.unit } : measured('temperature', parts);
  if (meaning === 'outputCurrentPlain') return measured(limit === 'min' ? 'outputCurrent' : 'shortCircuitCurrent', parts);
  const rangeOrder = order !== null && (meaning === 'supplyRange' || meaning === 'temperatureRange');
  return measured(meaning, rangeOrder ? { ...parts, order: null } : parts);
}

function measured(target: Target, parts: HeaderParts): HeaderReading {
  const parameter = targetParameter(target);
  const wrong = unitFault(parts.unit, PARAMETERS[parameter].field, PARAMETERS[parameter].words);
  // Noise over a band is another figure than its density.
  if (wrong !== null && parameter === 'voltageNoise' && unitFault(parts.unit?.replace(/p-?p|rms/iu, '') ?? null, 'voltage', '') === null) return { kind: 'known', field: null, unit: parts.unit };
  if (wrong !== null) return wrong;
  const read = readHeaderConditions(parts.conditions);
  if (typeof read === 'string') return { kind: 'problem', reason: read, fix: `${parts.words} (${parts.unit ?? PARAMETERS[parameter].headerUnit})` };
  if (isOffFrequency(parameter, read.frequency)) return { kind: 'known', field: PARAMETERS[parameter].field, unit: parts.unit };
  const { limit, order, unit, perPackage } = parts;
  const kept = keptLimit(target, limit);
  if (kept === undefined) return { kind: 'known', field: PARAMETERS[parameter].field, unit };
  const reading: MeasuredReading = { kind: 'measured', target, limit: kept, order, unit, condition: read.condition, perPackage };
  return questionOf(reading) ?? reading;
}

/** Below its corner noise is no white level; above a hundred hertz rejection and gain are not those of slow signals. */
function isOffFrequency(parameter: Parameter, frequency: number | null): boolean {
  if (frequency === null) return false;
  if (parameter === 'voltageNoise' || parameter === 'currentNoise') return frequency < 1000;
  return ['commonModeRejection', 'supplyRejection', 'openLoopGain'].includes(parameter) && frequency > 100;
}

/** The limit kind of the header; undefined when no check reads the figure with this kind (a minimum offset). */
function keptLimit(target: Target, limit: LimitKind | null): LimitKind | null | undefined {
  if (limit === null) return null;
  const kinds: readonly LimitKind[] = PARAMETERS[targetParameter(target)].kinds;
  if (!(target in PARAMETERS)) return limit;
  if (target === 'shortCircuitCurrent') return limit === 'max' ? undefined : limit;
  return kinds.includes(limit) ? limit : undefined;
}

/** What a column may mean that has two readings: asked, with the header that says each of them. */
function questionOf({ target, limit, unit, condition }: MeasuredReading): ColumnReading | null {
  if (target !== 'outputHighVoltage' || condition.supply !== undefined) return null;
  const units = unit ?? 'V';
  const load = loadWords(condition);
  const kind = limit === null || limit === 'typ' ? 'typ' : 'max';
  const words = 'an output high voltage: is it the distance from V+, or a voltage against ground, and then at which supply';
  return {
    kind: 'question',
    words,
    choices: [
      { words: 'the distance from V+', header: `output high headroom ${kind} (${units})${load === '' ? '' : ` @ ${load}`}` },
      { words: 'a voltage against ground, measured at 5 V', header: `VOH ${limit ?? 'typ'} (${units}) @ ${load === '' ? '' : `${load}, `}5 V` },
      { words: 'none of these: keep it as text', header: 'text' },
    ],
  };
}

function loadWords({ load }: Condition): string {
  if (load === undefined) return '';
  return load.kind === 'current' ? `${load.amperes * 1000} mA` : `${load.ohms} Ω to ${load.to}`;
}
