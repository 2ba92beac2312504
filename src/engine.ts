import { deriveDemands, listDemands, oneCircuit } from './demands/index.js';
import { cellsOf, changesFor, type Changing, comparedPart, compareParts, type LookupContext, lookupList, lookupsOf, sensitivitiesOf, sweep, type Swept, whyAhead, whyNothingFits } from './explanation/index.js';
import { classesOf } from './parts/classes.js';
import { curvesOf } from './curves/index.js';
import type { Part, PartSource, Tier } from './parts/part.js';
import { predictStage, type Prediction } from './prediction/index.js';
import { outlineAndRank, outlinesIn, screenAndRank } from './ranking/index.js';
import type { Asking, Comparison, DataUsed, DemandsReport, Explanation, PredictedInstead, PredictionReport, Report } from './report.js';
import { RULES } from './rules.js';
import { judgedMisses, type JudgedPart, judgePart, judgingOf, lendersOf, surveyedMisses } from './screening/index.js';
import type { Stage } from './stage/index.js';

const PLAIN: Asking = { strict: false, order: 'merit', assumed: [] };

/** What the stage asks of any amplifier; looks at no part. */
export function demandsOf(stage: Stage): DemandsReport {
  return { stage, demands: listDemands(deriveDemands(stage)) };
}

/** The whole flow on one screen: stage and parts in, judged, ranked and told why. */
export function shortlist(stage: Stage, source: PartSource, asking: Asking = PLAIN): Report {
  const demands = deriveDemands(stage);
  const { run, fit, screened } = screenAndRank({ demands, circuit: oneCircuit(stage).mark() }, source, asking);
  const data = dataOf(source);
  return {
    stage,
    demands: listDemands(demands),
    counts: { parts: data.catalog.parts, fit: screened.fit.length, undecided: screened.undecided.length, rejected: screened.rejected.length },
    fit,
    undecided: screened.undecided,
    rejected: screened.rejected,
    rejections: screened.rejections,
    nearest: screened.nearest,
    ahead: whyAhead(fit, asking.order),
    nothingFits: null,
    asking,
    data,
    origin: (partId, slot) => source.origin(partId, slot),
    curves: ({ part }) => curvesOf(run, stage, part),
  };
}

/** Where nothing fits: the report with the reason and the smallest changes that let something in. Any other report as it is. */
export function withWaysOut(report: Report, source: PartSource, changing: Changing): Report {
  if (report.fit.length > 0 || report.counts.parts === 0) return report;
  const { stage, rejected, undecided, asking } = report;
  // Parts of a list with views are not read for it.
  const misses = source.screening === undefined
    ? judgedMisses([...rejected, ...undecided])
    : surveyedMisses({ demands: deriveDemands(stage), circuit: oneCircuit(stage).mark() }, source, asking.strict);
  const search = { stage, source, misses, strict: asking.strict, order: asking.order };
  return { ...report, nothingFits: whyNothingFits(search, changing) };
}

/** Which part, and how it is asked; without `changing` nothing is said about what would let it in. */
export interface ExplainRequest {
  readonly part: Part;
  readonly asking?: Asking;
  readonly changing?: Changing;
}

/** So many of the parts that fit are told beside another. */
const TOLD = 3;

/** One part of the catalog on the stage, with its place in the shortlist. The part must be in the source. */
export function explain(stage: Stage, source: PartSource, request: ExplainRequest): Explanation {
  const { part, asking = PLAIN, changing } = request;
  const demands = deriveDemands(stage);
  const { run, counts, fit, lineOf } = outlineAndRank({ demands, circuit: oneCircuit(stage).mark() }, source, asking);
  if (source.screening === undefined && !source.parts.includes(part)) throw new RangeError(`part ${part.id} is not in the catalog that was judged`);
  const judged = judgePart(run, part);
  const ranked = judged.outcome !== 'fits' ? null : lineOf(judged);
  return {
    stage,
    demands: listDemands(demands),
    judged,
    rank: ranked?.rank ?? null,
    counts,
    // The list is lazy: one line more than is told, and no further.
    fitting: fit.slice(0, TOLD + 1).filter((one) => one !== ranked).slice(0, TOLD),
    lookups: judged.outcome === 'undecided' ? lookupsOf({ run, get parts() { return source.parts; }, cells: cellsOf(source), fit, order: asking.order }, judged) : null,
    sensitivity: sensitivitiesOf(run, judged),
    predicted: predictedInstead(stage, source, { judged, asking }),
    changes: changing === undefined || judged.outcome === 'fits' ? null : changesFor({ stage, part: judged.part, parts: lendersOf(source), strict: asking.strict }, changing),
    asking,
    data: dataOf(source),
    origin: (partId, slot) => source.origin(partId, slot),
    curves: () => curvesOf(run, stage, judged.part),
  };
}

/** The same report with what to look up, so that undecided parts are decided. The source must be the one it was made from. */
export function withLookups(report: Report, source: PartSource): Report {
  return { ...report, lookups: lookupList(lookupContext(report, source), report.undecided) };
}

function lookupContext({ stage, asking, fit }: Report, source: PartSource): LookupContext {
  const run = judgingOf(deriveDemands(stage), source, asking.strict);
  return { run, get parts() { return source.parts; }, cells: cellsOf(source), fit, order: asking.order };
}

/** The stage with one part in it, simulated; `compared` beside it. Judges nothing. */
export function predict(stage: Stage, source: PartSource, request: { readonly part: Part; readonly compared?: Part; readonly asking?: Asking }): PredictionReport {
  const asking = request.asking ?? PLAIN;
  const of = (part: Part): Prediction => predictionOf(stage, source, { part, strict: asking.strict });
  return { prediction: of(request.part), compared: request.compared === undefined ? null : of(request.compared), asking, data: dataOf(source) };
}

function predictionOf(stage: Stage, source: PartSource, { part, strict }: { readonly part: Part; readonly strict: boolean }): Prediction {
  const { operating } = deriveDemands(stage);
  const classWorst = part.class === null ? null : (classesOf(lendersOf(source), operating).get(part.class) ?? null);
  return predictStage(stage, part, { operating, strict, classWorst });
}

/** Checks that say only about how it is, or nothing, and what a simulation tells instead. */
const SIMULATED = ['distortion', 'noise', 'settling'];

function predictedInstead(stage: Stage, source: PartSource, { judged, asking }: { readonly judged: JudgedPart; readonly asking: Asking }): PredictedInstead | null {
  const remembers = deriveDemands(stage).distortion?.slewing?.remembers === true;
  const isOpen = ({ check, reason, outcome }: JudgedPart['verdicts'][number]): boolean => reason === 'not-built' || (check === 'distortion' && remembers && outcome !== 'pass');
  const checks = judged.verdicts.filter((verdict) => SIMULATED.includes(verdict.check) && isOpen(verdict)).map(({ check }) => check);
  return checks.length === 0 ? null : { checks, prediction: predictionOf(stage, source, { part: judged.part, strict: asking.strict }) };
}

/** Two parts of the catalog held against each other on the stage. Both must be in the source, and not be one. */
export function compare(stage: Stage, source: PartSource, { parts, asking = PLAIN }: { readonly parts: readonly [Part, Part]; readonly asking?: Asking }): Comparison {
  const report = shortlist(stage, source, asking);
  const ranked = report.fit.flatMap((line) => [line, ...line.variants].map((judged) => ({ judged, rank: line.rank })));
  const all = [...ranked, ...[...report.undecided, ...report.rejected].map((judged) => ({ judged, rank: null }))];
  const [one, other] = parts.map(({ id }) => all.find(({ judged }) => judged.part.id === id));
  if (one === undefined || other === undefined || one === other) throw new RangeError(`${parts.map(({ id }) => id).join(' and ')} are not two parts of the catalog that was judged`);
  const { demands, counts, data, origin } = report;
  const standing = compareParts(asking.order, [one.judged, other.judged]);
  return { stage, demands, parts: [comparedPart(one.judged, one.rank), comparedPart(other.judged, other.rank)], standing, counts, asking, data, origin };
}

/** The answer to one stage in short. */
export interface Outline {
  readonly counts: Report['counts'];
  /** Id of the first choice; null when nothing fits. */
  readonly first: string | null;
  /** Ids of what fits, by rank, each variant a place of its own. */
  readonly fit: readonly string[];
  /** By view of the source, the positions of what fits, rising. */
  readonly fitting: readonly Int32Array[];
  /** Ids, by rank, of what fits here and not in another answer from the same parts. */
  readonly beyond: (other: Pick<Outline, 'fitting'>) => readonly string[];
}

/** Answers many stages in a row on the same parts, with the counts and the order of `shortlist`. */
export function outlinesOf(source: PartSource, asking: Asking = PLAIN): (stage: Stage) => Outline {
  const outline = outlinesIn(source, asking);
  return (stage) => {
    const outlined = outline({ demands: deriveDemands(stage), circuit: oneCircuit(stage).mark() });
    const { counts, first, fitting, beyond } = outlined;
    return { counts, first, fitting, beyond, get fit() { return outlined.ids; } };
  };
}

/** Many values of one field: the stage at each (or in words why it is none), and the parts that are asked. */
export interface SweepRequest {
  readonly values: readonly number[];
  readonly stageAt: (value: number) => Stage | string;
  readonly asking?: Asking;
  /** What makes a turn: the answer (how many fit, and the first choice), or the first choice alone, which takes less time. */
  readonly turnsOf?: Swept['turnsOf'];
}

/** The answer at every value, and where it turns between them. */
export function sweepOver(source: PartSource, { values, stageAt, asking, turnsOf }: SweepRequest): Swept & { readonly data: DataUsed } {
  const outline = outlinesOf(source, asking);
  const swept = sweep(values, (value) => {
    const stage = stageAt(value);
    return typeof stage === 'string' ? { contradiction: stage } : outline(stage);
  }, turnsOf);
  return { ...swept, data: dataOf(source) };
}

function dataOf(source: PartSource): DataUsed {
  const approved = sizeOf(source, 'approved');
  const generic = sizeOf(source, 'generic');
  return { catalog: { parts: approved + generic, approved, generic, sha256: source.sha256 }, rules: RULES };
}

function sizeOf(source: PartSource, tier: Tier): number {
  if (source.screening === undefined) return source.parts.filter((part) => part.tier === tier).length;
  return source.screening.views.reduce((sum, view) => sum + (view.tier === tier ? view.size : 0), 0);
}
