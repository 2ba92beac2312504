import type { Operating } from '../../../src/parts/reading.js';
import { NAMES, RULES } from './figures.js';
import { flag, real, text } from './sql.js';

/** What of the stage decides how figures are read. */
export interface Surroundings {
  readonly operating: Operating;
  readonly strict: boolean;
}

/** Figures stated at 25 °C serve this far, K. */
const REACH = 15;
/** Terms a part may borrow from the generic sets of its class; the rest of them belong to the noise. */
const LENT = ['offsetDrift', 'offsetCurrent', 'commonModeRejection', 'supplyRejection', 'openLoopGain'] as const;

/** Largest distance from 25 °C, K. */
export const farthest = ({ coldest, hottest }: Operating): number => Math.max(Math.abs(coldest - 25), Math.abs(hottest - 25));

/**
 * `usable`: every figure that counts, with its worst and its best value, what it rests on and how well its conditions suit the stage.
 * With `--strict` only limits count.
 */
export function usableTable({ operating, strict }: Surroundings): string {
  const nominal = real(operating.nominalSupply);
  const hot = real(operating.hottest);
  const away = `coalesce(figure.temperature = 25.0, 0) and ${flag(farthest(operating) > REACH)}`;
  const far = `coalesce(figure.supply < ${nominal} / 2.0 * (1.0 - 1e-9) or figure.supply > ${nominal} * 2.0 * (1.0 + 1e-9), 0)`;
  const typical = 'case when half then value + abs(value) / 2.0 else value * factor end';
  return `create temp table usable as select figure.*, rule.more,
    ${away} as away,
    (case when figure.kind = 'typ' then ${typical} else value end) * (case when ${away} then coalesce(rule.away, 1.0) else 1.0 end) as worst,
    case when assumed then rule.best else value end as best,
    max(figure.kind = 'typ', 3 * (assumed or ${far}), 2 * (rule.away is not null and ${away})) as basis,
    abs(ln(coalesce(figure.supply, ${nominal}) / ${nominal})) as distance,
    case when is_over or figure.temperature is null then 1e4
      when figure.temperature = 25.0 then case when ${away} then 2e4 - 25.0 else -1e4 end
      when figure.temperature >= ${hot} then figure.temperature
      else 2e4 - figure.temperature end as warmth
    from figure join rule on rule.name = figure.name and rule.kind = figure.kind
    where ${strict ? "figure.kind <> 'typ' and not assumed" : '1'}`;
}

/** Of figures of one name: limits before typical ones, the nearest supply, the strongest basis, the temperature that suits best, the worse value. */
const SCALAR = `create temp table limited as select *, max(kind <> 'typ') over (partition by key, name) as has_limit from usable;
create temp table near as select *, min(distance) over (partition by key, name) as least from limited where kind <> 'typ' or not has_limit;
create temp table chosen as select *, row_number() over (partition by key, name order by basis, warmth, case when more then value else -value end) as place from near where distance <= least + 1e-9`;

/**
 * Input currents: the coolest rating that covers the top of the stage, nothing stated being 25 °C; where only a cooler one is known the current
 * doubles per 10 K, if the inputs are FETs or (type not known) draw less than 1 nA at the coolest rating.
 */
function currentTables({ operating }: Surroundings): string {
  const hot = real(operating.hottest);
  const rated = 'case when is_over then 9e999 else coalesce(temperature, 25.0) end';
  return `create temp table flowing as select *, ${rated} as rated, min(distance) over (partition by key, name) as least from usable where name in ('biasCurrent', 'offsetCurrent');
create temp table covering as select *, coalesce(min(case when rated >= ${hot} then rated end) over (partition by key, name), max(rated) over (partition by key, name)) as wanted from flowing where distance <= least + 1e-9;
create temp table at_wanted as select *, max(kind <> 'typ') over (partition by key, name) as has_limit from covering where rated = wanted;
create temp table current_chosen as select *, row_number() over (partition by key, name order by basis, value desc) as place from at_wanted where kind <> 'typ' or not has_limit;
create temp table coolest as select *, min(rated) over (partition by key) as cool from flowing where name = 'biasCurrent';
create temp table coolest_limits as select *, max(kind <> 'typ') over (partition by key) as has_limit from coolest where rated = cool;
create temp table doubling as select force.key, case when input_type is not null then input_type = 'fet' else coalesce(min(coolest_limits.value) < 1e-9, 0) end as doubles
  from force left join coolest_limits on coolest_limits.key = force.key and (coolest_limits.kind <> 'typ' or not has_limit) group by force.key;
create temp table current_read as select key, name, best, basis, worst, case when rated < ${hot} and doubles then ${hot} - rated else 0.0 end as kelvin
  from current_chosen join doubling using (key) where place = 1`;
}

/** The offset: one over temperature before one at 25 °C; of several the nearest supply, 25 °C before other temperatures, the larger. */
const OFFSET = `create temp table offset_limits as select *, max(kind <> 'typ') over (partition by key) as has_limit from usable where name = 'offsetVoltage';
create temp table offset_over as select *, max(is_over) over (partition by key) as has_over from offset_limits where kind <> 'typ' or not has_limit;
create temp table offset_near as select *, min(distance) over (partition by key) as least from offset_over where is_over or not has_over;
create temp table offset_chosen as select *, row_number() over (partition by key order by coalesce(temperature, 25.0) <> 25.0, value desc) as place from offset_near where distance <= least + 1e-9`;

/** `reading`: what each figure of each part is at worst and at best, and what it rests on. */
function readingTable(): string {
  return `create temp table reading as 
  select key, name, worst, best, basis from chosen where place = 1 and name not in ('biasCurrent', 'offsetCurrent', 'offsetVoltage')
  union all select key, name, worst * pow(2.0, kelvin / 10.0), best, max(basis, 2 * (kelvin > 0.0)) from current_read
  union all select key, name, worst, best, basis from offset_chosen where place = 1`;
}

/** Worst figures of a class over its generic sets; nothing is borrowed with `--strict`. */
function lentTable({ strict }: Surroundings): string {
  const rises = LENT.map((name) => `when ${text(name)} then ${RULES[name]?.more === undefined ? 'max' : 'min'}(worst)`).join(' ');
  return `create temp table lent as select class, name, case name ${rises} end as worst from reading join force using (key)
  where ${flag(!strict)} and tier = 'generic' and class is not null and name in (${LENT.map(text).join(', ')}) group by class, name`;
}

/** `known`: one row a part with all its readings, `NAME_w`, `NAME_b`, `NAME_basis`; `NAME_printed` where the list has the figure at all, `NAME_cw` and so on with what is borrowed. */
function knownTable(): string {
  const of = (name: string, column: string): string => `max(case when name = ${text(name)} then ${column} end)`;
  const read = NAMES.flatMap((name) => [`${of(name, 'worst')} as ${name}_w`, `${of(name, 'best')} as ${name}_b`, `${of(name, 'basis')} as ${name}_basis`]);
  const lent = LENT.map((name) => `${of(name, 'worst')} as ${name}_lent`);
  const columns = NAMES.flatMap((name) => [`${name}_w`, `${name}_b`, `${name}_basis`, `${name}_printed`]);
  return `create temp table read_row as select key, ${read.join(', ')} from reading group by key;
create temp table printed_row as select key, ${NAMES.map((name) => `max(name = ${text(name)}) as ${name}_printed`).join(', ')} from figure group by key;
create temp table lent_row as select class, ${lent.join(', ')} from lent group by class;
create temp table known as select force.key, tier, id, status, lifecycle, package, channels, qualification, family, price_amount, price_currency,
  phase_reversal, input_clamp, crossover_free, ${columns.join(', ')}, ${LENT.map(borrowing).join(', ')}, is_over as offset_over, supply as offset_supply
  from force left join read_row using (key) left join printed_row using (key) left join lent_row on lent_row.class = force.class
  left join (select key, is_over, supply from offset_chosen where place = 1) using (key)`;
}

/** The part's own figure, else its class's: its worst, or at best no contribution at all. */
function borrowing(name: string): string {
  const best = RULES[name]?.more === undefined ? '0.0' : '9e999';
  return `${name}_lent, coalesce(${name}_w, ${name}_lent) as ${name}_cw, coalesce(${name}_b, case when ${name}_lent is not null then ${best} end) as ${name}_cb, case when ${name}_w is null then 4 else ${name}_basis end as ${name}_cbasis`;
}

/** Everything between the part table and the checks. */
export function readingTables(surroundings: Surroundings): string {
  return [usableTable(surroundings), SCALAR, currentTables(surroundings), OFFSET, readingTable(), lentTable(surroundings), knownTable()].join(';\n');
}
