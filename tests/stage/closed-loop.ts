import { add, divide, magnitude, subtract, type Complex } from '../../src/formulas/complex.js';
import { pinResponse } from '../../src/formulas/pin-network.js';
import type { Stage } from '../../src/stage/index.js';

/** vo/vi of a stage's own networks about an amplifier A = GBW/jf: vo/A = v+ − v−. Infinity: ideal. */
export function closedLoop({ network }: Stage, frequency: number, gainBandwidth: number): Complex {
  if (network === null) throw new Error('no network');
  const [plus, minus] = [pinResponse(network.plus, frequency), pinResponse(network.minus, frequency)];
  const inverse = { re: 0, im: gainBandwidth === Infinity ? 0 : frequency / gainBandwidth };
  return divide(subtract(plus.fromInput, minus.fromInput), add(inverse, subtract(minus.fromOutput, plus.fromOutput)));
}

export const size = (value: Complex): number => magnitude(value);

