import type { Order } from '../../../src/ranking/index.js';
import { real, rows, text } from './sql.js';

/** Margin at which a check is comfortable, by limits and by anything weaker; the checks SQL answers of those the order looks at. */
const COMFORTABLE = [
  ['output-low', 1.25, 1.25], ['output-high', 1.25, 1.25], ['output-current', 1.25, 1.25], ['slew-rate', 1.2, 1.5], ['gain-bandwidth', 1.2, 1.5], ['dc-error', 1.25, 1.25],
] as const;

/** Nothing is worth less than this, and what is not known is worth this. */
const FLOOR = '0.2';

const clamped = (value: string): string => `max(${FLOOR}, min(1.0, max(0.0, ${value})))`;

/** 1 at the target and below, nothing at the worst, in the logarithm. */
const onLogScale = (value: string, target: string, worst: string): string => `coalesce(${clamped(`(ln(${worst}) - ln(${value})) / (ln(${worst}) - ln(${target}))`)}, ${FLOOR})`;

const STEPS: Readonly<Record<Order, string>> = {
  merit: '',
  price: 'price is null, price, ',
  current: 'current is null, current, ',
  margin: 'least_margin desc, ',
};

/**
 * `fitting`: what fits in its order, one line a family of one tier and proof. Merit is the geometric mean of three shares: margins, log price (0.05..20 EUR),
 * log supply current (0.1 µA..20 mA). What still ties goes by id; how much is to be confirmed SQL does not count.
 */
export function orderTables(order: Order): string {
  return `${rows('comfortable', ['check_id', 'by_limits', 'by_typicals'], COMFORTABLE.map(([check, limits, typicals]) => [text(check), real(limits), real(typicals)]))};
create temp table comfort as select key, verdict.margin, ${clamped('(verdict.margin - 0.8) / (case when basis = 0 then by_limits else by_typicals end - 0.8)')} as score from verdict join comfortable using (check_id) where verdict.margin is not null and abs(verdict.margin) < 9e999;
create temp table eased as select key, exp(avg(ln(score))) as margins, min(margin) as least_margin from comfort group by key;
create temp table proven as select key, max(basis) = 0 as by_limits from verdict group by key;
create temp table candidate as select known.key, tier, id, family, by_limits, quiescentCurrent_w as current, case when price_currency = 'EUR' then price_amount end as price,
  coalesce(margins, 1.0) as margins, coalesce(least_margin, 1.7e308) as least_margin
  from known join answer using (key) join proven using (key) left join eased using (key) where outcome = 'fits';
create temp table weighed as select *, exp((ln(margins) + ln(${onLogScale('price', '0.05', '20.0')}) + ln(${onLogScale('current', '0.1e-6', '20e-3')})) / 3.0) as merit from candidate;
create temp table lined as select *, row_number() over (order by ${STEPS[order]}tier = 'generic', not by_limits, merit desc, price is null, price, current is null, current, id) as place from weighed;
create temp table fitting as select *, min(place) over (partition by tier, by_limits, coalesce('family ' || family, 'alone ' || key)) as line from lined`;
}
