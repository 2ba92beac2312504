import type { Figure } from '../figure.js';
import { drawn, figuresOf } from '../figures.js';
import { foreign, html, prose, type Html } from '../html.js';
import type { ReviewedStage } from '../review.js';
import { csvLink, tableOf } from '../table.js';
import { figure, words } from '../cell.js';
import { idOf, section, type Place } from './ids.js';

/** The plots, each with its finding in one sentence and the same data as a table and as CSV. Nothing without any. */
export function plotsSection(place: Place): Html {
  return place.plots.length === 0 ? html`` : section(place, 'plots', place.plots.map((one) => figureBlock(place, one)));
}

/** Every plot that the stage has numbers for, drawn. */
export const plotsOfStage = (stage: ReviewedStage): readonly Figure[] => figuresOf({
  report: stage.report,
  chosen: stage.chosen?.judged ?? null,
  ...(stage.prediction === null ? {} : { prediction: stage.prediction }),
  ...(stage.sweep === null ? {} : { sweep: stage.sweep }),
});

function figureBlock(place: Place, { id, title, finding, svg, table, csv }: Figure): Html {
  const own = idOf(place, 'plot', id);
  return html`<figure id="${own}" aria-labelledby="${own}-title">
<figcaption id="${own}-title"><b>${prose(title)}</b> ${isolated(finding)}</figcaption>
<div class="scroll" role="group" tabindex="0" aria-labelledby="${own}-title">${drawn(svg)}</div>
<details><summary>Data of this figure</summary>
${tableOf({
    id: `${own}-data`,
    caption: title,
    columns: table.columns.map((name, at) => (at === 0 ? { title: name || 'What' } : { title: name, kind: 'number' })),
    rows: table.rows.map((row, at) => ({ id: `${own}-${at + 1}`, cells: row.map((text, column) => (column === 0 ? words(text) : figure(text, null))) })),
  }, { csv: false })}
${csvLink(own, title, csv)}
</details>
</figure>
`;
}

/** Names between U+2068 and U+2069 (first strong isolate, and its end) become elements that isolate. */
function isolated(text: string): Html {
  return html`${text.split(/(\u2068[^\u2069]*\u2069)/u).map((piece) => (piece.startsWith('\u2068') ? foreign(piece.slice(1, -1)) : html`${prose(piece)}`))}`;
}
