import type { LoopCurves, OpenLoop } from '../../../curves/index.js';
import { SERIES, type Series } from '../drawing/colours.js';

/** A curve of gain over frequency, V/V. */
export interface GainCurve {
  readonly name: string;
  readonly values: readonly number[];
  readonly series: Series;
}

/** Open loop as printed and as it must be counted on, noise gain, closed loop: in the order they are drawn. */
export function gainCurves({ openLoop, noiseGain, closedLoop }: LoopCurves): GainCurve[] {
  const open = openLoop.map((one): GainCurve => ({ name: openWords(one, openLoop.length), values: one.gain, series: one.kind === 'limit' ? SERIES.first : SERIES.second }));
  return [...open, { name: 'noise gain 1/β', values: noiseGain, series: SERIES.third }, { name: 'closed loop, signal', values: closedLoop, series: SERIES.fourth }];
}

/** `limit`: guaranteed, or guarded by the factor that stands in for one. */
export function openWords({ kind, how }: OpenLoop, curves: number): string {
  if (kind === 'typical') return 'open loop, typical';
  if (how === null) return curves === 1 ? 'open loop' : 'open loop, limit';
  return 'open loop, counted on';
}

/** The range of gain shown: from a tenth below the least plateau that matters to just above the open-loop gain where the curves begin, at most nine decades. */
export function gainRange({ openLoop, noiseGain }: LoopCurves): [number, number] {
  const crossing = Math.min(...openLoop.flatMap(({ crossing: at }) => (at === null ? [] : [at.gain])), ...noiseGain);
  const least = Math.max(1e-3, Math.min(1, crossing) / 10);
  const most = Math.max(...openLoop.flatMap(({ gain }) => gain), ...noiseGain.filter((gain) => gain < 1e4));
  return [10 ** Math.floor(Math.log10(least)), 10 ** Math.min(Math.ceil(Math.log10(most * 1.05)), Math.floor(Math.log10(least)) + 9)];
}
