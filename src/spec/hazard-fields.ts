import type { Bounds, FieldRow } from './field.js';

const someTime = (why: string): Bounds => ({ above: 0, why });

/** What is there first. */
export const SEQUENCES = ['supply-first', 'signal-first'] as const;

/** What can happen to a stage beside its signal. */
export const HAZARD_FIELDS: readonly FieldRow[] = [
  { path: 'overdrive', shape: 'quantity', kind: 'voltage', limit: 'max', bounds: { from: 0, why: 'how far beyond a rail is never negative; 0 V says that no input leaves the rails' }, accepted: 'a voltage: 0.5 V', example: '0.5 V', meaning: 'how far beyond either rail the input of the stage can be taken (a fault, a long cable); not said when not written' },
  { path: 'sequencing', shape: 'choice', words: SEQUENCES, accepted: 'supply-first or signal-first', example: 'signal-first', meaning: 'signal-first: the signal is there while the supply is off; not said when not written' },
  { path: 'supplyRipple', shape: 'map', accepted: 'a map: {amplitude: 50 mVpp, frequency: 100 kHz}', example: '{amplitude: 50 mVpp, frequency: 100 kHz}', meaning: 'ripple on the supply, of a switching converter for one; default none' },
  { path: 'supplyRipple.amplitude', shape: 'quantity', kind: 'amplitude', limit: 'max', bounds: { above: 0, why: 'a ripple of 0 is none (leave supplyRipple out)' }, accepted: 'an amplitude with its kind: 50 mVpp, 25 mVpk', example: '50 mVpp', meaning: 'of the ripple, as a sine' },
  { path: 'supplyRipple.frequency', shape: 'quantity', kind: 'frequency', bounds: { above: 0, why: 'ripple has a frequency above 0 Hz (slow changes are in supply)' }, accepted: 'a frequency: 100 kHz', example: '100 kHz', meaning: 'of the ripple' },
  { path: 'dutyCycle', shape: 'map', accepted: 'a map: {on: 2 ms, every: 1 s}', example: '{on: 2 ms, every: 1 s}', meaning: 'a stage that is switched off between measurements; default always on' },
  { path: 'dutyCycle.on', shape: 'quantity', kind: 'time', limit: 'min', bounds: someTime('a stage that is never on measures nothing'), accepted: 'a time: 2 ms', example: '2 ms', meaning: 'how long the supply is on' },
  { path: 'dutyCycle.every', shape: 'quantity', kind: 'time', bounds: someTime('a period takes some time'), accepted: 'a time: 1 s', example: '1 s', meaning: 'from one switching on to the next' },
];

/** Limits that go with them. */
export const HAZARD_LIMITS: readonly FieldRow[] = [
  { path: 'limits.supplyRipple', shape: 'quantity', kind: 'amplitude', limit: 'max', bounds: { above: 0, why: 'no amplifier rejects ripple altogether' }, accepted: 'an amplitude with its kind: 2 mVpp, 1 mVpk', example: '1 mVpk', meaning: 'what of supplyRipple may stand at the output' },
  { path: 'limits.startUp', shape: 'quantity', kind: 'time', limit: 'max', bounds: { above: 0, why: 'no amplifier starts at once' }, accepted: 'a time: 200 µs', example: '200 µs', meaning: 'time from switching on to a usable output' },
];
