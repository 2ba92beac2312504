import type { Verdict } from '../../../verdicts/verdict.js';
import { linearAxis } from '../drawing/axis.js';
import { said, saidShare } from '../drawing/said.js';
import type { Figure } from '../figure.js';
import type { PageInput } from '../page-input.js';
import { figureOf, WIDTH } from './assemble.js';
import { budgetMarkup } from './budget-markup.js';
import type { BudgetRow } from './budget-rows.js';

/** P5: every source of the output noise, V rms, with its share of the square. Null where noise is not asked or nothing of it is known. */
export function noiseBudget({ chosen }: PageInput): Figure | null {
  const verdict = chosen?.verdicts.find(({ check }) => check === 'noise');
  if (verdict === undefined || verdict.terms.length === 0) return null;
  const sources = noiseShares(verdict);
  const limit = allowed(verdict, totalOf(sources));
  const rows = [...sources.map(rowOf), totalRow(totalOf(sources))];
  const { body, height } = budgetMarkup({
    rows,
    limit: limit === null ? null : { value: limit, words: `limit ${said(limit, 'Vrms')}` },
    axisOf: (domain, pixels) => linearAxis({ words: 'noise at the output', unit: 'Vrms', domain, pixels }),
    note: ['Noises add as squares: percentages are shares of the square, and the bars do not add up to the whole.'],
  });
  return figureOf({ id: 'noise-budget', title: 'Noise budget', finding: findingOf(sources, limit), table: tableOf(sources), width: WIDTH, height, body, csv: csvOf(sources) });
}

export interface NoiseShare {
  readonly name: string;
  readonly rms: number;
  /** Of the sum of squares, 0..1. */
  readonly square: number;
  /** Whether another part would change it. */
  readonly isPart: boolean;
}

/** Largest first. */
export function noiseShares({ terms }: Pick<Verdict, 'terms'>): NoiseShare[] {
  const total = terms.reduce((sum, { value }) => sum + value ** 2, 0);
  return [...terms]
    .sort((a, b) => b.value - a.value)
    .map(({ name, value, slot }) => ({ name, rms: value, square: total === 0 ? 0 : value ** 2 / total, isPart: slot !== null || name.startsWith('amplifier') }));
}

const totalOf = (sources: readonly NoiseShare[]): number => Math.hypot(...sources.map(({ rms }) => rms));

/** Of a limit in volts the limit; of a signal-to-noise ratio the noise that would just meet it. */
function allowed({ required, offered, unit, sense }: Verdict, total: number): number | null {
  if (typeof required !== 'number') return null;
  if (unit === 'V' || unit === 'Vrms') return required;
  return sense === 'at-least' && typeof offered === 'number' ? (total * offered) / required : null;
}

const rowOf = ({ name, rms, square }: NoiseShare): BudgetRow => ({ name, from: 0, to: rms, words: `${said(rms, 'Vrms')}, ${saidShare(square)} of the square`, typicalShare: null, isTotal: false });

const totalRow = (total: number): BudgetRow => ({ name: 'all together', from: 0, to: total, words: said(total, 'Vrms'), typicalShare: null, isTotal: true });

function findingOf(sources: readonly NoiseShare[], limit: number | null): string {
  const total = totalOf(sources);
  const own = sources.filter(({ isPart }) => isPart).reduce((sum, { square }) => sum + square, 0);
  const against = limit === null ? '' : ` against ${said(limit, 'Vrms')} allowed`;
  const quiet = total * Math.sqrt(1 - Math.min(1, own));
  return `The output noise is ${said(total, 'Vrms')}${against}; the amplifier makes ${saidShare(own)} of the square, so a part without any noise would leave ${said(quiet, 'Vrms')}.`;
}

function tableOf(sources: readonly NoiseShare[]): Figure['table'] {
  const rows = sources.map(({ name, rms, square }) => [name, said(rms, 'Vrms'), saidShare(square)]);
  return { columns: ['source', 'at the output', 'share of the square'], rows: [...rows, ['all together', said(totalOf(sources), 'Vrms'), said(100, '%')]] };
}

function csvOf(sources: readonly NoiseShare[]): (string | number)[][] {
  return [['source', 'rms_V', 'share_of_square'], ...sources.map(({ name, rms, square }) => [name, rms, square])];
}
