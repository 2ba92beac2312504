import type { JudgedPart } from '../../../screening/index.js';
import type { Verdict } from '../../../verdicts/verdict.js';
import { formatPercent } from '../../../quantities/format.js';
import { amount, checkAmount, compared } from '../../amounts.js';
import { batteryText, swingText } from '../../budget-text.js';
import { termAmount } from '../../term-text.js';
import { comparisonText, cornerText } from '../../verdict-words.js';
import { EMPTY, figure, words } from '../cell.js';
import { html, type Html } from '../html.js';
import { tableOf, type PageRow } from '../table.js';
import { idOf, paragraphOf, section, subheading, type Place } from './ids.js';

/** Where the error, the noise, the current and the swing of the chosen part go. */
export function budgetsSection(place: Place): Html {
  const { chosen } = place.stage;
  if (chosen === null) return section(place, 'budgets', paragraphOf('No part fits, so there is no budget to show.'));
  return section(place, 'budgets', html`${dcError(place, chosen.judged)}${noise(place, chosen.judged)}${supplyCurrent(place, chosen.judged)}${swing(place, chosen.judged)}`);
}

const verdictOf = ({ verdicts }: JudgedPart, check: string): Verdict | undefined => verdicts.find((one) => one.check === check);

/** Terms add as magnitudes: all worst at once. The root-sum-square answers another question and stands apart. */
function dcError(place: Place, judged: JudgedPart): Html {
  const verdict = verdictOf(judged, 'dc-error');
  if (verdict === undefined) return html`${subheading(place, 'DC error')}${paragraphOf('The stage sets no limit on the DC error, so none is judged.')}`;
  const total = totalOf(verdict);
  const beside = verdict.rss === null ? '' : paragraphOf(`Root-sum-square of the same terms: ${amount(verdict.rss, 'V')}. It is shown for scale and decides nothing: it holds only for independent errors and for a share of the boards, not for all of them.`);
  return html`${subheading(place, 'DC error at the output')}
${paragraphOf(`${comparisonText(verdict)}${verdict.worstAt === null ? '' : `, ${cornerText(verdict.worstAt)}`}. Terms add as magnitudes, all worst at once.`)}
${tableOf({
    id: idOf(place, 'dc-budget'),
    caption: 'DC error budget',
    columns: [{ title: 'Term' }, { title: 'At the output', kind: 'number' }, { title: 'Share of the sum', kind: 'number' }],
    rows: [...termRows(place, verdict, total === null || total === 0 ? null : (value) => value / total), ...sumRow(place, verdict, total)],
  })}
${beside}`;
}

/** Independent noise adds as squares: the share of a term is that of its square. */
function noise(place: Place, judged: JudgedPart): Html {
  const verdict = verdictOf(judged, 'noise');
  if (verdict === undefined) return html`${subheading(place, 'Noise')}${paragraphOf('The stage sets no limit on noise, so none is judged.')}`;
  const squares = verdict.terms.reduce((sum, { value }) => sum + value ** 2, 0);
  return html`${subheading(place, 'Noise at the output')}
${paragraphOf(`${comparisonText(verdict)}. Terms are rms values and add as squares; the share is that of the square.`)}
${tableOf({
    id: idOf(place, 'noise-budget'),
    caption: 'Noise budget',
    columns: [{ title: 'Source' }, { title: 'At the output, rms', kind: 'number' }, { title: 'Share of the squares', kind: 'number' }],
    rows: termRows(place, verdict, squares === 0 ? null : (value) => value ** 2 / squares),
  })}`;
}

function termRows(place: Place, verdict: Verdict, shareOf: ((value: number) => number) | null): PageRow[] {
  return verdict.terms.map((term, at) => {
    const share = shareOf?.(term.value) ?? null;
    const percent = share === null ? EMPTY : figure(shareText(share), share);
    return { id: idOf(place, 'budget', verdict.check, String(at + 1)), cells: [words(term.name), figure(termAmount(verdict, term.value), term.value), percent] };
  });
}

function sumRow(place: Place, verdict: Verdict, total: number | null): PageRow[] {
  if (total === null) return [];
  const title = typeof verdict.offered === 'number' ? 'Sum' : 'Known part of the sum';
  return [{ id: idOf(place, 'budget', verdict.check, 'sum'), cells: [words(title), figure(checkAmount(verdict, total), total), words('')] }];
}

const totalOf = ({ offered, known }: Verdict): number | null => (typeof offered === 'number' ? offered : known);

function supplyCurrent(place: Place, judged: JudgedPart): Html {
  const { part, current, batteryHours } = judged;
  const channels = part.channels ?? 1;
  const one = current === null ? 'Quiescent current not known.' : `${amount(current, 'A', { round: 'up' })} per amplifier as it counts${channels > 1 ? `, ${amount(channels * current, 'A', { round: 'up' })} for the package of ${channels}` : ''}.`;
  const verdict = verdictOf(judged, 'supply-current');
  const limit = verdict === undefined ? ' The stage sets no limit on it.' : ` Limit ${compared(verdict)?.required ?? 'not comparable'}.`;
  return html`${subheading(place, 'Supply current')}
${paragraphOf(one + limit)}
${batteryHours === null ? '' : paragraphOf(`The battery ${batteryText(batteryHours)}.`)}`;
}

function swing(place: Place, judged: JudgedPart): Html {
  const rows = (['output-low', 'output-high', 'input-low', 'input-high'] as const).flatMap((check): PageRow[] => {
    const verdict = verdictOf(judged, check);
    const numbers = verdict === undefined ? null : compared(verdict);
    if (verdict === undefined || numbers === null) return [];
    return [{
      id: idOf(place, 'swing', check),
      cells: [words(verdict.title), figure(numbers.required, Number(verdict.required)), figure(numbers.offered, typeof verdict.offered === 'number' ? verdict.offered : verdict.known), words(verdict.worstAt === null ? '' : cornerText(verdict.worstAt))],
    }];
  });
  return html`${subheading(place, 'Swing')}
${judged.dynamicRange === null ? '' : paragraphOf(`${swingText(judged.dynamicRange)}.`)}
${tableOf({ id: idOf(place, 'swing'), caption: 'Room at the rails', columns: [{ title: 'End' }, { title: 'The stage leaves', kind: 'number' }, { title: 'The part needs', kind: 'number' }, { title: 'Worst case', kind: 'sentence' }], rows })}`;
}

/** What is next to nothing says so: five zeros after the point tell no reader anything. */
const shareText = (share: number): string => (share > 0 && share < 1e-4 ? '< 0.01\u00a0%' : formatPercent(share, { digits: 2 }).replace(' ', '\u00a0'));
