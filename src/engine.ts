import { deriveDemands, listDemands } from './demands/index.js';
import { whyAhead } from './explanation/index.js';
import type { Part, PartSource } from './parts/part.js';
import { rank } from './ranking/index.js';
import type { Asking, DataUsed, DemandsReport, Explanation, Report } from './report.js';
import { judging, screen } from './screening/index.js';
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
  const screened = screen(judging(demands, source.parts, asking.strict), source.parts);
  const fit = rank(screened.fit, asking.order);
  return {
    stage,
    demands: listDemands(demands),
    counts: { parts: source.parts.length, fit: screened.fit.length, undecided: screened.undecided.length, rejected: screened.rejected.length },
    fit,
    undecided: screened.undecided,
    rejected: screened.rejected,
    rejections: screened.rejections,
    nearest: screened.nearest,
    ahead: whyAhead(fit, asking.order),
    asking,
    data: dataOf(source),
    origin: (partId, slot) => source.origin(partId, slot),
  };
}

/** One part of the catalog on the stage, with its place in the shortlist. The part must be in the source. */
export function explain(stage: Stage, source: PartSource, request: { readonly part: Part; readonly asking?: Asking }): Explanation {
  const report = shortlist(stage, source, request.asking ?? PLAIN);
  const fits = report.fit.flatMap((line) => [line, ...line.variants]);
  const judged = [...fits, ...report.undecided, ...report.rejected].find((one) => one.part.id === request.part.id);
  if (judged === undefined) throw new RangeError(`part ${request.part.id} is not in the catalog that was judged`);
  const ranked = report.fit.find((line) => line === judged || line.variants.some((one) => one === judged));
  const { demands, counts, asking, data, origin } = report;
  const fitting = report.fit.filter((one) => one !== ranked).slice(0, 3);
  return { stage, demands, judged, rank: ranked?.rank ?? null, counts, fitting, asking, data, origin };
}

function dataOf(source: PartSource): DataUsed {
  const approved = source.parts.filter((part) => part.tier === 'approved').length;
  return { catalog: { parts: source.parts.length, approved, generic: source.parts.length - approved, sha256: source.sha256 }, rules: RULES };
}
