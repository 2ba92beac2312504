import type { Condition, Figure } from '../../src/parts/figures.js';
import { lossOf, type PrintedPoint, type Side } from './loss.js';
import type { DrawnPart } from './part-drawn.js';
import type { Dice } from './random.js';
import { counted, figureOf, kelvin, type Print } from './reading.js';
import type { DrawnStage } from './stage-drawn.js';

/** Where a point was rated and how much of the largest current of the stage it covers. */
interface Sketch {
  readonly way: string;
  readonly supplies: readonly (number | null)[];
  readonly reach: number;
  readonly count: number;
  readonly resistive: boolean;
  readonly isFarBeyond?: true;
}

/** A part with head-room points of one side in one of the ways they are known, and often with an offset that takes its share. */
export function drawHeadroomPart(dice: Dice, stage: DrawnStage, side: Side): DrawnPart {
  const largest = Math.max(...stage.demands[side === 'low' ? 'output-low' : 'output-high'].vertices.map(({ current }) => current));
  const print: Print = { kind: dice.chance(0.5) ? 'max' : 'typ', at25: dice.chance(0.3) };
  const sketch = largest < 1e-7 ? { ...drawSketch(dice, stage), way: 'no current towards the rail', count: 1, reach: 0, resistive: false } : drawSketch(dice, stage);
  const points = pointsOf(dice, sketch, { side, largest, stage });
  const share = drawOffset(dice, stage);
  const curveAt = (scale: number) => ({ side, print, points: points(scale) });
  const typical = `${print.kind === 'typ' ? 'typical' : 'limit'}${print.at25 ? ' at 25 °C' : ''}`;
  return {
    way: `${typical}, ${sketch.way}${share.way}`, inputType: null, ends: [1e-9, 1e4], isLinear: false,
    figures: (scale) => [...points(scale).map((point) => figure(point, side, print)), ...share.figures],
    physical: (scale, reading) =>
      sketch.isFarBeyond === true && reading === 'pessimistic' && largest > 0
        ? null
        : { loss: (supply) => lossOf(curveAt(scale), { stage, supply }, reading), offset: share.volts(reading) },
  };
}

function drawSketch(dice: Dice, stage: DrawnStage): Sketch {
  const { min, max } = stage.supply;
  const lower = Number((min * dice.even(0.7, 1)).toPrecision(3));
  const higher = Number((max * dice.even(1.05, 1.8)).toPrecision(3));
  const covered = { reach: dice.even(1.1, 3), count: dice.pick([1, 2, 3]), resistive: dice.chance(0.4) };
  const beyond = { reach: 1 / dice.even(1.02, 1.4), resistive: false };
  return dice.pick<Sketch>([
    { way: 'rated at or below the supply', supplies: [Math.min(lower, min)], ...covered },
    { way: 'no supply said', supplies: [null], ...covered },
    { way: 'rated at a higher supply', supplies: [higher], ...covered },
    { way: 'rated below and above the supply', supplies: [Math.min(lower, min), higher], ...covered, resistive: false },
    { way: 'rated inside the range of the supply', supplies: [stage.supply.nominal], ...covered },
    { way: 'beyond the heaviest of several points', supplies: [Math.min(lower, min)], count: dice.pick([2, 3]), ...beyond },
    { way: 'beyond the only point', supplies: [Math.min(lower, min)], count: 1, ...beyond },
    { way: 'beyond the heaviest, rated at a higher supply', supplies: [higher], count: 2, ...beyond },
    { way: 'more than 1.5 × the heaviest point', supplies: [Math.min(lower, min)], count: 2, reach: 1 / dice.even(1.7, 3), resistive: false, isFarBeyond: true },
  ]);
}

/** Points that lie on a slightly bent line, volts in proportion to the scale. */
function pointsOf(dice: Dice, sketch: Sketch, of: { side: Side; largest: number; stage: DrawnStage }): (scale: number) => PrintedPoint[] {
  const floor = dice.even(0.02, 0.3);
  const bend = dice.even(0.8, 1.3);
  const heaviest = of.largest * sketch.reach;
  const shares = [1, 0.4, 0.1].slice(0, sketch.count);
  const end = dice.pick(['rail', 'mid-supply'] as const);
  return (scale) =>
    sketch.supplies.flatMap((supply, set) =>
      shares.map((share): PrintedPoint => {
        const volts = scale * (floor + (1 - floor) * share ** bend) * (set === 0 ? 1 : 0.9);
        const amperes = heaviest * share;
        const across = (supply ?? of.stage.supply.nominal) * (end === 'rail' ? 1 : 0.5);
        return { volts, supply, load: sketch.resistive && amperes > 0 ? { ohms: (0.9 * across) / amperes, to: end } : { amperes } };
      }),
    );
}

function figure(point: PrintedPoint, side: Side, print: Print): Figure {
  const load: Condition['load'] =
    'amperes' in point.load
      ? { kind: 'current', amperes: point.load.amperes }
      : { kind: 'resistance', ohms: point.load.ohms, to: point.load.to === 'mid-supply' ? 'mid-supply' : side === 'high' ? 'ground' : 'supply' };
  const parameter = side === 'high' ? 'outputHighHeadroom' : 'outputLowHeadroom';
  return figureOf(parameter, print, point.volts, { load, ...(point.supply === null ? {} : { supply: point.supply }) });
}

interface Share {
  readonly way: string;
  readonly figures: readonly Figure[];
  volts(reading: 'pessimistic' | 'optimistic'): number;
}

/** What an offset and its drift take of the room; an AC-coupled stage is drawn without one. */
function drawOffset(dice: Dice, stage: DrawnStage): Share {
  if (stage.isAc || dice.chance(0.5)) return { way: '', figures: [], volts: () => 0 };
  const print: Print = { kind: dice.chance(0.5) ? 'max' : 'typ', at25: false };
  const offset = dice.ratio(0.2e-3, 5e-3);
  const perKelvin = dice.chance(0.5) ? dice.ratio(1e-6, 20e-6) : 0;
  return {
    way: ', with offset',
    figures: [figureOf('offsetVoltage', print, offset), ...(perKelvin > 0 ? [figureOf('offsetDrift', print, perKelvin)] : [])],
    volts: (reading) =>
      counted('offsetVoltage', { print, value: offset, stage }, reading) + kelvin(stage) * counted('offsetDrift', { print, value: perKelvin, stage }, reading),
  };
}
