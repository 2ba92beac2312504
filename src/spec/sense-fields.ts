import type { FieldRow } from './field.js';

const RESISTANCE = 'a resistance: 100 kΩ';
const SHARE = { from: 0, below: 1, why: 'a tolerance lies from 0 % to below 100 %' };
const LIGHT = { from: 0, why: 'the current of a photodiode is written positive; direction says which way it flows' };

/** What feeds a summing, a photodiode or a current-sense stage. */
export const SENSE_FIELDS: readonly FieldRow[] = [
  { path: 'legs', shape: 'map', accepted: 'a map of up to 12 legs, each under a name of your own: {command: {input: 0.5..4.5 V, resistance: 100 kΩ}}', example: '{command: {input: 0.5..4.5 V, resistance: 100 kΩ}}', meaning: 'summing only: what is added up, in the order told; the first voltage sets the gain that is shown' },
  { path: 'legs.NAME', shape: 'map', accepted: 'a map: {input: 0.5..4.5 V, resistance: 100 kΩ}', example: '{input: 0.5..4.5 V, resistance: 100 kΩ}', meaning: 'one leg; its name is of letters, digits, - and _' },
  { path: 'legs.NAME.input', shape: 'level', kind: 'voltage', words: ['supply', 'reference', 'ground'], accepted: 'a voltage or a range: 0.5..4.5 V; or supply, reference, ground', example: '0.5..4.5 V', meaning: 'far end of the leg, against ground' },
  { path: 'legs.NAME.amplitude', shape: 'quantity', kind: 'amplitude', bounds: { above: 0, why: 'an amplitude of 0 is no signal (a leg that rests is written input: ground)' }, accepted: 'an amplitude with its kind: 100 mVpk, 200 mVpp, 70 mVrms', example: '100 mVpk', meaning: 'AC-coupled: size of the signal, in place of input' },
  { path: 'legs.NAME.resistance', shape: 'quantity', kind: 'resistance', bounds: { above: 0, why: 'a leg of 0 Ω is a short circuit into the summing node' }, accepted: RESISTANCE, example: '100 kΩ', meaning: 'from the far end to the summing node' },
  { path: 'legs.NAME.gain', shape: 'quantity', kind: 'gain', bounds: { why: 'a gain of 0 leaves no signal' }, accepted: 'a ratio or decibels: 0.3, 0.3 V/V, −10 dB', example: '0.3', meaning: 'in place of resistance: how much of the leg reaches the output; −0.3 and 0.3 mean the same' },
  { path: 'photodiode', shape: 'map', accepted: 'a map: {current: 0..1.2 µA, direction: out-of-node, capacitance: 80 pF}', example: '{current: 0..1.2 µA, direction: out-of-node, capacitance: 80 pF}', meaning: 'transimpedance only: what drives the stage' },
  { path: 'photodiode.current', shape: 'quantity', kind: 'current', bounds: LIGHT, accepted: 'a current range: 0..1.2 µA', example: '0..1.2 µA', meaning: 'from the least to the most light' },
  { path: 'photodiode.direction', shape: 'choice', words: ['into-node', 'out-of-node'], accepted: 'into-node (anode at the summing node: the output falls) or out-of-node (cathode there: the output rises)', example: 'out-of-node', meaning: 'which way the current flows at the summing node' },
  { path: 'photodiode.capacitance', shape: 'quantity', kind: 'capacitance', bounds: { above: 0, why: 'a diode and its wiring have some capacitance, a few pF at the least' }, accepted: 'a capacitance: 80 pF', example: '80 pF', meaning: 'diode at its bias, and wiring' },
  { path: 'photodiode.dark', shape: 'quantity', kind: 'current', limit: 'max', bounds: LIGHT, accepted: 'a current: 200 pA', example: '200 pA', meaning: 'dark current at 25 °C, doubling per 10 K; default not counted' },
  { path: 'photodiode.ambient', shape: 'quantity', kind: 'current', bounds: LIGHT, accepted: 'a current or a range: 0..100 nA', example: '0..100 nA', meaning: 'of light that is always there; default none' },
  { path: 'shunt', shape: 'map', accepted: 'a map: {resistance: 20 mΩ, tolerance: 1 %, current: 0..3 A}, high side with bus: 10.8..13.2 V', example: '{resistance: 20 mΩ, tolerance: 1 %, current: 0..3 A}', meaning: 'low-side and high-side sense only: what turns the current into a voltage' },
  { path: 'shunt.resistance', shape: 'quantity', kind: 'resistance', bounds: { above: 0, why: 'a shunt of 0 Ω shows nothing' }, accepted: 'a resistance: 20 mΩ', example: '20 mΩ', meaning: 'of the shunt' },
  { path: 'shunt.tolerance', shape: 'quantity', kind: 'fraction', bounds: SHARE, accepted: 'a percentage: 1 %', example: '1 %', meaning: 'of the shunt; default 0' },
  { path: 'shunt.current', shape: 'quantity', kind: 'current', accepted: 'a current range: 0..3 A, -2..2 A', example: '0..3 A', meaning: 'through the shunt; negative is the other way' },
  { path: 'shunt.bus', shape: 'quantity', kind: 'voltage', bounds: { from: 0, why: 'the line that is measured lies at or above ground' }, accepted: 'a voltage, a tolerance or a range: 10.8..13.2 V', example: '10.8..13.2 V', meaning: 'high-side only: voltage of the line the shunt sits in, against ground' },
];
