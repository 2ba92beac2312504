import type { AnyDemand } from '../demands/index.js';
import type { CountedChange, NothingFits } from '../explanation/index.js';
import type { Report } from '../report.js';
import type { Stage } from '../stage/index.js';
import { amount, checkAmount } from './amounts.js';
import { changeCommand, optionLines } from './changes-text.js';
import { displayWidth, padded, paragraph } from './layout.js';
import { safeLine } from './safe-text.js';
import { inputUnit } from './input-words.js';
import { GLUE, glued, spelled } from './spelling.js';
import { isNarrow, type CommandContext, type Style } from './style.js';
import { comparisonText } from './verdict-words.js';
import { checkWords, counted } from './words.js';

/** Which limits together rule everything out, and the nearest part behind them. */
export function conflictLines(report: Report, style: Style): string[] {
  const conflict = report.nothingFits?.conflict ?? null;
  if (conflict === null) return [];
  const { blamed, nearest } = conflict;
  const all = report.counts.undecided === 0 ? 'every part' : `all ${report.counts.rejected} parts that do not fit`;
  const title = blamed.length === 1 ? `One demand by itself rules out ${all}:` : `These ${blamed.length} demands together rule out ${all}; without any one of them some would be left:`;
  const rows = blamed.map(({ check, leaves, alone }) => ({ what: demandText(report, check), leaves: leavesText({ leaves, alone, only: blamed.length === 1 }) }));
  return [
    ...paragraph(title, style),
    ...demandRows(rows, style),
    ...(nearest === null ? [] : paragraph(nearestText(nearest, blamed.length), style, { lead: '  ' })),
  ];
}

function demandRows(rows: readonly { readonly what: string; readonly leaves: string }[], style: Style): string[] {
  const widest = Math.max(...rows.map(({ what }) => displayWidth(spelled(what, style))));
  const abreast = !isNarrow(style) && widest + 30 <= style.width;
  return rows.flatMap(({ what, leaves }) => paragraph(`${abreast ? padded(spelled(what, style), widest).replaceAll(' ', GLUE) : what}${GLUE} ${leaves}`, style, { lead: '  ', indent: 6 }));
}

function demandText({ demands }: Report, check: string): string {
  const demand = demands.find((one) => one.check === check);
  const words = checkWords(check);
  if (demand === undefined) return words;
  if (Array.isArray(demand.required)) return `${words} ${demand.required.map((word: string) => safeLine(word)).join(' or ')}`;
  return `${words}${ROOM.has(check) ? roomText(demand) : limitText(demand)}`;
}

function limitText({ check, required, sense, unit }: AnyDemand): string {
  if (typeof required !== 'number' || unit === null) return '';
  return ` ${sense === 'at-least' ? '≥' : '≤'}${GLUE}${checkAmount({ check, unit }, required)}`;
}

/** Checks that compare with the room a stage leaves. */
const ROOM: ReadonlySet<string> = new Set(['input-low', 'input-high', 'output-low', 'output-high']);

const roomText = ({ required }: AnyDemand): string => (typeof required === 'number' ? `, where the stage leaves ${amount(required, 'V')}` : '');

function leavesText({ leaves, alone, only }: { readonly leaves: number; readonly alone: number; readonly only: boolean }): string {
  const others = alone === 0 ? 'no part fails nothing else' : `${counted(alone, 'part')} ${alone === 1 ? 'fails' : 'fail'} nothing else`;
  return only ? others : `alone leaves ${counted(leaves, 'part')}; ${others}`;
}

function nearestText({ check, part, among, verdict }: NonNullable<NonNullable<NothingFits['conflict']>['nearest']>, blamed: number): string {
  const who = blamed === 1 ? `Of ${counted(among, 'part')}` : `Of the ${counted(among, 'part')} that the ${blamed === 2 ? 'other leaves' : 'others leave'}`;
  return `${who}, ${safeLine(part)} comes nearest on ${checkWords(check)}: ${comparisonText(verdict)}.`;
}

/** The smallest changes that let parts in, each with what it lets in and as a command. */
export function waysOutLines(report: Report, style: Style, context: CommandContext): string[] {
  const { nothingFits, stage } = report;
  if (nothingFits === null) return [];
  const { changes } = nothingFits;
  if (changes.length === 0) return paragraph('Smallest changes: none of up to three inputs that may move lets a part in. mayChange in the stage names what may move.', style);
  return [
    ...paragraph('Smallest changes that let parts in (each judged again in full; figures rounded to the safe side):', style),
    ...changes.flatMap((change, at) => [
      ...optionLines(change, `  ${at + 1}  `, style),
      ...paragraph(letsText(change, stage), style, { lead: ' '.repeat(5), indent: 7 }),
      ...changeCommand(change, { command: ['shortlist'], context }, style),
    ]),
    ...paragraph(`${isSwing(changes[0]) ? 'Giving up swing first, then by the largest single factor.' : 'Sorted by the largest single factor.'} mayChange in the stage names what may move.`, style, { lead: '  ' }),
  ];
}

const isSwing = (change: CountedChange | undefined): boolean => change?.moves.length === 1 && change.moves[0]?.path === 'limits.swingLoss';

function letsText(change: CountedChange, stage: Stage): string {
  const given = inputLoss(change, stage);
  return `${given === null ? '' : `${given} at the input; `}lets in ${counted(change.lets, 'part')}, first ${safeLine(change.first)}`;
}

/** A swing that is given up, at the input of the stage; null where it has none, or several. */
function inputLoss({ moves }: CountedChange, stage: Stage): string | null {
  const loss = moves.find(({ path }) => path === 'limits.swingLoss')?.value;
  const slope = slopeOf(stage);
  return loss === undefined || loss === null || slope === null ? null : amount(loss / slope.perUnit, slope.unit, { digits: 2, round: 'up' });
}

/** What the one input of a stage does to its output at nominal values, per V or A; the middle of the resistors' corners. */
function slopeOf({ vertices, outputNominal }: Stage): { readonly perUnit: number; readonly unit: string } | null {
  const names = Object.keys(vertices[0]?.inputs ?? {}).filter((name) => name !== 'bus');
  const [name] = names;
  if (name === undefined || names.length !== 1 || name === 'level' || name === 'elapsed') return null;
  const values = vertices.map(({ inputs }) => inputs[name] ?? 0);
  const span = Math.max(...values) - Math.min(...values);
  const perUnit = (outputNominal.max - outputNominal.min) / span;
  return Number.isFinite(perUnit) && perUnit > 0 ? { perUnit, unit: inputUnit(name) } : null;
}

/** ` Give up the lowest 20 mV, 40 mA at the input, and 5 parts fit.`: what giving up swing at that rail does; empty where it was not found to help. */
export function givingUp({ nothingFits, stage }: Report, end: 'lowest' | 'highest'): string {
  const told = (nothingFits?.changes ?? []).filter(({ moves }) => moves.length === 1 && moves[0]?.path === 'limits.swingLoss');
  const texts = told.map((change, at) => {
    const here = inputLoss(change, stage);
    const volts = glued(safeLine(change.moves[0]?.text ?? ''));
    return `${at === 0 ? `Give up the ${end} ` : ''}${volts}${here === null ? '' : `, ${here} at the input,`} and ${counted(change.lets, 'part')} ${change.lets === 1 ? 'fits' : 'fit'}`;
  });
  return texts.length === 0 ? '' : ` ${texts.join('; ')}.`;
}
