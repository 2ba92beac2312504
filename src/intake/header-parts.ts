import type { LimitKind } from '../parts/figures.js';
import { FIELD_KINDS } from '../quantities/kinds.js';
import { readUnit } from '../quantities/units.js';

/** An ordinary header taken apart: `Iq typ (µA/ch) @ 25 °C`. */
export interface HeaderParts {
  /** Lower case, single blanks, without limit kind, unit and condition. */
  readonly words: string;
  /** As written; null when there is none. */
  readonly unit: string | null;
  readonly conditions: readonly string[];
  readonly limit: LimitKind | null;
  /** `typ/max`: the order of two or three figures in one cell. */
  readonly order: readonly LimitKind[] | null;
  /** The figure is of the whole package (`total`), not of one amplifier. */
  readonly perPackage: boolean;
}

/**
 * Every way a header can be taken apart, the likeliest first: units stand in `X (MHz)`, `X [MHz]`, `X/MHz`, `X, MHz`, `X in MHz` or
 * at the end; conditions behind `@` or `at`, in brackets, or at the end. The vocabulary decides which of them is meant.
 */
export function headerParts(header: string): readonly HeaderParts[] {
  const bracketed = withoutBrackets(header.replace(/[_\s]+/gu, ' ').trim());
  const [before = '', ...after] = bracketed.rest.split('@');
  const conditions = [...bracketed.conditions, ...after.map((text) => text.trim()).filter((text) => text !== '')];
  const plain = before.replace(/[\s/,:]+$/u, '').trim();
  const [order, left] = orderOf(plain);
  const base = { unit: bracketed.unit, conditions, order: order ?? bracketed.order };
  const all = [{ ...base, text: left }, ...splits(left).map((split) => ({ ...base, ...split, conditions: [...conditions, ...split.conditions], unit: split.unit ?? base.unit }))];
  const commented = bracketed.comments === '' ? [] : all.map((one) => ({ ...one, text: `${one.text} ${bracketed.comments}` }));
  const dropped = DECISIVE.test(bracketed.comments) ? [] : all;
  return [...commented, ...dropped].map(({ text, ...rest }) => ({ ...rest, ...wordsOf(text, bracketed.limit) }));
}

/** Folded words: lower case, `+` kept, everything else that is no letter or digit a blank. */
export function foldPhrase(text: string): string {
  return text.toLowerCase().replace(/[^\p{L}\p{N}+]+/gu, ' ').trim();
}

/** True for a unit of any kind of quantity. */
export function isUnit(text: string): boolean {
  const unit = text.trim();
  if (unit === '' || unit.length > LONGEST_UNIT || /^\d/u.test(unit)) return false;
  const known = UNITS.get(unit);
  if (known !== undefined) return known;
  const found = FIELD_KINDS.some((kind) => (readUnit(unit, kind)?.dimension ?? null) !== null);
  if (UNITS.size < MOST_REMEMBERED) UNITS.set(unit, found);
  return found;
}

/** `microvolts per degree Celsius` and the like. */
const LONGEST_UNIT = 40;
/** Headers repeat their units: each is looked up once. */
const UNITS = new Map<string, boolean>();
const MOST_REMEMBERED = 5000;

// A word in brackets that decides what is meant may not be passed over.
const DECISIVE = /\b(?:low|high|lower|upper|abs|absolute|amr|total|in|out|input|output|rail|side|drift)\b/iu;

interface Bracketed {
  readonly rest: string;
  readonly unit: string | null;
  readonly conditions: readonly string[];
  readonly order: readonly LimitKind[] | null;
  readonly limit: LimitKind | null;
  readonly comments: string;
}

const BRACKETS = /[([]((?:[^()[\]]|\([^()]*\))*)[)\]]/gu;

function withoutBrackets(header: string): Bracketed {
  let unit: string | null = null;
  let limit: LimitKind | null = null;
  let order: readonly LimitKind[] | null = null;
  const conditions: string[] = [];
  const comments: string[] = [];
  const rest = header.replace(BRACKETS, (_, content: string) => {
    const [own = '', ...behind] = content.split('@');
    conditions.push(...behind.map((text) => text.trim()));
    for (const piece of isUnit(own) ? [own] : own.split(/[,;]/u)) {
      const text = piece.trim();
      const orders = orderOf(text)[0];
      if (text === '') continue;
      else if (isUnit(text) && unit === null) unit = text.replace(/^\((.*)\)$/u, '$1');
      else if (orders !== null) order = orders;
      else if (LIMITS.has(foldPhrase(text))) limit = LIMITS.get(foldPhrase(text)) ?? null;
      else if (/\d|^over\b|^full\b/iu.test(text)) conditions.push(text);
      else if (!PER_CHANNEL.test(` ${foldPhrase(text)} `)) comments.push(text);
    }
    return ' ';
  });
  return { rest: rest.replace(/\s+/gu, ' '), unit, conditions, order, limit, comments: comments.join(' ') };
}

const LIMITS: ReadonlyMap<string, LimitKind> = new Map([
  ['min', 'min'], ['minimum', 'min'], ['typ', 'typ'], ['typical', 'typ'], ['nom', 'typ'], ['nominal', 'typ'], ['max', 'max'], ['maximum', 'max'],
]);

const LIMIT = '(?:min(?:imum)?|typ(?:ical)?|nom(?:inal)?|max(?:imum)?)';
const ORDER = new RegExp(`(?<![\\p{L}])(${LIMIT})\\.?\\s*[/|,-]\\s*(${LIMIT})\\.?(?:\\s*[/|,-]\\s*(${LIMIT})\\.?)?(?![\\p{L}])`, 'iu');

function orderOf(text: string): [readonly LimitKind[] | null, string] {
  const match = ORDER.exec(text);
  if (match === null) return [null, text];
  const order = match.slice(1).flatMap((word: string | undefined) => (word === undefined ? [] : [LIMITS.get(word.toLowerCase()) ?? 'typ' as const]));
  return [order, text.replace(ORDER, ' ').trim()];
}

interface Split {
  readonly text: string;
  readonly unit: string | null;
  readonly conditions: readonly string[];
}

/** Unit or condition at the end of the words. */
function splits(text: string): Split[] {
  const found: Split[] = [];
  const unitAt = (head: string, unit: string): void => {
    if (head.trim() !== '' && isUnit(unit)) found.push({ text: head, unit: unit.trim(), conditions: [] });
  };
  for (let at = text.indexOf('/'); at >= 0; at = text.indexOf('/', at + 1)) unitAt(text.slice(0, at), text.slice(at + 1));
  const [, listed = '', behindComma = ''] = /^(.*),\s*([^,]+)$/u.exec(text) ?? [];
  unitAt(listed, behindComma);
  const [, named = '', behindIn = ''] = /^(.*\S)\s+in\s+(\S.*)$/u.exec(text) ?? [];
  unitAt(named, behindIn);
  const [, bare = '', last = ''] = /^(.*\S)\s+(\S+)$/u.exec(text) ?? [];
  unitAt(bare, last);
  const [, head = '', condition = ''] = TRAILING.exec(text) ?? [];
  if (head.trim() !== '') found.push({ text: head, unit: null, conditions: [condition.trim()] });
  return found;
}

// `en 1 kHz`, `swing at 10k`, `Vos over temperature`, `Ib 85 °C`
const TRAILING = /^(.*?\S)[\s,]+(?:at\s+)?((?:[a-zA-Z]+\s*=\s*)?[+-]?\d+(?:[.,]\d+)?\s*(?:[kMmµun]?(?:Hz|Ω|[oO]hms?|R|A|V)|°?\s?C|k|K|M)|over\s+temp(?:erature)?|full\s+temp(?:erature)?(?:\s+range)?)$/u;

const PER_CHANNEL = / (?:per )?(?:each|ch|channel|amplifier|amp|op amp|opamp) $/u;
const PER_PACKAGE = / (?:per (?:package|device|ic|chip)|total|all channels) /u;

function wordsOf(text: string, bracket: LimitKind | null): Pick<HeaderParts, 'words' | 'limit' | 'perPackage'> {
  const kept: string[] = [];
  let limit: LimitKind | null = bracket;
  for (const word of foldPhrase(text).split(' ')) {
    const kind = LIMITS.get(word);
    if (kind === undefined) kept.push(word);
    else limit ??= kind;
  }
  const padded = ` ${kept.join(' ')} `;
  const channel = PER_CHANNEL.exec(padded);
  const each = channel !== null && channel.index > 0 ? padded.slice(0, channel.index + 1) : padded;
  const all = each.replace(PER_PACKAGE, ' ');
  return { words: all.trim(), limit, perPackage: all !== each && all.trim() !== '' };
}
