import type { Demands } from '../../src/demands/index.js';
import type { Bench, Load } from '../support/netlists.js';

/** Ends of the stage's inputs, volts: `input`, or `positive` and `negative`. AC-coupled: deviations from the bias. */
export type Point = Readonly<Record<string, number>>;

/** One drawn stage, twice: as the file the product reads, and as what lies on the bench. SI units, tolerances as fractions. */
export interface DrawnStage {
  readonly file: string;
  readonly demands: Demands;
  readonly bench: Bench;
  readonly isAc: boolean;
  readonly tolerance: number;
  readonly sourceTolerance: number;
  readonly supply: { readonly min: number; readonly nominal: number; readonly max: number };
  readonly reference: { readonly kind: 'ground' | 'mid-supply' | 'voltage'; readonly value: number; readonly tolerance: number };
  readonly points: readonly Point[];
  readonly centre: Point;
  readonly load: Load | null;
  readonly frequency: number;
  readonly temperature: { readonly min: number; readonly max: number };
  readonly gainError: number;
  readonly isVector: boolean;
  readonly swingLoss: number;
  readonly headroomMargin: number;
  readonly dcError: number;
}
