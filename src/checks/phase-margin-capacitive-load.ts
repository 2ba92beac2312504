import type { PhaseMarginDemand } from '../demands/index.js';
import { secondPoleForPhaseMargin } from '../formulas/two-pole-loop.js';
import { weakest, type Basis } from '../parts/basis.js';
import type { Reading } from '../parts/reading.js';
import { formatQuantity } from '../quantities/format.js';
import type { NumberFinding } from '../verdicts/finding.js';

/** A maker's limit of the load says that the part stays stable with it, no more: it stands for this margin at most, degrees. */
const MEANT = 45;

/** What is known of the loop but for the load. */
export interface Unloaded {
  /** Degrees, without the part's own excess phase, which the maker's limit contains. */
  readonly margin: number;
  readonly basis: Basis;
  /** Only the decision is wanted. */
  readonly brief?: boolean;
}

/**
 * Output resistance not known: the capacitive load the maker states decides, farad against farad, and no margin is invented.
 * Stated at unity gain it grows with the noise gain (a lower bound: the crossover falls, the pole stays), and what the
 * input-capacitance pole takes is taken off. Null where it cannot decide: a margin above 45° is asked, or it is not enough.
 */
export function byCapacitiveLoad(asked: PhaseMarginDemand, stated: Reading | null, unloaded: Unloaded): NumberFinding | null {
  if (stated === null || !decidesByLoad(asked)) return null;
  const gain = gainOver(asked, stated);
  const share = shareLeft(unloaded.margin);
  const offered = stated.value * gain * share;
  const required = asked.load.capacitance;
  if (isShort(offered, required)) return null;
  return {
    kind: 'numbers', required, offered, unit: 'F', sense: 'at-least',
    basis: weakest([stated.basis, unloaded.basis]), slot: stated.slot, how: unloaded.brief === true ? null : howOf(stated, gain, share),
    turnsAt: { figure: 'capacitiveLoad', kind: 'max', value: required / (gain * share), unit: 'F' },
  };
}

/** A limit that stands for so much margin decides about no more. */
export const decidesByLoad = ({ required }: Pick<PhaseMarginDemand, 'required'>): boolean => required <= MEANT;

/** What the maker's limit amounts to at the noise gain of the stage, F. */
export const loadAtGain = (asked: Pick<PhaseMarginDemand, 'noiseGain'>, stated: Reading): number => stated.value * gainOver(asked, stated);

/** Whether so much (F) is enough where this margin is left without the load, degrees. */
export const isLoadEnough = ({ load }: Pick<PhaseMarginDemand, 'load'>, atGain: number, margin: number): boolean => !isShort(atGain * shareLeft(margin), load.capacitance);

const gainOver = ({ noiseGain }: Pick<PhaseMarginDemand, 'noiseGain'>, stated: Reading): number => Math.max(1, noiseGain / statedGain(stated.slot));

/** Not by the tolerance of a verdict: a picofarad is much of a capacitance. */
const isShort = (offered: number, required: number): boolean => offered < required * (1 - 1e-9);

function howOf(stated: Reading, gain: number, share: number): string {
  return [
    'stated capacitive load; output resistance not known',
    stated.how,
    gain === 1 ? null : `× noise gain ${formatQuantity(gain, '1')}`,
    share === 1 ? null : `× ${formatQuantity(share, '1', { round: 'down' })} for the phase the input takes`,
  ].filter((step) => step !== null).join(', ');
}

/** A second pole that must leave more margin has to lie higher: its capacitance shrinks by this. */
function shareLeft(margin: number): number {
  const angle = MEANT + 90 - margin;
  if (angle <= MEANT) return 1;
  return angle >= 90 ? 0 : secondPoleForPhaseMargin(1, MEANT) / secondPoleForPhaseMargin(1, angle);
}

/** Noise gain a figure is stated at, as its slot has it; unity when nothing is said. */
function statedGain(slot: string | null): number {
  const gain = /[@,]G([^,]+)/u.exec(slot ?? '')?.[1];
  return gain === undefined ? 1 : Number(gain);
}
