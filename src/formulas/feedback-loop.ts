import { turningPoint } from './bisection.js';
import { add, divide, magnitude, multiply, phase, subtract, type Complex } from './complex.js';
import { requireNotNegative, requirePositive, requireWithin } from './domain.js';
import { outputShare, pinTransfers, type PinNetwork } from './pin-network.js';

const DEGREES = 180 / Math.PI;

/** The passive networks at both inputs of one amplifier; the amplifier's input capacitances to ground in F (default 0). */
export interface FeedbackNetworks {
  readonly plus: PinNetwork;
  readonly minus: PinNetwork;
  readonly plusCapacitance?: number;
  readonly minusCapacitance?: number;
}

/** A(jf) = gainBandwidth/(jf) · Π 1/(1 + jf/pole): Hz, above 0; a pole at Infinity is none. */
export interface LoopAmplifier {
  readonly gainBandwidth: number;
  readonly poles?: readonly number[];
}

/**
 * Feedback factor β: the share of the output voltage that comes back as v− − v+.
 * @param networks Ω and F
 * @returns V/V as a function of the frequency in Hz
 * @example feedbackFactor({plus: grounded, minus: 9 kΩ over 1 kΩ})(1e3) is 0.1
 * Source: Franco, Design with Operational Amplifiers and Analog Integrated Circuits (3rd ed. 2002), ch. 1 and 8 (from memory).
 */
export function feedbackFactor(networks: FeedbackNetworks): (frequency: number) => Complex {
  const { plus, minus, plusCapacitance, minusCapacitance } = networks;
  const back = outputShare(minus, minusCapacitance);
  // Most stages return nothing to the + input.
  if (plus.pin === 'ground' || plus.pin === 'input') return back;
  const forth = outputShare(plus, plusCapacitance);
  return (frequency) => subtract(back(frequency), forth(frequency));
}

/**
 * Closed-loop noise gain 1/(1/A + β): from a voltage between the amplifier's inputs to the output. Times the pin's impedance it is
 * the gain for a current into the pin.
 * @param networks Ω and F
 * @param amplifier Hz; gainBandwidth Infinity for the ideal one
 * @param frequency Hz, at least 0
 * @returns V/V
 * @example closedLoopNoiseGain({plus: grounded, minus: 9 kΩ over 1 kΩ}, {gainBandwidth: 1e6}, 100e3) is 5 − 5j
 * Source: as feedbackFactor().
 */
export function closedLoopNoiseGain(networks: FeedbackNetworks, amplifier: LoopAmplifier, frequency: number): Complex {
  requireNotNegative('closedLoopNoiseGain', { frequency });
  if (amplifier.gainBandwidth !== Infinity) requireAmplifier('closedLoopNoiseGain', amplifier);
  return divide({ re: 1, im: 0 }, add(inverseGain(amplifier, frequency), feedbackFactor(networks)(frequency)));
}

/**
 * Closed-loop gain from the signal to the output: (a+ − a−)/(1/A + β), a± the transfers from the signal to the pins.
 * @param networks Ω and F
 * @param amplifier Hz; gainBandwidth Infinity for the ideal one
 * @param frequency Hz, at least 0
 * @returns V/V
 * @example closedLoopGain({plus: input, minus: 9 kΩ over 1 kΩ}, {gainBandwidth: 1e6}, 100e3) is 5 − 5j
 * Source: as feedbackFactor().
 */
export function closedLoopGain(networks: FeedbackNetworks, amplifier: LoopAmplifier, frequency: number): Complex {
  const { plus, minus } = transfersOf(networks);
  const driven = subtract(plus(frequency).fromInput, minus(frequency).fromInput);
  return multiply(driven, closedLoopNoiseGain(networks, amplifier, frequency));
}

/**
 * True crossover: the highest frequency where the loop gain |A·β| is 1, whatever the shape below it.
 * @param networks Ω and F
 * @param amplifier Hz, above 0
 * @returns Hz, to 1e-12 of itself
 * @example loopCrossover(follower, {gainBandwidth: 1e6, poles: [2e6]}) is 910.2 kHz
 * Source: own algebra; a downward search and bisection in ln f.
 * @throws RangeError when the loop gain stays below 1.
 */
export function loopCrossover(networks: FeedbackNetworks, amplifier: LoopAmplifier): number {
  const { gainBandwidth } = requireAmplifier('loopCrossover', amplifier);
  const factor = feedbackFactor(networks);
  const excess = (position: number): number => {
    const frequency = Math.exp(position);
    return Math.log(magnitude(factor(frequency)) / magnitude(inverseGain(amplifier, frequency)));
  };
  let below = Math.log(gainBandwidth) + 1;
  while (excess(below) >= 0) below += 1;
  // Poles of a network of resistors and capacitors are real: |T| can have notches but no narrow peak for these steps to miss.
  for (let steps = 0; steps < 400; steps += 1) {
    const next = below - Math.min(0.25, Math.max(0.02, -excess(below) / 4));
    if (excess(next) >= 0) return Math.exp(turningPoint((position) => excess(position) >= 0, { low: below, high: next }));
    below = next;
  }
  throw new RangeError(`loopCrossover: the loop gain is below 1 from ${Math.exp(below)} Hz up; this network feeds too little back`);
}

/**
 * Phase margin at that crossover: 180° + arg(A·β) = 90° + arg β − Σ atan(f/pole). Lag beyond 360° stays at −180.
 * @param networks Ω and F
 * @param amplifier Hz, above 0
 * @returns degrees, −180..180
 * @example loopPhaseMargin(follower, {gainBandwidth: 1e6, poles: [2e6]}) is 65.53°
 * Source: Franco (3rd ed. 2002), ch. 8 (from memory).
 */
export function loopPhaseMargin(networks: FeedbackNetworks, amplifier: LoopAmplifier): number {
  const crossover = loopCrossover(networks, amplifier);
  const lead = phase(feedbackFactor(networks)(crossover));
  const lag = (amplifier.poles ?? []).reduce((sum, pole) => sum + DEGREES * Math.atan(crossover / pole), 0);
  const margin = 90 + lead - lag;
  // Only upwards is it wrapped: lag beyond a full turn must not look like margin.
  return Math.max(-180, margin > 180 ? margin - 360 : margin);
}

/**
 * Noise gain 1/|β| at the highest frequencies, where capacitors alone divide: it decides the minimum stable gain.
 * @param networks Ω and F
 * @returns V/V; Infinity when β falls without end, as with a bare resistor into an input capacitance
 * @example highFrequencyNoiseGain({plus: grounded, minus: 100 kΩ ∥ 3.986 pF over 50 pF}) is 13.54
 * Source: Graeme, Photodiode Amplifiers: Op Amp Solutions (1996) for 1 + Cin/Cf (from memory); general limit own algebra.
 */
export function highFrequencyNoiseGain(networks: FeedbackNetworks): number {
  // Far above any corner of real parts; the reduction forms no difference of large admittances, so it stays exact there.
  const [far, further] = [1e24, 1e26].map((frequency) => magnitude(feedbackFactor(networks)(frequency))) as [number, number];
  return further < far / 2 || far === 0 ? Infinity : 1 / further;
}

/**
 * Second pole of an amplifier told by its unity-gain crossover and phase margin: f2 = fu·tan PM.
 * @param unityCrossover fu Hz, above 0
 * @param phaseMargin degrees, above 0; from 90 on there is no excess phase
 * @returns Hz; Infinity for none
 * @example excessPole(1e6, 60) is 1.732 MHz
 * Source: own algebra: 180° − 90° − atan(fu/f2) = PM.
 */
export function excessPole(unityCrossover: number, phaseMargin: number): number {
  requirePositive('excessPole', { unityCrossover });
  requireWithin('excessPole', { phaseMargin }, { above: 0, to: 180 });
  return phaseMargin >= 90 ? Infinity : unityCrossover * Math.tan(phaseMargin / DEGREES);
}

function transfersOf({ plus, minus, plusCapacitance = 0, minusCapacitance = 0 }: FeedbackNetworks) {
  return { plus: pinTransfers(plus, plusCapacitance), minus: pinTransfers(minus, minusCapacitance) };
}

function inverseGain({ gainBandwidth, poles = [] }: LoopAmplifier, frequency: number): Complex {
  return poles.reduce((gain, pole) => multiply(gain, { re: 1, im: frequency / pole }), { re: 0, im: frequency / gainBandwidth });
}

function requireAmplifier(where: string, amplifier: LoopAmplifier): LoopAmplifier {
  requirePositive(where, { gainBandwidth: amplifier.gainBandwidth });
  for (const pole of amplifier.poles ?? []) if (pole !== Infinity) requirePositive(where, { pole });
  return amplifier;
}
