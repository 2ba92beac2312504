import { requireFinite, requireNotNegative, requirePositive, requireWithin } from './domain.js';
import { difference, nonInverting, type StagePoint } from './ranges.js';

/**
 * Transimpedance: vo = Vref + i·Rf when the current is pulled out of the node (cathode at the node), Vref − i·Rf when it is
 * pushed into it; vcm = Vref, DC noise gain 1.
 * @param stage current A, at least 0; feedback Ω, above 0; reference V; direction
 * @example transimpedance({current: 10e-6, feedback: 200e3, reference: 0.1, direction: 'into-node'}) stands at −1.9 V
 * Source: Graeme, Photodiode Amplifiers: Op Amp Solutions (1996), ch. 2 (from memory).
 */
export function transimpedance(stage: {
  readonly current: number;
  readonly feedback: number;
  readonly reference: number;
  readonly direction: 'into-node' | 'out-of-node';
}): StagePoint {
  const { current, feedback, reference, direction } = stage;
  requireNotNegative('transimpedance', { current });
  requirePositive('transimpedance', { feedback });
  requireFinite('transimpedance', { reference });
  const sign = direction === 'into-node' ? -1 : 1;
  return { output: reference + sign * current * feedback, commonMode: reference, noiseGain: 1 };
}

/**
 * Low-side sense, non-inverting: the input is I·Rsh, gain G from the reference.
 * @param stage current A, finite (negative: reverse current); shunt Ω above 0; gain at least 1; reference V
 * @example lowSideSense({current: 2, shunt: 0.01, gain: 50, reference: 0}) stands at 1 V, its inputs at 20 mV
 * Source: own algebra, nonInverting().
 */
export function lowSideSense(stage: {
  readonly current: number;
  readonly shunt: number;
  readonly gain: number;
  readonly reference: number;
}): StagePoint {
  const { current, shunt, gain, reference } = stage;
  requireFinite('lowSideSense', { current });
  requirePositive('lowSideSense', { shunt });
  requireWithin('lowSideSense', { gain }, { from: 1 });
  return nonInverting({ input: current * shunt, reference, ratio: gain - 1 });
}

/**
 * High-side sense by a matched difference stage: vo = Vref + G·I·Rsh, vcm = (G·Vbus + Vref)/(1+G).
 * @param stage current A, finite; shunt Ω above 0; gain above 0; bus and reference V
 * @example highSideSense({current: 5, shunt: 0.01, gain: 10, bus: 12, reference: 0}) stands at 0.5 V, its inputs at 10.9 V
 * Source: own algebra, difference().
 */
export function highSideSense(stage: {
  readonly current: number;
  readonly shunt: number;
  readonly gain: number;
  readonly bus: number;
  readonly reference: number;
}): StagePoint {
  const { current, shunt, gain, bus, reference } = stage;
  requireFinite('highSideSense', { current, bus });
  requirePositive('highSideSense', { shunt, gain });
  return difference({ positive: bus, negative: bus - current * shunt, reference, negativeRatio: gain, positiveRatio: gain });
}

/**
 * High-side sense with a transistor (voltage to current): vo = I·Rsh·RL/R1, vcm = Vbus − I·Rsh, NG about 1. The inputs must
 * work up to the bus.
 * @param stage current A, at least 0; shunt, sense (R1) and load (RL) Ω above 0; bus V
 * @example highSideMirror({current: 5, shunt: 0.01, sense: 100, load: 2e3, bus: 12}) stands at 1 V, its inputs at 11.95 V
 * Source: own algebra, common practice.
 */
export function highSideMirror(stage: {
  readonly current: number;
  readonly shunt: number;
  readonly sense: number;
  readonly load: number;
  readonly bus: number;
}): StagePoint {
  const { current, shunt, sense, load, bus } = stage;
  requireNotNegative('highSideMirror', { current });
  requirePositive('highSideMirror', { shunt, sense, load });
  requireFinite('highSideMirror', { bus });
  return { output: (current * shunt * load) / sense, commonMode: bus - current * shunt, noiseGain: 1 };
}
