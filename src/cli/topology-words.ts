import type { Topology } from '../index.js';

interface TopologyWords {
  /** What the stage does, in the engineer's words. */
  readonly does: string;
  /** Fields it cannot do without, besides topology and supply. */
  readonly needs: string;
}

/** Every topology as guided entry offers it and help lists it. */
export const TOPOLOGY_WORDS: Readonly<Record<Topology, TopologyWords>> = {
  follower: { does: 'passes a voltage on unchanged, so that its load does not weigh on it', needs: 'signal.input or signal.amplitude' },
  'non-inverting': { does: 'makes a voltage larger', needs: 'signal.input or signal.amplitude; gain, both resistors or signal.output' },
  inverting: { does: 'makes a voltage larger or smaller and turns it over', needs: 'signal.input or signal.amplitude; gain, both resistors or signal.output' },
  summing: { does: 'adds several voltages up, each with a gain of its own, and turns the sum over', needs: 'legs' },
  difference: { does: 'takes the difference of two voltages', needs: 'signal.positive and signal.negative, or signal.differential and signal.commonMode; gain, both resistors or signal.output' },
  transimpedance: { does: 'makes a voltage of the current of a photodiode', needs: 'photodiode (current, direction, capacitance)' },
  'low-side-sense': { does: 'measures a current through a shunt to ground', needs: 'shunt (resistance, current); gain, both resistors or signal.output' },
  'high-side-sense': { does: 'measures a current through a shunt in a supply line', needs: 'shunt (resistance, current, bus); gain, both resistors or signal.output' },
  'sallen-key-low-pass': { does: 'lets low frequencies pass, second order, not turned over', needs: 'filter (corner and q, or r1, r2, c1, c2); signal.input or signal.amplitude' },
  'multiple-feedback-low-pass': { does: 'lets low frequencies pass, second order, turned over', needs: 'filter (corner and q, or r1, r2, r3, c1, c2); signal.input or signal.amplitude' },
  integrator: { does: 'adds a voltage up over time', needs: 'integrator (resistance, capacitance; window, or AC-coupled a lowest frequency); signal.input or signal.amplitude' },
  'relaxation-oscillator': { does: 'makes a square wave by itself', needs: 'oscillator (frequency); no signal' },
};
