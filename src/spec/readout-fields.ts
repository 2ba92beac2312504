import type { FieldRow } from './field.js';

/** What reads the output, and what feeds the whole. */
export const READOUT_FIELDS: readonly FieldRow[] = [
  { path: 'following', shape: 'map', accepted: 'a map: {corner: 200 Hz, order: 1}', example: '{corner: 200 Hz, order: 1}', meaning: 'the low-pass that follows and ends the noise; default none' },
  { path: 'following.corner', shape: 'quantity', kind: 'frequency', bounds: { above: 0, why: 'a corner lies above 0 Hz' }, accepted: 'a frequency: 200 Hz', example: '200 Hz', meaning: 'its −3 dB frequency' },
  { path: 'following.order', shape: 'quantity', kind: 'count', bounds: { from: 1, to: 10, why: 'a low-pass that follows is of order 1 to 10' }, accepted: 'a whole number from 1 to 10: 1', example: '1', meaning: 'of a Butterworth response' },
  { path: 'converter', shape: 'map', accepted: 'a map: {bits: 12, range: 0..2.5 V}', example: '{bits: 12, range: 0..2.5 V}', meaning: 'the converter that reads the output; default none' },
  { path: 'converter.bits', shape: 'quantity', kind: 'count', bounds: { from: 4, to: 32, why: 'a converter has 4 to 32 bits' }, accepted: 'a whole number from 4 to 32: 12', example: '12', meaning: 'of the converter' },
  { path: 'converter.range', shape: 'quantity', kind: 'voltage', accepted: 'a range: 0..2.5 V', example: '0..2.5 V', meaning: 'from its lowest to its highest code' },
  { path: 'battery', shape: 'map', accepted: 'a map: {capacity: 500 mAh, usable: 80 %, others: 20 µA}', example: '{capacity: 500 mAh, usable: 80 %, others: 20 µA}', meaning: 'what feeds it, to tell how long: information, no check' },
  { path: 'battery.capacity', shape: 'quantity', kind: 'charge', limit: 'min', bounds: { above: 0, why: 'an empty battery feeds nothing' }, accepted: 'a charge: 500 mAh, 2.4 Ah', example: '500 mAh', meaning: 'as rated' },
  { path: 'battery.usable', shape: 'quantity', kind: 'fraction', bounds: { above: 0, to: 1, why: 'what can be used lies above 0 % and at most at 100 %' }, accepted: 'a percentage: 80 %', example: '80 %', meaning: 'of the capacity, over temperature and age; default all of it' },
  { path: 'battery.others', shape: 'quantity', kind: 'current', limit: 'max', bounds: { from: 0, why: 'what else draws from the battery is never negative' }, accepted: 'a current: 20 µA', example: '20 µA', meaning: 'what else draws from it; default nothing' },
];
