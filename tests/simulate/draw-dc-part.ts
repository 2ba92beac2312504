import type { Figure, Parameter } from '../../src/parts/figures.js';
import type { DrawnPart } from './part-drawn.js';
import type { Dice } from './random.js';
import { counted, figureOf, kelvin, type Print, type Reading } from './reading.js';
import type { DrawnStage } from './stage-drawn.js';

/**
 * Figures of the DC error, all of them worse in proportion to the scale, each a limit or a typical. Input currents are large
 * enough to matter through kilohms, also those that double per 10 K.
 */
export function drawDcPart(dice: Dice, stage: DrawnStage): DrawnPart {
  const print = (limit: 'min' | 'max'): Print => ({ kind: dice.chance(0.6) ? limit : 'typ', at25: false });
  const isFet = dice.chance(0.4);
  const offset = drawOffset(dice, stage, print('max'));
  const bias = drawCurrent(dice, stage, { parameter: 'biasCurrent', print: print('max'), amperes: dice.ratio(3e-9, 1e-6), isFet });
  const known = dice.chance(0.7);
  const difference = drawCurrent(dice, stage, { parameter: 'offsetCurrent', print: print('max'), amperes: bias.amperes * dice.even(0.05, 0.5), isFet });
  const rejections = [
    { parameter: 'commonModeRejection', print: print('min'), worst: 1 / dice.ratio(1e3, 1e5) },
    { parameter: 'supplyRejection', print: print('min'), worst: 1 / dice.ratio(1e3, 1e5) },
    { parameter: 'openLoopGain', print: print('min'), worst: 1 / dice.ratio(1e4, 1e6) },
  ] as const;
  const rejection = (at: number, scale: number, reading: Reading): number => {
    const { parameter, print: how, worst } = rejections[at]!;
    return counted(parameter, { print: how, value: 1 / (worst * scale), stage }, reading);
  };
  return {
    way: `${offset.way}${isFet ? ', FET input' : ''}${bias.way}${known ? '' : ', offset current not known'}`,
    inputType: isFet ? 'fet' : 'bipolar', ends: [1e-9, 1e6], isLinear: false,
    figures: (scale) => [
      ...offset.figures(scale),
      bias.figure(scale),
      ...(known ? [difference.figure(scale)] : []),
      ...rejections.map(({ parameter, print: how, worst }) => figureOf(parameter, how, 1 / (worst * scale))),
    ],
    physical: (scale, reading) => ({
      dc: {
        offset: offset.volts(scale, reading),
        ratedSupply: offset.supply,
        bias: bias.counts(scale, reading),
        offsetCurrent: known ? difference.counts(scale, reading) : reading === 'optimistic' ? 0 : null,
        commonModeRejection: rejection(0, scale, reading),
        supplyRejection: rejection(1, scale, reading),
        openLoopGain: rejection(2, scale, reading),
      },
    }),
  };
}

interface DrawnOffset {
  readonly way: string;
  readonly supply: number | null;
  figures(scale: number): Figure[];
  volts(scale: number, reading: Reading): number;
}

/** At 25 °C with a drift, or over temperature, and then no drift counts beside it. */
function drawOffset(dice: Dice, stage: DrawnStage, print: Print): DrawnOffset {
  const isOver = dice.chance(0.3);
  const supply = dice.chance(0.5) ? Number((stage.supply.nominal * dice.even(0.7, 1.4)).toPrecision(3)) : null;
  const [volts, perKelvin] = [dice.ratio(50e-6, 3e-3), dice.ratio(0.2e-6, 10e-6)];
  const condition = { ...(supply === null ? {} : { supply }), ...(isOver ? { temperature: 'over' as const } : {}) };
  return {
    way: `${print.kind === 'typ' ? 'typical' : 'limit'} offset${isOver ? ' over temperature' : ''}`,
    supply,
    figures: (scale) => [
      { parameter: 'offsetVoltage', kind: print.kind, value: scale * volts, condition },
      { parameter: 'offsetDrift', kind: print.kind, value: scale * perKelvin, condition: {} },
    ],
    volts: (scale, reading) =>
      counted('offsetVoltage', { print, value: scale * volts, stage }, reading) +
      (isOver ? 0 : kelvin(stage) * counted('offsetDrift', { print, value: scale * perKelvin, stage }, reading)),
  };
}

interface DrawnCurrent {
  readonly way: string;
  readonly amperes: number;
  figure(scale: number): Figure;
  counts(scale: number, reading: Reading): number;
}

interface CurrentSketch {
  readonly parameter: Parameter & ('biasCurrent' | 'offsetCurrent');
  readonly print: Print;
  readonly amperes: number;
  readonly isFet: boolean;
}

/** Rated at 25 °C, or hot enough for the stage. FET inputs double per 10 K above a cooler rating on the pessimistic reading. */
function drawCurrent(dice: Dice, stage: DrawnStage, { parameter, print, amperes, isFet }: CurrentSketch): DrawnCurrent {
  const rated = dice.chance(0.5) ? 25 : 125;
  const growth = isFet ? 2 ** (Math.max(0, stage.temperature.max - rated) / 10) : 1;
  return {
    way: rated === 25 ? '' : ', currents rated hot',
    amperes,
    figure: (scale) => ({ parameter, kind: print.kind, value: scale * amperes, condition: { temperature: rated } }),
    counts: (scale, reading) => counted(parameter, { print, value: scale * amperes, stage }, reading) * (reading === 'pessimistic' ? growth : 1),
  };
}
