import type { Scene } from './draft-scene.js';
import type { Topology } from './spec.js';

const CELL = '3.0..4.2 V';
const ADAPTER = '5 V ± 5 %';
const WHOLE_REFERENCE = '{value: mid-supply, tolerance: 1 %, resistance: 5 kΩ, bypass: 1 µF}';

/** DC-coupled stages of the greenhouse controller, one of every topology. */
export const DC_SCENES: Readonly<Record<Topology, Scene>> = {
  follower: {
    told: 'Reference buffer of the bench unit: passes 2.5 V on unchanged, so that no load weighs on its divider.',
    live: { topology: 'follower', supply: ADAPTER, 'signal.input': '2.475..2.525 V' },
    examples: { name: 'Reference buffer', gain: '1', 'signal.output': '2.475..2.525 V', reference: WHOLE_REFERENCE },
  },
  'non-inverting': {
    told: 'Soil-moisture probe of the field node, second amplifier: lifts 25 mV..330 mV on one lithium cell.',
    live: { topology: 'non-inverting', supply: CELL, gain: '8', 'signal.input': '25 mV..330 mV' },
    examples: { name: 'Soil-moisture probe, second amplifier', supplyPeak: '4.5 V', 'signal.output': '0.2..2.64 V', reference: '{value: 20 mV, tolerance: 1 %, resistance: 100 Ω, bypass: 1 µF}' },
  },
  inverting: {
    told: 'Vent-motor control of the bench unit: turns a command of 1.9 V..3.1 V over, about the middle of the supply.',
    live: { topology: 'inverting', supply: ADAPTER, gain: '-2', reference: 'mid-supply', 'signal.input': '1.9 V..3.1 V' },
    examples: { name: 'Vent-motor control', 'resistors.feedback': '20 kΩ', 'signal.output': '1.3..3.7 V', load: '{resistance: 1 kΩ, to: reference, capacitance: 100 pF}' },
  },
  summing: {
    told: 'Vent trim of the bench unit: adds up a position command, a slow wind trim and a leg to the supply.',
    live: {
      topology: 'summing', supply: ADAPTER, 'resistors.feedback': '30 kΩ', reference: 'mid-supply',
      legs: '{command: {input: 0.5..4.5 V, resistance: 100 kΩ}, trim: {input: 0..1 V, gain: 0.15}, centre: {input: supply, resistance: 100 kΩ}}',
    },
    examples: { name: 'Vent trim', 'signal.output': '1.375..2.725 V' },
  },
  difference: {
    told: 'Thermistor bridge of the frost watch: the difference of two voltages that both sit high on the supply.',
    live: { topology: 'difference', supply: ADAPTER, gain: '10', reference: 'mid-supply', 'signal.differential': '-180 mV..180 mV', 'signal.commonMode': '3.3 V..3.85 V' },
    examples: {
      name: 'Thermistor bridge, frost watch', 'resistors.feedback': '100 kΩ', 'resistors.toReference': '100 kΩ', 'resistors.tolerance': '0.1 %',
      'signal.output': '0.7..4.3 V', 'signal.positive': '3.21..3.94 V', 'signal.negative': '3.21..3.94 V', source: '{resistance: 1.43 kΩ, tolerance: 12 %}',
    },
  },
  transimpedance: {
    told: 'Light meter of the field node: a photodiode that pulls up to 1.2 µA out of the summing node, so the output rises with light.',
    live: {
      topology: 'transimpedance', supply: CELL, 'resistors.feedback': '1.5 MΩ', reference: '100 mV',
      photodiode: '{current: 0..1.2 µA, direction: out-of-node, capacitance: 80 pF}',
    },
    examples: { name: 'Light meter', supplyPeak: '4.5 V', 'signal.output': '0.1..1.9 V', 'signal.frequency': '100 Hz', load: '{resistance: 100 kΩ, to: ground}' },
  },
  'low-side-sense': {
    told: 'Pump current of the bench unit: a shunt to ground, whose 60 mV a non-inverting stage makes 2.4 V of.',
    live: { topology: 'low-side-sense', supply: ADAPTER, gain: '40', shunt: '{resistance: 20 mΩ, tolerance: 1 %, current: 0..3 A}' },
    examples: { name: 'Pump current', 'resistors.feedback': '195 kΩ', 'resistors.input': '5 kΩ', 'signal.output': '0..2.4 V', reference: 'ground' },
  },
  'high-side-sense': {
    told: 'Bus current of the bench unit: a shunt in the 12 V line, read by a difference stage that brings its inputs below 5 V.',
    live: {
      topology: 'high-side-sense', supply: ADAPTER, gain: '0.4', reference: '500 mV',
      shunt: '{resistance: 50 mΩ, tolerance: 1 %, current: 0..2 A, bus: 10.8..13.2 V}',
    },
    examples: {
      name: 'Bus current', 'resistors.feedback': '100 kΩ', 'resistors.input': '250 kΩ', 'resistors.positiveInput': '250 kΩ', 'resistors.toReference': '100 kΩ',
      'resistors.tolerance': '0.01 %', 'signal.output': '0.5..0.54 V',
    },
  },
  'sallen-key-low-pass': {
    told: 'Leaf-wetness filter of the field node: a Butterworth low-pass of 1 kHz before the converter.',
    live: { topology: 'sallen-key-low-pass', supply: CELL, gain: '1', filter: '{corner: 1 kHz, q: 0.707}', 'signal.input': '0.3..2.4 V' },
    examples: { name: 'Leaf-wetness filter', supplyPeak: '4.5 V', 'signal.output': '0.3..2.4 V', 'signal.frequency': '500 Hz', load: '{resistance: 50 kΩ, to: ground}' },
  },
  'multiple-feedback-low-pass': {
    told: 'Level filter of the bench unit: a low-pass of 5 kHz that doubles and turns a voltage over, about the middle of the supply.',
    live: { topology: 'multiple-feedback-low-pass', supply: ADAPTER, gain: '-2', reference: 'mid-supply', filter: '{corner: 5 kHz, q: 0.707}', 'signal.input': '2..3 V' },
    examples: { name: 'Level filter', 'signal.output': '1.5..3.5 V', 'signal.frequency': '2 kHz' },
  },
  integrator: {
    told: 'Water meter of the bench unit: adds up what a flow sensor gives between two readings, 20 ms apart.',
    live: { topology: 'integrator', supply: ADAPTER, reference: '2.5 V', integrator: '{resistance: 100 kΩ, capacitance: 100 nF, window: 20 ms}', 'signal.input': '2.5..3.5 V' },
    examples: { name: 'Water meter', 'resistors.feedback': '10 MΩ', 'signal.frequency': '50 Hz' },
  },
  'relaxation-oscillator': {
    told: 'Leaf-wetness oscillator of the field node: the leaf sensor is its capacitor, and wetness is read as frequency.',
    live: { topology: 'relaxation-oscillator', supply: CELL, oscillator: '{frequency: 2 kHz, edge: 5 %, capacitance: 1.1 nF}' },
    examples: { name: 'Leaf-wetness oscillator', supplyPeak: '4.5 V', load: '{resistance: 1 MΩ, to: ground, capacitance: 15 pF}' },
  },
};
