import type { Report } from '../report.js';
import type { JudgedPart } from '../screening/index.js';
import type { Stage, Vertex } from '../stage/index.js';
import { amount } from './amounts.js';
import { partName } from './fit-table.js';
import { paragraph } from './layout.js';
import { failingLine, failures } from './rejected-text.js';
import { safeLine } from './safe-text.js';
import type { Style } from './style.js';
import { givingUp } from './ways-out-text.js';
import { checkWords, counted } from './words.js';

/** Why nothing fits, as a practitioner would say it first. */
export function emptyReason(report: Report, style: Style): string[] {
  const rails = railReasons(report);
  return (rails.length > 0 ? rails : [commonReason(report)]).flatMap((sentence) => paragraph(sentence, style));
}

/** The nearest of those that are out, with what they are short by. */
export function nearestLines({ nearest, fit }: Report, style: Style): string[] {
  if (nearest.length === 0) return [];
  const title = fit.length === 0 ? 'Nearest to fitting:' : 'Nearest of those that do not fit:';
  return [...paragraph(title, style), ...nearest.flatMap((one) => failingLine(one, style))];
}

function commonReason({ counts, rejections, nearest }: Report): string {
  if (counts.parts === 0) return 'No part fits: the catalog is empty.';
  const out = rejections.map(({ check, parts }) => `${checkWords(check)} (${parts})`);
  const who = counts.undecided > 0 ? 'The others fail' : 'They fail';
  const rest = out.length > MOST ? ` and ${counted(out.length - MOST, 'more check')}` : '';
  const most = out.length === 0 ? '' : ` ${who} ${out.slice(0, MOST).join(', ')}${rest}.`;
  const first = nearest[0];
  const near = first === undefined ? '' : ` Nearest is ${partName(first.part)}: ${failures(first)}.`;
  const open = counts.undecided > 0 ? `No part is proven to fit; ${counts.undecided} of ${counted(counts.parts, 'part')} cannot be decided.` : `No part of ${counts.parts} fits.`;
  return `${open}${most}${near}`;
}

const MOST = 4;

/** Where the stage leaves an output stage no room at all, no catalog can help. */
function railReasons(report: Report): string[] {
  return (['output-low', 'output-high'] as const).flatMap((check) => {
    const demand = report.demands.find((one) => one.check === check);
    return typeof demand?.required === 'number' && demand.required <= 0 ? [railReason(report, check)] : [];
  });
}

function railReason(report: Report, check: 'output-low' | 'output-high'): string {
  const { stage } = report;
  const beyond = beyondRail(stage, check);
  if (beyond !== null) return beyondReason(beyond, check, stage);
  const reach = reachOf(report, check);
  const asked = check === 'output-low' ? lowest(stage) : highest(stage);
  const kept = stage.asked.margins.outputHeadroom;
  const margin = kept === undefined || kept.value === 0 ? '' : `, with ${amount(kept.value, 'V')} kept free`;
  const nearest = reach === null ? '' : reachSentence(reach);
  return `No amplifier on this supply reaches ${asked}${margin}: an output stage always keeps a little of the rail. limits.swingLoss may give up that end of the swing.${givingUp(report, check === 'output-low' ? 'lowest' : 'highest')}${nearest}`;
}

/** The worst corner, where the output asked for lies outside the supply itself; null where it lies inside. */
function beyondRail({ vertices }: Stage, check: 'output-low' | 'output-high'): Vertex | null {
  const room = (at: Vertex): number => (check === 'output-low' ? at.output : at.supply - at.output);
  const worst = vertices.reduce((best, next) => (room(next) < room(best) ? next : best));
  return room(worst) < -1e-9 * worst.supply ? worst : null;
}

function beyondReason({ supply, reference, output }: Vertex, check: 'output-low' | 'output-high', { topology }: Stage): string {
  const corner = [`supply ${amount(supply, 'V')}`, ...(reference === 0 ? [] : [`reference ${amount(reference, 'V')}`]), 'resistors at their ends'];
  const end = check === 'output-low' ? 'below ground' : 'above the supply';
  return `At the worst corner (${corner.join(', ')}) the output is asked to ${amount(output, 'V')}, ${end}: ${SHARED.has(topology) ? `tighten the tolerance of the resistors, for what both inputs share comes through them, or ${check === 'output-low' ? 'raise' : 'lower'} the reference` : 'lower the gain, tighten the tolerance, or let input and reference share one source'}.`;
}

/** Both inputs stand on a voltage of their own, which hardly falls with the gain. */
const SHARED: ReadonlySet<Stage['topology']> = new Set(['difference', 'high-side-sense']);

function lowest({ vertices }: Stage): string {
  const least = vertices.reduce((best, next) => (next.output < best.output ? next : best));
  return least.output < 0 ? `${amount(least.output, 'V')}, below V-` : amount(least.output, 'V');
}

function highest({ vertices }: Stage): string {
  const room = (at: Vertex): number => at.supply - at.output;
  const least = vertices.reduce((best, next) => (room(next) < room(best) ? next : best));
  return `${amount(least.output, 'V')} from a supply of ${amount(least.supply, 'V')}`;
}

function reachSentence({ part, needs, otherwise }: Reach): string {
  const among = otherwise ? 'Of the parts that fail nothing else,' : 'Of all parts,';
  return ` ${among} ${safeLine(part.part.id)} comes nearest: it needs ${amount(needs, 'V', { round: 'up' })} there.`;
}

interface Reach {
  readonly part: JudgedPart;
  readonly needs: number;
  /** Fails nothing but the ends of the output. */
  readonly otherwise: boolean;
}

/** The least head-room a part needs at that rail, on its worst reading; of those that fail nothing else where there are any. */
function reachOf({ rejected }: Report, check: string): Reach | null {
  const reaches = (parts: readonly JudgedPart[], otherwise: boolean): Reach[] => parts.flatMap((part): Reach[] => {
    const verdict = part.verdicts.find((one) => one.check === check);
    const values = [verdict?.offered, verdict?.offeredBest].filter((value) => typeof value === 'number');
    return values.length === 0 ? [] : [{ part, needs: Math.max(...values), otherwise }];
  });
  if (rejected.length > LONG) return null;
  const least = (found: readonly Reach[]): Reach | null => found.reduce<Reach | null>((best, next) => (best === null || next.needs < best.needs ? next : best), null);
  return least(reaches(rejected.filter(failsAtRails), true)) ?? least(reaches(rejected, false));
}

/** Of a longer list the parts are not gone through one by one: what lets one in was looked for already. */
const LONG = 20_000;

const RAILS: ReadonlySet<string> = new Set(['output-low', 'output-high']);

/** And nowhere else; known without judging it in words. */
const failsAtRails = ({ deciding }: JudgedPart): boolean => deciding.every((check) => RAILS.has(check));

/** What would have to be given up at the rails for a part that fails nothing else, V, rounded up; null when there is none. */
export function swingLossToTry(report: Report): number | null {
  if (report.rejected.length > LONG) return null;
  if (beyondRail(report.stage, 'output-low') !== null || beyondRail(report.stage, 'output-high') !== null) return null;
  const short = report.rejected.filter(failsAtRails).flatMap((part) => {
    const failing = part.verdicts.filter((one) => one.outcome === 'fail');
    const needs = failing.map(({ offered, offeredBest, required }) =>
      typeof offered === 'number' && typeof offeredBest === 'number' && typeof required === 'number' ? Math.max(offered, offeredBest) - required : null,
    );
    return needs.includes(null) ? [] : [Math.max(...needs.map(Number))];
  });
  return short.length === 0 ? null : (report.stage.asked.limits.swingLoss?.value ?? 0) + Math.min(...short);
}
