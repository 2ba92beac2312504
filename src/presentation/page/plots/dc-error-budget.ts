import type { Part } from '../../../parts/part.js';
import type { JudgedPart } from '../../../screening/index.js';
import type { Term } from '../../../verdicts/finding.js';
import type { Verdict } from '../../../verdicts/verdict.js';
import { linearAxis } from '../drawing/axis.js';
import { said, saidOr, saidShare } from '../drawing/said.js';
import type { Figure } from '../figure.js';
import type { PageInput } from '../page-input.js';
import { figureOf, WIDTH } from './assemble.js';
import { budgetMarkup } from './budget-markup.js';
import type { BudgetRow } from './budget-rows.js';

/** P4: what the DC error at its worst corner is made of, against its limit. Null where it is not asked or nothing of it is known. */
export function dcErrorBudget({ chosen }: PageInput): Figure | null {
  const verdict = chosen?.verdicts.find(({ check }) => check === 'dc-error');
  if (chosen === null || verdict === undefined || verdict.terms.length === 0 || typeof verdict.required !== 'number') return null;
  const terms = shares(chosen, verdict);
  const rows = rowsOf(terms);
  const { body, height } = budgetMarkup({ rows, limit: { value: verdict.required, words: `limit ${said(verdict.required, 'V')}` }, axisOf: (domain, pixels) => linearAxis({ words: 'DC error at the output', unit: 'V', domain, pixels }), note: noteOf(verdict, terms) });
  return figureOf({ id: 'dc-error-budget', title: 'DC error budget', finding: findingOf(verdict, terms), table: tableOf(terms, verdict.required), width: WIDTH, height, body, csv: csvOf(terms) });
}

/** A term with its share of the whole, and its size with the typical figure; null: no typical figure is known, or its term is not in proportion to it. */
export interface ErrorShare {
  readonly name: string;
  readonly value: number;
  readonly share: number;
  readonly typical: number | null;
}

/** Largest first. */
export function shares({ part }: Pick<JudgedPart, 'part'>, { terms }: Pick<Verdict, 'terms'>): ErrorShare[] {
  const total = totalOf(terms);
  return [...terms]
    .sort((a, b) => b.value - a.value)
    .map((term) => ({ name: term.name, value: term.value, share: total === 0 ? 0 : term.value / total, typical: typicalOf(part, term) }));
}

const totalOf = (terms: readonly { readonly value: number }[]): number => terms.reduce((sum, { value }) => sum + value, 0);

/** A term is its figure times something, or something over a rejection: with the typical figure it changes in that proportion. */
function typicalOf({ figures }: Part, { slot, value, basis }: Term): number | null {
  const counted = figures.find((figure) => slot !== null && slotOf(figure.parameter, figure.kind) === slot.split('@')[0]);
  if (counted === undefined || basis !== 'guaranteed' || counted.kind === 'typ' || counted.value === 0) return null;
  const typical = figures.find(({ parameter, kind }) => parameter === counted.parameter && kind === 'typ');
  if (typical === undefined || typical.value === 0) return null;
  return value * (counted.kind === 'max' ? typical.value / counted.value : counted.value / typical.value);
}

const slotOf = (parameter: string, kind: string): string => `${parameter}.${kind}`;

function rowsOf(terms: readonly ErrorShare[]): BudgetRow[] {
  let from = 0;
  const rows = terms.map(({ name, value, share, typical }): BudgetRow => {
    const row = { name, from, to: from + value, words: `${said(value, 'V')}, ${saidShare(share)}`, typicalShare: typical === null || value === 0 ? null : typical / value, isTotal: false };
    from += value;
    return row;
  });
  return [...rows, { name: 'all at once', from: 0, to: from, words: said(from, 'V'), typicalShare: null, isTotal: true }];
}

function noteOf({ rss }: Verdict, terms: readonly ErrorShare[]): string[] {
  return [
    ...(terms.some(({ typical }) => typical !== null) ? ['Hatched: the share with the typical figure, where one is printed.'] : []),
    ...(rss === null ? [] : [`Root-sum-square of the terms, shown beside their sum and not compared: ${said(rss, 'V')}.`]),
  ];
}

function findingOf(verdict: Verdict, terms: readonly ErrorShare[]): string {
  const [first] = terms;
  const total = totalOf(terms);
  const required = typeof verdict.required === 'number' ? verdict.required : 0;
  const known = verdict.known === null ? 'adds up to' : 'comes to at least';
  return `The error ${known} ${said(total, 'V')} against ${said(required, 'V')} allowed; the largest term is ${first?.name ?? ''} with ${saidShare(first?.share ?? 0)} of it.`;
}

function tableOf(terms: readonly ErrorShare[], limit: number): Figure['table'] {
  const rows = terms.map(({ name, value, share, typical }) => [name, said(value, 'V'), saidShare(share), typical === null ? 'not known' : said(typical, 'V')]);
  return { columns: ['term', 'at its worst', 'share', 'with the typical figure'], rows: [...rows, ['all at once', said(totalOf(terms), 'V'), '', ''], ['limit', saidOr(limit, 'V'), '', '']] };
}

function csvOf(terms: readonly ErrorShare[]): (string | number | null)[][] {
  return [['term', 'worst_V', 'share', 'typical_V'], ...terms.map(({ name, value, share, typical }) => [name, value, share, typical])];
}
