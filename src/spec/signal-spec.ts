import type { Swing, Value } from './amounts.js';

export interface SignalSpec {
  readonly coupling: 'dc' | 'ac';
  readonly shape: SignalShape;
  /** DC-coupled single input, also when given as amplitude with centre. */
  readonly input?: Swing;
  /** AC-coupled: peak volts about the bias. */
  readonly amplitude?: Value;
  /** Difference: far ends of the legs, independent of each other … */
  readonly positive?: Swing;
  readonly negative?: Swing;
  /** … or coupled: positive − negative, and their mean. */
  readonly differential?: Swing;
  readonly commonMode?: Swing;
  readonly output?: Swing;
  /** Hz. Of a pulse: its repetition. */
  readonly frequency?: { readonly bottom?: number; readonly top: number; readonly text: string };
  /** Step and pulse: 10 % to 90 % time wanted at the output, s. */
  readonly edge?: Value;
  /** Pulse: share of the period spent high, 0..1; absent: free. */
  readonly duty?: Value;
  /** How long one looks, s: its inverse is the lowest noise frequency. */
  readonly observation?: Value;
}

export type SignalShape = 'sine' | 'band-limited' | 'step' | 'pulse';

/** One leg of a summing stage: a signal or a fixed level through a resistor. */
export interface LegSpec {
  readonly name: string;
  /** `signal`: swing against ground (AC-coupled: about zero). The others move with the supply or rest at the reference. */
  readonly level: { readonly kind: 'signal'; readonly swing: Swing } | { readonly kind: 'supply' } | { readonly kind: 'reference' };
  /** One of the two is given: ohm, or the magnitude of the gain from this leg. */
  readonly resistance?: Value;
  readonly gain?: Value;
}
