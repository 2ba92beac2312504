import { TOPOLOGIES, type Topology } from '../../src/spec/spec.js';

/** Fewest lines that make a stage of each topology, without topology and supply. */
const OWN: Readonly<Record<Topology, string>> = {
  follower: 'signal: {input: 1..2 V}',
  'non-inverting': 'gain: 8\nsignal: {input: 25 mV..330 mV}',
  inverting: 'gain: -2\nreference: mid-supply\nsignal: {input: 2..3 V}',
  summing: 'legs: {command: {input: 0..1 V, resistance: 100 kΩ}}\nreference: mid-supply',
  difference: 'gain: 10\nreference: mid-supply\nsignal: {positive: 1.2..1.4 V, negative: 1.2..1.3 V}',
  transimpedance: 'photodiode: {current: 0..2 µA, direction: into-node, capacitance: 50 pF}\nreference: 3 V',
  'low-side-sense': 'gain: 40\nshunt: {resistance: 20 mΩ, current: 0..3 A}',
  'high-side-sense': 'gain: 0.4\nshunt: {resistance: 50 mΩ, current: 0..2 A, bus: 10.8..13.2 V}',
  'sallen-key-low-pass': 'filter: {corner: 1 kHz, q: 0.707}\nsignal: {input: 1..2 V}',
  'multiple-feedback-low-pass': 'gain: -2\nfilter: {corner: 1 kHz, q: 0.707}\nreference: mid-supply\nsignal: {input: 2..3 V}',
  integrator: 'integrator: {resistance: 100 kΩ, capacitance: 100 nF, window: 20 ms}\nreference: 2.5 V\nsignal: {input: 2.5..3 V}',
  'relaxation-oscillator': 'oscillator: {frequency: 1 kHz}',
};

/** The stage with further lines; a map that is written again replaces the one of the stage. */
export function stageFile(topology: Topology, lines = ''): string {
  const written = [...lines.matchAll(/^(\w+):/gmu)].map((match) => match[1] ?? '');
  const kept = OWN[topology].split('\n').filter((line) => !written.includes(line.slice(0, line.indexOf(':'))));
  return [`topology: ${topology}`, 'supply: 5 V', ...kept, ...(lines === '' ? [] : [lines]), ''].join('\n');
}

export const ALL_TOPOLOGIES: readonly { readonly topology: Topology }[] = TOPOLOGIES.map((topology) => ({ topology }));
