import type { Figure } from '../../../parts/figures.js';
import { figureSlot, PARAMETERS } from '../../../parts/figures.js';
import type { Origin, Part } from '../../../parts/part.js';
import { figureAmount } from '../../amounts.js';
import { conditionText } from '../../condition-text.js';
import { figureWords, KIND_WORDS } from '../../words.js';
import { figure, quoted, words, type Cell } from '../cell.js';
import { foreign, html, type Html } from '../html.js';
import { tableOf, type PageRow } from '../table.js';
import { idOf, listOf, paragraphOf, section, type Place } from './ids.js';

/** Every figure of the chosen part with the cell it stands in, and the files behind what is shown. */
export function sourcesSection(place: Place): Html {
  const { chosen, report } = place.stage;
  const { catalog, rules } = report.data;
  const part = chosen?.judged.part ?? null;
  return section(place, 'sources', html`<p>Catalog of ${catalog.parts} parts (${catalog.approved} approved, ${catalog.generic} generic), SHA-256 <code>${catalog.sha256}</code>, rules ${rules}.</p>
${listOf(files(place).map(([file, hash]) => html`Approved list ${foreign(file)}, SHA-256 <code>${hash}</code>`))}
${part === null ? paragraphOf('No part is chosen, so no figure is traced here; "railfit part ID --sources" traces those of any part.') : figureTable(place, part)}`);
}

/** The list files that the figures of the listed parts came from. */
function files({ review, stage: { report, chosen } }: Place): (readonly [string, string])[] {
  const listed = [...(chosen === null ? [] : [chosen.judged]), ...report.fit.slice(0, review.top), ...report.undecided.slice(0, review.top), ...report.nearest];
  const found = new Map<string, string>();
  for (const { part } of listed) {
    const [first] = part.figures;
    const origin = first === undefined ? null : report.origin(part.id, figureSlot(first));
    if (origin?.kind === 'cell') found.set(origin.sha256, origin.file);
  }
  return [...found].map(([hash, file]) => [file, hash]);
}

function figureTable(place: Place, part: Part): Html {
  return tableOf({
    id: idOf(place, 'figures'),
    caption: 'Where each figure of the chosen part came from',
    columns: [{ title: 'Figure' }, { title: 'Kind' }, { title: 'Value', kind: 'number' }, { title: 'Condition' }, { title: 'Source' }, { title: 'Row' }, { title: 'Column' }, { title: 'Header' }, { title: 'Cell as written' }],
    rows: part.figures.map((one) => rowOf(place, part, one)),
  });
}

function rowOf(place: Place, part: Part, one: Figure): PageRow {
  const slot = figureSlot(one);
  const { unit } = PARAMETERS[one.parameter];
  return {
    id: idOf(place, 'figure', slot),
    cells: [words(figureWords(one.parameter)), words(one.assumed === true ? 'assumed' : KIND_WORDS[one.kind]), figure(figureAmount(one.parameter, { value: one.value, unit }), one.value), words(conditionText(one.condition)), ...originCells(place.stage.report.origin(part.id, slot))],
  };
}

function originCells(origin: Origin | null): Cell[] {
  const none = words('');
  if (origin === null) return [words('not kept'), none, none, none, none];
  if (origin.kind === 'cell') return [quoted(origin.file), words(String(origin.row)), words(origin.columnLetter), quoted(origin.header), quoted(origin.cell)];
  if (origin.kind === 'generic') return [quoted(`generic set ${origin.id}`), none, none, quoted(origin.header), quoted(origin.cell)];
  return [quoted(origin.kind === 'class' ? `class ${origin.class}` : `assumed: ${origin.text}`), none, none, none, none];
}
