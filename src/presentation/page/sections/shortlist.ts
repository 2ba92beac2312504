import type { JudgedPart } from '../../../screening/index.js';
import type { RankedPart } from '../../../ranking/index.js';
import { aheadLines } from '../../ahead-text.js';
import { amount, priceText } from '../../amounts.js';
import { aboutPart, variantWords } from '../../fit-table.js';
import { noteLines } from '../../notes.js';
import { countsLine, ORDER_WORDS } from '../../shortlist-text.js';
import { tightestVerdict } from '../../tightest.js';
import { spareText } from '../../verdict-words.js';
import { checkWords } from '../../words.js';
import { EMPTY, figure, marked, quoted, words, type Cell } from '../cell.js';
import { foreign, html, prose, type Html } from '../html.js';
import { pageStyle, sentence } from '../page-style.js';
import { tableOf, type PageRow } from '../table.js';
import { idOf, listOf, paragraphOf, section, type Place } from './ids.js';

/** What fits, in its order, with the reasons for that order. */
export function shortlistSection(place: Place): Html {
  const { report } = place.stage;
  const style = pageStyle(place.review);
  const ahead = report.ahead === null ? '' : paragraphOf(sentence(aheadLines(report, style)));
  const order = report.fit.length < 2 ? '' : paragraphOf(`Order: ${ORDER_WORDS[report.asking.order]}`);
  return section(place, 'shortlist', html`${paragraphOf(countsLine(report))}
${fitTable(place)}
${cutOff(place)}
${order}
${ahead}
${listOf(noteLines(report, style).map(prose))}`);
}

function fitTable(place: Place): Html {
  const { fit } = place.stage.report;
  return tableOf({
    id: idOf(place, 'fit'),
    caption: 'Parts that fit, in order',
    head: 1,
    columns: [{ title: 'Place', kind: 'number' }, { title: 'Part' }, { title: 'List' }, { title: 'About', kind: 'sentence' }, { title: 'Tightest check' }, { title: 'Spare there', kind: 'number' }, { title: 'DC error at the output', kind: 'number' }, { title: 'Supply current', kind: 'number' }, { title: 'Price', kind: 'number' }, { title: 'Proof' }, { title: 'Merit', kind: 'number' }],
    rows: fit.slice(0, place.review.top).map((one) => fitRow(place, one)),
  });
}

function fitRow(place: Place, one: RankedPart): PageRow {
  const tightest = tightestVerdict(place.stage.report, one);
  const error = one.verdicts.find((verdict) => verdict.check === 'dc-error')?.offered;
  const about = [aboutPart(one.part), ...variantWords(one), ...(one.dominatedBy === null ? [] : [`nowhere better than ${one.dominatedBy}`])].filter((text) => text !== '').join('; ');
  return {
    id: idOf(place, 'part', one.part.id),
    cells: [
      figure(String(one.rank), one.rank),
      partCell(one, place.stage.chosen?.judged.part.id),
      words(one.part.tier),
      quoted(about),
      words(tightest === null ? '' : checkWords(tightest.check)),
      tightest === null ? EMPTY : figure(spareText(tightest).replace('\u00a0spare', ''), tightest.margin ?? tightest.spare),
      typeof error === 'number' ? figure(amount(error, 'V', { round: 'up' }), error) : EMPTY,
      one.current === null ? EMPTY : figure(amount(one.current, 'A', { round: 'up' }), one.current),
      one.part.price === null ? EMPTY : figure(priceText(one.part.price), one.part.price.amount),
      words(one.proof === 'limits' ? 'limits' : `typical, ${one.confirm.length}\u00a0to\u00a0confirm`),
      figure(one.merit.total.toFixed(2), one.merit.total),
    ],
  };
}

function partCell({ part }: JudgedPart, chosen: string | undefined): Cell {
  return marked(part.id === chosen ? html`${foreign(part.id)} <span class="also">(chosen)</span>` : foreign(part.id), part.id);
}

/** Nothing is cut silently. */
function cutOff({ review, stage }: Place): Html {
  const left = stage.report.fit.length - review.top;
  return left <= 0 ? html`` : html`<p>… and ${left} more that fit; <code>--top ${left + review.top}</code> shows all.</p>`;
}
