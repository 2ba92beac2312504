import type { Stage } from '../stage/index.js';
import type { Amplifier, Outcome } from './amplifier.js';
import type { Around } from './circuit.js';
import type { Corner, Level } from './corner.js';
import type { LinearStage } from './equations.js';

/** Everything one run over time needs. */
export interface Run {
  readonly stage: Stage;
  readonly form: Outcome;
  readonly amplifier: Amplifier;
  readonly around: Around;
  readonly linear: LinearStage;
  readonly corner: Corner;
  readonly levels: { readonly low: Level; readonly high: Level };
  /** V/s at the output, upwards and downwards. */
  readonly slew: { readonly up: number; readonly down: number };
  /** V: what the offset moves the output by at rest; towards the rail with the least room. */
  readonly shift: number;
}

/** The output over time, V from V−. */
export interface Wave {
  readonly t: readonly number[];
  readonly ideal: readonly number[];
  readonly output: readonly number[];
  /** Shares of the time. */
  readonly clipped: number;
  readonly slewing: number;
}
