import type { BatteryLife, DynamicRange } from '../screening/index.js';
import { amount } from './amounts.js';
import { held } from './spelling.js';

const HOURS_A_DAY = 24;
const DAYS_A_YEAR = 365.25;

/** `412 days`, `36 hours`, `3.1 years`: rounded down, a battery is never said to last longer. */
export function lifeText(hours: number): string {
  const [value, unit] = hours < 2 * HOURS_A_DAY ? [hours, 'hours'] : hours < 2 * DAYS_A_YEAR * HOURS_A_DAY ? [hours / HOURS_A_DAY, 'days'] : [hours / HOURS_A_DAY / DAYS_A_YEAR, 'years'];
  return held(`${amount(value, '1', { round: 'down' })} ${unit}`);
}

/** Life and where the current goes. */
export function batteryText({ hours, amplifier, network, others }: BatteryLife): string {
  const drawn = [
    `${amount(amplifier, 'A', { round: 'up' })} of the package`,
    ...(network > 0 ? [`${amount(network, 'A', { round: 'up' })} of load and feedback network`] : []),
    ...(others > 0 ? [`${amount(others, 'A', { round: 'up' })} of what else is on it`] : []),
  ];
  return `lasts ${lifeText(hours)} at ${drawn.join(', ')}; for information, not judged`;
}

/** Swing that is there, and what of the dynamic range head-room takes. */
export function swingText({ available, ideal, lossDecibels }: DynamicRange): string {
  return `${amount(available, 'V', { round: 'down' })} of ${amount(ideal, 'V')} between the rails can be used: head-room takes ${amount(lossDecibels, 'dB', { digits: 2, round: 'up' })} of the dynamic range`;
}
