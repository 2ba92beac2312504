import type { Basis } from '../parts/basis.js';
import type { Part } from '../parts/part.js';
import type { TurningPoint } from '../verdicts/finding.js';
import type { Verdict } from '../verdicts/verdict.js';
import type { BatteryLife } from './battery.js';
import type { DynamicRange } from './dynamic-range.js';
import type { PartHazard } from './hazards.js';

export type PartOutcome = 'fits' | 'undecided' | 'does-not-fit';

/** A figure to confirm before release: what a fit rests on that is not a limit. */
export interface Confirmation {
  /** Parameter, or the name of the term where no single figure stands behind it. */
  readonly figure: string;
  readonly slot: string | null;
  readonly basis: Basis;
  readonly how: string | null;
  /** Checks that rest on it. */
  readonly checks: readonly string[];
  /** The limit that would still pass, SI, where one figure decides. */
  readonly needed: Omit<TurningPoint, 'figure'> | null;
}

/** One part with all its verdicts, in the order of the checks. */
export interface JudgedPart {
  readonly part: Part;
  readonly outcome: PartOutcome;
  /** Fits only: every deciding figure a limit, or some derated, estimated, assumed or borrowed. */
  readonly proof: 'limits' | 'typical' | null;
  /** Undecided only: with its class's figures it would pass. */
  readonly likely: boolean;
  readonly verdicts: readonly Verdict[];
  /** Ids of the checks the outcome rests on: those that fail, of an undecided part those that are open; none where all pass. */
  readonly deciding: readonly string[];
  readonly confirm: readonly Confirmation[];
  /** What can go wrong though every check passes. */
  readonly hazards: readonly PartHazard[];
  /** Quiescent current per amplifier on the pessimistic reading, A; for the order, asked or not. */
  readonly current: number | null;
  /** What head-room leaves of the swing at the lowest supply; null where it is not known. */
  readonly dynamicRange: DynamicRange | null;
  /** Null without a battery, or with the quiescent current not known. */
  readonly batteryHours: BatteryLife | null;
}
