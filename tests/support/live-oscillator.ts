import { drawing, type Parts } from './drawings.js';
import { spice } from './spice.js';

/** An output that swings between two levels, V, at a slope of at most `slewRate`, V/s; the supply of the thresholds, V. */
export interface Comparing {
  readonly supply: number;
  readonly high: number;
  readonly low: number;
  readonly slewRate: number;
}

export interface Oscillation {
  readonly period: number;
  /** Share of the period the output is above the middle of its levels. */
  readonly duty: number;
  readonly upper: number;
  readonly lower: number;
  /** Largest voltage between both inputs. */
  readonly differential: number;
  /** 10 % to 90 % of the levels, s. */
  readonly edge: number;
}

const FARAD = 1e-9;
/** Where the input pair is fully over: any gain that is large against the swing. */
const VOLTS_TO_SLEW = 1e-4;

/** The settled period of an oscillator that runs at about `expected` Hz. */
export async function oscillate(parts: Parts, { supply, high, low, slewRate }: Comparing, expected: number): Promise<Oscillation> {
  const drawn = drawing('relaxation-oscillator', parts, { supply, input: 0 });
  const most = slewRate * FARAD;
  const step = 1 / expected / 4000;
  const lines = [
    ...drawn.lines,
    `by 0 y i=${most}*min(max((v(${drawn.plus})-v(${drawn.minus}))/${VOLTS_TO_SLEW},-1),1)`,
    `cy y 0 ${FARAD}`,
    // Holds the output at its levels within a tenth of a millivolt, without winding up.
    `bh y 0 i=${most * 1e4}*(max(v(y)-${high},0)+min(v(y)-${low},0))`,
    'eout out 0 y 0 1',
    `.tran ${step} ${6 / expected} 0 ${step} uic`,
  ];
  const result = await spice(['* an oscillator', ...lines, '.end', ''].join('\n'));
  const [times, output, plus, minus] = [result.real('time'), result.real('v(out)'), result.real('v(p)'), result.real('v(n)')];
  const rising = (level: number): number[] => crossings(times, output, level);
  const falling = (level: number): number[] => crossings(times, output.map((value) => -value), -level);
  const middle = (high + low) / 2;
  const last = rising(middle).slice(-2) as [number, number];
  const down = falling(middle).find((time) => time > last[0])!;
  const since = times.findIndex((time) => time > last[0]);
  const until = times.findIndex((time) => time > last[1]);
  const within = (values: readonly number[]): readonly number[] => values.slice(since, until);
  const at = (share: number): number => low + share * (high - low);
  return {
    period: last[1] - last[0],
    duty: (down - last[0]) / (last[1] - last[0]),
    upper: Math.max(...within(minus)),
    lower: Math.min(...within(minus)),
    differential: Math.max(...within(plus.map((value, k) => Math.abs(value - minus[k]!)))),
    edge: rising(at(0.9)).at(-1)! - rising(at(0.1)).at(-1)!,
  };
}

function crossings(times: readonly number[], values: readonly number[], level: number): number[] {
  return times.flatMap((time, k) => {
    const [a, b] = [values[k - 1], values[k]!];
    if (a === undefined || a >= level || b < level) return [];
    return [times[k - 1]! + ((level - a) / (b - a)) * (time - times[k - 1]!)];
  });
}
