import { figureSlot, PARAMETERS, type Parameter } from '../parts/figures.js';
import { asciiText } from '../quantities/ascii.js';
import { formatQuantity } from '../quantities/format.js';
import type { Explanation } from '../report.js';
import type { TurningPoint } from '../verdicts/finding.js';
import type { Verdict } from '../verdicts/verdict.js';
import { checkAmount, figureAmount } from './amounts.js';
import { commandLines, commandOf } from './commands.js';
import { paragraph } from './layout.js';
import { safeLine } from './safe-text.js';
import { GLUE, glued, held } from './spelling.js';
import type { CommandContext, Style } from './style.js';
import { figureWords, passingSide } from './words.js';

/** What to do about open checks: look the figure up, assume it for one run, or measure it. */
export function remedyLines(explanation: Explanation, style: Style, context: CommandContext): string[] {
  const open = explanation.judged.verdicts.filter((verdict) => verdict.outcome === 'unknown');
  // Where the figures that would decide it were found, they stand in a block of their own.
  const isSettled = explanation.lookups?.settles === true;
  const steps = [...(isSettled ? [] : lookups(open, explanation)), ...unbuilt(open)];
  const fitted = fittings(explanation, style, context);
  const assumption = isSettled ? null : assumeWords(open, explanation);
  const measured = open.flatMap(({ decidesAt }) => (decidesAt !== null && MEASURABLE.has(decidesAt.figure) ? [figureWords(decidesAt.figure)] : []));
  const listed: string[][] = steps.map((step) => paragraph(step, style, { lead: '  - ', indent: 4 }));
  if (assumption !== null) {
    listed.push([
      ...paragraph('or take a value for this run; it is written into the answer as an assumption:', style, { lead: '  - ', indent: 4 }),
      ...commandLines(commandOf(context, ['explain', explanation.judged.part.id], ['--assume', assumption]), style, '    '),
    ]);
  }
  if (measured.length > 0) {
    listed.push(paragraph(`or measure ${[...new Set(measured)].join(' and ')} on a few samples at the corner above; samples do not replace a limit`, style, { lead: '  - ', indent: 4 }));
  }
  const all = [...fitted, ...listed.flat()];
  return all.length === 0 ? [] : ['What to do', ...all];
}

/** Components that turn a check, as an option that pastes back. */
function fittings({ judged, changes }: Explanation, style: Style, context: CommandContext): string[] {
  // What lets the part in by itself or with others stands there, judged in full.
  const told = new Set(changes?.options.flatMap(({ moves }) => moves.map(({ path }) => path)));
  const offered = judged.verdicts.flatMap((verdict) => (verdict.remedies ?? []).filter(({ path }) => !told.has(path)).map((remedy) => ({ verdict, remedy })));
  return offered.flatMap(({ verdict, remedy }) => [
    ...paragraph(`${remedy.path} ${glued(remedy.text)}: ${verdict.title} ${checkAmount(verdict, remedy.offered)} with it, this check computed again; ${glued(remedy.cost)}`, style, { lead: '  - ', indent: 4 }),
    ...commandLines(commandOf(context, ['explain', judged.part.id], ['--set', `${remedy.path}=${asciiText(remedy.text).replaceAll(' ', '')}`]), style, '    '),
  ]);
}

const MEASURABLE: ReadonlySet<string> = new Set(['offsetVoltage', 'offsetDrift', 'biasCurrent', 'slewRate', 'gainBandwidth', 'outputLowHeadroom', 'outputHighHeadroom', 'quiescentCurrent', 'outputCurrent']);

/** Which limit to look up, and the cell it belongs in. */
function lookups(open: readonly Verdict[], explanation: Explanation): string[] {
  const sought = new Map<string, string>();
  for (const verdict of open) {
    const wanted = verdict.missing.length > 0 ? verdict.missing : verdict.decidesAt === null ? [] : [verdict.decidesAt];
    for (const one of wanted) sought.set(`${one.figure}.${one.kind ?? ''}`, lookup(one, explanation));
  }
  return [...sought.values()];
}

type Sought = Verdict['missing'][number] & Partial<Pick<TurningPoint, 'condition'>>;

function lookup(sought: Sought, explanation: Explanation): string {
  const { figure, kind } = sought;
  const { judged } = explanation;
  const slot = kind === null ? null : `${figure}.${kind}`;
  const origin = slot === null ? null : explanation.origin(judged.part.id, slot);
  const words = figureWords(figure, kind);
  const header = pointHeader(sought);
  if (header !== null && judged.part.tier === 'approved') return `look up the ${words} there, add the column "${header}" to your list, then import the list again`;
  if (origin?.kind === 'cell') return `look up the ${words} and put it in column ${origin.columnLetter} of row${GLUE}${origin.row} in ${safeLine(origin.file)}, then import the list again`;
  if (judged.part.tier === 'generic') {
    const states = judged.part.figures.some((known) => known.parameter === figure);
    return states ? `what the generic set states of ${figureWords(figure)} does not settle it: look at a part of your own` : `a generic set states no ${words}: look at a part of your own`;
  }
  return `look up the ${words}, give it a column in your list, then import the list again`;
}

/** Canonical header of a head-room point that would settle it: `output high headroom max (mV) @ 500 µA, 5 V`. */
function pointHeader({ figure, kind, beyond, condition }: Sought): string | null {
  const at = beyond ?? condition;
  if (at === undefined || !(figure in PARAMETERS) || kind === null) return null;
  const { words, headerUnit } = PARAMETERS[figure as Parameter];
  // A point counts up to its own current and from its own supply on.
  const load = at.current > 0 ? `${formatQuantity(at.current, 'A', { digits: 1, round: 'up' })}, ` : '';
  return held(`${words} ${kind} (${headerUnit}) @ ${load}${formatQuantity(at.supply, 'V', { round: 'down' })}`);
}

function unbuilt(open: readonly Verdict[]): string[] {
  return open.filter(({ reason }) => reason === 'not-built').map(({ title }) => `${title}: no figure settles it in this version; judge it by hand, or take the limit out of the stage`);
}

/** `PART.offsetDrift=29.8uV/C`: the value at which the first open check turns, or the class's own. */
function assumeWords(open: readonly Verdict[], { judged }: Explanation): string | null {
  const point = open.find(({ decidesAt }) => decidesAt !== null && decidesAt.figure !== 'temperature' && decidesAt.figure !== 'supplyVoltage')?.decidesAt ?? null;
  if (point === null || !(point.value > 0)) return null;
  const known = judged.part.figures.some((figure) => figureSlot(figure).startsWith(`${point.figure}.`));
  if (known) return null;
  const round = passingSide(point.figure, point.kind) === 'less' ? 'down' : 'up';
  return `${judged.part.id}.${point.figure}=${asciiText(figureAmount(point.figure, point, { round })).replaceAll(' ', '')}`;
}
