import { figureSlot, PARAMETERS, type Figure } from '../parts/figures.js';
import type { Origin, Part } from '../parts/part.js';
import type { Term } from '../verdicts/finding.js';
import type { Verdict } from '../verdicts/verdict.js';
import { amount, checkAmount, compared, figureAmount } from './amounts.js';
import { conditionText } from './condition-text.js';
import { originWords } from './origin-text.js';
import { paragraph } from './layout.js';
import { safeLine } from './safe-text.js';
import { glued } from './spelling.js';
import type { Style } from './style.js';
import { tableLines } from './table.js';
import { beyondText } from './verdict-words.js';
import { BASIS_WORDS, figureWords } from './words.js';

/** The part a verdict is about, with the origins of its figures. */
export interface Origins {
  readonly part: Part;
  origin(partId: string, slot: string): Origin | null;
}

const INDENT = 8;
const COLUMNS = [{ title: '', name: '', key: true }, { title: '', name: '', key: true, align: 'right' }, { title: '', name: '', wraps: true }, { title: '', name: '', moves: 1 }] as const;

/** What an offered value is made of: every term with figure, factors and origin, then the sum; missing figures stand where they would. */
export function termLines(verdict: Verdict, origins: Origins, style: Style): string[] {
  const factor = commonFactor(verdict.terms);
  const rows = [
    ...verdict.terms.map((term) => termRow(withoutFactor(term, factor), { verdict, origins, style })),
    ...(verdict.outcome === 'unknown' ? verdict.missing.map((missing) => (missing.beyond === undefined ? missingRow(missing, origins, style) : beyondRow(missing.figure, beyondText(missing.beyond, origins.part.tier)))) : []),
    ...sumRow(verdict),
  ];
  if (rows.length === 0) return singleFigure(verdict, origins, style);
  const title = factor === null ? [] : paragraph(`Terms at the output, each ${glued(factor)}:`, style, { lead: ' '.repeat(INDENT - 2) });
  return [...title, ...tableLines({ columns: COLUMNS, rows, indent: INDENT }, style)];
}

/** The noise gain all terms are multiplied by: said once. */
export function commonFactor(terms: readonly Term[]): string | null {
  const factors = new Set(terms.map(({ how }) => FACTOR.exec(how ?? '')?.[0] ?? null));
  const [only] = factors;
  return terms.length > 1 && factors.size === 1 && only != null ? only : null;
}

const FACTOR = /× noise gain \S+$/u;

function withoutFactor(term: Term, factor: string | null): Term {
  if (factor === null || term.how === null) return term;
  return { ...term, how: term.how.slice(0, -factor.length).replace(/, $/u, '') };
}

interface At {
  readonly verdict: Verdict;
  readonly origins: Origins;
  readonly style: Style;
}

function termRow(term: Term, { verdict, origins, style }: At): string[] {
  const figure = figureAt(origins.part, term.slot);
  const printed = term.figure === null ? printedText(figure) : printedOf(term.figure, figure);
  return [term.name, termAmount(verdict, term.value), madeFrom(printed, figure, stepsOf(term, verdict)), originOf(term, origins, style)];
}

/** On the best reading, which a fail shows, a figure of the class counts as nothing. */
export const stepsOf = (term: Term, { outcome }: Verdict): string => (outcome === 'fail' && term.basis === 'borrowed' ? 'counted as nothing' : (term.how ?? ''));

/** `3 mV typical × 3, × noise gain 8.14` or `3 mV limit, × noise gain 8.14`. */
function madeFrom(printed: string, figure: Figure | null, how: string): string {
  const steps = glued(how);
  const kind = figure === null || figure.assumed === true || steps.startsWith('typical') ? '' : figure.kind === 'typ' ? 'typical' : 'limit';
  const condition = figure === null ? '' : conditionText(figure.condition);
  const stated = [printed, kind, condition === '' ? '' : `(${condition})`].filter((word) => word !== '').join(' ');
  const joint = stated === '' || steps === '' ? '' : /^(?:typical|over|through|×|÷)/u.test(steps) ? ' ' : ', ';
  return stated + joint + steps;
}

export function printedOf(value: { readonly value: number; readonly unit: string }, figure: Figure | null): string {
  return figure === null ? figureAmount(value.unit === 'V/V' ? 'commonModeRejection' : '', value) : figureAmount(figure.parameter, value);
}

export const printedText = (figure: Figure | null): string => (figure === null ? '' : figureAmount(figure.parameter, { value: figure.value, unit: unitOf(figure) }));

export function originOf(term: Pick<Term, 'slot' | 'basis'>, origins: Origins, style: Style): string {
  const { part } = origins;
  const known = term.slot === null ? null : origins.origin(part.id, term.slot);
  // From words, or under a condition that was declared: the cell is there, the figure as such is not.
  if (figureAt(part, term.slot)?.assumed === true && known?.kind !== 'assumption') return known === null ? 'assumed' : `assumed, from ${originWords(known, style)}`;
  if (known !== null) return originWords(known, style);
  if (term.basis === 'borrowed') return `class ${safeLine(part.class ?? '')}, worst of its sets`;
  // A resistor's own noise is no figure of the list; that its bandwidth is typical is said where the bandwidth stands.
  return term.basis === 'guaranteed' || ((term.basis === 'derated' || term.basis === 'estimated') && term.slot === null) ? '' : BASIS_WORDS[term.basis];
}

export function figureAt(part: Part, slot: string | null): Figure | null {
  return slot === null ? null : (part.figures.find((figure) => figureSlot(figure) === slot) ?? null);
}

function missingRow({ figure, kind }: Verdict['missing'][number], origins: Origins, style: Style): string[] {
  const where = kind === null ? null : origins.origin(origins.part.id, `${figure}.${kind}`);
  const said = where === null || (where.kind !== 'cell' && where.kind !== 'generic') ? 'not in the list' : where.cell.trim() === '' ? 'cell is empty' : `cell is "${safeLine(where.cell)}"`;
  return [figureWords(figure), 'unknown', said, where === null ? '' : originWords(where, style)];
}

/** Points are known, but none near this current. */
const beyondRow = (figure: string, text: string): string[] => [figureWords(figure), 'unknown', text, ''];

/** The sum reads as in the line above it. */
function sumRow(verdict: Verdict): string[][] {
  const { terms, offered, known, unit, rss, adds } = verdict;
  const total = typeof offered === 'number' ? offered : known;
  if (terms.length < 2 || total === null || unit === null) return [];
  const beside = rss === null ? '' : `root-sum-square ${amount(rss, unit)}, shown for scale`;
  const said = compared(verdict)?.offered ?? termAmount(verdict, total);
  if (adds === 'squares') return [[typeof offered === 'number' ? 'together' : 'known', verdict.termUnit === undefined ? said : termAmount(verdict, squared(verdict)), 'the terms add as squares', '']];
  return [[typeof offered === 'number' ? 'sum' : 'known', said, beside, '']];
}

/** A term is in the unit of its check, unless it says another. */
export function termAmount(verdict: Verdict, value: number): string {
  return verdict.termUnit === undefined ? checkAmount(verdict, value) : amount(value, verdict.termUnit);
}

const squared = ({ terms }: Verdict): number => Math.hypot(...terms.map(({ value }) => value));

/** A check that compares one figure: where that figure stands. */
function singleFigure(verdict: Verdict, origins: Origins, style: Style): string[] {
  const figure = figureAt(origins.part, verdict.slot);
  const basis = verdict.standsOn ?? 'guaranteed';
  const made = madeFrom(printedText(figure), figure, verdict.how ?? '');
  const origin = verdict.slot === null ? '' : originOf({ slot: verdict.slot, basis }, origins, style);
  const text = [made, origin].filter((words) => words !== '').join('; ');
  return text === '' ? [] : paragraph(text, style, { lead: ' '.repeat(INDENT) });
}

const unitOf = (figure: Figure): string => PARAMETERS[figure.parameter].unit;
