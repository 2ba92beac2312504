import type { Draft } from './draft.js';
import { present } from './present.js';
import type { BatterySpec, ConverterSpec, FollowingSpec } from './spec.js';
import { readRange, readValue } from './value.js';

/** Hz and order. */
export function readFollowing(draft: Draft): FollowingSpec | undefined {
  const corner = readValue(draft, 'following.corner');
  const order = readValue(draft, 'following.order')?.value;
  return corner === undefined || order === undefined ? undefined : { corner, order };
}

/** Bits and volts. */
export function readConverter(draft: Draft): ConverterSpec | undefined {
  const bits = readValue(draft, 'converter.bits')?.value;
  const range = readRange(draft, 'converter.range', 'the lowest and the highest voltage it reads');
  return bits === undefined || range === undefined ? undefined : { bits, range };
}

/** C, fraction, A. */
export function readBattery(draft: Draft): BatterySpec | undefined {
  const capacity = readValue(draft, 'battery.capacity');
  const more = present({ usable: readValue(draft, 'battery.usable'), others: readValue(draft, 'battery.others') });
  return capacity === undefined ? undefined : { capacity, ...more };
}
