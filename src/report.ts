import type { AnyDemand } from './demands/index.js';
import type { WhyAhead } from './explanation/index.js';
import type { Origin } from './parts/part.js';
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
  readonly asking: Asking;
  readonly data: DataUsed;
  /** Origin of a figure by part and slot; null where none is kept. */
  readonly origin: (partId: string, slot: string) => Origin | null;
}

/** One part on one stage. */
export interface Explanation extends DemandsReport {
  readonly judged: JudgedPart;
  /** Place among what fits; null when it does not. */
  readonly rank: number | null;
  readonly counts: Report['counts'];
  /** Up to three parts that fit as things stand. */
  readonly fitting: readonly RankedPart[];
  readonly asking: Asking;
  readonly data: DataUsed;
  readonly origin: (partId: string, slot: string) => Origin | null;
}
