import type { Report } from '../../report.js';
import type { JudgedPart } from '../../screening/index.js';

/** Everything the page of one stage is made of. Prediction and sweep are drawn when they are there. */
export interface PageInput {
  readonly report: Report;
  /** The part the page is about; null: none fits or none was chosen. */
  readonly chosen: JudgedPart | null;
  readonly prediction?: PredictionCurves;
  readonly sweep?: SweepCurve;
}

/** What the drawing of the waveform reads of a prediction. Seconds and volts, arrays of one length. */
export interface PredictionCurves {
  readonly part: string;
  readonly waveform: {
    readonly t: readonly number[];
    readonly ideal: readonly number[];
    /** Null where its figures do not say it. */
    readonly typical: readonly number[] | null;
    readonly worst: readonly number[] | null;
  } | null;
}

/** What the drawing of a sweep reads of it. Values in SI units. */
export interface SweepCurve {
  /** Dotted path of the stage file: `limits.dcError`. */
  readonly over: string;
  readonly unit?: string;
  readonly points: readonly SweepPoint[];
  /** Where the first choice, or whether anything fits, changes. */
  readonly turns: readonly { readonly at: number; readonly from: string | null; readonly to: string | null }[];
  /** Where the stage stands now; looked up in the stage when absent. */
  readonly current?: number;
}

export interface SweepPoint {
  readonly value: number;
  readonly counts: { readonly fit: number; readonly undecided: number; readonly rejected: number };
  /** Id of the first of what fits; null: nothing does. */
  readonly first: string | null;
}
