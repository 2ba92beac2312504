import type { Demands } from '../../../src/demands/index.js';
import type { Order } from '../../../src/ranking/index.js';
import { errorCheck, errorTables } from './dc-error.js';
import { figureTable, ruleTable } from './figures.js';
import { hazardChecks } from './hazards.js';
import { headroomChecks, headroomTables } from './headroom.js';
import { orderTables } from './order.js';
import { junctionCheck, plainChecks } from './plain-checks.js';
import { readingTables } from './readings.js';

export interface SqlAsking {
  readonly strict: boolean;
  readonly order: Order;
}

/** Checks that are a search, an integral or a march over time, or whose demand is a function of the part: no SQL worth the name answers them. */
export const NOT_IN_SQL = ['phase-margin', 'noise', 'distortion', 'supply-ripple', 'settling', 'frequency-error'] as const;

/** Which of those the stage asks all the same; such a stage has no SQL form. */
export function askedBeyondSql(demands: Demands): string[] {
  const asked = NOT_IN_SQL.filter((check) => demands[check]?.required != null);
  const moves = demands['slew-rate']?.motion.kind === 'edge' ? ['slew-rate'] : [];
  const ownCapacitance = demands['gain-bandwidth']?.requiredWith == null ? [] : ['gain-bandwidth'];
  const ownCapacitor = demands['stable-gain']?.open == null ? [] : ['stable-gain'];
  return [...asked, ...moves, ...ownCapacitance, ...ownCapacitor];
}

/**
 * The whole answer as one script: temporary tables from the part table up to `verdict` (part, check, outcome), `answer` (part, outcome) and `fitting`.
 * The catalog itself is only read.
 */
export function sqlForm(demands: Demands, { strict, order }: SqlAsking): string {
  const surroundings = { operating: demands.operating, strict };
  const error = demands['dc-error'];
  const standings = [...plainChecks(demands), junctionCheck(demands), ...headroomChecks(demands), ...(error === null ? [] : [errorCheck(error)]), ...hazardChecks(demands)];
  return [
    figureTable(), ruleTable(), readingTables(surroundings), headroomTables(demands, surroundings), ...(error === null ? [] : [errorTables(error)]),
    `create temp table standing as ${standings.join('\nunion all ')}`,
    // Both readings pass, or even the best one fails; everything else is open.
    "create temp table verdict as select *, case when worst = 1 and best = 1 then 'pass' when best = 0 and coalesce(worst, 0) = 0 then 'fail' else 'unknown' end as outcome from standing",
    "create temp table answer as select key, case when sum(outcome = 'fail') > 0 then 'does-not-fit' when sum(outcome = 'unknown') > 0 then 'undecided' else 'fits' end as outcome from verdict group by key",
    orderTables(order), '',
  ].join(';\n');
}

/** One row a part, in the order of the catalog: tier, id, outcome, its place and its line among what fits, and its verdicts as JSON. */
export const PARTS = `with told as (select key, json_group_object(check_id, json_array(outcome, basis, case when abs(margin) < 1e300 then margin end)) as verdicts from verdict group by key)
select tier, id, outcome, place, line, verdicts from known join answer using (key) join told using (key) left join (select key, place, line from fitting) using (key) order by tier, id`;

/** One row a check: how many parts it fails, lets pass and leaves open. */
export const TALLY = "select check_id, sum(outcome = 'fail'), sum(outcome = 'pass'), sum(outcome = 'unknown') from verdict group by check_id";
