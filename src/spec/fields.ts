import type { FieldRow } from './field.js';
import { TOPOLOGIES } from './spec.js';
import { HAZARD_FIELDS, HAZARD_LIMITS } from './hazard-fields.js';
import { LIMIT_FIELDS } from './limit-fields.js';
import { SENSE_FIELDS } from './sense-fields.js';
import { SHAPING_FIELDS } from './shaping-fields.js';
import { SIGNAL_FIELDS } from './signal-fields.js';
import { READOUT_FIELDS } from './readout-fields.js';
import { TEAM_FIELDS } from './team-fields.js';

const RESISTOR = 'a resistance: 70 kΩ, 4k7';
const POSITIVE_OHM = { above: 0, why: 'a resistor of the gain network is above 0 Ω' };
const PART_OF_ONE = { from: 0, below: 1, why: 'a tolerance lies from 0 % to below 100 %' };
const NOT_NEGATIVE_OHM = { from: 0, why: 'a resistance is never negative' };
const NOT_NEGATIVE_FARAD = { from: 0, why: 'a capacitance is never negative' };

const CIRCUIT_FIELDS: readonly FieldRow[] = [
  { path: 'name', shape: 'text', accepted: 'any text', example: 'Soil-moisture probe', meaning: 'what the stage is called in reports' },
  { path: 'topology', shape: 'choice', words: TOPOLOGIES, accepted: TOPOLOGIES.join(', '), example: 'non-inverting', meaning: 'the circuit around the amplifier', option: '--topology' },
  { path: 'supply', shape: 'quantity', kind: 'supply', bounds: { above: 0, why: 'a stage needs a supply above 0 V' }, accepted: 'one voltage, a tolerance or a range: 5 V, 5 V ± 5 %, 3.0..4.2 V', example: '5 V ± 5 %', meaning: 'the single supply, against ground', option: '--supply' },
  { path: 'supplyPeak', shape: 'quantity', kind: 'supply', limit: 'max', bounds: { above: 0, why: 'a stage needs a supply above 0 V' }, accepted: 'one voltage: 4.5 V', example: '5.5 V', meaning: 'highest transient on the supply, against the absolute maximum; default: the top of supply' },
  { path: 'gain', shape: 'quantity', kind: 'gain', bounds: { why: 'a gain of 0 leaves no signal' }, accepted: 'a ratio or decibels: 8, 8 V/V, 20 dB', example: '8', meaning: 'signal gain; for inverting stages −8 and 8 mean the same', option: '--gain' },
  { path: 'resistors', shape: 'map', accepted: 'a map: {feedback: 70 kΩ, input: 10 kΩ, tolerance: 1 %}', example: '{feedback: 70 kΩ, input: 10 kΩ, tolerance: 1 %}', meaning: 'the gain network; default: chosen from gain in E96, feedback path about 100 kΩ' },
  { path: 'resistors.feedback', shape: 'quantity', kind: 'resistance', bounds: POSITIVE_OHM, accepted: RESISTOR, example: '70 kΩ', meaning: 'output to inverting input; of an integrator across its capacitor, to bleed it' },
  { path: 'resistors.input', shape: 'quantity', kind: 'resistance', bounds: POSITIVE_OHM, accepted: RESISTOR, example: '10 kΩ', meaning: 'inverting input to signal, or to the reference in a non-inverting stage' },
  { path: 'resistors.positiveInput', shape: 'quantity', kind: 'resistance', bounds: POSITIVE_OHM, accepted: RESISTOR, example: '10 kΩ', meaning: 'difference form: signal to non-inverting input; default: as input' },
  { path: 'resistors.toReference', shape: 'quantity', kind: 'resistance', bounds: POSITIVE_OHM, accepted: RESISTOR, example: '70 kΩ', meaning: 'difference form: non-inverting input to the reference; default: as feedback' },
  { path: 'resistors.tolerance', shape: 'quantity', kind: 'fraction', bounds: PART_OF_ONE, accepted: 'a percentage: 1 %', example: '1 %', meaning: 'of each resistor, filter and timing resistors included; default 1 %' },
  { path: 'reference', shape: 'map', accepted: 'ground, mid-supply, a voltage with tolerance, or a map: {value: mid-supply, tolerance: 1 %, resistance: 5 kΩ, bypass: 1 µF}', example: 'mid-supply', meaning: 'what the signal rests on; default ground', option: '--reference' },
  { path: 'reference.value', shape: 'level', kind: 'voltage', words: ['ground', 'mid-supply'], accepted: 'ground, mid-supply or a voltage: 2.5 V ± 1 %, 1.2..1.3 V', example: 'mid-supply', meaning: 'ground, half the supply, or a fixed voltage' },
  { path: 'reference.tolerance', shape: 'quantity', kind: 'fraction', bounds: PART_OF_ONE, accepted: 'a percentage: 1 %', example: '1 %', meaning: 'of the voltage, or of the half of the supply' },
  { path: 'reference.resistance', shape: 'quantity', kind: 'resistance', bounds: NOT_NEGATIVE_OHM, accepted: 'a resistance: 5 kΩ', example: '5 kΩ', meaning: 'what the reference shows to the stage; default: stiff' },
  { path: 'reference.bypass', shape: 'quantity', kind: 'capacitance', bounds: NOT_NEGATIVE_FARAD, accepted: 'a capacitance: 1 µF', example: '1 µF', meaning: 'capacitor across the reference' },
];

const SURROUNDING_FIELDS: readonly FieldRow[] = [
  { path: 'source', shape: 'map', accepted: 'a resistance, or a map: {resistance: 1 kΩ, tolerance: 5 %}', example: '{resistance: 1 kΩ}', meaning: 'what drives the stage; default 0 Ω' },
  { path: 'source.resistance', shape: 'quantity', kind: 'resistance', bounds: NOT_NEGATIVE_OHM, accepted: 'a resistance: 1 kΩ', example: '1 kΩ', meaning: 'in series with the input' },
  { path: 'source.tolerance', shape: 'quantity', kind: 'fraction', bounds: PART_OF_ONE, accepted: 'a percentage: 5 %', example: '5 %', meaning: 'of the source resistance; default 0' },
  { path: 'load', shape: 'map', accepted: 'a text: 10 kΩ to ground, 100 pF, or a map: {resistance: 10 kΩ, to: ground, capacitance: 100 pF, isolation: 220 Ω}', example: '10 kΩ to ground, 100 pF', meaning: 'what hangs on the output; default nothing', option: '--load' },
  { path: 'load.resistance', shape: 'quantity', kind: 'resistance', bounds: { above: 0, why: 'a load resistance is above 0 Ω (0 Ω is a short circuit)' }, accepted: 'a resistance: 10 kΩ', example: '10 kΩ', meaning: 'the smallest it can be' },
  { path: 'load.to', shape: 'choice', words: ['ground', 'supply', 'reference'], accepted: 'ground, supply or reference', example: 'ground', meaning: 'where the load resistance goes; ground when not written' },
  { path: 'load.capacitance', shape: 'quantity', kind: 'capacitance', bounds: NOT_NEGATIVE_FARAD, accepted: 'a capacitance: 100 pF', example: '100 pF', meaning: 'from the output to ground' },
  { path: 'load.isolation', shape: 'quantity', kind: 'resistance', bounds: NOT_NEGATIVE_OHM, accepted: 'a resistance: 220 Ω', example: '220 Ω', meaning: 'in series between the amplifier and its load, outside the loop; default none' },
  { path: 'temperature', shape: 'quantity', kind: 'temperature', bounds: { above: -273.15, why: 'nothing is colder than −273.15 °C' }, accepted: 'one temperature or a range: 25 °C, -20..60 °C', example: '-20..60 °C', meaning: 'ambient; default 25 °C', option: '--temperature' },
];

/** Every field of the stage file, in the order it is told. */
export const FIELDS: readonly FieldRow[] = [
  ...CIRCUIT_FIELDS, ...SENSE_FIELDS, ...SHAPING_FIELDS, ...SIGNAL_FIELDS, ...SURROUNDING_FIELDS, ...READOUT_FIELDS, ...HAZARD_FIELDS, ...LIMIT_FIELDS,
  ...HAZARD_LIMITS, ...TEAM_FIELDS,
];
