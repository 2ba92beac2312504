import type { PredictionCurves, SweepCurve } from './page-input.js';
import type { JudgedPart } from '../../screening/index.js';
import type { Report } from '../../report.js';

/** A field an option changed, as typed. */
export interface StageChanged {
  readonly path: string;
  readonly text: string;
  readonly option: string;
}

/** The part a review is about, and who chose it: named for this review, kept with the stage, or simply the first in order. */
export interface ChosenPart {
  readonly judged: JudgedPart;
  /** Place among what fits; null when it does not. */
  readonly rank: number | null;
  readonly by: 'named' | 'saved' | 'first';
  /** Why it is on the list no more; it is shown as it was last, outside the shortlist. */
  readonly withdrawn?: string;
}

/** One stage of a review: as written, as changed by options, as judged. */
export interface ReviewedStage {
  /** As typed; null when options alone describe the stage. */
  readonly file: string | null;
  readonly text: string | null;
  /** SHA-256 of the text in UTF-8, hexadecimal: that of the file, unless it began with a byte order mark. */
  readonly sha256: string | null;
  readonly changes: readonly StageChanged[];
  /** Null when nothing fits and no part was named. */
  readonly chosen: ChosenPart | null;
  readonly report: Report;
  /** The chosen part on the stage, simulated; null without one. */
  readonly prediction: PredictionCurves | null;
  /** What the first budget of the stage costs; null where none is written. */
  readonly sweep: SweepCurve | null;
}

export const SYMBOLS = ['iec', 'ieee'] as const;
/** Drawing rules of the schematic: IEC 60617 or IEEE 315. */
export type Symbols = (typeof SYMBOLS)[number];

/** Everything a review says, before it is a page, a table or a document. */
export interface Review {
  readonly stages: readonly ReviewedStage[];
  /** Base name of the file it is written to; null on stdout. */
  readonly name: string | null;
  /** ISO 8601 with zone. */
  readonly time: string;
  /** Name and version of the tool. */
  readonly tool: string;
  /** As it can be typed again. */
  readonly command: string;
  readonly symbols: Symbols;
  /** How many parts of each kind are listed; counts are complete. */
  readonly top: number;
  /** Rejected parts with all their verdicts too. */
  readonly all: boolean;
}
