import type { MovableInput } from '../spec/movable.js';
import type { Override } from '../spec/spec.js';
import type { Stage } from '../stage/index.js';

/** The stage with further options over it, read and built as the command would; null where it would be refused. */
export type Rerun = (overrides: readonly Override[]) => Stage | null;

/** What a search for changes may use: the stage under other options, its inputs as they stand, and which of them may move. */
export interface Changing {
  readonly rerun: Rerun;
  readonly inputs: readonly MovableInput[];
  /** `mayChange` of the stage; null: the usual ones. */
  readonly mayChange: readonly string[] | null;
}

/** One input moved. */
export interface Move {
  readonly path: string;
  /** What to write there: pastes back as `--set path=text`. */
  readonly text: string;
  /** What stands there now. */
  readonly was: string;
  /** False: a default, or nothing. */
  readonly written: boolean;
  /** Written value in SI units; null of words. */
  readonly value: number | null;
  /** Where the outcome turns, unrounded; null where only some values exist (words, preferred values). */
  readonly boundary: number | null;
  readonly direction: 'up' | 'down' | null;
  /** New to old, 1 or more; 1 of words. */
  readonly factor: number;
}

/** A smallest set of moves with which every check passes: judged again in full. */
export interface Change {
  readonly moves: readonly Move[];
  /** What it means for the circuit; null where a limit moves. */
  readonly design: string | null;
  /** The largest factor among the moves. */
  readonly factor: number;
}

/** What would let one part in. */
export interface Changes {
  /** By factor, then by number of moves. */
  readonly options: readonly Change[];
  /** Checks that do not pass as things stand. */
  readonly notPassing: readonly string[];
  /** Of these the ones that no single input that may move brings round. */
  readonly stuck: readonly string[];
  /** Inputs that may move here. */
  readonly movable: readonly string[];
  /** Where nothing that may move helps: what would, of the inputs that are kept fixed. Told, not proposed. */
  readonly beyond: readonly Change[];
  /** Ways the stage file cannot say, computed beside it. */
  readonly advice: readonly Advice[];
  /** Named in mayChange, and nothing this search can move. */
  readonly untried: readonly string[];
}

/** A way that no field of the stage stands for. Numbers only; SI. */
export type Advice =
  /** The offset is taken out once at 25 °C: what is left of the DC error, with what else must move. */
  | { readonly kind: 'calibrate'; readonly left: number; readonly allowed: number; readonly moves: readonly Move[] }
  /** Two stages of this gain each, both judged in full with these shares of the gain error (fraction) and of the DC error (V at the output of each). */
  | { readonly kind: 'split'; readonly gain: number; readonly gainError: number; readonly dcErrors: readonly [number, number] | null };

/** As the command line would set it. */
export const setting = (path: string, text: string): Override => ({ path, text, option: `--set ${path}` });
