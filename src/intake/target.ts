import type { Parameter } from '../parts/figures.js';
import { PARAMETERS } from '../parts/figures.js';
import type { Target } from './column-reading.js';

/** The parameter whose unit and limit kinds the cells of a column have. */
export function targetParameter(target: Target): Parameter {
  return isParameter(target) ? target : SPECIAL[target];
}

export function isParameter(target: Target): target is Parameter {
  return target in PARAMETERS;
}

const SPECIAL: Readonly<Record<Exclude<Target, Parameter>, Parameter>> = {
  supplyRange: 'supplyVoltage',
  temperatureRange: 'temperature',
  bothSwings: 'outputLowHeadroom',
  outputHighVoltage: 'outputHighHeadroom',
  commonModeLow: 'inputLowHeadroom',
  commonModeHigh: 'inputHighHeadroom',
  commonModeHighFromRail: 'inputHighHeadroom',
  commonModeRange: 'inputHighHeadroom',
  outputCurrentPlain: 'shortCircuitCurrent',
};
