import type { Comparison } from '../report.js';
import { cautionsOf, confirmationJson, document } from './json.js';
import { stageJson } from './stage-json.js';
import { verdictJson, type OriginOf } from './verdict-json.js';

/** The document `comparison`: two parts side by side on one stage. */
export function comparisonJson(comparison: Comparison): string {
  const { stage, parts, standing, asking, data } = comparison;
  const origin: OriginOf = (part, slot) => comparison.origin(part, slot);
  return document('comparison', {
    stage: stageJson(stage),
    parts: parts.map((one) => partJson(one, origin)),
    checks: standing.checks.map(({ check, title, better }) => ({ check, title, better })),
    ahead: standing.ahead,
    decidedBy: standing.decidedBy,
    stability: standing.stability,
    dominated: standing.dominated,
    asking,
    data: { catalog: data.catalog, rules: data.rules },
  });
}

function partJson({ judged, rank, merit }: Comparison['parts'][number], origin: OriginOf): object {
  const { part, outcome, proof, likely, confirm, verdicts, current, dynamicRange, batteryHours } = judged;
  const { id, tier, description, channels, price } = part;
  return {
    id, tier, class: part.class, description, package: part.package, channels, price, current, outcome,
    ...(outcome === 'undecided' ? { likely } : {}),
    proof,
    rank,
    merit: merit?.total ?? null,
    meritShares: merit === null ? null : { margins: merit.margins, price: merit.price, current: merit.current },
    confirm: confirm.map(confirmationJson),
    dynamicRange,
    ...(batteryHours === null ? {} : { battery: batteryHours }),
    cautions: cautionsOf(judged),
    verdicts: verdicts.map((verdict) => verdictJson(verdict, id, origin)),
  };
}
