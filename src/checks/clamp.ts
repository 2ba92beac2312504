import type { ClampDemand } from '../demands/index.js';
import type { Reading } from '../parts/reading.js';
import type { Readings } from '../parts/readings.js';
import { formatQuantity } from '../quantities/format.js';
import type { Finding, Missing, NumberFinding } from '../verdicts/finding.js';
import type { Check } from './check.js';

/** Diodes between inputs begin to conduct at the one and conduct in earnest at the other, V (common practice). */
const CONDUCTS = { begin: 0.5, full: 0.7 };

/** The voltage between the inputs against diodes that join them, and against the differential rating (M9). */
export const clamp: Check<ClampDemand> = {
  id: 'clamp',
  title: 'input clamp',
  unit: 'V',
  reads: ['inputClamp', 'differentialInput', 'slewRate'],
  hasMargin: false,
  asks: ({ clamp: asked }) => (asked.avoided ? asked : null),
  judge: judgeClamp,
};

/** One number against the other; also of a part nobody asked, for its cautions. */
export function judgeClamp(asked: ClampDemand, readings: Readings): Finding {
  const { unit, sense, slewing } = asked;
  const rate = slewing === null ? null : readings.figure('slewRate');
  const required = apart(asked, rate);
  // Whether it slews is not known: it may.
  const most = slewing !== null && rate === null ? Math.max(required, slewing.apart) : required;
  const common = { kind: 'numbers', required, unit, sense, notes: notesOf(asked, rate) } as const;
  if (most <= CONDUCTS.begin) return { ...common, ...ANY_PART };
  const endured = enduredBy(asked, readings);
  if (endured !== null && (most === required || endured.offered >= most)) return { ...common, ...endured };
  const slower: Missing[] = most > required ? [{ figure: 'slewRate', kind: 'min' }] : [];
  return missing({ ...asked, required }, endured === null ? [NO_STATEMENT, ...slower] : slower);
}

/** What a part endures between its inputs, V, and why. */
type Standing = Pick<NumberFinding, 'offered' | 'basis' | 'slot' | 'how'>;

const NO_STATEMENT: Missing = { figure: 'inputClamp', kind: null };
/** Below this no diode conducts: whatever joins the inputs does not matter. */
const ANY_PART: Standing = { offered: CONDUCTS.begin, basis: 'guaranteed', slot: null, how: 'no diode conducts below it (common practice)' };

function missing({ required, unit, sense }: ClampDemand, what: readonly Missing[]): Finding {
  return { kind: 'undecided', required, unit, sense, cause: 'missing-figure', missing: what };
}

/** A part slower than the slope lets the inputs part by its whole lag. */
function apart({ required, slewing }: ClampDemand, rate: Reading | null): number {
  return slewing !== null && rate !== null && rate.value < slewing.slewRate * (1 - 1e-9) ? Math.max(required, slewing.apart) : required;
}

function enduredBy(asked: ClampDemand, readings: Readings): Standing | null {
  const rating = readings.figure('differentialInput');
  const { inputClamp } = readings.identity;
  if (inputClamp === true) return clamped(rating, readings);
  if (rating !== null) return standing({ value: rating.value, basis: rating.basis, slot: rating.slot, how: rating.how });
  return inputClamp === null ? null : standing({ value: Math.max(asked.supply, asked.required), basis: 'guaranteed', slot: null, how: 'no diodes join the inputs' });
}

function clamped(rating: Reading | null, readings: Readings): Standing {
  const conducts = readings.bounded(CONDUCTS.begin, CONDUCTS.full);
  if (rating !== null && rating.value < conducts) return standing(rating);
  return { offered: conducts, basis: 'estimated', slot: null, how: `diodes join the inputs and conduct from ${CONDUCTS.begin} to ${CONDUCTS.full} V on (common practice)` };
}

function standing({ value, basis, slot, how }: Pick<Reading, 'value' | 'basis' | 'slot' | 'how'>): Standing {
  return { offered: value, basis, slot, how };
}

function notesOf({ slewing, required }: ClampDemand, rate: Reading | null): string[] {
  if (slewing === null || rate === null || rate.value >= slewing.slewRate * (1 - 1e-9) || slewing.apart <= required) return [];
  return [`slower than the ${formatQuantity(slewing.slewRate, 'V/s')} of the signal: while it slews the inputs stand up to ${formatQuantity(slewing.apart, 'V')} apart`];
}
