import { PARAMETERS } from '../parts/figures.js';
import type { Form, Prediction } from '../prediction/index.js';
import type { PredictionReport } from '../report.js';
import { amount, figureAmount } from './amounts.js';
import { commandOf, nextLines } from './commands.js';
import { dataLine } from './data-text.js';
import { labelled, paragraph } from './layout.js';
import { cellOf, QUANTITY_WORDS, quantitiesOf, reasonsOf, wantedCell } from './prediction-rows.js';
import { safeLine } from './safe-text.js';
import { finished, glued } from './spelling.js';
import { assumptionLines, stageCautions, stageInShort } from './stage-text.js';
import type { CommandContext, Style } from './style.js';
import { tableLines, type Column } from './table.js';
import { PARAMETER_WORDS } from './words.js';

/** One part (or two side by side) on one stage, simulated: typical and guaranteed worst, what was left out, what the model does not have. */
export function renderPrediction(report: PredictionReport, style: Style, context: CommandContext): string {
  const { prediction, compared, asking } = report;
  const { stage } = prediction;
  const all = [prediction, ...(compared === null ? [] : [compared])];
  const blocks = [
    [...paragraph(headline(all), style), ...paragraph(stageInShort(stage), style, { lead: 'Stage   ' }), ...stageCautions(stage, style)],
    table(all, style),
    ...all.map((one) => missingLines(one, { style, named: all.length > 1 })),
    ...all.map((one) => noteLines(one, { style, named: all.length > 1 })),
    figureLines(all, style),
    ['Limits of the model', ...prediction.limits.flatMap((sentence) => paragraph(glued(sentence), style, { lead: '  ', indent: 4 }))],
    [...assumptionLines([...stage.assumptions, ...(asking.strict ? ['only limits count (strict)'] : []), ...asking.assumed.map((wish) => `for this run ${wish}`)], style), ...dataLine(report.data, style)],
    nextLines([
      { words: commandOf(context, ['explain', prediction.part.id]), why: 'every check of this part' },
      { words: commandOf(context, ['predict', prediction.part.id], ['--csv']), why: 'the waveform as a table' },
    ], style),
  ];
  return finished(blocks.flatMap((block) => (block.length === 0 ? [] : [...block, ''])), style);
}

function headline(all: readonly Prediction[]): string {
  const names = all.map(({ part }) => `${safeLine(part.id)} (${part.tier === 'approved' ? 'approved list' : 'generic set'})`);
  return `${names.join(' and ')} in the stage, predicted, not judged.`;
}

function table(all: readonly Prediction[], style: Style): string[] {
  const [first] = all;
  if (first === undefined) return [];
  const named = all.length > 1;
  const forms = all.flatMap((one) => [{ one, form: one.typical, word: 'typical' }, { one, form: one.worst, word: 'worst' }]);
  const columns: Column[] = [
    { title: '', key: true },
    { title: 'asked', name: 'asked', moves: 1, align: 'right' },
    ...forms.map(({ one, word }): Column => ({ title: named ? `${safeLine(one.part.id)}\n${word}` : word === 'worst' ? 'guaranteed\nworst' : word, align: 'right' })),
  ];
  const quantities = [...new Set(all.flatMap(quantitiesOf))];
  const rows = quantities.map((quantity) => [QUANTITY_WORDS[quantity], wantedCell(quantity, first), ...forms.map(({ one, form }) => cellOf(quantity, form.results[quantity], one))]);
  return tableLines({ columns, rows }, style);
}

interface Told {
  readonly style: Style;
  /** Whether the part must be named. */
  readonly named: boolean;
}

function missingLines({ part, typical, worst }: Prediction, { style, named }: Told): string[] {
  const [one, other] = [reasonsOf(typical), reasonsOf(worst)];
  const both = one.filter((reason) => other.includes(reason));
  const lines = [...both, ...one.filter((reason) => !both.includes(reason)).map((reason) => `typical: ${reason}`), ...other.filter((reason) => !both.includes(reason)).map((reason) => `worst: ${reason}`)];
  const title = named ? `Not predicted of ${safeLine(part.id)}` : 'Not predicted';
  return lines.length === 0 ? [] : [title, ...lines.flatMap((line) => paragraph(glued(line), style, { lead: '  ', indent: 4 }))];
}

function noteLines({ part, typical, worst }: Prediction, { style, named }: Told): string[] {
  const both = typical.notes.filter((note) => worst.notes.includes(note));
  const own = (form: Form): string[] => form.notes.filter((note) => !both.includes(note));
  const name = named ? `${safeLine(part.id)}, ` : '';
  const told = (word: string, form: Form, more: readonly string[]): string[] =>
    paragraph(glued([`on ${amount(form.at.supply, 'V')}`, ...more].join('; ')), style, { lead: `  ${name}${word}: `, indent: 4 });
  return [...told('typical', typical, own(typical)), ...told('worst', worst, own(worst)), ...(both.length === 0 ? [] : paragraph(glued(both.join('; ')), style, { lead: `  ${name}both: `, indent: 4 }))];
}

/** The figures the model is made of. */
function figureLines(all: readonly Prediction[], style: Style): string[] {
  return all.flatMap(({ part, typical, worst }) =>
    ([['typical', typical], ['worst', worst]] as const).flatMap(([word, form]) => {
      const words = form.figures.map(({ parameter, value, how }) => `${PARAMETER_WORDS[parameter]} ${figureAmount(parameter, { value, unit: PARAMETERS[parameter].unit })}${how === null || how.endsWith('as printed') ? '' : ` (${how})`}`);
      return labelled('Figures', `${all.length > 1 ? `${safeLine(part.id)}, ` : ''}${word}: ${glued(words.join(', '))}`, style);
    }),
  );
}
