import { BUILT_TOPOLOGIES, type SignalSpec, type Topology } from './spec.js';

/** One stage of the greenhouse controller, as a draft shows it. Texts as they are typed, by dotted path. */
export interface Scene {
  /** What the stage is for. */
  readonly told: string;
  /** Fields without which this stage cannot be derived. */
  readonly live: Readonly<Record<string, string>>;
  /** Examples that agree with what is live; other fields take the example of the table of fields. */
  readonly examples: Readonly<Record<string, string>>;
}

type Coupling = SignalSpec['coupling'];

/** The scene of a topology and coupling; null for a difference stage with AC coupling, which is not built. */
export function sceneOf(topology: Topology, coupling: Coupling): Scene | null {
  return (coupling === 'dc' ? DC : AC)[topology];
}

const CELL = '3.0..4.2 V';
const ADAPTER = '5 V ± 5 %';
const WHOLE_REFERENCE = '{value: mid-supply, tolerance: 1 %, resistance: 5 kΩ, bypass: 1 µF}';
const BIASED = '{value: mid-supply, resistance: 100 kΩ}';

const DC: Readonly<Record<Topology, Scene>> = {
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
  difference: {
    told: 'Thermistor bridge of the frost watch: the difference of two voltages that both sit high on the supply.',
    live: { topology: 'difference', supply: ADAPTER, gain: '10', reference: 'mid-supply', 'signal.differential': '-180 mV..180 mV', 'signal.commonMode': '3.3 V..3.85 V' },
    examples: {
      name: 'Thermistor bridge, frost watch', 'resistors.feedback': '100 kΩ', 'resistors.toReference': '100 kΩ', 'resistors.tolerance': '0.1 %',
      'signal.output': '0.7..4.3 V', 'signal.positive': '3.21..3.94 V', 'signal.negative': '3.21..3.94 V', source: '{resistance: 1.43 kΩ, tolerance: 12 %}',
    },
  },
};

const AC: Readonly<Record<Topology, Scene | null>> = {
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
  difference: null,
};

/** Every topology and coupling a draft can be written for. */
export const DRAFTS: readonly { readonly topology: Topology; readonly coupling: Coupling }[] = BUILT_TOPOLOGIES.flatMap((topology) =>
  (['dc', 'ac'] as const).filter((coupling) => sceneOf(topology, coupling) !== null).map((coupling) => ({ topology, coupling })),
);
