import { judgeClamp } from '../checks/clamp.js';
import { judgeOverdrive } from '../checks/overdrive.js';
import { judgeStartUp } from '../checks/start-up.js';
import { judgeRipple } from '../checks/supply-ripple.js';
import type { Demands } from '../demands/index.js';
import type { Part } from '../parts/part.js';
import type { Readings } from '../parts/readings.js';
import { standingOf } from '../verdicts/standing.js';
import type { Finding, Missing } from '../verdicts/finding.js';

/** What the stage says can happen to it, and what a part makes of it; null, or what is missing, where no figure says. SI units. */
export type Circumstance =
  /** An input can leave the rails, and whether the part then reverses its phase is not known. */
  | { readonly kind: 'reversal-unknown' }
  /** The stage takes the inputs this far apart, V; whether diodes join them is not known. */
  | { readonly kind: 'clamp-unknown'; readonly apart: number }
  /** V beyond a rail against what the inputs endure. */
  | { readonly kind: 'overdrive'; readonly beyond: number; readonly endures: number | null }
  /** After the input was beyond a rail the output needs this long, s. */
  | { readonly kind: 'recovery'; readonly time: number | null }
  /** V peak at the output. */
  | { readonly kind: 'ripple'; readonly output: number | null; readonly frequency: number; readonly missing: readonly Missing[] }
  /** s, of the time the stage is on. */
  | { readonly kind: 'start-up'; readonly time: number | null; readonly on: number; readonly missing: readonly Missing[] };

/** Cautions on what the stage states; what it avoids or limits is judged instead. */
export function circumstancesOf(part: Part, demands: Demands, readings: Readings): Circumstance[] {
  return [
    ...reversalUnknown(part, demands),
    ...clampUnknown(part, demands, readings),
    ...overdriven(demands, readings),
    ...recovery(demands, readings),
    ...ripple(demands, readings),
    ...starting(demands, readings),
  ];
}

const goesOut = ({ overdrive: { reach } }: Demands): boolean => (reach.beyond ?? 0) > 0 || (reach.unpowered ?? 0) > 0;

function reversalUnknown(part: Part, demands: Demands): Circumstance[] {
  const { avoided, reach } = demands['phase-reversal'];
  return part.phaseReversal === null && !avoided && !reach.still && goesOut(demands) ? [{ kind: 'reversal-unknown' }] : [];
}

function clampUnknown(part: Part, { clamp: asked, 'frequency-error': oscillator }: Demands, readings: Readings): Circumstance[] {
  // The frequency of an oscillator says it where it is judged.
  if (part.inputClamp !== null || asked.avoided || oscillator !== null) return [];
  const finding = judgeClamp(asked, readings);
  const isUnknown = finding.kind === 'undecided' && finding.missing.some(({ figure }) => figure === 'inputClamp');
  return isUnknown && typeof finding.required === 'number' ? [{ kind: 'clamp-unknown', apart: Math.max(finding.required, asked.slewing?.apart ?? 0) }] : [];
}

function overdriven({ overdrive: asked }: Demands, readings: Readings): Circumstance[] {
  if (asked.avoided || asked.required === null || asked.required === 0) return [];
  const finding = judgeOverdrive(asked, readings);
  if (standingOf(finding) === 'pass') return [];
  return [{ kind: 'overdrive', beyond: asked.required, endures: finding.kind === 'numbers' ? finding.offered : null }];
}

/** A start-up that is told or judged from an overload has the recovery in it. */
function recovery(demands: Demands, readings: Readings): Circumstance[] {
  if (!goesOut(demands) || demands['start-up']?.overloaded === true) return [];
  return [{ kind: 'recovery', time: readings.figure('overloadRecovery')?.value ?? null }];
}

function ripple({ 'supply-ripple': asked }: Demands, readings: Readings): Circumstance[] {
  if (asked?.required !== null) return [];
  const finding = judgeRipple(asked, Infinity, readings);
  return [{ kind: 'ripple', output: offeredOf(finding), frequency: asked.frequency, missing: missingOf(finding) }];
}

function starting({ 'start-up': asked }: Demands, readings: Readings): Circumstance[] {
  if (asked?.required !== null || asked.on === null) return [];
  const finding = judgeStartUp(asked, Infinity, readings);
  return [{ kind: 'start-up', time: offeredOf(finding), on: asked.on, missing: missingOf(finding) }];
}

const offeredOf = (finding: Finding): number | null => (finding.kind === 'numbers' ? finding.offered : null);
const missingOf = (finding: Finding): readonly Missing[] => (finding.kind === 'bound' || finding.kind === 'undecided' ? finding.missing : []);
