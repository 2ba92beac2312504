import { formatComparison } from '../quantities/format.js';
import { spoken } from './spoken.js';
import type { Verdict } from '../verdicts/verdict.js';

const RELATION = { 'at-least': 'needs at least', 'at-most': 'allowed at most' } as const;

/** One verdict in one plain sentence, quoting only numbers that are in it. */
export function verdictSentence(verdict: Verdict): string {
  if (verdict.sense === 'one-of' || Array.isArray(verdict.required)) return wordSentence(verdict);
  const { required, offered, unit, sense } = verdict;
  if (typeof required !== 'number' || unit === null || sense === null) return `${verdict.title}: ${why(verdict)}`;
  const value = typeof offered === 'number' ? offered : verdict.known;
  const limited = spoken(verdict.check, required, unit);
  if (value === null) return `${verdict.title}: ${why(verdict)}; ${RELATION[sense]} ${formatComparison(limited.value, limited.value, limited.unit, sense)[1]}`;
  const said = spoken(verdict.check, verdict.spare === 0 ? required : value, unit);
  const [shown, limit] = formatComparison(said.value, limited.value, said.unit, sense);
  // Of a bound that is not enough yet nothing is better than what is known of it.
  const partly = typeof offered === 'number' ? '' : sense === 'at-most' ? 'at least ' : 'at most ';
  const ending = verdict.outcome === 'unknown' ? `: ${why(verdict)}` : verdict.outcome === 'fail' ? ': does not hold' : '';
  return `${verdict.title} ${partly}${shown}, ${RELATION[sense]} ${limit}${ending}`;
}

function wordSentence(verdict: Verdict): string {
  const wanted = Array.isArray(verdict.required) ? verdict.required.join(' or ') : '';
  return `${verdict.title} ${verdict.offered === null ? 'not known' : String(verdict.offered)}, wanted ${wanted}`;
}

const REASONS: Readonly<Record<string, string>> = {
  'missing-figure': 'a figure is missing',
  'beyond-data': 'beyond what the data cover',
  'no-counting-point': 'no point counts here',
  currency: 'another currency',
  'not-built': 'this check is not built yet',
  'not-said': 'the stage does not say it',
  'typical-only': 'only a typical figure, too close after derating',
  estimated: 'an estimate, too close to decide',
  assumed: 'an assumed value, which cannot fail a part',
  borrowed: 'borrowed figures make up more than a tenth of the limit',
};

function why(verdict: Verdict): string {
  const reason = verdict.reason === null ? 'not decided' : (REASONS[verdict.reason] ?? verdict.reason);
  const missing = verdict.missing.map((one) => [one.figure, one.kind].filter((word) => word !== null).join(' '));
  return missing.length === 0 ? reason : `${reason} (${missing.join(', ')})`;
}
