import type { Report } from '../report.js';
import type { JudgedPart } from '../screening/index.js';
import { csvText } from './csv-cell.js';

/** The whole shortlist as a table: what fits by rank, then what cannot be decided, then what does not fit. SI numbers. */
export function shortlistCsv(report: Report): string {
  const fits = report.fit.flatMap((line) => [{ line, one: line satisfies JudgedPart }, ...line.variants.map((one) => ({ line, one }))]);
  const checks = [...new Set([...report.fit, ...report.undecided, ...report.rejected].flatMap(({ verdicts }) => verdicts.map(({ check }) => check)))];
  const header = ['rank', 'part', 'tier', 'outcome', 'proof', 'merit', 'tightest', 'price', 'currency', 'supply current (A)', 'failing', ...checks];
  const ranked = fits.map(({ line, one }) => [line.rank, ...rowOf(one, { merit: one === line ? line.merit.total : null, tightest: one === line ? line.tightest : null }, checks)]);
  const others = [...report.undecided, ...report.rejected].map((one) => [null, ...rowOf(one, { merit: null, tightest: null }, checks)]);
  return csvText([header, ...ranked, ...others]);
}

interface Order {
  readonly merit: number | null;
  readonly tightest: string | null;
}

function rowOf(one: JudgedPart, order: Order, checks: readonly string[]): (string | number | null)[] {
  const { part, verdicts } = one;
  const failing = verdicts.filter(({ outcome }) => outcome === 'fail').map(({ check }) => check);
  const outcomes = checks.map((check) => verdicts.find((verdict) => verdict.check === check)?.outcome ?? null);
  return [part.id, part.tier, one.outcome, one.proof, order.merit, order.tightest, part.price?.amount ?? null, part.price?.currency ?? null, one.current, failing.join(' ') || null, ...outcomes];
}
