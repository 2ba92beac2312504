import type { SweptPoint, SweptState, SweptTurn } from '../explanation/index.js';
import { formatPercent } from '../quantities/format.js';
import type { SweepOver, SweepReport } from '../report.js';
import { dataLine } from './data-text.js';
import { labelled, paragraph } from './layout.js';
import { safeLine } from './safe-text.js';
import { finished, glued, held } from './spelling.js';
import { assumptionLines, stageCautions, stageInShort } from './stage-text.js';
import type { Style } from './style.js';
import { sweptAmount, sweptTexts, turnAmount } from './sweep-amounts.js';
import { tableLines } from './table.js';
import { counted } from './words.js';

/** What the values of one field cost: how many parts fit at each, which comes first, and the values at which that turns. */
export function renderSweep(report: SweepReport, style: Style): string {
  const { stage, asking } = report;
  const assumed = [...(stage?.assumptions ?? []), ...(asking.strict ? ['only limits count (strict)'] : []), ...asking.assumed.map((wish) => `for this run ${wish}`)];
  const blocks = [
    [...labelled('Sweep', sweptWords(report), style), ...(stage === null ? [] : [...labelled('Stage', stageInShort(stage), style), ...stageCautions(stage, style)])],
    pointLines(report, style),
    turnLines(report, style),
    [...assumptionLines(assumed, style), ...dataLine(report.data, style)],
  ];
  return finished(blocks.flatMap((block) => (block.length === 0 ? [] : [...block, ''])), style);
}

function sweptWords({ over, points }: SweepReport): string {
  const [from, to] = [over.from, over.to].map((end) => sweptAmount(over, end, { digits: 4 }));
  const spacing = over.scale === 'log' ? 'in even ratios' : 'in even steps';
  return [`${over.path} from ${from ?? ''} to ${to ?? ''}, ${counted(points.length, 'value')} ${spacing}`, keptWords(over)].filter((words) => words !== '').join('; ');
}

/** What becomes of the ends the field has in the stage. */
function keptWords(over: SweepOver): string {
  const { keeps } = over;
  if (keeps.kind === 'lower-end') return `each value is the upper end, the lower one stays at ${sweptAmount(over, keeps.lower, { digits: 4 })}`;
  if (keeps.kind === 'nothing') return keeps.replaced === null ? '' : `each value stands still, in place of ${glued(safeLine(keeps.replaced))}`;
  const [above, below] = [keeps.above, keeps.below].map((fraction) => formatPercent(fraction));
  return `each value with the tolerance of the stage, ${above === below ? held(`± ${above ?? ''}`) : held(`+${above ?? ''} -${below ?? ''}`)}`;
}

const CELLS = 16;

function pointLines(report: SweepReport, style: Style): string[] {
  const texts = sweptTexts(report);
  const most = Math.max(1, ...report.points.map(({ state }) => fitOf(state)));
  const columns = [
    { title: report.over.path.split('.').at(-1) ?? '', align: 'right', key: true },
    { title: 'fit', align: 'right', name: 'fit' },
    { title: 'open', align: 'right', name: 'cannot be decided' },
    { title: 'out', align: 'right', name: 'do not fit' },
    { title: '', name: '' },
    { title: 'First choice', name: 'first choice', wraps: true },
  ] as const;
  return tableLines({ columns, rows: report.points.map((point, at) => rowOf(point, texts[at] ?? '', most)) }, style);
}

const fitOf = (state: SweptState): number => ('contradiction' in state ? 0 : state.counts.fit);

function rowOf({ state }: SweptPoint, value: string, most: number): string[] {
  if ('contradiction' in state) return [value, '-', '-', '-', '', `no such stage: ${glued(safeLine(state.contradiction))}`];
  const { fit, undecided, rejected } = state.counts;
  // One part is never nothing.
  return [value, String(fit), String(undecided), String(rejected), '#'.repeat(Math.ceil((CELLS * fit) / most)), state.first === null ? 'none fits' : safeLine(state.first)];
}

function turnLines({ over, turns, points, turnsOf }: SweepReport, style: Style): string[] {
  if (turnsOf === 'first') {
    const many = paragraph('How many fit changes at more values than anybody reads; where the first choice turns is told.', style);
    return turns.length === 0 ? paragraph('How many fit changes at more values than anybody reads; the first choice stays.', style) : [...many, ...toldTurns({ over, turns }, style)];
  }
  if (turns.length === 0) return points.length < 2 ? [] : paragraph('Neither how many fit nor the first choice turns between these values.', style);
  return toldTurns({ over, turns }, style);
}

function toldTurns({ over, turns }: Pick<SweepReport, 'over' | 'turns'>, style: Style): string[] {
  return ['Turns', ...turns.flatMap((turn) => paragraph(`from ${turnAmount(over, turn.at)} on: ${turnWords(turn)}`, style, { lead: '  ', indent: 6 }))];
}

function turnWords({ from, to, gained, lost }: SweptTurn): string {
  if ('contradiction' in to) return `no such stage: ${glued(safeLine(to.contradiction))}`;
  const before = 'contradiction' in from ? null : from;
  const counts = before === null ? `a stage again; ${to.counts.fit} fit` : before.counts.fit === to.counts.fit ? `${to.counts.fit} fit as before` : `${to.counts.fit} fit instead of ${before.counts.fit}`;
  return [counts, ...moved(before === null ? [] : gained, 'in'), ...moved(before === null ? [] : lost, 'out'), ...firstWords(before?.first ?? null, to.first)].join('; ');
}

/** So many ids are named; the rest is counted. */
const NAMED = 3;

function moved(ids: readonly string[], where: 'in' | 'out'): string[] {
  if (ids.length === 0) return [];
  const rest = ids.length - NAMED;
  return [`${where}: ${ids.slice(0, NAMED).map(safeLine).join(', ')}${rest > 0 ? ` and ${rest} more` : ''}`];
}

function firstWords(before: string | null, after: string | null): string[] {
  if (before === after) return [];
  if (after === null) return ['none fits any more'];
  return [`first choice ${safeLine(after)}${before === null ? '' : ` instead of ${safeLine(before)}`}`];
}
