import type { Curves } from './curves/index.js';
import type { AnyDemand } from './demands/index.js';
import type { Changes, ComparedPart, LookupList, NothingFits, PartLookups, Sensitivity, Standing, SweptPoint, SweptTurn, WhyAhead } from './explanation/index.js';
import type { Origin } from './parts/part.js';
import type { Prediction } from './prediction/index.js';
import type { Order, RankedPart } from './ranking/index.js';
import type { JudgedPart, Rejection } from './screening/index.js';
import type { Stage } from './stage/index.js';

/** What every answer rests on. */
export interface DataUsed {
  readonly catalog: { readonly parts: number; readonly approved: number; readonly generic: number; readonly sha256: string };
  /** Version of the judging rules; changes when a verdict can change for the same data. */
  readonly rules: string;
}

/** How the answer was asked for. */
export interface Asking {
  readonly strict: boolean;
  readonly order: Order;
  /** `PART.figure=VALUE` as given, each carried into the output. */
  readonly assumed: readonly string[];
}

/** A stage's demands without any part. */
export interface DemandsReport {
  readonly stage: Stage;
  readonly demands: readonly AnyDemand[];
}

/** A ranked shortlist: what every presenter receives. Complete; presenters cut it to length. */
export interface Report extends DemandsReport {
  readonly counts: { readonly parts: number; readonly fit: number; readonly undecided: number; readonly rejected: number };
  readonly fit: readonly RankedPart[];
  readonly undecided: readonly JudgedPart[];
  readonly rejected: readonly JudgedPart[];
  readonly rejections: readonly Rejection[];
  readonly nearest: readonly JudgedPart[];
  readonly ahead: WhyAhead | null;
  /** Where nothing fits: why, and what would change that; null otherwise, or where nobody can rerun the stage. */
  readonly nothingFits: NothingFits | null;
  /** What to look up; only where it was asked for. */
  readonly lookups?: LookupList;
  readonly asking: Asking;
  readonly data: DataUsed;
  /** Origin of a figure by part and slot; null where none is kept. */
  readonly origin: (partId: string, slot: string) => Origin | null;
  /** What pictures of the stage with one of these parts show; computed when asked. */
  readonly curves: (judged: JudgedPart) => Curves;
}

/** One part on one stage, simulated; with --compare a second one beside it. */
export interface PredictionReport {
  readonly prediction: Prediction;
  readonly compared: Prediction | null;
  readonly asking: Asking;
  readonly data: DataUsed;
}

/** What no closed form answers, simulated instead: told, not judged. */
export interface PredictedInstead {
  readonly checks: readonly string[];
  readonly prediction: Prediction;
}

/** One part on one stage. */
export interface Explanation extends DemandsReport {
  readonly judged: JudgedPart;
  /** Place among what fits; null when it does not. */
  readonly rank: number | null;
  readonly counts: Report['counts'];
  /** Undecided only: what would decide it. */
  readonly lookups: PartLookups | null;
  /** Whether verdicts hang on borrowed or typical figures. */
  readonly sensitivity: readonly Sensitivity[];
  /** Up to three parts that fit as things stand. */
  readonly fitting: readonly RankedPart[];
  /** What would let it in; null where it fits, or where nobody can rerun the stage. */
  readonly changes: Changes | null;
  /** Null where every check has a closed form. */
  readonly predicted: PredictedInstead | null;
  readonly asking: Asking;
  readonly data: DataUsed;
  readonly origin: (partId: string, slot: string) => Origin | null;
  /** What pictures of the stage with this part show; computed when asked. */
  readonly curves: () => Curves;
}

/** The field that is swept, as the command understood it. */
export interface SweepOver {
  /** Dotted path in the stage file. */
  readonly path: string;
  readonly from: number;
  readonly to: number;
  /** SI; dB for ratios. */
  readonly unit: string;
  /** Spoken in percent: a fraction. */
  readonly isShare: boolean;
  readonly scale: 'linear' | 'log';
  /** What becomes of the ends the field has in the stage. */
  readonly keeps:
    | { readonly kind: 'nothing'; readonly replaced: string | null }
    | { readonly kind: 'lower-end'; readonly lower: number }
    | { readonly kind: 'tolerance'; readonly below: number; readonly above: number };
}

/** What the values of one field cost: how many parts fit and which comes first at each, and where that turns. */
export interface SweepReport {
  /** As it stands without the sweep; null where it is none. */
  readonly stage: Stage | null;
  readonly over: SweepOver;
  readonly points: readonly SweptPoint[];
  readonly turns: readonly SweptTurn[];
  /** `first`: only turns of the first choice are told. */
  readonly turnsOf: 'any' | 'first';
  readonly asking: Asking;
  readonly data: DataUsed;
}

/** Two parts of the catalog side by side on one stage. */
export interface Comparison extends DemandsReport {
  readonly parts: readonly [ComparedPart, ComparedPart];
  readonly standing: Standing;
  readonly counts: Report['counts'];
  readonly asking: Asking;
  readonly data: DataUsed;
  readonly origin: Report['origin'];
}
