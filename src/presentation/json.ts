import type { AnyDemand } from '../demands/index.js';
import { formatQuantity } from '../quantities/format.js';
import type { Problem } from '../quantities/problem.js';
import type { DataUsed, DemandsReport, Explanation, Report } from '../report.js';
import type { Confirmation, JudgedPart } from '../screening/index.js';
import type { RankedPart } from '../ranking/index.js';
import { changesJson, waysOutJson } from './changes-json.js';
import { formulasJson } from './formula-text.js';
import { hazardText } from './hazard-text.js';
import { partLookupsJson, sensitivityJson } from './lookup-json.js';
import { bodyOf } from './prediction-body.js';
import { problemJson } from './problem-json.js';
import { stageJson } from './stage-json.js';
import { verdictJson, type OriginOf } from './verdict-json.js';

/** Schema names and versions; within a version only additions. */
const SCHEMA_VERSION = 1;

/** A JSON document: SI base units as numbers, unknown as null with a reason. Ends with one newline. */
export function document(schema: string, body: Readonly<Record<string, unknown>>): string {
  return printed(documentOf(schema, body));
}

/** The same before it is printed, for a document that stands in another or on one line. */
export const documentOf = (schema: string, body: Readonly<Record<string, unknown>>): object => ({ schema: `railfit/${schema}`, schemaVersion: SCHEMA_VERSION, ...body });

const printed = (one: object): string => `${JSON.stringify(one, null, 2)}\n`;

export const shortlistJson = (report: Report, options: ShortlistCut): string => printed(shortlistDocument(report, options));

/** How much of a long list is told. */
export interface ShortlistCut {
  readonly top: number;
  readonly all: boolean;
}

/** What `shortlist --json` prints. */
export function shortlistDocument(report: Report, options: ShortlistCut): object {
  const origin: OriginOf = (part, slot) => report.origin(part, slot);
  const judged = (one: JudgedPart): object => judgedJson(one, origin);
  return documentOf('shortlist', {
    ...demandsBody(report),
    counts: report.counts,
    fit: report.fit.slice(0, options.top).map((one) => rankedJson(one, origin)),
    undecided: report.undecided.slice(0, options.top).map(judged),
    rejections: report.rejections,
    nearest: report.nearest.map(judged),
    ahead: report.ahead,
    ...waysOutJson(report),
    ...(options.all ? { rejected: report.rejected.map(judged) } : {}),
    asking: report.asking,
    data: dataJson(report.data),
  });
}

export function explanationJson(explanation: Explanation, { formulas = false }: { readonly formulas?: boolean } = {}): string {
  const { judged, data } = explanation;
  const { part } = judged;
  const origin: OriginOf = (id, slot) => explanation.origin(id, slot);
  return document('explanation', {
    stage: stageJson(explanation.stage),
    part: { id: part.id, tier: part.tier, class: part.class, description: part.description, family: part.family, package: part.package, channels: part.channels, price: part.price },
    outcome: judged.outcome,
    proof: judged.proof,
    rank: explanation.rank,
    ...(judged.outcome === 'undecided' ? { likely: judged.likely } : {}),
    verdicts: judged.verdicts.map((verdict) => verdictJson(verdict, part.id, origin)),
    confirm: judged.confirm.map(confirmationJson),
    ...informed(judged),
    ...changesJson(explanation),
    ...(explanation.lookups === null ? {} : { lookups: partLookupsJson(explanation.lookups) }),
    sensitivity: explanation.sensitivity.map(sensitivityJson),
    ...(explanation.predicted === null ? {} : { predicted: { checks: explanation.predicted.checks, ...bodyOf(explanation.predicted.prediction) } }),
    ...(formulas ? { formulas: formulasJson(explanation) } : {}),
    cautions: cautionsOf(judged),
    fitting: explanation.fitting.map((one) => one.part.id),
    asking: explanation.asking,
    data: dataJson(data),
  });
}

export function demandsJson(report: DemandsReport): string {
  return document('demands', demandsBody(report));
}

export function problemsJson(problems: readonly Problem[]): string {
  return document('problems', { problems: problems.map(problemJson) });
}

function demandsBody(report: DemandsReport): { stage: object; demands: object[] } {
  return { stage: stageJson(report.stage), demands: report.demands.map(demandJson) };
}

function demandJson(demand: AnyDemand): object {
  const { check, required, unit, sense, because, source } = demand;
  const built = 'built' in demand ? { reason: 'not-built' } : {};
  return { check, required, unit, sense, because, source, ...built };
}

function rankedJson(one: RankedPart, origin: OriginOf): object {
  const { merit, tightest, dominatedBy } = one;
  const shares = { margins: merit.margins, price: merit.price, current: merit.current };
  return { rank: one.rank, ...identity(one), merit: merit.total, meritShares: shares, tightest, dominatedBy, variants: one.variants.map(variantJson), proof: one.proof, confirm: one.confirm.map(confirmationJson), ...verdicts(one, origin) };
}

/** Another package or channel count of the same die. */
function variantJson({ part, current }: JudgedPart): object {
  return { part: part.id, package: part.package, channels: part.channels, price: part.price, current };
}

function judgedJson(one: JudgedPart, origin: OriginOf): object {
  return { ...identity(one), outcome: one.outcome, ...(one.outcome === 'undecided' ? { likely: one.likely } : {}), ...verdicts(one, origin) };
}

function identity({ part }: JudgedPart): object {
  return { part: part.id, tier: part.tier, class: part.class, description: part.description };
}

function verdicts(one: JudgedPart, origin: OriginOf): object {
  return { ...informed(one), cautions: cautionsOf(one), verdicts: one.verdicts.map((verdict) => verdictJson(verdict, one.part.id, origin)) };
}

/** What is told and not judged. */
function informed({ dynamicRange, batteryHours }: JudgedPart): object {
  return { dynamicRange, ...(batteryHours === null ? {} : { battery: batteryHours }) };
}

export function confirmationJson({ figure, basis, how, checks, needed }: Confirmation): object {
  return { figure, basis, how, checks, needed };
}

/** Cautions of the part as a whole; those of a check stand beside its verdict. */
export function cautionsOf({ part, verdicts: all, current, hazards }: JudgedPart): string[] {
  const wanted = all.find((verdict) => verdict.check === 'channels')?.required;
  return [
    ...(part.tier === 'generic' ? ['a generic set: a class of parts, not something to order'] : []),
    ...hazards.map(hazardText),
    ...idleSections(part.channels ?? 1, typeof wanted === 'number' ? wanted : 1, current),
  ];
}

export function dataJson(data: DataUsed): object {
  return { catalog: data.catalog, rules: data.rules };
}

/** A dual or quad for one stage: its other sections draw current too. `current` is the pessimistic quiescent current of one, A. */
function idleSections(channels: number, wanted: number, current: number | null): string[] {
  const idle = channels - wanted;
  if (idle <= 0) return [];
  const drawn = current === null ? 'each draws its quiescent current' : `they draw ${formatQuantity(idle * current, 'A', { round: 'up' })} of the ${formatQuantity(channels * current, 'A', { round: 'up' })} of the package`;
  return [`${idle} of ${channels} sections idle: ${idle === 1 ? drawn.replace('they draw', 'it draws') : drawn}; an idle section is tied off as a follower inside its input range`];
}
