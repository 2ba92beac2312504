import type { Condition } from '../parts/figures.js';
import { amount } from './amounts.js';

/** Under which condition a figure was rated: `10 kΩ to ground, 5 V, 25 °C`; empty when none is stated. */
export function conditionText({ load, supply, temperature, gain }: Condition): string {
  return [
    ...(load === undefined ? [] : [load.kind === 'current' ? amount(load.amperes, 'A') : `${amount(load.ohms, 'Ω')} to ${load.to}`]),
    ...(supply === undefined ? [] : [amount(supply, 'V')]),
    ...(temperature === undefined ? [] : [temperature === 'over' ? 'over temperature' : amount(temperature, '°C')]),
    ...(gain === undefined ? [] : [`gain ${amount(gain, 'V/V')}`]),
  ].join(', ');
}
