import { GAUSS_WEIGHTS, KRONROD_NODES, KRONROD_WEIGHTS, PANEL_POINTS } from './gauss-kronrod.js';

/** Butterworth low-pass behind the stage: −3 dB corner Hz above 0, order at least 1. */
export interface FollowingFilter {
  readonly corner: number;
  readonly order: number;
}

/** Edges of a panel, ln Hz. */
export type Panel = readonly [from: number, to: number];

/**
 * Points of panels one after another: frequency Hz; weight Hz of the 15-point rule; difference Hz, by which the 7-point rule inside it
 * weighs less; filter |F|².
 */
export interface PanelAxis {
  readonly frequency: Float64Array;
  readonly weight: Float64Array;
  readonly difference: Float64Array;
  readonly filter: Float64Array;
}

/**
 * Frequencies, weights and filter at the points of some panels.
 * @param panels edges in ln Hz
 * @param following filter, or null
 * @returns Hz, Hz, Hz, and |F|²
 * @example panelAxis([[Math.log(1), Math.log(2)]], null).weight adds up to 1 Hz
 * Source: as panelIntegral(), with df = f·d(ln f).
 */
export function panelAxis(panels: readonly Panel[], following: FollowingFilter | null): PanelAxis {
  const empty = (): Float64Array => new Float64Array(panels.length * PANEL_POINTS);
  const axis = { frequency: empty(), weight: empty(), difference: empty(), filter: empty() };
  panels.forEach(([from, to], panel) => {
    const half = (to - from) / 2;
    for (let k = 0; k < PANEL_POINTS; k += 1) {
      const at = panel * PANEL_POINTS + k;
      const frequency = Math.exp((from + to) / 2 + half * (KRONROD_NODES[k] ?? NaN));
      const weight = KRONROD_WEIGHTS[k] ?? NaN;
      axis.frequency[at] = frequency;
      axis.weight[at] = frequency * half * weight;
      axis.difference[at] = frequency * half * (weight - (GAUSS_WEIGHTS[k] ?? NaN));
      axis.filter[at] = butterworthPower(frequency, following);
    }
  });
  return axis;
}

/**
 * Power response of a Butterworth low-pass: 1/(1 + (f/fc)^2n).
 * @param frequency Hz, at least 0
 * @param following filter, or null for none
 * @returns V²/V²
 * @example butterworthPower(2e3, {corner: 1e3, order: 2}) is 1/17
 * Source: Butterworth, On the theory of filter amplifiers, Wireless Engineer 7, 1930 (from memory).
 */
export function butterworthPower(frequency: number, following: FollowingFilter | null): number {
  return following ? 1 / (1 + (frequency / following.corner) ** (2 * following.order)) : 1;
}
