import type { JudgedPart } from '../../../screening/index.js';
import type { Verdict } from '../../../verdicts/verdict.js';
import { compared } from '../../amounts.js';
import { aboutPart } from '../../fit-table.js';
import { likelyFirst } from '../../likely-first.js';
import { comparisonText, cornerText, shortfall, unknownText } from '../../verdict-words.js';
import { checkWords, counted } from '../../words.js';
import { EMPTY, figure, marked, quoted, words } from '../cell.js';
import { foreign, html, type Html } from '../html.js';
import { tableOf, type PageRow } from '../table.js';
import { idOf, paragraphOf, section, type Place } from './ids.js';

/** Near misses in full, what cannot be decided, the rest by reason. */
export function rejectedSection(place: Place): Html {
  const { report } = place.stage;
  const { rejected, undecided } = report.counts;
  return section(place, 'rejected', html`${paragraphOf(`${counted(rejected, 'part')} ${rejected === 1 ? 'does' : 'do'} not fit, ${undecided} cannot be decided.`)}
${nearest(place)}
${undecidedTable(place)}
${reasonsTable(place)}
${allRejected(place)}`);
}

function nearest(place: Place): Html {
  const { nearest: near } = place.stage.report;
  return tableOf({
    id: idOf(place, 'nearest'),
    caption: 'Nearest of those that do not fit: every check they fail',
    columns: [{ title: 'Part' }, { title: 'Check' }, { title: 'Has', kind: 'number' }, { title: 'Limit', kind: 'number' }, { title: 'Misses by', kind: 'sentence' }, { title: 'Worst case', kind: 'sentence' }],
    rows: near.flatMap((one) => one.verdicts.filter(({ outcome }) => outcome === 'fail').map((verdict) => missRow(place, one, verdict))),
  });
}

function missRow(place: Place, { part }: JudgedPart, verdict: Verdict): PageRow {
  const numbers = compared(verdict);
  return {
    id: idOf(place, 'miss', part.id, verdict.check),
    cells: [
      quoted(part.id),
      words(verdict.title),
      numbers === null ? EMPTY : figure(numbers.offered, typeof verdict.offered === 'number' ? verdict.offered : null),
      numbers === null ? EMPTY : figure(numbers.required, Number(verdict.required)),
      words(shortfall(verdict)),
      words(verdict.worstAt === null ? '' : cornerText(verdict.worstAt)),
    ],
  };
}

function undecidedTable(place: Place): Html {
  const { undecided } = place.stage.report;
  const shown = likelyFirst(undecided, place.review.top);
  const rows = shown.flatMap((one) => one.verdicts.filter(({ outcome }) => outcome === 'unknown').map((verdict) => openRow(place, one, verdict)));
  const table = tableOf({
    id: idOf(place, 'undecided'),
    caption: 'Cannot be decided: what is open, and where it would turn',
    columns: [{ title: 'Part' }, { title: 'About', kind: 'sentence' }, { title: 'Check' }, { title: 'Known', kind: 'sentence' }, { title: 'Open', kind: 'sentence' }, { title: 'Likely to fit' }],
    rows,
  });
  return html`${table}${cut(undecided.length - shown.length, 'cannot be decided', place)}`;
}

function openRow(place: Place, one: JudgedPart, verdict: Verdict): PageRow {
  return {
    id: idOf(place, 'open', one.part.id, verdict.check),
    tone: 'open',
    cells: [quoted(one.part.id), quoted(aboutPart(one.part)), words(verdict.title), words(comparisonText(verdict)), words(unknownText([verdict])), words(one.likely ? 'yes' : 'no')],
  };
}

/** Counts are complete; a part that fails several checks counts at each. */
function reasonsTable(place: Place): Html {
  const { rejections, rejected } = place.stage.report;
  return html`${tableOf({
    id: idOf(place, 'reasons'),
    caption: 'Why the others are out (one part can fail several checks)',
    columns: [{ title: 'Check' }, { title: 'Parts that fail it', kind: 'number' }, { title: 'Of these fail nothing else', kind: 'number' }],
    rows: rejections.map(({ check, parts }) => {
      const alone = rejected.filter(({ deciding }) => deciding.length === 1 && deciding[0] === check).length;
      return { id: idOf(place, 'reason', check), cells: [words(checkWords(check)), figure(String(parts), parts), figure(String(alone), alone)] };
    }),
  })}`;
}

function allRejected(place: Place): Html {
  const { rejected } = place.stage.report;
  if (rejected.length === 0) return html``;
  return html`<details id="${idOf(place, 'all-rejected')}"><summary>Every part that does not fit, with the checks it fails</summary>
${tableOf({
    id: idOf(place, 'out'),
    caption: 'Parts that do not fit',
    columns: [{ title: 'Part' }, { title: 'List' }, { title: 'Fails', kind: 'sentence' }, { title: 'Number', kind: 'number' }],
    rows: rejected.map((one) => outRow(place, one)),
  })}
</details>`;
}

function outRow(place: Place, { part, deciding }: JudgedPart): PageRow {
  const failing = deciding.map(checkWords);
  return { id: idOf(place, 'part', part.id), cells: [marked(foreign(part.id), part.id), words(part.tier), words(failing.join(', ')), figure(String(failing.length), failing.length)] };
}

/** Nothing is cut silently. */
function cut(left: number, verb: string, { review }: Place): Html {
  return left <= 0 ? html`` : html`<p>… and ${left} more that ${verb}; <code>--top ${left + review.top}</code> shows all.</p>`;
}

