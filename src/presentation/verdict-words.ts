import type { Tier } from '../parts/part.js';
import { REACH } from '../parts/headroom-curve.js';
import { formatComparison } from '../quantities/format.js';
import type { Beyond, TurningPoint } from '../verdicts/finding.js';
import type { Verdict } from '../verdicts/verdict.js';
import { amount, checkAmount, compared, figureAmount, share } from './amounts.js';
import { spoken } from './spoken.js';
import { inputUnit } from './input-words.js';
import { safeLine } from './safe-text.js';
import { GLUE, held } from './spelling.js';
import { checkWords, figureWords, OVER, passingSide, REASON_WORDS, SAYINGS } from './words.js';

/** `27.4 mV, allowed 20 mV`, or for words `conditional, wanted approved`. */
export function comparisonText(verdict: Verdict): string {
  if (typeof verdict.offered === 'string') return `${safeLine(verdict.offered)}, wanted ${wanted(verdict)}`;
  const numbers = compared(verdict);
  if (numbers === null) return requirementText(verdict);
  const [before, against] = sayingOf(verdict);
  const bound = verdict.offered === null ? `at${GLUE}${verdict.sense === 'at-least' ? 'most' : 'least'} ` : '';
  return `${before === '' ? '' : `${before} `}${bound}${numbers.offered}, ${against} ${numbers.required}`;
}

/** What must be large is needed, what must be small is allowed. */
const sayingOf = ({ check, sense }: Verdict): readonly [string, string] => SAYINGS[check] ?? ['', sense === 'at-least' ? 'the stage needs' : 'allowed'];

/** What is asked, alone. */
function requirementText(verdict: Verdict): string {
  if (Array.isArray(verdict.required)) return `wanted ${wanted(verdict)}`;
  if (typeof verdict.required !== 'number' || verdict.unit === null) return '';
  const [, against] = sayingOf(verdict);
  return `${against} ${checkAmount(verdict, verdict.required)}`;
}

const wanted = ({ required }: Verdict): string => (Array.isArray(required) ? required.map((word: string) => safeLine(word)).join(' or ') : '');

/** By how much a failing check misses: `over by 7.4 mV (37 %)`. */
export function shortfall(verdict: Verdict): string {
  if (typeof verdict.offered === 'string') return `${safeLine(verdict.offered)}, wanted ${wanted(verdict)}`;
  const left = spareOf(verdict);
  if (left === null || verdict.unit === null) return comparisonText(verdict);
  const word = `${OVER.has(verdict.check) && verdict.sense !== 'at-least' ? 'over' : 'short'} by ${verdict.offered === null ? `at${GLUE}least ` : ''}`;
  const relative = relativeTo(verdict, Math.abs(left), 'up');
  return `${word}${compared(verdict)?.difference ?? amount(Math.abs(left), verdict.unit)}${relative === null ? '' : ` (${relative})`}`;
}

/** SI, negative when short; of a bound what is known. */
function spareOf(verdict: Verdict): number | null {
  if (verdict.spare !== null) return verdict.spare;
  if (verdict.known === null || typeof verdict.required !== 'number') return null;
  return verdict.sense === 'at-least' ? verdict.known - verdict.required : verdict.required - verdict.known;
}

function relativeTo(verdict: Verdict, distance: number, round: 'up' | 'down'): string | null {
  if (typeof verdict.required !== 'number' || verdict.required <= 0 || verdict.unit === null || IN_UNITS.has(spoken(verdict.check, 1, verdict.unit).unit)) return null;
  return share(distance / verdict.required, round);
}

/** Checks whose room is spoken in the unit itself. */
const IN_UNITS: ReadonlySet<string> = new Set(['°C', 'dB', '%']);
/** From this ratio on a margin is told as a multiple. */
const MULTIPLE = 2;

/** What a passing check has left: `133 mV spare`, `22 % spare`, `23 times`. */
export function spareText(verdict: Verdict): string {
  if (typeof verdict.offered === 'string') return safeLine(verdict.offered);
  const { spare, margin, unit, check } = verdict;
  if (spare === null || unit === null || typeof verdict.offered !== 'number') return 'no limit known';
  if (check === 'channels') return `has ${amount(verdict.offered, unit)}`;
  if (spare === 0) return 'met exactly';
  const inUnits = `${compared(verdict)?.difference ?? amount(spare, unit)}${GLUE}spare`;
  const saidIn = spoken(check, 1, unit).unit;
  if (margin === null || IN_UNITS.has(saidIn) || (saidIn === 'V' && !OVER.has(check))) return inUnits;
  if (margin >= MULTIPLE && !OVER.has(check)) return `${amount(margin, '1', { digits: 2, round: 'down' })}${GLUE}times`;
  const relative = relativeTo(verdict, spare, 'down');
  return relative === null ? inUnits : `${relative}${GLUE}spare`;
}

/** Why checks of one reason are open and where each would turn: `offset drift unknown: passes if 29.8 µV/°C or less`. */
export function unknownText(verdicts: readonly Verdict[]): string {
  const [verdict] = verdicts;
  if (verdict === undefined) return '';
  const point = verdict.decidesAt;
  if (verdict.reason === 'missing-figure') return `${missingText(verdict)} unknown${point === null ? '' : `: passes if ${turningText(point)}`}`;
  const titles = verdicts.map(({ check }) => checkWords(check)).join(' and ');
  const reason = verdict.reason === null ? 'not decided' : REASON_WORDS[verdict.reason];
  const turns = verdicts.flatMap(({ decidesAt }) => (decidesAt === null ? [] : [`${figureWords(decidesAt.figure)} is ${turningText(decidesAt)}`]));
  return `${titles}: ${reason}${turns.length === 0 ? '' : `; ${turns.length === 1 ? 'passes' : 'pass'} if ${turns.join(' and ')}`}`;
}

export function missingText({ missing }: Verdict): string {
  return missing.map((one) => figureWords(one.figure)).join(' and ') || 'a figure';
}

/** `29.8 µV/°C or less`, `299 mV or less at 1.45 mA, 3.2 V`, rounded to the safe side. */
export function turningText(point: Turning): string {
  const side = passingSide(point.figure, point.kind);
  return `${turningValue(point)} or${GLUE}${side}${conditionOf(point)}`;
}

/** The value alone, rounded to the safe side. */
export function turningValue(point: Turning): string {
  return figureAmount(point.figure, point, { round: passingSide(point.figure, point.kind) === 'less' ? 'down' : 'up' });
}

/** ` at 1.45 mA, 3.2 V`, or nothing. */
export function conditionOf({ condition }: Turning): string {
  return condition === undefined ? '' : ` at ${amount(condition.current, 'A')}, ${amount(condition.supply, 'V')}`;
}

/** `the list covers up to 248 µA (1.5 × = 372 µA); 463 µA flows here`. */
export function beyondText({ covers, current }: Beyond, tier: Tier): string {
  const [flows, reach] = formatComparison(current, REACH * covers, 'A', 'at-most').map(held);
  return `the ${tier === 'approved' ? 'list' : 'set'} covers up to ${amount(covers, 'A')} (${REACH}${GLUE}×${GLUE}= ${reach}); ${flows} flows here`;
}

type Turning = Omit<TurningPoint, 'figure'> & { readonly figure: string };

/** The corner a verdict stands at: `at 4.2 V supply, 330 mV input, -20 °C, 245 µA sourced`. */
export function cornerText(corner: Readonly<Record<string, number>>): string {
  const words = Object.entries(corner).map(([key, value]) => {
    if (key === 'reference' && value === 0) return null;
    return key === 'temperature' && 'currentTemperature' in corner ? `offset at ${cornerWord(key, value)}` : cornerWord(key, value);
  });
  const said = words.filter((word) => word !== null);
  return said.length === 0 ? '' : `at ${said.join(', ')}`;
}

const CORNER_WORDS: Readonly<Record<string, string>> = { positive: 'at the + input', negative: 'at the - input', current: 'input current', bus: 'bus' };

function cornerWord(key: string, value: number): string {
  if (key === 'currentTemperature') return `currents at ${amount(value, '°C')}`;
  if (key === 'temperature') return amount(value, '°C');
  if (key === 'elapsed') return value === 0 ? 'just after a reset' : `${amount(value, 's')} after a reset`;
  if (key === 'level') return value === 0 ? 'output low' : 'output high';
  if (key !== 'load') return `${amount(value, inputUnit(key))} ${CORNER_WORDS[key] ?? safeLine(key)}`;
  if (Math.abs(value) <= 1e-12) return 'no output current';
  return `${amount(Math.abs(value), 'A')} ${value > 0 ? 'sourced' : 'sunk'}`;
}
