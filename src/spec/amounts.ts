/** A value with its ends; equal ends when the user gave one figure. `text` is the canonical echo. */
export interface Interval {
  readonly min: number;
  readonly nominal: number;
  readonly max: number;
  readonly text: string;
}

/** One figure with the canonical echo of what was typed. */
export interface Value {
  readonly value: number;
  readonly text: string;
}

/** Swing of one input: its extremes against ground (DC-coupled), volts. */
export interface Swing {
  readonly min: number;
  readonly max: number;
  readonly text: string;
}
