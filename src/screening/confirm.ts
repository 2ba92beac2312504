import type { TurningPoint } from '../verdicts/finding.js';
import type { Verdict } from '../verdicts/verdict.js';
import type { Confirmation } from './judged-part.js';

/** Everything a fit rests on that is not a limit, once each, with the checks that rest on it. */
export function confirmations(verdicts: readonly Verdict[]): Confirmation[] {
  const found = new Map<string, Confirmation>();
  for (const verdict of verdicts) {
    if (verdict.basis === 'guaranteed') continue;
    for (const one of weakPoints(verdict)) {
      const key = one.slot ?? `${one.figure}/${verdict.check}`;
      const known = found.get(key);
      found.set(key, known === undefined ? one : merged(known, one));
    }
  }
  return [...found.values()];
}

function merged(known: Confirmation, one: Confirmation): Confirmation {
  const checks = known.checks.includes(one.checks[0] ?? '') ? known.checks : [...known.checks, ...one.checks];
  return { ...known, checks };
}

function weakPoints(verdict: Verdict): Confirmation[] {
  const needed = verdict.turnsAt === null ? null : neededOf(verdict.turnsAt);
  const checks = [verdict.check];
  // A term with no figure of its own (the noise of a resistor over a typical bandwidth) is nothing anybody can look up.
  const terms = verdict.terms.filter((term) => term.basis !== 'guaranteed' && (term.slot !== null || term.basis === 'borrowed' || term.basis === 'assumed'));
  if (terms.length > 0) {
    return terms.map((term) => {
      const figure = parameterOf(term.slot);
      // Only the figure the verdict turns on has a limit that would still pass.
      const turns = term.name === 'head-room' || (figure !== null && figure === verdict.turnsAt?.figure);
      return { figure: figure ?? term.name, slot: term.slot, basis: term.basis, how: term.how, checks, needed: turns ? needed : null };
    });
  }
  // A demand of zero (no frequency above DC) is met by any figure.
  if (needed?.value === 0 && verdict.sense === 'at-least') return [];
  const figure = parameterOf(verdict.slot) ?? verdict.turnsAt?.figure ?? verdict.check;
  return [{ figure, slot: verdict.slot, basis: verdict.basis ?? 'assumed', how: verdict.how, checks, needed }];
}

/** The turning point without the figure it is of: that of the confirmation may be one of its terms. */
function neededOf({ kind, value, unit, condition }: TurningPoint): NonNullable<Confirmation['needed']> {
  return { kind, value, unit, ...(condition === undefined ? {} : { condition }) };
}

/** `slewRate.typ@V5` → slewRate. */
function parameterOf(slot: string | null): string | null {
  return slot === null ? null : (slot.split('.')[0] ?? null);
}
