import type { BriefVerdict } from '../verdicts/decide.js';
import type { JudgedPart } from './judged-part.js';

export const SHOWN = 3;
/** A word that does not match is farther away than any number nearby. */
const WORD = 3;
/** What counts as one step of a temperature, K, and of a head-room, as a fraction of the supply. */
const KELVIN = 20;
const SUPPLY_SHARE = 0.1;

/** The rejected parts whose failing checks are together nearest to their limits. */
export function nearestOf(rejected: readonly JudgedPart[], nominalSupply: number): JudgedPart[] {
  const measured = rejected.map((one) => ({ one, distance: distanceOf(one, nominalSupply) }));
  measured.sort((a, b) => a.distance - b.distance || (a.one.part.id < b.one.part.id ? -1 : 1));
  return measured.slice(0, SHOWN).map(({ one }) => one);
}

function distanceOf({ verdicts }: JudgedPart, nominalSupply: number): number {
  return verdicts.filter((verdict) => verdict.outcome === 'fail').reduce((sum, verdict) => sum + shortness(verdict, nominalSupply), 0);
}

/** 0 at the limit; ratios count as their logarithm. */
export function shortness(verdict: BriefVerdict, nominalSupply: number): number {
  if (verdict.margin !== null && verdict.margin > 0) return Math.abs(Math.log(verdict.margin));
  if (typeof verdict.required !== 'number') return WORD;
  const offered = typeof verdict.offered === 'number' ? verdict.offered : verdict.known;
  if (offered === null) return WORD;
  const short = Math.abs(verdict.required - offered);
  return verdict.unit === '°C' ? short / KELVIN : short / (SUPPLY_SHARE * nominalSupply);
}
