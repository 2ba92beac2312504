import type { PhaseReversalDemand } from '../demands/index.js';
import { weakest, type Basis } from '../parts/basis.js';
import type { Readings } from '../parts/readings.js';
import { formatQuantity } from '../quantities/format.js';
import type { Finding, WordFinding } from '../verdicts/finding.js';
import type { Check } from './check.js';

/** An input that leaves its range must not turn the output to the other rail (M9). */
export const phaseReversal: Check<PhaseReversalDemand> = {
  id: 'phase-reversal',
  title: 'phase reversal',
  unit: null,
  reads: ['phaseReversal', 'inputLowHeadroom', 'inputHighHeadroom'],
  hasMargin: false,
  asks: ({ 'phase-reversal': asked }) => (asked.avoided ? asked : null),
  judge: judgeReversal,
};

function judgeReversal(asked: PhaseReversalDemand, readings: Readings): Finding {
  const { required, unit } = asked;
  const none = (note: string, basis: WordFinding['basis'] = 'guaranteed'): WordFinding => ({ kind: 'words', required, offered: 'none', basis, notes: [note] });
  if (asked.reach.still) return none('the inputs rest at the reference, out of reach of the signal');
  if (readings.identity.phaseReversal === false) return none('the list says there is none');
  if (staysWithinRails(asked)) return none('by the stage no input leaves the rails');
  const range = inputRange(asked, readings);
  if (range !== null && range.room >= (asked.reach.beyond ?? Infinity)) return none(`the inputs work ${formatQuantity(range.room, 'V')} beyond the rails, as far as they are taken`, range.basis);
  if (readings.identity.phaseReversal === null) {
    return { kind: 'undecided', required, unit, sense: null, cause: 'missing-figure', missing: [{ figure: 'phaseReversal', kind: null }] };
  }
  return { kind: 'words', required, offered: 'possible', basis: range?.basis ?? 'guaranteed', notes: [reasonOf(asked)] };
}

/** The stage says both: no input beyond a rail, and the supply before the signal. Silence rules out nothing. */
export function staysWithinRails({ reach }: Pick<PhaseReversalDemand, 'reach'>): boolean {
  return reach.beyond === 0 && reach.unpowered === 0;
}

/** How far beyond both rails the inputs work, V; asked where the stage says how far they are taken, and the supply is there first. */
function inputRange({ reach }: PhaseReversalDemand, readings: Readings): { readonly room: number; readonly basis: Basis } | null {
  const [low, high] = [readings.figure('inputLowHeadroom'), readings.figure('inputHighHeadroom')];
  if (reach.beyond === null || reach.unpowered !== 0 || low === null || high === null) return null;
  return { room: Math.min(-low.value, -high.value), basis: weakest([low.basis, high.basis]) };
}

function reasonOf({ reach: { beyond, unpowered } }: PhaseReversalDemand): string {
  if (beyond !== null && beyond > 0) return `an input goes ${formatQuantity(beyond, 'V')} beyond a rail: the output jumps to the other one`;
  if (unpowered !== null && unpowered > 0) return 'the signal is there before the supply: the output may start at the wrong rail';
  return 'when an input leaves its range, at overload or power-up, the output jumps to the other rail';
}
