import { FILTERS, ONE_INPUT, ownersOf, SENSES } from './ownership.js';
import type { Topology } from './spec.js';

export interface Reason {
  readonly message: string;
  readonly fix: string;
}

/** Why a topology does not have a field, and what to write instead. */
export function reasonFor(path: string, topology: Topology): Reason {
  const found = REASONS.find(({ paths, of }) => paths.includes(path) && of.includes(topology));
  if (found !== undefined) return { message: found.message, fix: found.fix };
  const owners = (ownersOf(path) ?? []).join(' or ');
  const article = /^[aeio]/.test(owners) ? 'an' : 'a';
  const isInput = SECOND.includes(path) && ONE_INPUT.includes(topology);
  return { message: `${path} belongs to ${article} ${owners} stage, not to topology ${topology}`, fix: isInput ? 'input: 25 mV..330 mV' : 'leave it out' };
}

interface Row extends Reason {
  readonly paths: readonly string[];
  readonly of: readonly Topology[];
}

const FED = ['signal.input', 'signal.amplitude', 'signal.center'];
const SECOND = ['signal.positive', 'signal.negative', 'signal.differential', 'signal.commonMode'];
const NO_SIGNAL: Reason = { message: 'an oscillator makes its own signal: what it runs at is oscillator.frequency', fix: 'oscillator: {frequency: 2 kHz}' };
const OSCILLATOR: readonly Topology[] = ['relaxation-oscillator'];
const NOT_LINEAR = ['limits.swingLoss', 'limits.gainError', 'limits.gainErrorKind', 'limits.dcError', 'limits.outputNoise', 'limits.snr', 'limits.distortion', 'limits.settling', 'limits.phaseMargin'];

const REASONS: readonly Row[] = [
  { paths: ['gain'], of: ['summing'], message: 'each leg of a summing stage has a gain of its own: legs.NAME.gain, or legs.NAME.resistance', fix: 'legs: {command: {input: 0.5..4.5 V, gain: 0.3}}' },
  { paths: ['gain'], of: ['transimpedance'], message: 'a transimpedance stage turns a current into a voltage: its gain is resistors.feedback, volts per ampere', fix: 'resistors: {feedback: 1 MΩ}' },
  { paths: ['gain'], of: ['integrator'], message: 'an integrator gains with time: integrator.resistance and integrator.capacitance say how fast', fix: 'integrator: {resistance: 100 kΩ, capacitance: 100 nF}' },
  { paths: ['gain'], of: OSCILLATOR, message: 'an oscillator amplifies no signal: it has no gain', fix: 'leave it out' },
  { paths: ['resistors'], of: ['follower'], message: 'a follower feeds its output straight back: it has no gain resistors', fix: 'leave it out, or topology: non-inverting' },
  { paths: ['resistors.input'], of: ['summing'], message: 'each leg of a summing stage has an input resistor of its own: legs.NAME.resistance', fix: 'legs: {command: {input: 0.5..4.5 V, resistance: 100 kΩ}}' },
  { paths: ['resistors.input'], of: ['transimpedance'], message: 'a photodiode feeds the summing node straight: there is no input resistor', fix: 'leave it out' },
  { paths: ['resistors.feedback', 'resistors.input'], of: ['multiple-feedback-low-pass'], message: 'the resistors of a multiple-feedback filter are filter.r1, r2 and r3', fix: 'filter: {corner: 1 kHz, q: 0.707}, and gain: -2' },
  { paths: ['resistors.input'], of: ['integrator'], message: 'the input resistor of an integrator is integrator.resistance', fix: 'integrator: {resistance: 100 kΩ, capacitance: 100 nF}' },
  { paths: ['resistors.feedback', 'resistors.input'], of: OSCILLATOR, message: 'the resistors of an oscillator are oscillator.resistance, toSupply, toGround and toOutput', fix: 'oscillator: {frequency: 2 kHz, resistance: 330 kΩ}' },
  { paths: ['reference'], of: OSCILLATOR, message: 'an oscillator has no reference: oscillator.toSupply, toGround and toOutput set its thresholds', fix: 'leave it out' },
  { paths: FED, of: ['difference'], message: 'a difference stage has two inputs: positive and negative, or differential and commonMode', fix: '{positive: 1.2..1.4 V, negative: 1.2..1.3 V}' },
  { paths: FED, of: ['summing'], message: 'a summing stage is fed through its legs: legs.NAME.input, or AC-coupled legs.NAME.amplitude', fix: 'legs: {command: {input: 0.5..4.5 V, resistance: 100 kΩ}}' },
  { paths: FED, of: ['transimpedance'], message: 'a transimpedance stage is fed by its photodiode: photodiode.current', fix: 'photodiode: {current: 0..1.2 µA, direction: out-of-node, capacitance: 80 pF}' },
  { paths: FED, of: SENSES, message: 'a current-sense stage is fed by its shunt: shunt.current', fix: 'shunt: {resistance: 20 mΩ, current: 0..3 A}' },
  { paths: ['signal'], of: OSCILLATOR, ...NO_SIGNAL },
  { paths: ['signal.output'], of: ['integrator'], message: 'where an integrator ends follows from its input, resistance, capacitance and window', fix: 'leave it out' },
  { paths: ['source'], of: ['summing'], message: 'what drives a leg is part of its resistance: legs.NAME.resistance', fix: 'leave it out, and add it to the resistance of the leg' },
  { paths: ['source'], of: ['transimpedance'], message: 'a photodiode is a source of current: no resistance of a source counts', fix: 'leave it out' },
  { paths: ['source'], of: SENSES, message: 'the shunt itself is the source: shunt.resistance', fix: 'leave it out' },
  { paths: ['overdrive', 'sequencing'], of: OSCILLATOR, message: 'nothing drives an oscillator: its inputs stay between their thresholds', fix: 'leave it out' },
  { paths: ['overdrive', 'sequencing'], of: ['transimpedance'], message: 'a photodiode is a source of current and takes the node nowhere by itself', fix: 'leave it out' },
  { paths: ['supplyRipple', 'limits.supplyRipple'], of: OSCILLATOR, message: 'the thresholds of an oscillator follow its supply: what ripple does to its edges is not modelled', fix: 'leave it out' },
  { paths: ['source'], of: OSCILLATOR, message: 'nothing drives an oscillator', fix: 'leave it out' },
  { paths: ['shunt.bus'], of: ['low-side-sense'], message: 'a low-side shunt sits at ground: only a high-side one has a bus', fix: 'leave it out, or topology: high-side-sense' },
  { paths: ['filter.r3'], of: ['sallen-key-low-pass'], message: 'a Sallen-Key low-pass has two resistors, r1 and r2; r3 belongs to multiple feedback', fix: 'leave it out, or topology: multiple-feedback-low-pass' },
  { paths: ['capacitors'], of: ['follower'], message: 'a follower has no feedback resistor that a capacitor could bridge', fix: 'leave it out, or load: {isolation: 220 Ω} against a capacitive load' },
  { paths: ['capacitors.feedback'], of: FILTERS, message: 'the capacitors of a filter are filter.c1 and c2', fix: 'leave it out; tolerance may stay' },
  { paths: ['capacitors.feedback'], of: ['integrator'], message: 'the capacitor of an integrator is integrator.capacitance', fix: 'leave it out; tolerance may stay' },
  { paths: ['capacitors.feedback'], of: OSCILLATOR, message: 'the capacitor of an oscillator is oscillator.capacitance', fix: 'leave it out; tolerance may stay' },
  { paths: ['following', 'converter'], of: OSCILLATOR, message: 'an oscillator drives logic, not a converter: drives says which', fix: 'drives: {threshold: 0.3..0.7}' },
  { paths: NOT_LINEAR, of: OSCILLATOR, message: 'an oscillator switches from end to end: it is judged by limits.frequencyError, oscillator.edge and drives', fix: 'limits: {frequencyError: 3 %}' },
];
