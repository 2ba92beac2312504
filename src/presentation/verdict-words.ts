import type { TurningPoint } from '../verdicts/finding.js';
import type { Verdict } from '../verdicts/verdict.js';
import { amount, compared, figureAmount, share } from './amounts.js';
import { safeLine } from './safe-text.js';
import { GLUE } from './spelling.js';
import { figureWords, OVER, passingSide, REASON_WORDS, SAYINGS } from './words.js';

/** `27.4 mV, allowed 20 mV`, or for words `conditional, wanted approved`. */
export function comparisonText(verdict: Verdict): string {
  if (typeof verdict.offered === 'string') return `${safeLine(verdict.offered)}, wanted ${wanted(verdict)}`;
  const numbers = compared(verdict);
  if (numbers === null) return requirementText(verdict);
  const [before, against] = SAYINGS[verdict.check] ?? ['', 'allowed'];
  const bound = verdict.offered === null ? `at${GLUE}least ` : '';
  return `${before === '' ? '' : `${before} `}${bound}${numbers.offered}, ${against} ${numbers.required}`;
}

/** What is asked, alone. */
function requirementText(verdict: Verdict): string {
  if (Array.isArray(verdict.required)) return `wanted ${wanted(verdict)}`;
  if (typeof verdict.required !== 'number' || verdict.unit === null) return '';
  const [, against] = SAYINGS[verdict.check] ?? ['', 'allowed'];
  return `${against} ${amount(verdict.required, verdict.unit, { round: verdict.sense === 'at-least' ? 'up' : 'down' })}`;
}

const wanted = ({ required }: Verdict): string => (Array.isArray(required) ? required.map((word: string) => safeLine(word)).join(' or ') : '');

/** By how much a failing check misses: `over by 7.4 mV (37 %)`. */
export function shortfall(verdict: Verdict): string {
  if (typeof verdict.offered === 'string') return `${safeLine(verdict.offered)}, wanted ${wanted(verdict)}`;
  const left = spareOf(verdict);
  if (left === null || verdict.unit === null) return comparisonText(verdict);
  const word = `${OVER.has(verdict.check) ? 'over' : 'short'} by ${verdict.offered === null ? `at${GLUE}least ` : ''}`;
  const relative = relativeTo(verdict, Math.abs(left), 'up');
  return `${word}${amount(Math.abs(left), verdict.unit, { round: 'up' })}${relative === null ? '' : ` (${relative})`}`;
}

/** SI, negative when short; of a bound what is known. */
function spareOf(verdict: Verdict): number | null {
  if (verdict.spare !== null) return verdict.spare;
  if (verdict.known === null || typeof verdict.required !== 'number') return null;
  return verdict.sense === 'at-least' ? verdict.known - verdict.required : verdict.required - verdict.known;
}

function relativeTo(verdict: Verdict, distance: number, round: 'up' | 'down'): string | null {
  if (typeof verdict.required !== 'number' || verdict.required <= 0 || verdict.unit === '°C') return null;
  return share(distance / verdict.required, round);
}

/** Checks whose room is spoken in the unit itself. */
const IN_UNITS: ReadonlySet<string> = new Set(['V', '°C']);
/** From this ratio on a margin is told as a multiple. */
const MULTIPLE = 2;

/** What a passing check has left: `133 mV spare`, `22 % spare`, `23 times`. */
export function spareText(verdict: Verdict): string {
  if (typeof verdict.offered === 'string') return safeLine(verdict.offered);
  const { spare, margin, unit, check } = verdict;
  if (spare === null || unit === null || typeof verdict.offered !== 'number') return 'no limit known';
  if (unit === '1') return `has ${amount(verdict.offered, unit)}`;
  if (spare === 0) return 'met exactly';
  const inUnits = `${amount(spare, unit, { round: 'down' })}${GLUE}spare`;
  if (margin === null || (IN_UNITS.has(unit) && !OVER.has(check))) return inUnits;
  if (margin >= MULTIPLE && !OVER.has(check)) return `${amount(margin, '1', { digits: 2, round: 'down' })}${GLUE}times`;
  const relative = relativeTo(verdict, spare, 'down');
  return relative === null ? inUnits : `${relative}${GLUE}spare`;
}

/** Why a check is open and where it would turn: `offset drift unknown: fits if 29.8 µV/°C or less`. */
export function unknownText(verdict: Verdict, title: string): string {
  const point = verdict.decidesAt;
  const condition = point === null ? '' : `: passes if ${turningText(point)}`;
  if (verdict.reason === 'missing-figure') return `${missingText(verdict)} unknown${condition}`;
  const reason = verdict.reason === null ? 'not decided' : REASON_WORDS[verdict.reason];
  const ending = point === null ? '' : `; passes if ${figureWords(point.figure)} is ${turningText(point)}`;
  return `${title}: ${reason}${ending}`;
}

export function missingText({ missing }: Verdict): string {
  return missing.map((one) => figureWords(one.figure)).join(' and ') || 'a figure';
}

/** `29.8 µV/°C or less`, rounded to the safe side. */
export function turningText(point: Omit<TurningPoint, 'figure'> & { readonly figure: string }): string {
  const side = passingSide(point.figure, point.kind);
  return `${figureAmount(point.figure, point, { round: side === 'less' ? 'down' : 'up' })} or${GLUE}${side}`;
}

/** The corner a verdict stands at: `at 4.2 V supply, 330 mV input, -20 °C, 245 µA sourced`. */
export function cornerText(corner: Readonly<Record<string, number>>): string {
  const words = Object.entries(corner).map(([key, value]) => (key === 'reference' && value === 0 ? null : cornerWord(key, value)));
  const said = words.filter((word) => word !== null);
  return said.length === 0 ? '' : `at ${said.join(', ')}`;
}

const CORNER_WORDS: Readonly<Record<string, string>> = { supply: 'supply', reference: 'reference', input: 'input', positive: 'at the + input', negative: 'at the - input' };

function cornerWord(key: string, value: number): string | null {
  if (key === 'temperature') return amount(value, '°C');
  if (key !== 'load') return `${amount(value, 'V')} ${CORNER_WORDS[key] ?? key}`;
  if (Math.abs(value) <= 1e-12) return 'no output current';
  return `${amount(Math.abs(value), 'A')} ${value > 0 ? 'sourced' : 'sunk'}`;
}
