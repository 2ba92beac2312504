import type { Stage } from '../stage/index.js';

/** The surroundings figures are read for: temperature ends in °C and the nominal supply in V. */
export interface Operating {
  readonly coldest: number;
  readonly hottest: number;
  readonly nominalSupply: number;
}

export function operatingOf(stage: Stage): Operating {
  return { coldest: stage.temperature.min, hottest: stage.temperature.max, nominalSupply: stage.supply.nominal };
}

/** Largest distance of the stage's temperatures from 25 °C, K, and the end it stands at. */
export function farthestFrom25(stage: Stage): { kelvin: number; at: number } {
  const cold = Math.abs(stage.temperature.min - 25);
  const hot = Math.abs(stage.temperature.max - 25);
  return cold > hot ? { kelvin: cold, at: stage.temperature.min } : { kelvin: hot, at: stage.temperature.max };
}
