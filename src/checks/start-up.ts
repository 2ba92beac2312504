import type { StartUpDemand } from '../demands/index.js';
import { weakest } from '../parts/basis.js';
import type { Parameter } from '../parts/figures.js';
import type { Readings } from '../parts/readings.js';
import type { Finding, Missing, Term } from '../verdicts/finding.js';
import type { Check } from './check.js';

/** From switching on to a usable output: start-up, and where the signal is there first the recovery from overload. */
export const startUp: Check<StartUpDemand> = {
  id: 'start-up',
  title: 'start-up',
  unit: 's',
  reads: ['startUpTime', 'overloadRecovery'],
  hasMargin: true,
  asks: ({ 'start-up': asked }) => (asked?.required == null ? null : asked),
  judge: (asked, readings) => judgeStartUp(asked, asked.required ?? Infinity, readings),
};

/** What it takes; `required` s, Infinity where only the number is wanted. */
export function judgeStartUp({ unit, sense, overloaded }: StartUpDemand, required: number, readings: Readings): Finding {
  const parts = [taken('start-up', 'startUpTime', readings), ...(overloaded ? [taken('overload recovery', 'overloadRecovery', readings)] : [])];
  const terms = parts.flatMap((one) => ('term' in one ? [one.term] : []));
  const missing = parts.flatMap((one) => ('missing' in one ? [one.missing] : []));
  const known = terms.reduce((sum, { value }) => sum + value, 0);
  const common = { required, unit, sense, terms, basis: weakest(terms.map(({ basis }) => basis)) } as const;
  if (missing.length === 0) return { kind: 'numbers', ...common, offered: known };
  const [only] = missing;
  const turnsAt = missing.length === 1 && only !== undefined && known < required && Number.isFinite(required) ? { figure: only.figure, kind: 'max', value: required - known, unit: 's' } as const : null;
  return { kind: 'bound', ...common, known, missing, cause: 'missing-figure', turnsAt };
}

type Taken = { readonly term: Term } | { readonly missing: Missing & { readonly figure: Parameter } };

function taken(name: string, figure: Parameter, readings: Readings): Taken {
  const reading = readings.figure(figure);
  if (reading === null) return { missing: { figure, kind: 'max' } };
  const { value, slot, basis, how, printed } = reading;
  return { term: { name, value, slot, basis, how, figure: printed === null ? null : { value: printed, unit: 's' } } };
}
