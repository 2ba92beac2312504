import { lowestHolding } from '../formulas/bisection.js';
import { bandwidthForSettling } from '../formulas/settling.js';
import { stepRiseTime, stepSettling } from '../formulas/step-response.js';
import { gainBandwidthForFlatBandwidth } from '../formulas/transimpedance-error.js';
import { formatQuantity } from '../quantities/format.js';
import type { Stage } from '../stage/index.js';
import { closedLoopOf } from './closed-loop.js';
import type { ClosedLoop } from './speed-demand.js';

/** One thing that asks for bandwidth: in words, and how much, Hz, with the capacitance of the amplifier's own input, F. */
export interface Criterion {
  readonly what: string;
  readonly needed: (inputCapacitance: number) => number;
}

/** What edge and settling time ask of the bandwidth; nothing where the stage itself, with an ideal amplifier, is too slow. */
export function stepCriteria(stage: Stage): Criterion[] {
  const loop = closedLoopOf(stage);
  // A filter makes its own edge: what it asks of the amplifier is to stay that filter.
  if (loop === null || stage.response.kind === 'low-pass') return [];
  return [...edgeCriterion(stage, loop), ...settlingCriterion(stage, loop)];
}

export const hasEdge = ({ shape }: Stage): boolean => shape === 'step' || shape === 'pulse';

function edgeCriterion(stage: Stage, loop: ClosedLoop): Criterion[] {
  const { edge } = stage;
  if (edge === null || !hasEdge(stage)) return [];
  const what = `${withNoiseGain(stage, loop)}an edge of ${formatQuantity(edge, 's')} from 10 % to 90 %`;
  const onePole = Math.log(9) / (2 * Math.PI * edge);
  return criterion(stage, loop, { what, onePole, flat: stepRiseTime(MAXIMALLY_FLAT) / (2 * Math.PI * edge), holds: (response) => stepRiseTime(response) <= edge });
}

function settlingCriterion(stage: Stage, loop: ClosedLoop): Criterion[] {
  const limit = stage.asked.limits.settling;
  if (limit === undefined) return [];
  const { within: { value: within, text }, to } = limit;
  const what = `${withNoiseGain(stage, loop)}settling within ${text} to ${to.text}`;
  const flat = stepSettling(MAXIMALLY_FLAT, to.value) / (2 * Math.PI * within);
  return criterion(stage, loop, { what, onePole: bandwidthForSettling(within, to.value), flat, holds: (response) => stepSettling(response, to.value) <= within });
}

/** Natural frequency 1 rad/s. */
const MAXIMALLY_FLAT = { gain: 1, a: Math.SQRT2, b: 1, c: 0 };

interface Asked {
  readonly what: string;
  /** Closed-loop bandwidth of one pole, and natural frequency of a maximally flat loop, that do it, Hz. */
  readonly onePole: number;
  readonly flat: number;
  holds(response: ReturnType<ClosedLoop['at']>): boolean;
}

/** Far beyond any amplifier, as a multiple of the bandwidth one pole needs. */
const IDEAL = 1e9;

function criterion(stage: Stage, loop: ClosedLoop, asked: Asked): Criterion[] {
  const { what, onePole } = asked;
  const { response, noiseGain } = stage;
  if (loop.form === 'one-pole') return [{ what, needed: () => noiseGain.nominal * onePole }];
  const holds = (inputCapacitance: number) => (gainBandwidth: number) => asked.holds(loop.at({ gainBandwidth, inputCapacitance }));
  if (!holds(0)(IDEAL * onePole)) return [];
  const searched = remembering((inputCapacitance) => lowestHolding(holds(inputCapacitance), IDEAL * onePole));
  if (response.kind !== 'transimpedance' || response.feedbackCapacitance !== null) return [{ what, needed: searched }];
  const needed = (inputCapacitance: number): number =>
    gainBandwidthForFlatBandwidth({ ...response, inputCapacitance: response.inputCapacitance + inputCapacitance }, asked.flat) ?? searched(inputCapacitance);
  return [{ what, needed }];
}

/** Many parts have the same input capacitance, or none stated. */
export function remembering(of: (x: number) => number): (x: number) => number {
  const known = new Map<number, number>();
  return (x) => {
    const value = known.get(x) ?? of(x);
    known.set(x, value);
    return value;
  };
}

function withNoiseGain({ noiseGain }: Stage, { form }: ClosedLoop): string {
  return form === 'one-pole' ? `noise gain ${formatQuantity(noiseGain.nominal, 'V/V')} at nominal resistors, ` : '';
}
