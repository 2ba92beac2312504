import type { Assumption, Lookup, PartLookups } from '../explanation/index.js';
import { PARAMETERS, type Condition, type LimitKind, type Parameter } from '../parts/figures.js';
import { asciiText } from '../quantities/ascii.js';
import { parseQuantity } from '../quantities/parse.js';
import { amount, figureAmount, priceText } from './amounts.js';
import { conditionText } from './condition-text.js';
import { safeLine } from './safe-text.js';
import { GLUE } from './spelling.js';
import { counted, figureWords } from './words.js';

/** `offset drift maximum`, `package`. */
export const lookupName = ({ figure, kind }: Lookup): string => figureWords(figure, kind);

/** What the answer must be: `29.8 µV/°C or less`, rounded to the safe side, or the words the stage wants. */
export function neededText({ figure, turn, wanted, unit }: Lookup): string {
  if (typeof wanted === 'string') return figure === 'price' ? `${priceOf(wanted)} or${GLUE}less` : safeLine(wanted);
  if (wanted !== null) return `${wanted} or${GLUE}more`;
  if (turn === null || unit === null) return 'any value of such a part';
  const said = (value: number, up: boolean): string => figureAmount(figure, { value, unit }, { round: up ? 'up' : 'down' });
  if (turn.until === null) return `${said(turn.value, turn.side === 'more')} or${GLUE}${turn.side}`;
  const [low, high] = turn.side === 'more' ? [turn.value, turn.until] : [turn.until, turn.value];
  return `${said(low, true)} to ${said(high, false)}`;
}

/** Both in one line of plain text: `offset drift maximum: 29.8 µV/°C or less`. */
export const summaryOfLookup = (lookup: Lookup): string => `${lookupName(lookup)}: ${neededText(lookup)}`.replaceAll(GLUE, ' ');

/** `EUR:0.5` → 0.50 EUR */
function priceOf(wanted: string): string {
  const [currency = '', value = '0'] = wanted.split(':');
  return amount(Number(value), currency);
}

/** Where the figure belongs: `approved.csv row 19, N (cell is "TBD")`, or the column that is to be added. */
export function cellText(lookup: Lookup, { row, part }: PartLookups): string {
  const { cell } = lookup;
  if (part.tier === 'generic') return '';
  if (cell !== null) {
    const said = cell.cell.trim() === '' ? 'cell is empty' : `cell is "${safeLine(cell.cell.trim())}"`;
    return `${safeLine(cell.file)} row${GLUE}${cell.row}, ${cell.columnLetter} (${said})`;
  }
  const header = `a new column "${headerText(lookup)}"`;
  return row === null ? header : `${safeLine(row.file)} row${GLUE}${row.row}, ${header}`;
}

/** Header of the canonical list: `offset drift max (µV/K)`. */
export function headerText({ figure, kind, condition, wanted }: Lookup): string {
  if (!isParameter(figure)) return figure === 'price' && typeof wanted === 'string' ? `price (${wanted.split(':')[0] ?? 'EUR'})` : figure;
  return canonical(figure, kind ?? 'typ', condition);
}

function canonical(parameter: Parameter, kind: LimitKind, condition: Condition): string {
  const { words, headerUnit } = PARAMETERS[parameter];
  const named = kind === 'max' && words.endsWith(' maximum') ? words : `${words} ${kind}`;
  const stated = conditionText(condition).replaceAll(GLUE, ' ');
  return `${named} (${headerUnit})${stated === '' ? '' : ` @ ${stated}`}`;
}

const isParameter = (word: string): word is Parameter => word in PARAMETERS;

/** `its class has 1 µV/°C to 10 µV/°C`: for scale. */
export function spanText({ figure, span, unit }: Lookup, tier: 'approved' | 'generic'): string | null {
  if (span === null || unit === null) return null;
  const said = (value: number): string => figureAmount(figure, { value, unit });
  const values = span.least === span.most ? said(span.least) : `${said(span.least)} to ${said(span.most)}`;
  const who = span.class === null ? (tier === 'approved' ? 'parts of the catalog' : 'the other sets') : `its class ${safeLine(span.class)}`;
  return `for scale: ${who} ${span.class === null ? 'have' : 'has'} ${values} (${counted(span.parts, 'part')})`;
}

/** Where it would stand: `1 of 4`, with the best it could take where that is another. */
export function placeText(place: NonNullable<PartLookups['place']>): string {
  return place.best < place.rank ? `${place.rank} of ${place.of}, at best ${place.best}` : `${place.rank} of ${place.of}`;
}

/** `0.22 EUR, approved` */
export function identityText({ part }: PartLookups): string {
  return [...(part.price === null ? [] : [priceText(part.price)]), part.tier === 'generic' ? 'generic set' : (part.status ?? 'status not known')].join(', ');
}

/** `--assume PART.offsetDrift=29.8µV/°C` for each, in ASCII; null where a value would not be read back. */
export function assumeWords({ part, assume }: PartLookups): string[] | null {
  if (assume === null || assume.length === 0) return null;
  const words = assume.map((one) => assumed(part.id, one));
  return words.includes(null) ? null : words.flatMap((word) => (word === null ? [] : ['--assume', word]));
}

/** Digits of a value to paste: within a thousandth of where it turns. */
const DIGITS = 4;

function assumed(id: string, { figure, kind, value, side }: Assumption): string | null {
  const { unit, field } = PARAMETERS[figure];
  const text = asciiText(figureAmount(figure, { value, unit }, { digits: DIGITS, round: side === 'more' ? 'up' : 'down' })).replace(/[\s\u00a0]/gu, '');
  if (!parseQuantity(text, field).ok) return null;
  return `${id}.${figure}${kind === null ? '' : `.${kind}`}=${text}`;
}
