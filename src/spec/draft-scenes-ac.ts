import type { Scene } from './draft-scene.js';
import type { Topology } from './spec.js';

const CELL = '3.0..4.2 V';
const ADAPTER = '5 V ± 5 %';
const BIASED = '{value: mid-supply, resistance: 100 kΩ}';

/** AC-coupled stages of the greenhouse controller, of every topology that may be. */
export const AC_SCENES: Readonly<Partial<Record<Topology, Scene>>> = {
  follower: {
    told: 'Microphone line of the bench unit: passes an AC-coupled signal on unchanged, about the middle of the supply.',
    live: { topology: 'follower', supply: ADAPTER, reference: BIASED, 'signal.amplitude': '1 Vpk', 'signal.coupling': 'ac' },
    examples: { name: 'Microphone line', gain: '1', 'signal.output': '1.5..3.5 V' },
  },
  'non-inverting': {
    told: "Vibration pickup on the vent's hinge: an AC-coupled signal of a few millivolts on one lithium cell.",
    live: { topology: 'non-inverting', supply: CELL, gain: '50', reference: BIASED, 'signal.amplitude': '25 mVpk', 'signal.coupling': 'ac' },
    examples: { name: 'Vent vibration pickup', supplyPeak: '4.5 V', 'resistors.feedback': '98 kΩ', 'resistors.input': '2 kΩ', 'signal.output': '0.55..3.05 V' },
  },
  inverting: {
    told: 'Pump sound of the bench unit: an AC-coupled signal turned over, about the middle of the supply.',
    live: { topology: 'inverting', supply: ADAPTER, gain: '-5', reference: 'mid-supply', 'signal.amplitude': '300 mVpk', 'signal.coupling': 'ac' },
    examples: { name: 'Pump sound', 'resistors.feedback': '100 kΩ', 'resistors.input': '20 kΩ', 'signal.output': '1..4 V' },
  },
  summing: {
    told: 'Sound of the bench unit: mixes two AC-coupled pickups, about the middle of the supply.',
    live: {
      topology: 'summing', supply: ADAPTER, 'resistors.feedback': '100 kΩ', reference: 'mid-supply', 'signal.coupling': 'ac',
      legs: '{pump: {amplitude: 200 mVpk, resistance: 20 kΩ}, vent: {amplitude: 100 mVpk, gain: 2}}',
    },
    examples: { name: 'Pump and vent sound', 'signal.output': '1.3..3.7 V' },
  },
  'sallen-key-low-pass': {
    told: 'Sound filter of the bench unit: a Butterworth low-pass of 10 kHz for an AC-coupled signal, about the middle of the supply.',
    live: { topology: 'sallen-key-low-pass', supply: ADAPTER, gain: '1', reference: BIASED, filter: '{corner: 10 kHz, q: 0.707}', 'signal.amplitude': '1 Vpk', 'signal.coupling': 'ac' },
    examples: { name: 'Sound filter', 'signal.output': '1.5..3.5 V' },
  },
  'multiple-feedback-low-pass': {
    told: "Vibration filter behind the vent's pickup: a low-pass of 5 kHz with a gain of −2, about the middle of the supply.",
    live: { topology: 'multiple-feedback-low-pass', supply: ADAPTER, gain: '-2', reference: 'mid-supply', filter: '{corner: 5 kHz, q: 1}', 'signal.amplitude': '500 mVpk', 'signal.coupling': 'ac' },
    examples: { name: 'Vibration filter', 'signal.output': '1.5..3.5 V', 'signal.frequency': '1 kHz' },
  },
  integrator: {
    told: 'Speed of the vent: integrates the AC-coupled signal of an acceleration pickup, about the middle of the supply.',
    live: { topology: 'integrator', supply: ADAPTER, reference: 'mid-supply', integrator: '{resistance: 100 kΩ, capacitance: 100 nF}', 'signal.amplitude': '1 Vpk', 'signal.coupling': 'ac', 'signal.frequency': '50 Hz..1 kHz' },
    examples: { name: 'Vent speed', 'resistors.feedback': '1 MΩ' },
  },
};
