import type { SwingWindow } from '../../curves/index.js';
import type { Verdict } from '../../verdicts/verdict.js';
import { amount, range } from '../amounts.js';
import { displayWidth, padded, padStart, paragraph } from '../layout.js';
import type { Lane } from '../page/plots/swing-lane.js';
import { lanesOf } from '../page/plots/swing-window.js';
import { GLUE, spelled } from '../spelling.js';
import type { Style } from '../style.js';
import { inToneOf, markOf, worstOutcome } from './outcome-mark.js';
import { signsOf } from './signs.js';
import { swingCells } from './swing-cells.js';

/** What the bars of the rails are drawn from: the windows the figures of the design review show, and the verdicts beside them. */
export interface SwingFacts {
  readonly swing: readonly SwingWindow[];
  readonly verdicts: readonly Verdict[];
}

export type Pin = 'output' | 'input';

const INDENT = 2;
/** Columns of the longest pin and of the longest mark, and of both with their gaps: `output  PASS  `. */
const [PIN, VERDICT, HEAD] = [6, 4, 14];
/** Fewer cells tell nothing apart; more say no more. */
const [FEWEST, MOST_CELLS] = [18, 60];

/** A bar from rail to rail for each pin, at the supply end that leaves it the least room; the numbers under it. Nothing where there is no room for a bar. */
export function swingBars(facts: SwingFacts, pins: readonly Pin[], style: Style): string[] {
  const rows = pins.flatMap((pin) => rowOf(facts, pin));
  if (rows.length === 0) return [];
  const widest = (texts: readonly string[]): number => Math.max(...texts.map((text) => displayWidth(spelled(text, style))));
  const [left, right] = [widest(rows.map(({ ground }) => ground)), widest(rows.map(({ top }) => top))];
  const cells = Math.min(MOST_CELLS, style.width - INDENT - HEAD - left - right - 4);
  if (cells < FEWEST) return [];
  const bars = rows.map(({ lane }) => swingCells(lane, cells, signsOf(style)));
  const lines = rows.flatMap((row, at) => [
    `${' '.repeat(INDENT)}${padded(row.pin, PIN)}  ${padded(markOf(row.outcome, style), VERDICT)}  ${padStart(spelled(row.ground, style), left)} ${inTone(bars[at] ?? '', style)} ${spelled(row.top, style)}`,
    ...paragraph(numbersOf(row.lane), style, { lead: ' '.repeat(INDENT + HEAD) }),
  ]);
  return [...lines, ...paragraph(legendOf(bars, style), style, { lead: ' '.repeat(INDENT) })];
}

/** What is out of reach in the tone of a fail; its sign says it too. */
function inTone(bar: string, style: Style): string {
  const { missing } = signsOf(style);
  return bar.split(new RegExp(`(${missing}+)`, 'u')).map((part) => (part.startsWith(missing) ? inToneOf(part, 'fail', style) : part)).join('');
}

interface Row {
  readonly pin: Pin;
  readonly lane: Lane;
  /** Null where the stage asks nothing of this pin. */
  readonly outcome: Verdict['outcome'] | null;
  readonly ground: string;
  readonly top: string;
}

function rowOf({ swing, verdicts }: SwingFacts, pin: Pin): Row[] {
  const sides = verdicts.filter(({ check }) => check === `${pin}-low` || check === `${pin}-high`);
  const window = windowOf(swing, sides);
  const lane = window === null ? undefined : lanesOf(window)[pin === 'output' ? 0 : 1];
  if (lane === undefined) return [];
  const outcome = sides.length === 0 ? null : worstOutcome(sides);
  return [{ pin, lane, outcome, ground: amount(0, 'V'), top: amount(lane.supply, 'V') }];
}

/** The window at the supply where the tightest of the verdicts stands; the lowest supply where none says one. */
function windowOf(swing: readonly SwingWindow[], sides: readonly Verdict[]): SwingWindow | null {
  const told = sides.filter(({ worstAt }) => worstAt?.['supply'] !== undefined);
  const tightest = told.reduce<Verdict | null>((best, next) => (best === null || (next.spare ?? Infinity) < (best.spare ?? Infinity) ? next : best), null);
  const supply = tightest?.worstAt?.['supply'];
  return swing.find((window) => window.supply === supply) ?? swing[0] ?? null;
}

function numbersOf(lane: Lane): string {
  const { signal, error, band, supply } = lane;
  const off = error > 0 ? `, off by up to ${amount(error, 'V', { digits: 2, round: 'up' })}` : '';
  return `signal ${range(signal.min, signal.max, 'V')}${off}; usable ${usableText(band, supply)}`;
}

/** Ends rounded to the safe side. */
function usableText({ low, high }: Lane['band'], supply: number): string {
  if (low === null && high === null) return 'range not known';
  if (low !== null && high !== null && low >= high) return `nothing of ${amount(supply, 'V')}`;
  const ends = [low === null ? `not${GLUE}known` : amount(low, 'V', { round: 'up' }), high === null ? `not${GLUE}known` : amount(high, 'V', { round: 'down' })];
  return ends.join('..');
}

/** Only the signs that occur. */
function legendOf(bars: readonly string[], style: Style): string {
  const signs = signsOf(style);
  const meanings: readonly (readonly [string, string])[] = [
    [signs.full, 'signal'],
    [signs.error, 'offset and drift'],
    [signs.free, 'free'],
    [signs.taken, 'head-room kept by the part'],
    [signs.missing, 'out of its reach'],
    [signs.open, 'not known'],
  ];
  return meanings.filter(([sign]) => bars.some((bar) => bar.includes(sign))).map(([sign, words]) => `${sign}${GLUE}${words}`).join(', ');
}
