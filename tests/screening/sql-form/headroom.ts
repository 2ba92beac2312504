import type { Demands, HeadroomDemand } from '../../../src/demands/index.js';
import { farthest, type Surroundings } from './readings.js';
import { flag, meets, type Outlook, real, realOrNull, rows, standing, text } from './sql.js';

/** How far past its heaviest point a set may be drawn on, and the threshold the scaling of supplies assumes, V. */
const REACH = '1.5';
const THRESHOLD = '0.7';
const SAME_LOAD = 'key, name, supply, amperes, ohms, toward';

/** `point`: one a load and supply: the limit, else the typical figure; of several temperatures the one that needs no estimate, then the nearest, then the larger. */
function pointTable({ operating }: Surroundings): string {
  const warmed = `case when away then ${real(1 + 0.005 * farthest(operating))} else 1.0 end`;
  return `create temp table swing_limits as select *, max(kind <> 'typ') over (partition by ${SAME_LOAD}) as has_limit from usable where name in ('outputLowHeadroom', 'outputHighHeadroom');
create temp table swing_chosen as select *, row_number() over (partition by ${SAME_LOAD} order by away * 1e9 + warmth, value desc) as place from swing_limits where kind <> 'typ' or not has_limit;
create temp table point as select key, name = 'outputHighHeadroom' as high, supply, amperes, value as printed,
  case when amperes is null then coalesce(ohms, 10e3) end as ohms, coalesce(toward, 'mid-supply') as toward,
  worst * ${warmed} as worst, case when amperes is null and ohms is null then 0.0 else best end as best,
  max(basis, 2 * away, 3 * (supply is null or (amperes is null and ohms is null))) as basis,
  coalesce(toward = case name when 'outputLowHeadroom' then 'ground' else 'supply' end, 0) as assisted,
  assumed and amperes is null and ohms is null as anywhere
  from swing_chosen where place = 1`;
}

/** Current at which a point was measured, by its own load, connection and supply. */
function measured(supply: string): string {
  const output = `case when point.high then ${supply} - printed else printed end`;
  const end = `case toward when 'ground' then 0.0 when 'supply' then ${supply} else ${supply} / 2.0 end`;
  return `coalesce(amperes, max(0.0, (case when point.high then (${output}) - (${end}) else (${end}) - (${output}) end) / ohms))`;
}

/** Every vertex of either side, with its room and the current that flows there. */
function vertexTable(demands: Demands): string {
  const of = (demand: HeadroomDemand, high: boolean): string[][] =>
    demand.vertices.map(({ room, supply, current, assistingLoad }, at) => [flag(high), String(at), real(room), real(supply), real(current), realOrNull(assistingLoad)]);
  return rows('vertex', ['high', 'v', 'room', 'vs', 'flowing', 'assist'], [...of(demands['output-low'], false), ...of(demands['output-high'], true)]);
}

/**
 * `bounding`: at each vertex the points that count of the set rated nearest at or below its supply, and of the nearest above it, scaled on the worst reading.
 * `step`: one a current, the larger head-room; each with the one before it.
 */
const SETS = `create temp table placed as select key, point.high, v, vs, flowing, coalesce(point.supply, vs) as rating, ${measured('coalesce(point.supply, vs)')} as current, worst, best, basis
  from vertex join point on point.high = vertex.high
  where not anywhere and (not assisted or (assist is not null and amperes is null and assist <= ohms * (1.0 + 1e-9)));
create temp table rating_limits as select *, max(case when rating <= vs * (1.0 + 1e-9) then rating end) over here as below, min(case when rating > vs * (1.0 + 1e-9) then rating end) over here as above
  from placed window here as (partition by key, high, v);
create temp table bounding as select *, 0 as upper, 1.0 as scale from rating_limits where rating = below
  union all select *, 1, (above - ${THRESHOLD}) / (vs - ${THRESHOLD}) from rating_limits where rating = above and vs > ${THRESHOLD};
create temp table at_current as select key, high, v, flowing, upper, current, worst * scale as worst, max(best) over here as best, max(basis, 2 * upper) as basis,
  row_number() over (partition by key, high, v, upper, current order by worst desc) as place
  from bounding window here as (partition by key, high, v, upper, current);
create temp table step as select *, lag(current) over rising as c0, lag(worst) over rising as w0, lag(best) over rising as b0, lag(basis) over rising as basis0, max(current) over (partition by key, high, v, upper) as heaviest
  from at_current where place = 1 window rising as (partition by key, high, v, upper order by current)`;

const between = (value: string, before: string): string => `case when c0 is null or current <= flowing * (1.0 + 1e-9) then ${value} else ${before} + (flowing - c0) / (current - c0) * (${value} - ${before}) end`;
const IS_BEYOND = `flowing > heaviest * ${REACH} * (1.0 + 1e-9)`;

/** `needed`: between two points a straight line; past the heaviest one drawn on to 1.5 × its current, unknown from there. The smaller of the two sets counts, one that ends before the current only if both do. */
const NEEDED = `create temp table read_step as select *, flowing <= heaviest * (1.0 + 1e-9) as reached,
  row_number() over (partition by key, high, v, upper order by current < flowing * (1.0 - 1e-9), case when current >= flowing * (1.0 - 1e-9) then current else -current end) as turn from step;
create temp table set_need as select key, high, v, upper, reached, worst as bound_w, best as bound_b,
  case when reached then ${between('worst', 'w0')} when ${IS_BEYOND} then null
    else max(worst, worst + (worst - coalesce(w0, 0.0)) / (current - coalesce(c0, 0.0)) * (flowing - current)) end as worst,
  case when reached then ${between('best', 'b0')} when ${IS_BEYOND} then null else best end as best,
  case when not reached then max(basis, coalesce(basis0, 0), 2) when c0 is null or current <= flowing * (1.0 + 1e-9) then basis else max(basis, basis0) end as basis
  from read_step where turn = 1;
create temp table covering_sets as select *, max(reached) over (partition by key, high, v) as any_reached from set_need;
create temp table need_order as select *, min(best) over here as least_b, min(bound_w) over here as least_bound_w, min(bound_b) over here as least_bound_b,
  row_number() over (partition by key, high, v order by worst is null, worst, upper) as place
  from covering_sets where reached or not any_reached window here as (partition by key, high, v);
create temp table anywhere as select key, high, max(worst) as worst, max(best) as best, basis from point where anywhere group by key, high;
create temp table needed as select known.key, vertex.high, vertex.v, room, coalesce(anywhere.worst, need.worst) as worst, coalesce(anywhere.best, least_b) as best,
  coalesce(least_bound_w, 0.0) as bound_w, coalesce(least_bound_b, 0.0) as bound_b, coalesce(anywhere.basis, need.basis, 0) as basis
  from known join vertex
  left join need_order as need on need.key = known.key and need.high = vertex.high and need.v = vertex.v and need.place = 1
  left join anywhere on anywhere.key = known.key and anywhere.high = vertex.high`;

/** What the offset takes of the room, as far as it is known. */
function share({ noiseGain, kelvin }: HeadroomDemand, outlook: Outlook): string {
  const drift = `case when coalesce(offset_over, 0) then 0.0 else coalesce(offsetDrift_${outlook}, 0.0) * ${real(kelvin)} end`;
  return `(${real(noiseGain)} * (coalesce(offsetVoltage_${outlook}, 0.0) + ${drift}))`;
}

/** `spared_low`, `spared_high`: every vertex judged. Room below zero fails every part; without a number more than the room already is a fail, anything else is open. */
function sparedTable(demand: HeadroomDemand, high: boolean): string {
  const stands = (outlook: Outlook): string => {
    const own = outlook === 'w' ? 'worst' : 'best';
    return `case when not ${meets('room', '0.0', 'at-most')} then 0 when ${own} is not null then ${meets('room', `(${own} + ${share(demand, outlook)})`, 'at-most')}
      when ${meets('room', `(bound_${outlook} + ${share(demand, outlook)})`, 'at-most')} then null else 0 end`;
  };
  const drift = `case when coalesce(offset_over, 0) or ${flag(demand.kelvin === 0)} then 0 else coalesce(offsetDrift_basis, 0) end`;
  return `create temp table spared_${high ? 'high' : 'low'} as select key, ${stands('w')} as w, ${stands('b')} as b, max(basis, coalesce(offsetVoltage_basis, 0), ${drift}) as vertex_basis, room - worst - ${share(demand, 'w')} as spare
  from needed join known using (key) where high = ${flag(high)}`;
}

/** All vertices hold, one fails, or one is open. */
const all = (column: string): string => `case when min(${column}) = 0 then 0 when count(${column}) < count(*) then null else 1 end`;

export function headroomTables(demands: Demands, surroundings: Surroundings): string {
  return [pointTable(surroundings), vertexTable(demands), SETS, NEEDED, sparedTable(demands['output-low'], false), sparedTable(demands['output-high'], true), peakTables(demands)].join(';\n');
}

export function headroomChecks(demands: Demands): string[] {
  const sides = ['low', 'high'].map((side) => {
    const margin = '1.0 + 0.25 * min(spare) / 0.05';
    return `${standing({ check: `output-${side}`, worst: all('w'), best: all('b'), basis: 'max(vertex_basis)', margin, from: `spared_${side}` })} group by key`;
  });
  return [...sides, outputCurrentCheck(demands)];
}

/** `usable_current`: in each direction the heaviest point its own side was measured at, half as much again at worst. */
function peakTables(demands: Demands): string {
  const peaks = demands['output-current'].peaks.map(({ side, amperes, supply }, at) => [String(at), flag(side === 'high'), real(amperes), real(supply)]);
  return `${rows('peak', ['p', 'high', 'asked', 'vs'], peaks)};
create temp table unassisted as select key, p, ${measured('coalesce(point.supply, peak.vs)')} as current, basis from peak join point on point.high = peak.high where not assisted;
create temp table heaviest_point as select key, p, current as heaviest, basis, row_number() over (partition by key, p order by current desc, basis) as place from unassisted;
create temp table directed as select known.key, asked, case when heaviest > 0.0 then ${REACH} * heaviest end as usable, max(2, coalesce(3 * (basis = 3), 0)) as basis
  from known join peak left join heaviest_point on heaviest_point.key = known.key and heaviest_point.p = peak.p and place = 1;
create temp table drawn as select key, min(case when usable is null then null else ${meets('asked', 'usable', 'at-least')} end) as least, count(usable) = count(*) as all_known, max(basis) as basis, min(usable - asked) as spare from directed group by key;
create temp table tightest_peak as select key, usable / asked as ratio, row_number() over (partition by key order by usable - asked) as place from directed where usable is not null`;
}

/** The guaranteed current; without it each direction by its points, and no fail on those. A stage that draws none needs no figure. */
function outputCurrentCheck(demands: Demands): string {
  const { required, peaks } = demands['output-current'];
  const rated = (outlook: Outlook): string => meets(real(required), `outputCurrent_${outlook}`, 'at-least');
  const none = flag(peaks.length === 0);
  const points = 'case when least = 0 then 0 when all_known then 1 end';
  const best = 'case when all_known then 1 end';
  const margin = `case when outputCurrent_w is not null then outputCurrent_w / ${real(required)} else (select ratio from tightest_peak where tightest_peak.key = known.key and place = 1) end`;
  return standing({
    check: text('output-current').slice(1, -1),
    worst: `case when outputCurrent_w is not null then ${rated('w')} when ${none} then 1 else ${points} end`,
    best: `case when outputCurrent_w is not null then ${rated('b')} when ${none} then 1 else ${best} end`,
    basis: `case when outputCurrent_w is not null then outputCurrent_basis when ${none} then 0 else drawn.basis end`,
    margin,
    from: 'known left join drawn using (key)',
  });
}
