import { amount, checkAmount, range } from '../../amounts.js';
import { safeLine } from '../../safe-text.js';
import { glued } from '../../spelling.js';
import { askedOf, circuitOf, loadOf } from '../../stage-text.js';
import { checkWords } from '../../words.js';
import type { AnyDemand } from '../../../demands/index.js';
import { figure, marked, words } from '../cell.js';
import { drawn, schematicSvg } from '../figures.js';
import { foreign, html, prose, type Html } from '../html.js';
import { tableOf } from '../table.js';
import { idOf, listOf, section, type Place } from './ids.js';

/** The stage as it was understood: drawn, with its values, and what it asks of any amplifier. */
export function stageSection(place: Place): Html {
  const { stage } = place.stage.report;
  const cautions = stage.cautions.map((text) => html`<span class="caution">Caution: ${prose(glued(safeLine(text)))}</span>`);
  return section(place, 'stage', html`${drawing(place)}
${values(place)}
${listOf(cautions)}
${demandTable(place)}`);
}

function drawing(place: Place): Html {
  const { stage } = place.stage.report;
  const svg = schematicSvg(stage, place.review.symbols);
  const rules = place.review.symbols === 'iec' ? 'IEC 60617' : 'IEEE 315';
  return html`<figure id="${idOf(place, 'schematic')}" class="schematic">
<div class="scroll" role="group" tabindex="0" aria-label="Schematic">${drawn(svg)}</div>
<figcaption>Schematic of the ${stage.topology} stage with its values, symbols after ${rules}. Decoupling and layout are not drawn.</figcaption>
</figure>`;
}

function values(place: Place): Html {
  const { stage } = place.stage.report;
  const rows: (readonly [string, string | Html])[] = [
    ...(stage.name === null ? [] : [['Name', foreign(stage.name)] as const]),
    ['Circuit', circuitOf(stage).map((text) => prose(safeLine(text))).join(', ')],
    ['Signal gain', stage.gainUnit === null ? 'none: the stage oscillates' : prose(amount(stage.gain, stage.gainUnit))],
    ['Noise gain', prose(`${amount(stage.noiseGain.nominal, 'V/V')} (${range(stage.noiseGain.min, stage.noiseGain.max, 'V/V')} at the corners); at DC ${range(stage.dcNoiseGain.min, stage.dcNoiseGain.max, 'V/V')}`)],
    ['Supply', prose(`${range(stage.supply.min, stage.supply.max, 'V')} single, nominal ${amount(stage.supply.nominal, 'V')}, peak ${amount(stage.supplyPeak, 'V')}`)],
    ['Output', prose(`${range(stage.outputNominal.min, stage.outputNominal.max, 'V')} nominal, ${range(stage.output.min, stage.output.max, 'V')} over all corners`)],
    ['Amplifier inputs', prose(`${range(stage.commonMode.min, stage.commonMode.max, 'V')} over all corners`)],
    ['Load', prose(loadOf(stage.load))],
    ['Temperature', prose(range(stage.temperature.min, stage.temperature.max, '°C'))],
    ...resistors(place),
    ['Limits and wishes', askedOf(stage).map(prose).join(', ') || 'none written'],
  ];
  return html`<dl>${rows.map(([name, text]) => html`<dt>${name}</dt><dd>${text}</dd>`)}</dl>`;
}

function resistors({ stage: { report } }: Place): (readonly [string, string])[] {
  const { resistors: fitted } = report.stage;
  if (fitted === null) return [];
  const named = [['feedback', fitted.feedback], ['input', fitted.input], ['positive input', fitted.positiveInput], ['to reference', fitted.toReference]] as const;
  const shown = named.flatMap(([name, ohms]) => (ohms === undefined || !Number.isFinite(ohms) || ohms === 0 ? [] : [`${name} ${amount(ohms, 'Ω')}`]));
  return shown.length === 0 ? [] : [['Resistors', `${shown.join(', ')}, ${amount(fitted.tolerance * 100, '%')}`]];
}

/** What any amplifier must deliver here, with the figures it came from and the source of the relation. */
function demandTable(place: Place): Html {
  const rows = place.stage.report.demands.map((demand) => ({
    id: idOf(place, 'demand', demand.check),
    cells: [words(checkWords(demand.check)), words(senseOf(demand)), requiredOf(demand), words(glued(safeLine(demand.because)))],
  }));
  return tableOf({
    id: idOf(place, 'demands'),
    caption: 'What the stage asks of any amplifier',
    columns: [{ title: 'Check' }, { title: 'Must be' }, { title: 'Value', kind: 'number' }, { title: 'Because', kind: 'sentence' }],
    rows,
  });
}

const SENSES = { 'at-least': 'at least', 'at-most': 'at most', 'one-of': 'one of' } as const;
const senseOf = ({ sense }: AnyDemand): string => (sense === null ? '' : SENSES[sense]);

function requiredOf(demand: AnyDemand): ReturnType<typeof words> {
  const { required } = demand;
  if (typeof required === 'number') return figure(checkAmount(demand, required), required);
  if (required === null) return words('not built yet');
  const text = required.join(' or ');
  return marked(foreign(text), text);
}
