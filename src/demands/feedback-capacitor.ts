import type { PassiveElement, PinNetwork } from '../formulas/pin-network.js';

const NAME = 'feedback capacitor';

/** Both input networks of an amplifier. */
interface Networks {
  readonly plus: PinNetwork;
  readonly minus: PinNetwork;
}

/** The stage with this capacitor (F) from the output to the − input, in place of one that is there; none for 0. */
export function withFeedbackCapacitor(network: Networks, farad: number): Networks {
  const { elements, pin } = network.minus;
  const others = elements.filter(({ name }) => name !== NAME);
  const added: PassiveElement[] = farad === 0 ? [] : [{ name: NAME, kind: 'capacitor', value: farad, between: ['output', pin] }];
  return { ...network, minus: { elements: [...others, ...added], pin } };
}
