import { safeLine } from '../../safe-text.js';
import { glued } from '../../spelling.js';
import { checkWords } from '../../words.js';
import { words } from '../cell.js';
import { html, type Html } from '../html.js';
import { tableOf } from '../table.js';
import { idOf, listOf, paragraphOf, section, type Place } from './ids.js';

const RULES = [
  'Extreme value for every limit: all terms worst at once, at every corner of supply, reference, signal and resistor values.',
  'Root-sum-square only for noise, where the sources are independent; beside the DC error it is shown for scale and decides nothing.',
  'No Monte Carlo. The three answer different questions and never stand in one column.',
  'Every check is judged on a pessimistic and on an optimistic reading of its figures. Both pass: pass. Both fail: fail. Otherwise it is open, with the value at which it turns.',
  'A limit counts as printed, a typical figure only after a derating. Unknown is never a pass.',
  'Order of what fits: desirability of Derringer and Suich (Journal of Quality Technology 12(4), 1980) of margins, price and supply current on fixed scales.',
];

/** How it is judged, and from which source each relation is. */
export function methodSection(place: Place): Html {
  const rows = place.stage.report.demands.map(({ check, source }) => ({ id: idOf(place, 'method', check), cells: [words(checkWords(check)), words(glued(safeLine(source)))] }));
  return section(place, 'method', html`${listOf(RULES)}
${tableOf({ id: idOf(place, 'methods'), caption: 'Relation behind each check, with its source', columns: [{ title: 'Check' }, { title: 'Relation and source', kind: 'sentence' }], rows })}
${paragraphOf('"From memory" means that author, title and year are cited without a printed copy at hand. Marks M1, M2, … are those of "railfit help physics".')}`);
}
