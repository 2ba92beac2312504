import type { Report } from '../report.js';
import type { JudgedPart } from '../screening/index.js';
import type { Verdict } from '../verdicts/verdict.js';

/**
 * The check with the least comfortable margin of a part that fits, as the order of the shortlist reckons it: the one meaning of
 * "tightest" on the page. A further package or channel count of a die has that of its line. Null where nothing has a margin, and of a
 * part that does not fit: there what is short or open comes first.
 */
export function tightestVerdict({ fit }: Pick<Report, 'fit'>, { part, verdicts }: Pick<JudgedPart, 'part' | 'verdicts'>): Verdict | null {
  const line = fit.find((one) => [one, ...one.variants].some((kin) => kin.part.id === part.id));
  return verdicts.find(({ check, outcome }) => outcome === 'pass' && check === line?.tightest) ?? null;
}
