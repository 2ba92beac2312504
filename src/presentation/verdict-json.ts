import type { Origin } from '../parts/part.js';
import type { Term } from '../verdicts/finding.js';
import type { Verdict } from '../verdicts/verdict.js';
import { verdictSentence } from './verdict-sentence.js';

export type OriginOf = (partId: string, slot: string) => Origin | null;

/** One verdict as documents carry it; numbers unrounded. Fields that do not apply are left out, unknown ones are null. */
export function verdictJson(verdict: Verdict, partId: string, originOf: OriginOf): object {
  const where = (slot: string | null): string | null => (slot === null ? null : originText(originOf(partId, slot)));
  return {
    check: verdict.check,
    outcome: verdict.outcome,
    required: verdict.required,
    offered: verdict.offered,
    offeredBest: verdict.offeredBest,
    unit: verdict.unit,
    sense: verdict.sense,
    margin: verdict.margin,
    ...(verdict.spare === null ? {} : { spare: verdict.spare }),
    basis: verdict.basis,
    ...(verdict.reason === null ? {} : { reason: verdict.reason }),
    ...(verdict.known === null ? {} : { known: verdict.known }),
    ...(verdict.missing.length === 0 ? {} : { missing: verdict.missing }),
    ...(verdict.decidesAt === null ? {} : { decidesAt: verdict.decidesAt }),
    worstAt: verdict.worstAt,
    ...(verdict.terms.length === 0 ? {} : { terms: verdict.terms.map((term) => termJson(term, where)) }),
    ...(verdict.adds === undefined ? {} : { adds: verdict.adds }),
    ...(verdict.termUnit === undefined ? {} : { termUnit: verdict.termUnit }),
    ...(verdict.rss === null ? {} : { rss: verdict.rss }),
    ...(verdict.slot === null || verdict.terms.length > 0 ? {} : { origin: where(verdict.slot), how: verdict.how }),
    ...(verdict.cautions.length === 0 ? {} : { cautions: verdict.cautions }),
    ...(verdict.notes === undefined ? {} : { notes: verdict.notes }),
    ...(verdict.measures === undefined ? {} : { measures: verdict.measures }),
    ...(verdict.remedies === undefined ? {} : { remedies: verdict.remedies }),
    text: verdictSentence(verdict),
  };
}

function termJson(term: Term, where: (slot: string | null) => string | null): object {
  const { name, value, basis, how } = term;
  return { name, value, basis, figure: term.figure, how, origin: where(term.slot) ?? (basis === 'borrowed' ? 'class' : null) };
}

/** Where a figure came from in one string: a cell by RFC 7111 (`approved.csv#cell=2,13`), a generic set, a class, an assumption. */
export function originText(origin: Origin | null): string | null {
  if (origin === null) return null;
  if (origin.kind === 'cell') return `${origin.file}#cell=${origin.row},${origin.column}`;
  if (origin.kind === 'generic') return `generic set ${origin.id}`;
  return origin.kind === 'class' ? `class ${origin.class}` : `assumption ${origin.text}`;
}
