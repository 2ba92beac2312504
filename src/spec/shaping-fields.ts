import type { FieldRow } from './field.js';

const OHM = { above: 0, why: 'a resistor is above 0 Ω' };
const FARAD = { above: 0, why: 'a capacitor is above 0 F' };
const RESISTANCE = 'a resistance: 10 kΩ';
const CAPACITANCE = 'a capacitance: 1 nF';

/** What shapes the signal in time or frequency: filters, integrator, oscillator, capacitors. */
export const SHAPING_FIELDS: readonly FieldRow[] = [
  { path: 'filter', shape: 'map', accepted: 'a map: {corner: 1 kHz, q: 0.707}, or all components as fitted', example: '{corner: 1 kHz, q: 0.707}', meaning: 'filters only: what response is wanted, or what it is made of' },
  { path: 'filter.corner', shape: 'quantity', kind: 'frequency', bounds: { above: 0, why: 'a corner lies above 0 Hz' }, accepted: 'a frequency: 1 kHz', example: '1 kHz', meaning: 'natural frequency; of a Butterworth filter (q 0.707) the −3 dB frequency' },
  { path: 'filter.q', shape: 'quantity', kind: 'number', bounds: { from: 0.3, to: 20, why: 'a second-order stage is built with a Q of 0.3 to 20' }, accepted: 'a number: 0.707', example: '0.707', meaning: '0.577 Bessel, 0.707 Butterworth, above it the response peaks' },
  { path: 'filter.r1', shape: 'quantity', kind: 'resistance', bounds: OHM, accepted: RESISTANCE, example: '10 kΩ', meaning: 'as fitted, in place of corner and q: from the signal to the inner node' },
  { path: 'filter.r2', shape: 'quantity', kind: 'resistance', bounds: OHM, accepted: RESISTANCE, example: '10 kΩ', meaning: 'inner node to the + input (Sallen-Key), to the output (multiple feedback)' },
  { path: 'filter.r3', shape: 'quantity', kind: 'resistance', bounds: OHM, accepted: RESISTANCE, example: '10 kΩ', meaning: 'multiple feedback only: inner node to the − input' },
  { path: 'filter.c1', shape: 'quantity', kind: 'capacitance', bounds: FARAD, accepted: CAPACITANCE, example: '22 nF', meaning: 'inner node to the output (Sallen-Key), to the reference (multiple feedback)' },
  { path: 'filter.c2', shape: 'quantity', kind: 'capacitance', bounds: FARAD, accepted: CAPACITANCE, example: '10 nF', meaning: '+ input to the reference (Sallen-Key), − input to the output (multiple feedback)' },
  { path: 'integrator', shape: 'map', accepted: 'a map: {resistance: 100 kΩ, capacitance: 100 nF, window: 20 ms}', example: '{resistance: 100 kΩ, capacitance: 100 nF, window: 20 ms}', meaning: 'integrator only: how fast it adds up' },
  { path: 'integrator.resistance', shape: 'quantity', kind: 'resistance', bounds: OHM, accepted: 'a resistance: 100 kΩ', example: '100 kΩ', meaning: 'from the signal to the − input' },
  { path: 'integrator.capacitance', shape: 'quantity', kind: 'capacitance', bounds: FARAD, accepted: 'a capacitance: 100 nF', example: '100 nF', meaning: 'from the output to the − input' },
  { path: 'integrator.window', shape: 'quantity', kind: 'time', limit: 'max', bounds: { above: 0, why: 'the time from one reset to the next is above 0 s' }, accepted: 'a time: 20 ms', example: '20 ms', meaning: 'from one reset to the next; AC-coupled the lowest frequency may stand for it' },
  { path: 'oscillator', shape: 'map', accepted: 'a map: {frequency: 2 kHz, edge: 5 %}', example: '{frequency: 2 kHz, edge: 5 %}', meaning: 'relaxation oscillator only: what it runs at' },
  { path: 'oscillator.frequency', shape: 'quantity', kind: 'frequency', bounds: { above: 0, why: 'an oscillator runs above 0 Hz' }, accepted: 'a frequency: 2 kHz', example: '2 kHz', meaning: 'wanted; with resistance and capacitance as fitted, about what they give' },
  { path: 'oscillator.edge', shape: 'quantity', kind: 'fraction', limit: 'max', bounds: { above: 0, below: 1, why: 'an edge takes more than none and less than all of the half period' }, accepted: 'a percentage: 5 %', example: '5 %', meaning: 'longest edge, as a share of the half period; default 5 %' },
  { path: 'oscillator.resistance', shape: 'quantity', kind: 'resistance', bounds: OHM, accepted: 'a resistance: 330 kΩ', example: '330 kΩ', meaning: 'timing resistor, output to − input; default chosen' },
  { path: 'oscillator.capacitance', shape: 'quantity', kind: 'capacitance', bounds: FARAD, accepted: 'a capacitance: 1.1 nF', example: '1.1 nF', meaning: 'timing capacitor, − input to ground; default chosen' },
  { path: 'oscillator.toSupply', shape: 'quantity', kind: 'resistance', bounds: OHM, accepted: RESISTANCE, example: '100 kΩ', meaning: 'threshold resistor, + input to the supply; default chosen' },
  { path: 'oscillator.toGround', shape: 'quantity', kind: 'resistance', bounds: OHM, accepted: RESISTANCE, example: '100 kΩ', meaning: 'threshold resistor, + input to ground; default chosen' },
  { path: 'oscillator.toOutput', shape: 'quantity', kind: 'resistance', bounds: OHM, accepted: RESISTANCE, example: '100 kΩ', meaning: 'threshold resistor, + input to the output; default chosen' },
  { path: 'drives', shape: 'map', accepted: 'a map: {threshold: 0.3..0.7, maxEdge: 10 µs}', example: '{threshold: 0.3..0.7, maxEdge: 10 µs}', meaning: 'relaxation oscillator only: the logic it drives' },
  { path: 'drives.threshold', shape: 'quantity', kind: 'share', bounds: { above: 0, below: 1, why: 'a logic threshold lies inside the supply: above 0 and below 1 of it' }, accepted: 'a range of shares of the supply: 0.3..0.7, 30..70 %', example: '0.3..0.7', meaning: 'between which levels the logic may read either' },
  { path: 'drives.maxEdge', shape: 'quantity', kind: 'time', limit: 'max', bounds: { above: 0, why: 'an edge takes some time' }, accepted: 'a time: 10 µs', example: '10 µs', meaning: 'longest time between the two thresholds' },
  { path: 'capacitors', shape: 'map', accepted: 'a map: {feedback: 10 pF, tolerance: 5 %}', example: '{feedback: 10 pF, tolerance: 5 %}', meaning: 'capacitors around the amplifier' },
  { path: 'capacitors.feedback', shape: 'quantity', kind: 'capacitance', bounds: FARAD, accepted: 'a capacitance: 10 pF', example: '10 pF', meaning: 'output to inverting input; default none, in a transimpedance stage the best for each part' },
  { path: 'capacitors.tolerance', shape: 'quantity', kind: 'fraction', bounds: { from: 0, below: 1, why: 'a tolerance lies from 0 % to below 100 %' }, accepted: 'a percentage: 5 %', example: '5 %', meaning: 'of each capacitor; default 5 %' },
];
