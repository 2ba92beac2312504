import type { Verdict } from '../../../verdicts/verdict.js';
import { compared } from '../../amounts.js';
import { safeLine } from '../../safe-text.js';
import { glued } from '../../spelling.js';
import { cornerText, unknownText } from '../../verdict-words.js';
import { formatPercent } from '../../../quantities/format.js';
import { BASIS_WORDS } from '../../words.js';
import { EMPTY, figure, marked, quoted, words, type Cell } from '../cell.js';
import { foreign, html, prose, type Html } from '../html.js';
import { tableOf, type PageRow } from '../table.js';
import { idOf, listOf, paragraphOf, section, type Place } from './ids.js';
import { madeOfTable } from './made-of.js';
import { checkCell, checkTone } from './outcome.js';

/** Every check of the chosen part: value, limit, spare in units and percent, corner; then what each value is made of. */
export function marginsSection(place: Place): Html {
  const { chosen } = place.stage;
  if (chosen === null) return section(place, 'margins', paragraphOf('No part fits, so there are no margins to show. What the nearest parts are short by stands under "What does not fit".'));
  const { judged } = chosen;
  const verdicts = judged.verdicts;
  return section(place, 'margins', html`<p>Worst case of ${foreign(judged.part.id)}: every figure at its limit, all terms worst at once, at the corner that is worst for the check. A typical figure counts only after its derating, and is marked.</p>
${tableOf({
    id: idOf(place, 'checks'),
    caption: `Margins of ${safeLine(judged.part.id)}`,
    columns: [{ title: 'Check' }, { title: 'Verdict' }, { title: 'Part', kind: 'number' }, { title: 'Must be' }, { title: 'Limit', kind: 'number' }, { title: 'Spare', kind: 'number' }, { title: 'Spare of the limit', kind: 'number' }, { title: 'Rests on' }, { title: 'Worst case', kind: 'sentence' }],
    rows: verdicts.map((verdict) => marginRow(place, verdict)),
  })}
${notes(place, verdicts)}
${madeOfTable(place, judged)}`);
}

function marginRow(place: Place, verdict: Verdict): PageRow {
  const numbers = compared(verdict);
  const { spare, required, unit, check } = verdict;
  const sign = spare !== null && spare < 0 ? '-' : '';
  const percent = spare === null || typeof required !== 'number' || required <= 0 || unit === null || NO_SHARE.has(unit) ? null : spare / required;
  return {
    id: idOf(place, 'check', check),
    tone: checkTone(verdict.outcome),
    cells: [
      words(verdict.title),
      checkCell(verdict.outcome),
      numbers === null ? wordOf(verdict.offered) : figure(numbers.offered, typeof verdict.offered === 'number' ? verdict.offered : verdict.known),
      words(verdict.sense === null ? '' : { 'at-least': 'at least', 'at-most': 'at most', 'one-of': 'one of' }[verdict.sense]),
      numbers === null ? wordOf(required) : figure(numbers.required, typeof required === 'number' ? required : null),
      numbers === null || spare === null ? EMPTY : figure(spare === 0 ? 'none' : `${sign}${numbers.difference}`, spare),
      percent === null ? EMPTY : figure(percentText(percent), percent),
      words(restsOn(verdict)),
      words(verdict.worstAt === null ? '' : cornerText(verdict.worstAt)),
    ],
  };
}

/** A share of a temperature or of a level in decibels says nothing. */
const NO_SHARE: ReadonlySet<string> = new Set(['°C', 'dB', '1']);

/** Rounded to the safe side. */
const percentText = (fraction: number): string => formatPercent(fraction, { digits: 2, round: 'down' }).replace(' ', '\u00a0');

function wordOf(value: Verdict['required'] | Verdict['offered']): Cell {
  if (value === null) return words('not known');
  return typeof value === 'number' ? figure(String(value), value) : quoted(typeof value === 'string' ? value : value.join(' or '));
}

function restsOn({ outcome, standsOn, basis }: Verdict): string {
  const stands = basis ?? standsOn;
  if (stands === null) return outcome === 'unknown' ? 'not known' : '';
  return stands === 'guaranteed' ? 'limit' : BASIS_WORDS[stands];
}

/** What stands beside the numbers: cautions, why a check is open, the same said otherwise. */
function notes(place: Place, verdicts: readonly Verdict[]): Html {
  const items = verdicts.flatMap((verdict) => [
    ...(verdict.outcome === 'unknown' ? [marked(html`${prose(`${verdict.title}: ${unknownText([verdict])}`)}`, '').shown] : []),
    ...verdict.cautions.map((caution) => html`<span class="caution">Caution, ${verdict.title}: ${prose(glued(safeLine(caution)))}</span>`),
    ...(verdict.notes ?? []).map((note) => html`${verdict.title}: ${prose(glued(safeLine(note)))}`),
  ]);
  return listOf(items);
}
