import type { DemandBase, NumberDemand } from './demand.js';

/** Highest junction temperature, °C; `required` null: no limit written, a part that states its own is held to it. */
export interface JunctionDemand extends DemandBase {
  readonly required: number | null;
  readonly unit: '°C';
  readonly sense: 'at-most';
  /** Highest ambient, °C, and highest supply, V. */
  readonly ambient: number;
  readonly supply: number;
  /** Worst dissipation in the output through load and feedback network, and through a capacitive load, W. */
  readonly output: number;
  readonly capacitive: number;
}

/** A relaxation oscillator: what its frequency may be off by, as a fraction of that with an ideal output. */
export interface FrequencyErrorDemand extends NumberDemand {
  /** Ω, and R·C in s. */
  readonly toSupply: number;
  readonly toGround: number;
  readonly toOutput: number;
  readonly timeConstant: number;
  readonly ends: readonly OscillatorEnd[];
}

/** One end of the supply, V, with the heaviest current out of the output while it is high and into it while it is low, A. */
export interface OscillatorEnd {
  readonly supply: number;
  readonly sourced: number;
  readonly sunk: number;
}

/** What draws from the battery beside the amplifier, A on average, and how long it lasts. */
export interface BatteryBudget {
  readonly network: number;
  readonly others: number;
  /** h at an average current in A; Infinity at none. */
  hoursAt(current: number): number;
}

