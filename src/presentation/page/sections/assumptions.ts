import { DERATING_WORDS } from '../derating-words.js';
import { confirmationInFull } from '../../confirm-text.js';
import { safeLine } from '../../safe-text.js';
import { glued } from '../../spelling.js';
import { html, prose, type Html } from '../html.js';
import { listOf, paragraphOf, section, subheading, type Place } from './ids.js';

/** What the answer takes for granted: of the stage, of the figures, of this run, and what is not modelled at all. */
export function assumptionsSection(place: Place): Html {
  const { chosen, report } = place.stage;
  const { asking, stage } = report;
  const ofStage = [...stage.assumptions, ...(asking.strict ? ['only limits count (strict)'] : []), ...asking.assumed.map((wish) => `for this run ${wish}`)].map((text) => prose(glued(safeLine(text))));
  const figures = chosen?.judged.confirm.map((one) => prose(confirmationInFull(one))) ?? [];
  return section(place, 'assumptions', html`${subheading(place, 'Of the stage')}
${ofStage.length === 0 ? paragraphOf('None: every field was written.') : listOf(ofStage)}
${subheading(place, 'Figures that are no limits')}
${figures.length === 0 ? paragraphOf('None: every figure the answer rests on is a limit.') : listOf(figures)}
${paragraphOf(DERATING_WORDS)}
${subheading(place, 'Not modelled')}
${paragraphOf('Layout and parasitics that are not written down, electromagnetic interference, long-term drift and ageing, self-heating of the offset, resistors that change with temperature or voltage.')}`);
}
