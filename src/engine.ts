import { deriveDemands, listDemands, type Demands } from './demands/index.js';
import { whyAhead } from './explanation/index.js';
import type { Part, PartSource, Tier } from './parts/part.js';
import { rank, rankSurveyed, type RankedPart } from './ranking/index.js';
import type { Asking, DataUsed, DemandsReport, Explanation, Report } from './report.js';
import { judgePart, judging, screen, screenViews, type JudgedPart, type Screened } from './screening/index.js';
import type { Stage } from './stage/index.js';

/** Version of the judging rules. */
export const RULES = '1';

const PLAIN: Asking = { strict: false, order: 'merit', assumed: [] };

/** What the stage asks of any amplifier; looks at no part. */
export function demandsOf(stage: Stage): DemandsReport {
  return { stage, demands: listDemands(deriveDemands(stage)) };
}

/** The whole flow on one screen: stage and parts in, judged, ranked and told why. */
export function shortlist(stage: Stage, source: PartSource, asking: Asking = PLAIN): Report {
  const demands = deriveDemands(stage);
  const { fit, screened } = screenedAndRanked(demands, source, asking);
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
    asking,
    data,
    origin: (partId, slot) => source.origin(partId, slot),
  };
}

/** The part among those that were judged. Through views only what fits is looked into: the others have no place to be found at. */
function judgedIn(report: Report, source: PartSource, part: Part): { judged: JudgedPart; ranked: RankedPart | undefined } {
  const isIt = (one: JudgedPart): boolean => one.part.id === part.id && one.part.tier === part.tier;
  const alone = source.screening === undefined ? null : judgePart(judging(deriveDemands(report.stage), source.screening.generic, report.asking.strict), part);
  if (alone !== null && alone.outcome !== 'fits') return { judged: alone, ranked: undefined };
  const ranked = report.fit.find((line) => isIt(line) || line.variants.some(isIt));
  const judged = ranked === undefined ? (alone ?? [...report.undecided, ...report.rejected].find(isIt)) : [ranked, ...ranked.variants].find(isIt);
  if (judged === undefined) throw new RangeError(`part ${part.id} is not in the catalog that was judged`);
  return { judged, ranked };
}

/** Part by part, or through views when the source has them: the same answer, without reading what is not shown. */
function screenedAndRanked(demands: Demands, source: PartSource, { strict, order }: Asking): { screened: Screened; fit: readonly RankedPart[] } {
  if (source.screening === undefined) {
    const screened = screen(judging(demands, source.parts, strict), source.parts);
    return { screened, fit: rank(screened.fit, order) };
  }
  const surveyed = screenViews(judging(demands, source.screening.generic, strict), source.screening.views);
  return { screened: surveyed, fit: rankSurveyed(surveyed, order) };
}

/** One part of the catalog on the stage, with its place in the shortlist. The part must be in the source. */
export function explain(stage: Stage, source: PartSource, request: { readonly part: Part; readonly asking?: Asking }): Explanation {
  const report = shortlist(stage, source, request.asking ?? PLAIN);
  const { judged, ranked } = judgedIn(report, source, request.part);
  const { demands, counts, asking, data, origin } = report;
  const fitting = report.fit.filter((one) => one !== ranked).slice(0, 3);
  return { stage, demands, judged, rank: ranked?.rank ?? null, counts, fitting, asking, data, origin };
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
