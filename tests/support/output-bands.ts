import type { Part } from '../../src/parts/part.js';
import { central, COMMON_PRACTICE, from, isBipolar, isFet, limit, stated, type Relation } from './band-figures.js';
import { headroomAt, heavyResistance, swingCurves, type SwingCurve } from './swing-rows.js';

/** Threshold of a MOS output device, V: common practice. */
const THRESHOLD = 0.7;
/** A lightest row below this is that of a rail-to-rail output; an emitter follower loses more. */
const RAIL_TO_RAIL = 0.4;
const drive = (supply: number): number => supply - THRESHOLD;
const lightest = ({ rows }: SwingCurve): number => rows[0]?.headroom ?? Number.POSITIVE_INFINITY;
const isJunctionFet = (part: Part): boolean => part.class?.startsWith('jfet') ?? false;

/** Relations between swing, current and supply. */
export const OUTPUT_RELATIONS: readonly Relation[] = [
  {
    name: 'head-room rises with current',
    source: 'resistance and saturation of the output device: Gray, Hurst, Lewis & Meyer, 5th ed. 2009, ch. 1 (from memory)',
    unit: 'V',
    band: [0, Number.POSITIVE_INFINITY],
    values: (part) => swingCurves(part).flatMap(({ rows }) => rows.slice(1).map((row, at) => row.headroom - (rows[at]?.headroom ?? 0))),
  },
  {
    name: 'head-room against supply',
    source: 'on-resistance ~ 1/(VS - Vth) of a MOS device, saturation voltage independent of the supply: Gray, Hurst, Lewis & Meyer, 5th ed. 2009, ch. 1 (from memory); Vth 0.7 V and twice the ratio as the upper end, common practice',
    unit: 'of (VS - 0.7 V) ratio',
    band: [0, 1],
    values: supplyShares,
  },
  {
    name: 'both rails alike',
    source: `${COMMON_PRACTICE}: the two output devices of a rail-to-rail output differ by mobility and size, not by an order`,
    unit: 'high/low',
    band: [0.75, 2.5],
    values: railRatios,
  },
  {
    name: 'saturation of a bipolar output',
    source: 'VCEsat of tens of millivolts: Gray, Hurst, Lewis & Meyer, 5th ed. 2009, ch. 1 (from memory)',
    unit: 'V',
    band: [12e-3, Number.POSITIVE_INFINITY],
    values: (part) => (isBipolar(part) ? swingCurves(part).map(lightest) : []),
  },
  {
    name: 'short-circuit current against on-resistance',
    source: 'a MOS device of on-resistance R saturates at (VS - Vth)/(2R): Gray, Hurst, Lewis & Meyer, 5th ed. 2009, ch. 1 (from memory); less where the current is limited: common practice',
    unit: 'of saturation',
    band: [0.08, 2.5],
    values: saturationShares,
  },
  {
    name: 'usable against short-circuit current',
    source: COMMON_PRACTICE,
    unit: 'A/A',
    band: [0.2, 0.75],
    values: (part) => from([stated(part, 'outputCurrent', 'min'), central(part, 'shortCircuitCurrent')], (usable, short) => usable / short),
  },
  {
    name: 'heaviest swing row against usable current',
    source: 'a guaranteed swing at a current guarantees the current',
    unit: 'A/A',
    band: [0, 1],
    values: (part) => swingCurves(part).flatMap(({ rows }) => from([rows.at(-1)?.current ?? null, stated(part, 'outputCurrent', 'min')], (heaviest, usable) => heaviest / usable)),
  },
  {
    name: 'swing left at the lowest supply',
    source: `${COMMON_PRACTICE}: a part is not sold for a supply on which its output cannot move`,
    unit: 'V',
    band: [0.3, Number.POSITIVE_INFINITY],
    values: (part) => from([stated(part, 'supplyVoltage', 'min'), lightOf(part, 'outputLowHeadroom'), lightOf(part, 'outputHighHeadroom')], (supply, low, high) => supply - low - high),
  },
  {
    name: 'rows on supplies the part works on',
    source: 'a figure cannot be rated where the part is not',
    unit: 'of the range',
    band: [0, 1],
    values: (part) => {
      const [least, most] = [stated(part, 'supplyVoltage', 'min'), stated(part, 'supplyVoltage', 'max')];
      return least === null || most === null ? [] : swingCurves(part).map(({ supply }) => (supply - least) / (most - least));
    },
  },
  {
    name: 'absolute against operating maximum',
    source: COMMON_PRACTICE,
    unit: 'V/V',
    band: [1.02, 1.6],
    values: (part) => from([stated(part, 'supplyAbsoluteMaximum', 'max'), stated(part, 'supplyVoltage', 'max')], (absolute, operating) => absolute / operating),
  },
  {
    name: 'junction above ambient',
    source: COMMON_PRACTICE,
    unit: 'K',
    band: [15, 150],
    values: (part) => from([limit(part, 'junctionTemperature'), stated(part, 'temperature', 'max')], (junction, ambient) => junction - ambient),
  },
];

function lightOf(part: Part, rail: SwingCurve['rail']): number | null {
  const curves = swingCurves(part).filter((curve) => curve.rail === rail);
  return curves[0] === undefined ? null : lightest(curves[0]);
}

/** Head-room at the lower of two rated supplies over that at the higher, at equal current, on the way from 0.85 (0) to twice the drive ratio (1). */
function supplyShares(part: Part): number[] {
  const curves = swingCurves(part);
  return curves.flatMap((low) =>
    curves
      .filter((high) => high.rail === low.rail && high.supply > low.supply)
      .flatMap((high) =>
        low.rows.flatMap(({ current, headroom }) => {
          const isBelow = current < (high.rows[0]?.current ?? 0);
          const other = isBelow ? lightest(high) : headroomAt(high.rows, current);
          if (other === null) return [];
          const share = (headroom / other - LEAST_GAIN) / ((2 * drive(high.supply)) / drive(low.supply) - LEAST_GAIN);
          // Below the lightest row of the higher supply its head-room is only known to be smaller.
          return [isBelow ? Math.max(0, share) : share];
        }),
      ),
  );
}

/** A higher supply may cost a little: a row at equal resistance carries more current there. */
const LEAST_GAIN = 0.85;

function railRatios(part: Part): number[] {
  const curves = swingCurves(part);
  return curves
    .filter((curve) => curve.rail === 'outputLowHeadroom' && lightest(curve) < RAIL_TO_RAIL)
    .flatMap((low) => {
      const high = curves.find((curve) => curve.rail === 'outputHighHeadroom' && curve.supply === low.supply);
      if (high === undefined || lightest(high) >= RAIL_TO_RAIL) return [];
      return low.rows.flatMap((row) => from([headroomAt(high.rows, row.current)], (other) => other / row.headroom));
    });
}

/** Short-circuit current over what the output device can carry, at the highest supply the swing is rated at. */
function saturationShares(part: Part): number[] {
  if (!isFet(part) || isJunctionFet(part)) return [];
  const curves = swingCurves(part);
  const highest = Math.max(...curves.map(({ supply }) => supply));
  return curves
    .filter((curve) => curve.supply === highest && lightest(curve) < RAIL_TO_RAIL)
    .flatMap(({ rows }) => from([central(part, 'shortCircuitCurrent'), heavyResistance(rows)], (short, resistance) => (short * 2 * resistance) / drive(highest)));
}
