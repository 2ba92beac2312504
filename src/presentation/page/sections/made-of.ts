import type { Part } from '../../../parts/part.js';
import type { JudgedPart } from '../../../screening/index.js';
import type { Term } from '../../../verdicts/finding.js';
import type { Verdict } from '../../../verdicts/verdict.js';
import { checkAmount } from '../../amounts.js';
import { conditionText } from '../../condition-text.js';
import { glued } from '../../spelling.js';
import { figureAt, originOf, printedOf, printedText, stepsOf, termAmount, type Origins } from '../../term-text.js';
import { KIND_WORDS } from '../../words.js';
import { figure, quoted, words, type Cell } from '../cell.js';
import type { Html } from '../html.js';
import { pageStyle } from '../page-style.js';
import { tableOf, type PageRow } from '../table.js';
import { idOf, type Place } from './ids.js';

/** What each number of a part is made of: figure as printed, its kind and condition, what was done to it, and where it stands. */
export function madeOfTable(place: Place, judged: JudgedPart): Html {
  return tableOf({
    id: idOf(place, 'terms'),
    caption: 'What each number is made of',
    columns: [{ title: 'Check and term' }, { title: 'Counts', kind: 'number' }, { title: 'Figure', kind: 'number' }, { title: 'Kind' }, { title: 'Condition' }, { title: 'Made with', kind: 'sentence' }, { title: 'Origin' }],
    rows: judged.verdicts.flatMap((verdict) => rowsOf(place, judged.part, verdict)),
  });
}

function rowsOf(place: Place, part: Part, verdict: Verdict): PageRow[] {
  if (verdict.terms.length > 0) return verdict.terms.map((term, at) => rowOf(place, { part, verdict, term, id: idOf(place, 'term', verdict.check, String(at + 1)) }));
  if (verdict.slot === null || typeof verdict.offered !== 'number') return [];
  const single: Term = { name: '', value: verdict.offered, slot: verdict.slot, basis: verdict.standsOn ?? 'guaranteed', figure: null, how: verdict.how };
  return [rowOf(place, { part, verdict, term: single, id: idOf(place, 'term', verdict.check) })];
}

interface At {
  readonly part: Part;
  readonly verdict: Verdict;
  readonly term: Term;
  readonly id: string;
}

function rowOf(place: Place, { part, verdict, term, id }: At): PageRow {
  const counts = term.name === '' ? checkAmount(verdict, term.value) : termAmount(verdict, term.value);
  const title = term.name === '' ? verdict.title : `${verdict.title}: ${term.name}`;
  return { id, cells: [words(title), figure(counts, term.value), ...figureCells(place, { part, verdict, term })] };
}

/** Figure, kind, condition, steps, origin: the same five wherever a number is traced. */
export function figureCells(place: Place, { part, verdict, term }: Omit<At, 'id'>): Cell[] {
  const found = figureAt(part, term.slot);
  const printed = term.figure === null ? printedText(found) : printedOf(term.figure, found);
  const kind = found === null ? '' : found.assumed === true ? 'assumed' : KIND_WORDS[found.kind];
  const origins: Origins = { part, origin: (id, slot) => place.stage.report.origin(id, slot) };
  return [
    figure(printed, found?.value ?? term.figure?.value ?? null),
    words(kind),
    words(found === null ? '' : conditionText(found.condition)),
    words(glued(stepsOf(term, verdict))),
    quoted(originOf(term, origins, pageStyle(place.review))),
  ];
}
