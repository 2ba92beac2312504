import type { PassiveElement, PinNetwork } from '../formulas/pin-network.js';
import { maximallyFlatCapacitor } from '../formulas/transimpedance.js';
import type { Stage, StageLoad } from '../stage/index.js';
import type { OscillatorResponse } from '../stage/response.js';
import type { Amplifier } from './amplifier.js';
import { networkStates, type NetworkStates } from './states.js';

/** Held nodes of every stage: what the amplifier drives, and the signal at its + and − side (of an oscillator: the supply). */
export const HELD = ['drive', 'signal +', 'signal −', 'supply'] as const;
/** Place of each among them. */
export const DRIVE = 0;
export const SUPPLY = 3;
/** Taps in this order. */
export const TAPS = ['output', '+', '−'] as const;

/** The passive circuit around the amplifier as equations, and how the signal enters it. */
export interface Around {
  readonly states: NetworkStates;
  /** Of one unit of signal at each held node, V; and into the fed node, A. */
  readonly signal: { readonly held: readonly number[]; readonly fed: readonly number[] };
  /** What a resistive load divides away at all frequencies is in the printed gain bandwidth already: put back. */
  readonly restored: number;
  /** F across the feedback resistor where the capacitor is left to the part; null otherwise. */
  readonly chosenCapacitor: number | null;
}

/** The circuit of a stage about this amplifier, its references and supplies at rest. */
export function circuitAround(stage: Stage, amplifier: Amplifier, gainBandwidth: number): Around {
  const { response } = stage;
  const chosen = chosenCapacitor(stage, amplifier, gainBandwidth);
  const { plus, minus } = response.kind === 'oscillator' ? oscillating(response) : linear(stage, chosen);
  const [atPlus, atMinus] = [sided(plus, '+'), sided(minus, '−')];
  const outside = outputSide(stage.load, amplifier.outputResistance);
  const isWired = amplifier.outputResistance === 0;
  const wired = (node: string): string => (isWired && node === 'output' ? 'drive' : node);
  const elements = [...atPlus.elements, ...atMinus.elements, ...inputs(amplifier, [atPlus.pin, atMinus.pin]), ...outside]
    .map((one) => ({ ...one, between: [wired(one.between[0]), wired(one.between[1])] as const }));
  const isFed = response.kind === 'transimpedance';
  const network = { elements, held: HELD, fed: isFed ? [atMinus.pin] : [], taps: ['output', atPlus.pin, atMinus.pin].map(wired) };
  return { states: networkStates(network), signal: signalOf(stage), restored: restoredBy(stage.load, amplifier.outputResistance), chosenCapacitor: chosen };
}

interface Pins {
  readonly plus: PinNetwork;
  readonly minus: PinNetwork;
}

function linear({ network }: Stage, chosen: number | null): Pins {
  if (network === null) throw new RangeError('a stage without a network that is no oscillator');
  if (chosen === null || chosen === 0) return network;
  const { elements, pin } = network.minus;
  return { plus: network.plus, minus: { pin, elements: [...elements, { name: 'feedback capacitor', kind: 'capacitor', value: chosen, between: ['output', pin] }] } };
}

/** The capacitor that makes this stage maximally flat with the part in it, as the checks take it. */
function chosenCapacitor({ response }: Stage, { inputCapacitance }: Amplifier, gainBandwidth: number): number | null {
  if (response.kind !== 'transimpedance' || response.feedbackCapacitance !== null) return null;
  const total = response.inputCapacitance + inputCapacitance;
  return total === 0 ? 0 : maximallyFlatCapacitor({ feedback: response.feedback, inputCapacitance: total, gainBandwidth });
}

function oscillating({ resistance, capacitance, toSupply, toGround, toOutput }: OscillatorResponse): Pins {
  return {
    plus: {
      pin: 'pin',
      elements: [
        { name: 'to supply', kind: 'resistor', value: toSupply, between: ['supply', 'pin'] },
        { name: 'to ground', kind: 'resistor', value: toGround, between: ['pin', 'ground'] },
        { name: 'to output', kind: 'resistor', value: toOutput, between: ['output', 'pin'] },
      ],
    },
    minus: {
      pin: 'pin',
      elements: [
        { name: 'timing', kind: 'resistor', value: resistance, between: ['output', 'pin'] },
        { name: 'timing capacitor', kind: 'capacitor', value: capacitance, between: ['pin', 'ground'] },
      ],
    },
  };
}

/** Inner nodes by names of their own; the signal is one source a side. */
function sided({ elements, pin }: PinNetwork, side: '+' | '−'): PinNetwork {
  const named = (node: string): string => {
    if (node === 'output' || node === 'ground' || node === 'supply') return node;
    return node === 'input' ? `signal ${side}` : `${node} ${side}`;
  };
  return { pin: named(pin), elements: elements.map((one) => ({ ...one, between: [named(one.between[0]), named(one.between[1])] as const })) };
}

/** The capacitance of the amplifier's own inputs, where a pin has any impedance. */
function inputs({ inputCapacitance }: Amplifier, pins: readonly string[]): PassiveElement[] {
  if (inputCapacitance === 0) return [];
  return pins.filter((pin) => pin.startsWith('pin')).map((pin) => ({ name: `own input ${pin}`, kind: 'capacitor', value: inputCapacitance, between: [pin, 'ground'] }));
}

/** Output resistance, isolation and load, to an AC ground. */
function outputSide(load: StageLoad | null, outputResistance: number): PassiveElement[] {
  const own: PassiveElement[] = outputResistance === 0 ? [] : [{ name: 'Ro', kind: 'resistor', value: outputResistance, between: ['drive', 'output'] }];
  if (load === null) return own;
  const far = load.isolation > 0 ? 'far' : 'output';
  return [
    ...own,
    ...(load.isolation > 0 ? [{ name: 'Riso', kind: 'resistor', value: load.isolation, between: ['output', far] } as const] : []),
    ...(load.resistance === null ? [] : [{ name: 'RL', kind: 'resistor', value: load.resistance, between: [far, 'ground'] } as const]),
    ...(load.capacitance === 0 ? [] : [{ name: 'CL', kind: 'capacitor', value: load.capacitance, between: [far, 'ground'] } as const]),
  ];
}

function restoredBy(load: StageLoad | null, outputResistance: number): number {
  if (load?.resistance == null) return 1;
  const outside = load.resistance + load.isolation;
  return (outside + outputResistance) / outside;
}

/** A unit of signal: at both legs of a difference stage in opposite directions, else where the stage has its input. */
function signalOf({ topology, response }: Stage): Around['signal'] {
  if (response.kind === 'transimpedance') return { held: [0, 0, 0, 0], fed: [1] };
  if (response.kind === 'oscillator') return { held: [0, 0, 0, 1], fed: [] };
  const held = topology === 'difference' ? [0, 0.5, -0.5, 0] : topology === 'high-side-sense' ? [0, 0, -1, 0] : [0, 1, 1, 0];
  return { held, fed: [] };
}
