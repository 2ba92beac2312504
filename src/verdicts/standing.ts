import { meets } from './compare.js';
import type { Finding, NumberFinding } from './finding.js';
import type { Outcome } from './verdict.js';

/** Share of a limit that borrowed terms may make up in a pass. */
const BORROWED_SHARE = 0.1;

export type Standing = 'pass' | 'fail' | 'open';

/** What becomes of both readings. */
export function outcomeOf(pessimistic: Finding, optimistic: Finding): Outcome {
  const worst = standingOf(pessimistic);
  const best = optimistic === pessimistic ? worst : standingOf(optimistic);
  return worst === 'pass' && best === 'pass' ? 'pass' : best === 'fail' && worst !== 'pass' ? 'fail' : 'unknown';
}

/** How one reading stands by itself. */
export function standingOf(finding: Finding): Standing {
  if (finding.kind === 'numbers') return standingOfNumbers(finding);
  if (finding.kind === 'bound') return meets(finding.required, finding.known, finding.sense) ? 'open' : 'fail';
  if (finding.kind === 'words') return finding.required.some((word) => same(word, finding.offered)) ? 'pass' : 'fail';
  if (finding.kind === 'undecided') return 'open';
  const standings = finding.findings.map(standingOf);
  if (standings.includes('fail')) return 'fail';
  return standings.includes('open') ? 'open' : 'pass';
}

/** A number against its limit. */
export function standingOfNumbers({ required, offered, sense, borrowed = 0 }: Pick<NumberFinding, 'required' | 'offered' | 'sense' | 'borrowed'>): Standing {
  if (!meets(required, offered, sense)) return 'fail';
  const tooMuch = borrowed > BORROWED_SHARE * Math.abs(required) * (1 + 1e-9);
  return tooMuch ? 'open' : 'pass';
}

const same = (a: string, b: string): boolean => a.trim().toLowerCase() === b.trim().toLowerCase();
