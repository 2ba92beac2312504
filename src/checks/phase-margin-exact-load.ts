import { multiply, type Complex } from '../formulas/complex.js';
import { feedbackFactor } from '../formulas/feedback-loop.js';
import type { PassiveElement, PinNetwork } from '../formulas/pin-network.js';
import type { LoadedOutput } from './phase-margin-loop.js';

/** Both input networks as the loop has them; F at the − input. */
export interface LoopNetworks {
  readonly plus: PinNetwork;
  readonly minus: PinNetwork;
  readonly minusCapacitance: number;
}

/** Feedback factor as a function of the frequency in Hz. */
export type Factor = (frequency: number) => Complex;

/**
 * β·load of a feedback network that loads the output resistance itself: Ro, Riso, RL and CL are nodes of the same circuit, so that
 * what the capacitors of a filter take from the output is in it. What a load resistance divides away at all frequencies is in the
 * printed gain bandwidth already and put back. Source: nodal analysis.
 */
export function loadedFactor({ plus, minus, minusCapacitance }: LoopNetworks, load: LoadedOutput): Factor {
  // Each pin is asked by itself, with all there is at the output: the other network too.
  const [ofPlus, ofMinus] = [inside(plus, '+'), inside(minus, '−')];
  const input: PassiveElement[] = minusCapacitance === 0 || HELD.has(ofMinus.pin) ? [] : [{ name: 'own input', kind: 'capacitor', value: minusCapacitance, between: [ofMinus.pin, 'ground'] }];
  const elements = [...ofPlus.elements, ...ofMinus.elements, ...input, ...outputSide(load)];
  const around = ({ pin }: PinNetwork): PinNetwork => (HELD.has(pin) ? { elements: [], pin } : { elements, pin });
  const factor = feedbackFactor({ plus: around(ofPlus), minus: around(ofMinus) });
  const { resistance, isolation, outputResistance } = load;
  const restored = resistance === null ? 1 : (resistance + isolation + outputResistance) / (resistance + isolation);
  return (frequency) => multiply({ re: restored, im: 0 }, factor(frequency));
}

const HELD: ReadonlySet<string> = new Set(['output', 'input', 'ground']);
/** The stage's output, behind the output resistance. */
const OUT = 'loaded output';
/** Less than this is none, Ω. */
const WIRE = 1e-9;

/** Inner nodes by names of their own, the output behind Ro. */
function inside({ elements, pin }: PinNetwork, side: string): PinNetwork {
  const renamed = (node: string): string => (node === 'output' ? OUT : HELD.has(node) ? node : `${node} ${side}`);
  return { pin: renamed(pin), elements: elements.map((one) => ({ ...one, between: [renamed(one.between[0]), renamed(one.between[1])] })) };
}

function outputSide({ outputResistance, isolation, resistance, capacitance }: LoadedOutput): PassiveElement[] {
  const isIsolated = isolation > WIRE;
  const far = isIsolated ? 'far' : OUT;
  return [
    { name: 'Ro', kind: 'resistor', value: outputResistance, between: ['output', OUT] },
    ...(isIsolated ? [{ name: 'Riso', kind: 'resistor', value: isolation, between: [OUT, far] } as const] : []),
    ...(resistance === null ? [] : [{ name: 'RL', kind: 'resistor', value: resistance, between: [far, 'ground'] } as const]),
    ...(capacitance === 0 ? [] : [{ name: 'CL', kind: 'capacitor', value: capacitance, between: [far, 'ground'] } as const]),
  ];
}
