import type { PassiveElement, PinNetwork } from '../formulas/pin-network.js';
import type { Surroundings } from './circuit.js';

/** A resistor of a pin's network; nothing when it has no resistance. */
export function resistor(name: string, value: number, between: readonly [string, string]): PassiveElement[] {
  return value === 0 ? [] : [{ name, kind: 'resistor', value, between }];
}

/** A capacitor of a pin's network; nothing when it has no capacitance. */
export function capacitor(name: string, value: number, between: readonly [string, string]): PassiveElement[] {
  return value === 0 ? [] : [{ name, kind: 'capacitor', value, between }];
}

/** An input that sees the signal through the source resistance alone. */
export function sourcePin({ sourceResistance }: Surroundings): PinNetwork {
  if (sourceResistance === 0) return { elements: [], pin: 'input' };
  return { elements: resistor('source', sourceResistance, ['input', 'pin']), pin: 'pin' };
}

/** An AC-coupled + input: the source and the bias resistance share the pin. Without a bias resistance the source alone. */
export function biasedPin(around: Surroundings): PinNetwork {
  const { sourceResistance, referenceResistance } = around;
  const bias = resistor('bias', referenceResistance, ['pin', 'ground']);
  if (sourceResistance === 0) return { elements: [], pin: 'input' };
  return { elements: [...resistor('source', sourceResistance, ['input', 'pin']), ...bias], pin: 'pin' };
}

/** An input that rests at the reference: its resistance, with the bypass across it. */
export function referencePin({ referenceResistance, referenceBypass }: Surroundings): PinNetwork {
  if (referenceResistance === 0) return { elements: [], pin: 'ground' };
  const elements = [...resistor('reference', referenceResistance, ['pin', 'ground']), ...capacitor('bypass', referenceBypass, ['pin', 'ground'])];
  return { elements, pin: 'pin' };
}

/** A leg from the pin to the reference: the resistor, then what the reference shows. */
export function referenceLeg(name: string, value: number, { referenceResistance, referenceBypass }: Surroundings): PassiveElement[] {
  if (referenceResistance === 0) return resistor(name, value, ['pin', 'ground']);
  return [
    ...resistor(name, value, ['pin', 'reference']),
    ...resistor('reference', referenceResistance, ['reference', 'ground']),
    ...capacitor('bypass', referenceBypass, ['reference', 'ground']),
  ];
}

/** A leg from the pin to the signal: the resistor, then the source resistance. */
export function signalLeg(name: string, value: number, { sourceResistance }: Surroundings): PassiveElement[] {
  if (sourceResistance === 0) return resistor(name, value, ['pin', 'input']);
  return [...resistor(name, value, ['pin', 'leg']), ...resistor('source', sourceResistance, ['leg', 'input'])];
}

/** Feedback from the output to the pin: resistor with the capacitor across it. */
export function feedbackLeg(value: number, { feedbackCapacitance }: Surroundings): PassiveElement[] {
  return [...resistor('feedback', value, ['output', 'pin']), ...capacitor('feedback capacitor', feedbackCapacitance, ['output', 'pin'])];
}

/** The inverting input is the output itself. */
export const FOLLOWING_PIN: PinNetwork = { elements: [], pin: 'output' };

/** A network whose pin is an inner node. */
export function pinOf(elements: readonly PassiveElement[]): PinNetwork {
  return { elements, pin: 'pin' };
}
