import type { Stage } from '../../src/stage/index.js';
import { buildStage } from '../../src/stage/index.js';
import type { Topology } from '../../src/spec/spec.js';
import type { Parts } from './drawings.js';
import { specOf } from './stage-file.js';

/** A stage as it is written, and what of it lies on the bench: values by hand, or those the product chose and prints. */
export interface Bench {
  readonly name: string;
  readonly topology: Topology;
  /** The stage file, without limits. */
  readonly file: string;
  parts(stage: Stage): Parts;
  /** Half the swing of what the drawing drives, V or A; other legs counted in. Absent where no sine makes the largest output. */
  readonly half?: number;
}

/** The product's stage with these limits and further lines; a refusal or a contradiction fails the test. */
export function built({ topology, file }: Bench, limits: string, ...lines: readonly string[]): Stage {
  const result = buildStage(specOf([`topology: ${topology}`, file, `limits: {${limits}}`, ...lines, ''].join('\n')));
  if (result.ok) return result.stage;
  throw new Error(result.problems.map(({ message }) => message).join('\n'));
}

/** Filter components as the product prints them. */
function chosen(stage: Stage): Parts {
  if (stage.response.kind !== 'low-pass') throw new Error('no filter');
  const { gain: _gain, ...parts } = { gain: 0, ...stage.response.parts };
  return { ...parts };
}

const FIVE = 'supply: 5 V';

/** One stage of each topology, every resistance around it included; the twelfth, the oscillator, has a bench of its own. */
export const BENCHES: readonly Bench[] = [
  {
    name: 'behind 10 kΩ',
    half: 2,
    topology: 'follower',
    file: `${FIVE}\nsignal: {input: 0.5..4.5 V, frequency: 20 kHz}\nsource: {resistance: 10 kΩ}`,
    parts: () => ({ source: 10e3 }),
  },
  {
    name: '× 8 behind 1 kΩ, to ground',
    half: 0.2375,
    topology: 'non-inverting',
    file: `${FIVE}\nresistors: {feedback: 70 kΩ, input: 10 kΩ, tolerance: 0 %}\nsignal: {input: 25 mV..500 mV, frequency: 2 kHz}\nsource: {resistance: 1 kΩ}`,
    parts: () => ({ feedback: 70e3, input: 10e3, source: 1e3 }),
  },
  {
    name: 'a reference of 5 kΩ',
    half: 0.4,
    topology: 'non-inverting',
    file: `${FIVE}\nresistors: {feedback: 27 kΩ, input: 10 kΩ, tolerance: 0 %}\nreference: {value: 2.5 V, resistance: 5 kΩ}\nsignal: {input: 2.1..2.9 V, frequency: 10 kHz}`,
    parts: () => ({ feedback: 27e3, input: 10e3, referenceResistance: 5e3 }),
  },
  {
    name: 'a reference of 5 kΩ with 10 µF across it',
    half: 0.4,
    topology: 'non-inverting',
    file: `${FIVE}\nresistors: {feedback: 27 kΩ, input: 10 kΩ, tolerance: 0 %}\nreference: {value: 2.5 V, resistance: 5 kΩ, bypass: 10 µF}\nsignal: {input: 2.1..2.9 V, frequency: 10 kHz}`,
    parts: () => ({ feedback: 27e3, input: 10e3, referenceResistance: 5e3, bypass: 10e-6 }),
  },
  {
    name: 'a feedback capacitor of 100 pF',
    half: 0.3,
    topology: 'non-inverting',
    file: `${FIVE}\nresistors: {feedback: 27 kΩ, input: 9 kΩ, tolerance: 0 %}\ncapacitors: {feedback: 100 pF}\nreference: 2.5 V\nsignal: {input: 2.2..2.8 V, frequency: 20 kHz}`,
    parts: () => ({ feedback: 27e3, input: 9e3, feedbackCapacitor: 100e-12 }),
  },
  {
    name: '× 50, AC-coupled, its gain leg ending in a large capacitor',
    half: 0.02,
    topology: 'non-inverting',
    file: `${FIVE}\nresistors: {feedback: 98 kΩ, input: 2 kΩ, tolerance: 0 %}\nreference: {value: mid-supply, resistance: 100 kΩ}\nsignal: {amplitude: 20 mVpk, coupling: ac, frequency: 2 kHz}`,
    parts: () => ({ feedback: 98e3, input: 2e3 }),
  },
  {
    name: '× 3 with 1 kΩ of source and 5 kΩ of reference',
    half: 0.5,
    topology: 'inverting',
    file: `${FIVE}\nresistors: {feedback: 27 kΩ, input: 8 kΩ, tolerance: 0 %}\nreference: {value: 2.5 V, resistance: 5 kΩ, bypass: 1 µF}\nsignal: {input: 2..3 V, frequency: 10 kHz}\nsource: {resistance: 1 kΩ}`,
    parts: () => ({ feedback: 27e3, input: 8e3, source: 1e3, referenceResistance: 5e3, bypass: 1e-6 }),
  },
  {
    name: 'a feedback capacitor of 100 pF',
    half: 0.5,
    topology: 'inverting',
    file: `${FIVE}\nresistors: {feedback: 27 kΩ, input: 9 kΩ, tolerance: 0 %}\ncapacitors: {feedback: 100 pF}\nreference: 2.5 V\nsignal: {input: 2..3 V, frequency: 10 kHz}`,
    parts: () => ({ feedback: 27e3, input: 9e3, feedbackCapacitor: 100e-12 }),
  },
  {
    name: 'three legs, one from the supply',
    half: 2.25,
    topology: 'summing',
    file: `${FIVE}\nresistors: {feedback: 30 kΩ, tolerance: 0 %}\nreference: {value: 2.5 V, resistance: 5 kΩ, bypass: 10 µF}\nlegs:\n  a: {input: 0.5..4.5 V, resistance: 100 kΩ}\n  b: {input: 2..3 V, resistance: 200 kΩ}\n  c: {input: supply, resistance: 100 kΩ}\nsignal: {frequency: 10 kHz}`,
    parts: () => ({ feedback: 30e3, a: 100e3, b: 200e3, c: 100e3, referenceResistance: 5e3, bypass: 10e-6 }),
  },
  {
    name: '× 10 behind legs of 2 kΩ',
    half: 0.18,
    topology: 'difference',
    file: `${FIVE}\nresistors: {feedback: 200 kΩ, input: 18 kΩ, tolerance: 0 %}\nreference: 2.5 V\nsignal: {differential: -180 mV..180 mV, commonMode: 2.5 V..2.5 V, frequency: 2 kHz}\nsource: {resistance: 2 kΩ}`,
    parts: () => ({ feedback: 200e3, input: 18e3, source: 2e3 }),
  },
  {
    name: '× 4 against a reference of 5 kΩ with 10 µF across it',
    topology: 'difference',
    file: `${FIVE}\nresistors: {feedback: 40 kΩ, input: 10 kΩ, tolerance: 0 %}\nreference: {value: 2.5 V, resistance: 5 kΩ, bypass: 10 µF}\nsignal: {differential: -300 mV..300 mV, commonMode: 2.5 V..2.5 V, frequency: 10 kHz}`,
    parts: () => ({ feedback: 40e3, input: 10e3, referenceResistance: 5e3, bypass: 10e-6 }),
  },
  {
    name: '100 kΩ with 5 pF',
    half: 15e-6,
    topology: 'transimpedance',
    file: `${FIVE}\nresistors: {feedback: 100 kΩ, tolerance: 0 %}\ncapacitors: {feedback: 5 pF}\nreference: 500 mV\nphotodiode: {current: 0..30 µA, direction: out-of-node, capacitance: 50 pF}\nsignal: {frequency: 50 kHz}`,
    parts: () => ({ feedback: 100e3, diode: 50e-12, feedbackCapacitor: 5e-12 }),
  },
  {
    name: '40 V/V of 20 mΩ',
    half: 1.5,
    topology: 'low-side-sense',
    file: `${FIVE}\nresistors: {feedback: 195 kΩ, input: 5 kΩ, tolerance: 0 %}\nshunt: {resistance: 20 mΩ, current: 0..3 A}\nsignal: {frequency: 2 kHz}`,
    parts: () => ({ feedback: 195e3, input: 5e3, shunt: 20e-3 }),
  },
  {
    name: '0.4 V/V of 50 mΩ at 12 V',
    half: 1,
    topology: 'high-side-sense',
    file: `${FIVE}\nresistors: {feedback: 100 kΩ, input: 250 kΩ, tolerance: 0 %}\nreference: 500 mV\nshunt: {resistance: 50 mΩ, current: 0..2 A, bus: 12 V}\nsignal: {frequency: 10 kHz}`,
    parts: () => ({ feedback: 100e3, input: 250e3, shunt: 50e-3 }),
  },
  {
    name: '10 kHz, Q = 1, components chosen',
    half: 0.5,
    topology: 'sallen-key-low-pass',
    file: `${FIVE}\nfilter: {corner: 10 kHz, q: 1}\nresistors: {tolerance: 0 %}\ncapacitors: {tolerance: 0 %}\nsignal: {input: 2..3 V, frequency: 8 kHz}`,
    parts: chosen,
  },
  {
    name: 'gain of 2, components given, behind 1 kΩ',
    half: 0.3,
    topology: 'sallen-key-low-pass',
    file: `${FIVE}\ngain: 2\nresistors: {feedback: 10 kΩ, input: 10 kΩ, tolerance: 0 %}\nfilter: {r1: 9 kΩ, r2: 10 kΩ, c1: 1.6 nF, c2: 1.6 nF}\ncapacitors: {tolerance: 0 %}\nreference: 2.5 V\nsource: {resistance: 1 kΩ}\nsignal: {input: 2.2..2.8 V, frequency: 5 kHz}`,
    parts: () => ({ r1: 9e3, r2: 10e3, c1: 1.6e-9, c2: 1.6e-9, feedback: 10e3, input: 10e3, source: 1e3 }),
  },
  {
    name: '5 kHz, Q = 1, gain of −2, components chosen',
    half: 0.4,
    topology: 'multiple-feedback-low-pass',
    file: `${FIVE}\ngain: -2\nfilter: {corner: 5 kHz, q: 1}\nresistors: {tolerance: 0 %}\ncapacitors: {tolerance: 0 %}\nreference: {value: mid-supply, resistance: 5 kΩ, bypass: 10 µF}\nsignal: {input: 2.1..2.9 V, frequency: 4 kHz}`,
    parts: (stage) => ({ ...chosen(stage), referenceResistance: 5e3, bypass: 10e-6 }),
  },
  {
    name: '10 kΩ and 10 nF',
    topology: 'integrator',
    file: `${FIVE}\nreference: 2.5 V\nintegrator: {resistance: 10 kΩ, capacitance: 10 nF, window: 100 µs}\nresistors: {tolerance: 0 %}\ncapacitors: {tolerance: 0 %}\nsignal: {input: 2..3 V, frequency: 1 kHz}`,
    parts: () => ({ input: 10e3, c: 10e-9 }),
  },
];
