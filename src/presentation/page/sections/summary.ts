import { safeLine } from '../../safe-text.js';
import { tightestVerdict } from '../../tightest.js';
import { spareText } from '../../verdict-words.js';
import { checkWords } from '../../words.js';
import { EMPTY, figure, marked, words, type Cell } from '../cell.js';
import { foreign, html, type Html } from '../html.js';
import type { ChosenPart, Review } from '../review.js';
import { tableOf, type PageRow } from '../table.js';
import { cautionCount } from './answer.js';
import { idOf, SECTIONS, type Place, type SectionName } from './ids.js';
import { outcomeCell, outcomeTone } from './outcome.js';

/** What a stage is called: its name, else its file, else its topology. */
export function stageTitle({ stage }: Pick<Place, 'stage'>): string {
  return safeLine(stage.report.stage.name ?? stage.file ?? `${stage.report.stage.topology} stage`);
}

/** Everything on the page by name, in reading order. */
export function contents(places: readonly Place[]): Html {
  const own = (place: Place): Html => html`<ol>${sectionsOf(place).map((name) => html`<li><a href="#${idOf(place, name)}">${SECTIONS[name]}</a></li>`)}</ol>`;
  const ends = html`<li><a href="#reproduce">Reproduce</a></li><li><a href="#sign-off">Sign-off</a></li>`;
  const [first] = places;
  if (places.length === 1 && first !== undefined) return html`<nav aria-label="Contents"><ol>${sectionsOf(first).map((name) => html`<li><a href="#${idOf(first, name)}">${SECTIONS[name]}</a></li>`)}${ends}</ol></nav>`;
  return html`<nav aria-label="Contents"><ol><li><a href="#summary">Summary</a></li>${places.map((place) => html`<li class="whole"><a href="#s${place.number}">${place.number}. ${foreign(stageTitle(place))}</a>${own(place)}</li>`)}${ends}</ol></nav>`;
}

const sectionsOf = (place: Place): SectionName[] => (Object.keys(SECTIONS) as SectionName[]).filter((name) => name !== 'plots' || place.plots.length > 0);

/** Several stages side by side; one stage needs none. */
export function summarySection(places: readonly Place[]): Html {
  if (places.length < 2) return html``;
  return html`<section id="summary" aria-labelledby="summary-title">
<h2 id="summary-title">Summary</h2>
${tableOf({
    id: 'summary-table',
    caption: 'The stages and what was chosen for them',
    columns: [{ title: 'Stage' }, { title: 'Part' }, { title: 'Verdict' }, { title: 'Proof' }, { title: 'Tightest check' }, { title: 'Spare there', kind: 'number' }, { title: 'Fit', kind: 'number' }, { title: 'Open', kind: 'number' }, { title: 'Do not fit', kind: 'number' }, { title: 'Cautions', kind: 'number' }],
    rows: places.map(rowOf),
  })}
</section>
`;
}

function rowOf(place: Place): PageRow {
  const { chosen, report } = place.stage;
  const { fit, undecided, rejected } = report.counts;
  const tightest = chosen === null ? null : tightestVerdict(report, chosen.judged);
  const title = stageTitle(place);
  const cautions = cautionCount(place);
  return {
    id: `s${place.number}-summary`,
    ...(chosen === null ? {} : { tone: outcomeTone(chosen.judged.outcome) }),
    cells: [
      marked(html`<a href="#s${place.number}">${foreign(title)}</a>`, title),
      chosen === null ? words('none') : chosenCell(chosen),
      chosen === null ? words(undecided > 0 ? '? none is proven to fit' : '✕ nothing fits') : outcomeCell(chosen.judged.outcome),
      words(chosen?.judged.proof ?? ''),
      words(tightest === null ? '' : checkWords(tightest.check)),
      tightest === null ? EMPTY : figure(spareText(tightest).replace('\u00a0spare', ''), tightest.margin),
      ...[fit, undecided, rejected, cautions].map((count) => figure(String(count), count)),
    ],
  };
}

function chosenCell({ judged: { part }, withdrawn }: ChosenPart): Cell {
  return withdrawn === undefined ? marked(foreign(part.id), part.id) : marked(html`${foreign(part.id)} <span class="also">(withdrawn since)</span>`, `${part.id} (withdrawn since)`);
}

/** The title of the whole page. */
export function reviewTitle({ stages }: Review): string {
  const [first] = stages;
  return stages.length === 1 && first !== undefined ? stageTitle({ stage: first }) : `${stages.length} stages`;
}
