import { aheadLines } from '../../ahead-text.js';
import { confirmationInFull } from '../../confirm-text.js';
import { emptyReason } from '../../empty-answer.js';
import { aboutPart, partName } from '../../fit-table.js';
import { cautionsOf } from '../../json.js';
import { safeLine } from '../../safe-text.js';
import { countsLine } from '../../shortlist-text.js';
import { glued } from '../../spelling.js';
import { tightestVerdict } from '../../tightest.js';
import { comparisonText, cornerText, spareText, unknownText } from '../../verdict-words.js';
import { checkWords, counted } from '../../words.js';
import { foreign, html, prose, type Html } from '../html.js';
import { pageStyle, sentence } from '../page-style.js';
import type { ChosenPart } from '../review.js';
import { checksLine, chosenBy } from './answer-words.js';
import { idOf, listOf, paragraphOf, section, type Place } from './ids.js';
import { outcomeTone, outcomeWords } from './outcome.js';

/** The answer first: which part or none, why in three lines, what qualifies it, what is open. */
export function answerSection(place: Place): Html {
  const { chosen, report } = place.stage;
  const body = chosen === null ? emptyAnswer(place) : chosenAnswer(place, chosen);
  const tone = chosen === null ? (report.counts.undecided > 0 ? 'open' : 'bad') : outcomeTone(chosen.judged.outcome);
  return section(place, 'answer', html`<div class="answer ${tone}">
${body}
${labelled('Cautions', cautionsOfAnswer(place), 'caution-list')}
${labelled('Confirm before release', confirmations(chosen), '')}
${undecidedBlock(place)}
</div>`);
}

function chosenAnswer(place: Place, chosen: ChosenPart): Html {
  const about = aboutPart(chosen.judged.part);
  return html`<p class="verdict">${foreign(chosen.judged.part.id)} <span class="${outcomeTone(chosen.judged.outcome)}"><span class="w">${outcomeWords(chosen.judged.outcome)}</span></span>${chosen.withdrawn === undefined ? '' : html`, <span class="w">withdrawn since</span>`}</p>
<p class="soft">${chosenBy(place.stage, chosen)}${about === '' ? '' : html` ${foreign(about)}.`}</p>
${listOf(reasons(place, chosen).map(prose))}`;
}

/** Three lines: what the checks say, where it is tightest, why it and not another. */
function reasons(place: Place, chosen: ChosenPart): string[] {
  const { report } = place.stage;
  return [checksLine(chosen), tightestLine(place, chosen), orderLine(place, chosen) ?? countsLine(report)];
}

function tightestLine({ stage }: Place, { judged }: ChosenPart): string {
  const verdict = tightestVerdict(stage.report, judged);
  if (verdict === null) return judged.outcome === 'fits' ? 'No check has a margin to compare.' : 'What is short or open stands in the table of margins.';
  const corner = verdict.worstAt === null ? '' : ` ${cornerText(verdict.worstAt)}`;
  return `Tightest: ${checkWords(verdict.check)} ${comparisonText(verdict)}, ${spareText(verdict)}${corner}.`;
}

function orderLine(place: Place, { rank, judged }: ChosenPart): string | null {
  const { report } = place.stage;
  if (rank === 1 && report.fit[0]?.part.id === judged.part.id && report.ahead !== null) return sentence(aheadLines(report, pageStyle(place.review)));
  return rank === null ? null : `Place ${rank} of ${counted(report.fit.length, 'line')} in the shortlist. ${countsLine(report)}`;
}

function emptyAnswer(place: Place): Html {
  const { report } = place.stage;
  const style = pageStyle(place.review);
  const open = report.counts.undecided > 0;
  return html`<p class="verdict"><span class="w">${open ? '? no part is proven to fit' : '✕ no part fits'}</span></p>
${emptyReason(report, style).map((line) => paragraphOf(line))}
${paragraphOf(countsLine(report))}`;
}

/** All cautions that hold for the answer, wherever else they stand. */
export function cautionsOfAnswer({ stage }: Pick<Place, 'stage'>): string[] {
  const { chosen, report } = stage;
  const ofChosen = chosen === null ? [] : [...cautionsOf(chosen.judged), ...chosen.judged.verdicts.flatMap((verdict) => verdict.cautions.map((caution) => `${checkWords(verdict.check)}: ${caution}`))];
  const assumed = report.asking.assumed.map((wish) => `figure assumed for this review only: ${wish}`);
  const gone = chosen?.withdrawn === undefined ? [] : [`${chosen.judged.part.id} ${chosen.withdrawn}; it is shown as it was last and stands outside the shortlist`];
  return [...gone, ...report.stage.cautions, ...ofChosen, ...assumed].map((text) => glued(safeLine(text)));
}

/** How many cautions stand in the answer box. */
export const cautionCount = (place: Place): number => cautionsOfAnswer(place).length;

const confirmations = (chosen: ChosenPart | null): string[] => (chosen?.judged.outcome === 'fits' ? chosen.judged.confirm.map(confirmationInFull) : []);

function labelled(title: string, items: readonly string[], kind: string): Html {
  return items.length === 0 ? html`` : html`<p><b>${title}</b></p>${listOf(items.map(prose), kind)}`;
}

const OPEN_SHOWN = 5;

function undecidedBlock(place: Place): Html {
  const { chosen, report } = place.stage;
  const others = report.undecided.filter((one) => one.part.id !== chosen?.judged.part.id);
  const own = chosen?.judged.verdicts.filter((verdict) => verdict.outcome === 'unknown').map((verdict) => unknownText([verdict])) ?? [];
  const items = others.slice(0, OPEN_SHOWN).map((one) => `${partName(one.part)}${one.likely ? ', likely to fit' : ''}: ${one.verdicts.filter((verdict) => verdict.outcome === 'unknown').map((verdict) => unknownText([verdict])).join('; ')}`);
  const rest = others.length - items.length;
  const more = rest > 0 ? html`<p><a href="#${idOf(place, 'undecided')}">All ${others.length} that cannot be decided</a></p>` : '';
  return html`${labelled('Open for the chosen part', own, '')}${labelled('Cannot be decided', items, '')}${more}`;
}
