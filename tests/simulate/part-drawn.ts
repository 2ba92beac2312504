import type { Figure } from '../../src/parts/figures.js';
import type { InputType } from '../../src/parts/part.js';
import type { Reading } from './reading.js';

/** Volts an output loses at a rail, as a text of the simulator's in a current, and as a number. */
export interface Loss {
  text(current: string): string;
  at(amperes: number): number;
}

/** What an amplifier of the simulator is made of in one reading; what a check does not look at is absent. */
export interface Physical {
  /** The one figure of a check that compares one. */
  readonly value?: number;
  /** Per side, what the output may give, A. */
  readonly usable?: { readonly high: number; readonly low: number };
  readonly loss?: (supply: number) => Loss;
  /** Volts, at the input, drift included. */
  readonly offset?: number;
  readonly dc?: DcFigures;
}

export interface DcFigures {
  readonly offset: number;
  readonly ratedSupply: number | null;
  readonly bias: number;
  /** Null: the pins may differ by the whole bias current. */
  readonly offsetCurrent: number | null;
  readonly commonModeRejection: number;
  readonly supplyRejection: number;
  readonly openLoopGain: number;
}

/** A part whose figures grow worse with one scale, and what it is in the simulator at that scale. Null: no figure to simulate with. */
export interface DrawnPart {
  /** In which way its figures are known. */
  readonly way: string;
  readonly inputType: InputType | null;
  readonly ends: readonly [number, number];
  /** True: the scale is a length rather than a factor. */
  readonly isLinear: boolean;
  figures(scale: number): readonly Figure[];
  physical(scale: number, reading: Reading): Physical | null;
}
