import { weakest, type Basis } from '../parts/basis.js';
import { equal, marginOf, spareOf } from './compare.js';
import type { Finding, Remedy, SingleFinding, WordFinding } from './finding.js';
import { remarksOf, remediesOf } from './remarks.js';
import { outcomeOf, standingOf, type Standing } from './standing.js';
import type { Outcome, Reason, Verdict } from './verdict.js';

/** What decide needs to know of a check to word its verdict. */
export interface CheckIdentity {
  readonly id: string;
  readonly title: string;
  /** False for head-rooms and temperatures: a ratio says nothing there. */
  readonly hasMargin: boolean;
}

/** The only place findings become verdicts: pass on both readings passes, fail on the best reading fails, all else is unknown. */
export function decide(check: CheckIdentity, pessimistic: Finding, optimistic: Finding): Verdict {
  const outcome = outcomeOf(pessimistic, optimistic);
  const [shown, other] = outcome === 'fail' ? [optimistic, pessimistic] : [pessimistic, optimistic];
  if (shown.kind === 'words') return wordVerdict(check, outcome, { finding: shown, best: offeredOf(other) });
  const basis = basisBehind(pessimistic, shown);
  const remedies = outcome === 'pass' ? [] : remediesOf(pessimistic);
  return verdictOf(check, { outcome, shown: shownOf(shown, outcome), whole: shown, other, basis, remedies });
}

/** What tally and order need of a verdict. */
export type BriefVerdict = Pick<Verdict, 'check' | 'outcome' | 'required' | 'offered' | 'unit' | 'margin' | 'spare' | 'basis' | 'standsOn' | 'known'>;

/** The same decision where nothing is told but its numbers. */
export function decideBriefly(check: CheckIdentity, pessimistic: Finding, optimistic: Finding): BriefVerdict {
  const outcome = outcomeOf(pessimistic, optimistic);
  const shown = outcome === 'fail' ? optimistic : pessimistic;
  if (shown.kind === 'words') {
    const basis = shown.basis ?? 'guaranteed';
    return { check: check.id, outcome, required: shown.required, offered: shown.offered, unit: null, margin: null, spare: null, basis: outcome === 'unknown' ? null : basis, standsOn: basis, known: null };
  }
  return numbersOf(check, { outcome, shown: shownOf(shown, outcome), basis: basisBehind(pessimistic, shown) });
}

const basisBehind = (pessimistic: Finding, shown: Exclude<Finding, WordFinding>): Basis => basisOf(pessimistic.kind === 'words' || pessimistic.kind === 'undecided' ? shown : pessimistic);

/** Of the vertices that decide, the one of least spare; one with a number before one with a bound. */
function shownOf(finding: Exclude<Finding, WordFinding>, outcome: Outcome): SingleFinding {
  if (finding.kind !== 'vertices') return finding;
  const [one, another] = finding.findings;
  if (one !== undefined && another === undefined) return one;
  const ranked = deciding(finding.findings, outcome).sort((a, b) => rank(a) - rank(b) || spare(a) - spare(b));
  const first = ranked[0];
  if (first === undefined) throw new RangeError('a check over vertices has none');
  return first;
}

/** A fail is decided by the vertices that fail, an unknown by those that do not pass, a pass by all. */
function deciding(findings: readonly SingleFinding[], outcome: Outcome): SingleFinding[] {
  const standings = findings.map((finding) => ({ finding, standing: standingOf(finding) }));
  const chosen = standings.filter(({ standing }) => (outcome === 'fail' ? standing === 'fail' : outcome === 'unknown' ? standing !== 'pass' : true));
  return (chosen.length > 0 ? chosen : standings).map(({ finding }) => finding);
}

const rank = (finding: SingleFinding): number => ({ numbers: 0, bound: 1, undecided: 2 })[finding.kind];

function spare(finding: SingleFinding): number {
  if (finding.kind === 'numbers') return spareOf(finding.required, finding.offered, finding.sense);
  if (finding.kind === 'bound') return spareOf(finding.required, finding.known, finding.sense);
  return typeof finding.required === 'number' ? finding.required : 0;
}

/** Weakest basis, over all vertices for head-rooms. */
function basisOf(finding: Exclude<Finding, WordFinding>): Basis {
  if (finding.kind === 'vertices') return finding.basis ?? weakest(finding.findings.map(basisOf));
  return finding.kind === 'undecided' ? 'guaranteed' : finding.basis;
}

interface Decided {
  readonly outcome: Outcome;
  readonly shown: SingleFinding;
  /** What `shown` was taken from. */
  readonly whole: Finding;
  readonly other: Finding;
  readonly basis: Basis;
  readonly remedies: readonly Remedy[];
}

function numbersOf(check: CheckIdentity, { outcome, shown, basis }: Pick<Decided, 'outcome' | 'shown' | 'basis'>): BriefVerdict {
  const offered = shown.kind === 'numbers' ? finite(shown.offered) : null;
  const compared = offered !== null && typeof shown.required === 'number' && shown.sense !== null;
  return {
    check: check.id,
    outcome,
    required: shown.required,
    offered,
    unit: shown.unit,
    margin: compared && check.hasMargin ? marginOf(shown.required, offered, shown.sense) : null,
    spare: compared ? tidy(spareOf(shown.required, offered, shown.sense), shown.required, offered) : null,
    basis: outcome === 'unknown' ? null : basis,
    standsOn: shown.kind === 'undecided' ? null : basis,
    known: shown.kind === 'bound' && (shown.known !== 0 || outcome === 'fail') ? finite(shown.known) : null,
  };
}

function verdictOf(check: CheckIdentity, decided: Decided): Verdict {
  const { outcome, shown, whole, other, basis, remedies } = decided;
  const { required, offered, unit, margin, spare: left, basis: grade, standsOn, known } = numbersOf(check, decided);
  return {
    check: check.id,
    title: check.title,
    outcome,
    required,
    offered,
    offeredBest: offeredOf(other),
    ...(whole.kind === 'vertices' && other.kind === 'vertices' ? { otherThere: numberOf(other.findings[whole.findings.indexOf(shown)]) } : {}),
    unit,
    sense: shown.sense ?? (Array.isArray(shown.required) ? 'one-of' : null),
    margin,
    spare: left,
    basis: grade,
    standsOn,
    worstAt: shown.corner ?? null,
    terms: shown.kind === 'undecided' ? [] : (shown.terms ?? []),
    rss: shown.kind === 'numbers' ? (shown.rss ?? null) : null,
    known,
    reason: outcome === 'unknown' ? reasonOf(shown, basis) : null,
    missing: shown.kind === 'numbers' ? [] : shown.missing,
    decidesAt: outcome === 'unknown' ? (shown.turnsAt ?? null) : null,
    turnsAt: shown.turnsAt ?? null,
    cautions: shown.cautions ?? [],
    slot: shown.kind === 'numbers' ? (shown.slot ?? null) : null,
    how: shown.kind === 'numbers' ? (shown.how ?? null) : null,
    ...remarksOf(shown, remedies),
  };
}

/** Both readings have their vertices in the same order. */
const numberOf = (finding: SingleFinding | undefined): number | null => (finding?.kind === 'numbers' ? finite(finding.offered) : null);

const finite = (value: number): number | null => (Number.isFinite(value) ? value : null);

/** A spare that is zero but for rounding is zero. */
function tidy(left: number, required: number, offered: number): number {
  return equal(required, offered) ? 0 : left;
}

const AS_OUTCOME: Record<Standing, Outcome> = { pass: 'pass', fail: 'fail', open: 'unknown' };

function offeredOf(finding: Finding): number | string | null {
  if (finding.kind === 'words') return finding.offered;
  const shown = shownOf(finding, AS_OUTCOME[standingOf(finding)]);
  return shown.kind === 'numbers' ? finite(shown.offered) : null;
}

const REASONS: Record<Basis, Reason> = {
  guaranteed: 'beyond-data',
  derated: 'typical-only',
  estimated: 'estimated',
  assumed: 'assumed',
  borrowed: 'borrowed',
};

function reasonOf(shown: SingleFinding, basis: Basis): Reason {
  return shown.kind === 'numbers' ? REASONS[basis] : shown.cause;
}

function wordVerdict(check: CheckIdentity, outcome: Outcome, { finding, best }: { readonly finding: WordFinding; readonly best: Verdict['offeredBest'] }): Verdict {
  const { required, offered, notes, measures } = finding;
  const basis = finding.basis ?? 'guaranteed';
  return {
    check: check.id, title: check.title, outcome, required, offered, offeredBest: best,
    unit: null, sense: 'one-of', margin: null, spare: null, basis: outcome === 'unknown' ? null : basis, standsOn: basis, worstAt: null, terms: [], rss: null,
    known: null, reason: outcome === 'unknown' ? REASONS[basis] : null, missing: [], decidesAt: null, turnsAt: null, cautions: [], slot: null, how: null,
    ...(notes === undefined || notes.length === 0 ? {} : { notes }),
    ...(measures === undefined ? {} : { measures }),
  };
}
