import { BORROWABLE } from '../parts/classes.js';
import { figureSlot, PARAMETERS, type Figure, type LimitKind, type Parameter } from '../parts/figures.js';
import type { Part } from '../parts/part.js';
import { bestPossible } from '../parts/select.js';
import { rulesFor, verdictsOf, type JudgedPart, type Judging } from '../screening/index.js';
import type { Outcome, Verdict } from '../verdicts/verdict.js';
import { readsOf } from './candidates.js';

/** One end of what weak figures may be, and how the check stands there. */
export interface SensitivityEnd {
  /** In the unit of the check; null where nothing can be compared. */
  readonly offered: number | null;
  readonly outcome: Outcome;
}

/** Whether a verdict hangs on figures that are borrowed from a class, or only typical. */
export interface Sensitivity {
  readonly check: string;
  readonly title: string;
  readonly on: 'borrowed' | 'typical';
  readonly figures: readonly Parameter[];
  readonly required: number;
  readonly unit: string;
  /** Borrowed: no contribution at all. Typical: as printed, taken for a limit. */
  readonly best: SensitivityEnd;
  /** Borrowed: the worst of the class, taken for its own. Typical: derated. */
  readonly worst: SensitivityEnd;
  /** As the check stands. */
  readonly outcome: Outcome;
  /** The check would stand otherwise at one of the ends. */
  readonly depends: boolean;
}

/** Every verdict in numbers that has borrowed or derated figures in it, judged again with these at both ends. */
export function sensitivitiesOf(run: Judging, { part, verdicts }: JudgedPart): Sensitivity[] {
  return verdicts.flatMap((verdict) => [...onBorrowed(run, part, verdict), ...onTypical(run, part, verdict)]);
}

function onBorrowed(run: Judging, part: Part, verdict: Verdict): Sensitivity[] {
  const worst = rulesFor(run, part).classWorst;
  if (worst === null || run.strict || !verdict.terms.some(({ basis }) => basis === 'borrowed')) return [];
  const lacking = readsOf(verdict.check).filter((one) => (BORROWABLE as readonly string[]).includes(one) && worst[one] !== undefined && !part.figures.some(({ parameter }) => parameter === one));
  const figures = lacking.filter((one) => matters(run, part, { verdict, figure: one }));
  const at = (value: (parameter: Parameter) => number): Part => figures.reduce((known, parameter) => withFigure(known, { parameter, kind: kindOf(parameter), value: value(parameter), condition: {} }), part);
  return compared(run, verdict, { on: 'borrowed', figures, best: at(bestOf), worst: at((parameter) => worst[parameter] ?? bestOf(parameter)) });
}

/** Leaving the offset current unknown says more than its class does where the bias current bounds it: only what is counted counts. */
function matters(run: Judging, part: Part, { verdict, figure }: { readonly verdict: Verdict; readonly figure: Parameter }): boolean {
  const [with0] = verdictsOf(run, withFigure(part, { parameter: figure, kind: kindOf(figure), value: bestOf(figure), condition: {} }), new Set([verdict.check]));
  return with0 === undefined || with0.terms.filter(({ basis }) => basis === 'borrowed').length < verdict.terms.filter(({ basis }) => basis === 'borrowed').length;
}

const kindOf = (parameter: Parameter): LimitKind => ((PARAMETERS[parameter].kinds as readonly string[]).includes('max') ? 'max' : 'min');
const bestOf = (parameter: Parameter): number => bestPossible({ parameter, kind: kindOf(parameter) });

function onTypical(run: Judging, part: Part, verdict: Verdict): Sensitivity[] {
  const reads = new Set<string>(readsOf(verdict.check));
  const derated = new Set([...verdict.terms.map(({ slot, basis }) => (basis === 'guaranteed' ? null : slot)), verdict.slot]);
  const typical = part.figures.filter((one) => one.kind === 'typ' && reads.has(one.parameter) && derated.has(figureSlot(one)) && limitKind(one) !== null);
  if (typical.length === 0) return [];
  const asLimits = typical.reduce((known, one) => withFigure(known, { ...one, kind: limitKind(one) ?? 'typ' }), part);
  return compared(run, verdict, { on: 'typical', figures: [...new Set(typical.map(({ parameter }) => parameter))], best: asLimits, worst: part });
}

function limitKind({ parameter }: Figure): LimitKind | null {
  const kinds: readonly string[] = PARAMETERS[parameter].kinds;
  return kinds.includes('max') ? 'max' : kinds.includes('min') ? 'min' : null;
}

function withFigure(part: Part, figure: Figure): Part {
  return { ...part, figures: [...part.figures.filter((one) => figureSlot(one) !== figureSlot(figure)), figure] };
}

interface Ends {
  readonly on: Sensitivity['on'];
  readonly figures: readonly Parameter[];
  readonly best: Part;
  readonly worst: Part;
}

function compared(run: Judging, verdict: Verdict, { on, figures, best, worst }: Ends): Sensitivity[] {
  const { check, title, required, unit, outcome } = verdict;
  if (figures.length === 0 || typeof required !== 'number' || unit === null) return [];
  const ends = { best: endOf(run, best, check), worst: on === 'typical' ? derated(verdict) : endOf(run, worst, check) };
  // Open for another reason at both ends: nothing is said by these figures.
  if (ends.best.outcome === 'unknown' && ends.worst.outcome === 'unknown') return [];
  return [{ check, title, on, figures, required, unit, ...ends, outcome, depends: ends.best.outcome !== ends.worst.outcome }];
}

/** Derated figures alone stand against the limit: what would pass on the other reading is another end. */
function derated({ outcome, offered, offeredBest, otherThere }: Verdict): SensitivityEnd {
  const value = outcome === 'fail' ? (otherThere ?? offeredBest) : offered;
  return { offered: typeof value === 'number' ? value : null, outcome };
}

function endOf(run: Judging, part: Part, check: string): SensitivityEnd {
  const [verdict] = verdictsOf(run, part, new Set([check]));
  const value = verdict?.offered ?? verdict?.known ?? null;
  return { offered: typeof value === 'number' ? value : null, outcome: verdict?.outcome ?? 'unknown' };
}
