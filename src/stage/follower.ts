import { biasedPin, FOLLOWING_PIN, sourcePin } from './networks.js';
import { inputOf, UNITY, type Circuit, type RatioCorner, type Surroundings } from './circuit.js';

/** Unity-gain follower: output and both inputs move with the signal. */
export function follower(around: Surroundings): Circuit {
  const level = around.ac
    ? (input: number, reference: number): number => reference + input
    : (input: number): number => input;
  const corner: RatioCorner = {
    noiseGain: 1,
    output: (point, reference) => level(inputOf(point, 'input'), reference),
    commonMode: (point, reference) => level(inputOf(point, 'input'), reference),
  };
  return {
    gain: 1,
    gainUnit: 'V/V',
    noiseGain: UNITY,
    dcNoiseGain: UNITY,
    resistors: null,
    nominal: corner,
    corners: [corner],
    networkConductance: 0,
    networkEnd: (_commonMode, reference) => reference,
    seriesPositive: around.ac ? around.referenceResistance : around.sourceResistance,
    seriesNegative: 0,
    resistorRejection: null,
    network: { plus: around.ac ? biasedPin(around) : sourcePin(around), minus: FOLLOWING_PIN },
    notes: [],
  };
}
