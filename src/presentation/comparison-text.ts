import type { ComparedCheck, ComparedPart } from '../explanation/index.js';
import { formatQuantity } from '../quantities/format.js';
import type { Comparison } from '../report.js';
import type { Verdict } from '../verdicts/verdict.js';
import { differenceText, meritText } from './ahead-text.js';
import { amount, compared, priceText } from './amounts.js';
import { commandOf, nextLines } from './commands.js';
import { dataLine } from './data-text.js';
import { aboutPart } from './fit-table.js';
import { cautionsOf } from './json.js';
import { labelled, paragraph } from './layout.js';
import { safeLine } from './safe-text.js';
import { finished, glued, GLUE } from './spelling.js';
import { stabilityText } from './stability-text.js';
import { assumptionLines, stageCautions, stageInShort } from './stage-text.js';
import type { CommandContext, Style } from './style.js';
import { tableLines } from './table.js';
import { missingText, shortfall, spareText } from './verdict-words.js';
import { counted, REASON_WORDS } from './words.js';

/** Two parts side by side: what decides between them, what they are, every check of both, what qualifies each. */
export function renderComparison(comparison: Comparison, style: Style, context: CommandContext): string {
  const { stage, parts, asking, data } = comparison;
  const assumed = [...stage.assumptions, ...(asking.strict ? ['only limits count (strict)'] : []), ...asking.assumed.map((wish) => `for this run ${wish}`)];
  const offers = parts.map(({ judged }) => ({ words: commandOf(context, ['explain', judged.part.id]), why: 'every term and its origin' }));
  const blocks = [
    [...paragraph(decisionText(comparison), style, { indent: 2 }), ...(firmness(comparison) === '' ? [] : paragraph(firmness(comparison), style, { lead: '  ' })), ...parts.flatMap((one, at) => partLines(one, at, style)), ...labelled('Stage', stageInShort(stage), style), ...stageCautions(stage, style)],
    aboutLines(comparison, style),
    checkLines(comparison, style),
    favourLines(comparison, style),
    parts.flatMap((one) => cautionLines(one, style)),
    [...assumptionLines(assumed, style), ...dataLine(data, style)],
    nextLines(offers, style),
  ];
  return finished(blocks.flatMap((block) => (block.length === 0 ? [] : [...block, ''])), style);
}

const idOf = ({ judged }: ComparedPart): string => safeLine(judged.part.id);

const OUTCOME_WORDS = { fits: 'fits', undecided: 'cannot be decided', 'does-not-fit': 'does not fit' } as const;

function decisionText({ parts, standing }: Comparison): string {
  const [one, other] = parts;
  if (standing.ahead === null) {
    const both = one.judged.outcome === 'undecided' ? 'can be decided' : 'fits';
    return `${idOf(one)} and ${idOf(other)}: neither ${both}, so neither has a place; each is told by its checks.`;
  }
  const [first, second] = standing.ahead === 0 ? parts : [other, one];
  if (standing.decidedBy === 'outcome') return `${idOf(first)} is ahead of ${idOf(second)}: it ${OUTCOME_WORDS[first.judged.outcome]}, the other ${OUTCOME_WORDS[second.judged.outcome]}.`;
  const places = first.rank === null || second.rank === null ? '' : first.rank === second.rank ? `, rank ${first.rank} on one line (one die)` : `, rank ${first.rank} against ${second.rank}`;
  return `${idOf(first)} is ahead of ${idOf(second)}${places}: ${stepText(standing.decidedBy ?? '', [first, second])}.`;
}

/** The step that decides, with both numbers. */
function stepText(step: string, [first, second]: readonly [ComparedPart, ComparedPart]): string {
  const against = (of: (one: ComparedPart) => string): string => `${of(first)} against ${of(second)}`;
  const words: Readonly<Record<string, string>> = {
    tier: 'it is on the approved list, the other is a generic set',
    proof: 'it rests on limits only, the other partly on figures that are not limits',
    merit: `merit ${meritText([first.merit?.total ?? 0, second.merit?.total ?? 0])}`,
    price: `price ${against(({ judged }) => priceText(judged.part.price) || 'not known')}`,
    current: `supply current ${against(({ judged }) => currentText(judged.current))}`,
    margin: 'its least margin is larger',
    estimates: `${against(({ judged }) => counted(judged.confirm.length, 'figure'))} to confirm`,
    id: 'equal in everything that counts; then by part number',
  };
  return words[step] ?? step;
}

const currentText = (current: number | null): string => (current === null ? 'not known' : amount(current, 'A'));

function firmness({ parts, standing }: Comparison): string {
  const { ahead, stability, dominated } = standing;
  if (ahead === null || stability === null) return '';
  const names = ahead === 0 ? ([idOf(parts[0]), idOf(parts[1])] as const) : ([idOf(parts[1]), idOf(parts[0])] as const);
  const beaten = dominated === null ? '' : ` ${idOf(parts[dominated])} is nowhere better than ${idOf(parts[dominated === 0 ? 1 : 0])} in margins, price or current; margins beyond comfort do not count.`;
  return stabilityText(stability, names) + beaten;
}

function aboutLines({ parts }: Comparison, style: Style): string[] {
  const [one, other] = parts;
  const row = (name: string, of: (part: ComparedPart) => string): string[] => [name, of(one), of(other)];
  const share = (name: 'margins' | 'price' | 'current') => ({ merit }: ComparedPart): string => (merit === null ? '' : formatQuantity(merit[name], '1'));
  const rows = [
    row('outcome', ({ judged, rank }) => `${OUTCOME_WORDS[judged.outcome]}${rank === null ? '' : `, rank ${rank}`}${judged.likely ? ', likely to fit' : ''}`),
    row('list', ({ judged }) => (judged.part.tier === 'approved' ? 'approved' : 'generic set')),
    row('proof', ({ judged }) => (judged.proof === null ? '' : judged.proof === 'limits' ? 'limits' : `typical, ${judged.confirm.length} to confirm`)),
    row('price', ({ judged }) => priceText(judged.part.price) || 'not known'),
    row('supply current', ({ judged }) => currentText(judged.current)),
    row('merit', ({ merit }) => (merit === null ? '' : formatQuantity(merit.total, '1'))),
    row('its share of margins', share('margins')),
    row('its share of price', share('price')),
    row('its share of current', share('current')),
  ];
  return tableLines({ columns: sideColumns('', [one, other]), rows: rows.filter((cells) => cells.slice(1).some((cell) => cell !== '')) }, style);
}

function partLines({ judged }: ComparedPart, at: number, style: Style): string[] {
  const about = aboutPart(judged.part);
  return labelled(at === 0 ? 'Parts' : '', `${safeLine(judged.part.id)}${about === '' ? '' : `: ${about}`}`, style);
}

const sideColumns = (title: string, parts: readonly [ComparedPart, ComparedPart]) => [{ title, key: true }, ...parts.map((part) => ({ title: idOf(part), name: `${idOf(part)}:` }))] as const;

function checkLines({ parts, standing }: Comparison, style: Style): string[] {
  const rows = standing.checks.map(({ title, verdicts, better }: ComparedCheck) => [title, ...verdicts.map((verdict, at) => `${cellOf(verdict)}${better === at ? `${GLUE}*` : ''}`)]);
  const marked = standing.checks.some(({ better }) => better !== null);
  return [...tableLines({ columns: sideColumns('Check', parts), rows }, style), ...(marked ? paragraph('* better of the two in this check', style, { lead: ' ' }) : [])];
}

/** Both numbers, then what is left or missing. */
function cellOf(verdict: Verdict | null): string {
  if (verdict === null) return 'not judged';
  const both = bothNumbers(verdict);
  if (verdict.outcome === 'pass') return joined(both, spareText(verdict));
  if (verdict.outcome === 'fail') return joined(`FAIL${GLUE}${both}`, shortfall(verdict));
  return joined(`?${GLUE}${both}`, verdict.reason === 'missing-figure' ? `${missingText(verdict)} unknown` : verdict.reason === null ? '' : REASON_WORDS[verdict.reason]);
}

/** `32.1 mV ≤ 35 mV` where it holds, `42 mV > 35 mV` where it does not, `36 mV against 35 mV` where that is open; nothing of words and counts. */
function bothNumbers(verdict: Verdict): string {
  const numbers = compared(verdict);
  if (numbers === null || verdict.check === 'channels') return '';
  const atLeast = verdict.sense === 'at-least';
  const sign = verdict.outcome === 'unknown' ? 'against' : verdict.outcome === 'pass' ? (atLeast ? '≥' : '≤') : atLeast ? '<' : '>';
  const bound = verdict.offered === null ? `at${GLUE}${atLeast ? 'most' : 'least'}${GLUE}` : '';
  return `${bound}${numbers.offered}${GLUE}${sign}${GLUE}${numbers.required}`;
}

const joined = (...words: readonly string[]): string => words.map((word) => (word.endsWith(GLUE) ? word.slice(0, -1) : word)).filter((word) => word !== '').join(', ');

/** What speaks for each, the one behind too. */
function favourLines({ parts, standing }: Comparison, style: Style): string[] {
  return ([0, 1] as const).flatMap((side) => {
    const words = [...savings(parts[side], parts[side === 0 ? 1 : 0]), ...standing.speaksFor[side].map((difference) => differenceText(difference, side, printedOf(standing.checks, difference.check)))];
    return words.length === 0 ? [] : paragraph(`In favour of ${idOf(parts[side])}: ${words.join(', ')}.`, style, { indent: 2 });
  });
}

/** The numbers of a check as its row in the table has them: the same figure reads the same. */
function printedOf(checks: readonly ComparedCheck[], wanted: string): readonly (string | null)[] {
  const verdicts = checks.find(({ check }) => check === wanted)?.verdicts ?? [];
  return verdicts.map((verdict) => (verdict?.offered == null ? null : (compared(verdict)?.offered ?? null)));
}

function savings({ judged: mine }: ComparedPart, { judged: other }: ComparedPart): string[] {
  const [price, theirs] = [mine.part.price, other.part.price];
  const cheaper = price !== null && price.currency === theirs?.currency ? theirs.amount - price.amount : 0;
  const less = (other.current ?? Number.NaN) - (mine.current ?? Number.NaN);
  return [...(cheaper > 0 && price !== null ? [`${amount(cheaper, price.currency)} cheaper`] : []), ...(less > 0 ? [`${amount(less, 'A')} less supply current`] : [])];
}

function cautionLines(one: ComparedPart, style: Style): string[] {
  const checks = one.judged.verdicts.flatMap(({ title, cautions }) => cautions.map((caution) => `${title}: ${caution}`));
  return [...cautionsOf(one.judged), ...checks].flatMap((caution) => paragraph(`${idOf(one)}: ${glued(safeLine(caution))}`, style, { lead: 'caution: ', indent: 9 }));
}
