import type { LimitKind, Parameter } from '../../src/parts/figures.js';
import { drawDcPart } from './draw-dc-part.js';
import { drawHeadroomPart } from './draw-headroom-part.js';
import type { DrawnPart } from './part-drawn.js';
import type { Dice } from './random.js';
import { counted, countedHeadroom, figureOf, type Print } from './reading.js';
import type { DrawnStage } from './stage-drawn.js';

export const SIMULATED_CHECKS = [
  'input-low', 'input-high', 'output-low', 'output-high', 'output-current', 'slew-rate', 'gain-bandwidth', 'stable-gain', 'dc-error',
] as const;
export type SimulatedCheck = (typeof SIMULATED_CHECKS)[number];

/** A part near nothing yet: its scale is set afterwards. */
export function drawPart(dice: Dice, stage: DrawnStage, check: SimulatedCheck): DrawnPart {
  if (check === 'input-low' || check === 'input-high') return inputPart(dice, stage, check);
  if (check === 'output-low' || check === 'output-high') return drawHeadroomPart(dice, stage, check === 'output-low' ? 'low' : 'high');
  if (check === 'slew-rate') return fastPart(dice, stage, 'slewRate');
  if (check === 'gain-bandwidth') return fastPart(dice, stage, 'gainBandwidth');
  if (check === 'stable-gain') return stablePart();
  if (check === 'output-current') return currentPart(dice);
  return drawDcPart(dice, stage);
}

export function drawPrint(dice: Dice, limit: LimitKind): Print {
  return { kind: dice.chance(0.5) ? limit : 'typ', at25: dice.chance(0.4) };
}

export const printed = (print: Print): string => `${print.kind === 'typ' ? 'typical' : 'limit'}${print.at25 ? ' at 25 °C' : ''}`;

function inputPart(dice: Dice, stage: DrawnStage, check: 'input-low' | 'input-high'): DrawnPart {
  const print = drawPrint(dice, 'max');
  const parameter: Parameter = check === 'input-low' ? 'inputLowHeadroom' : 'inputHighHeadroom';
  return {
    way: printed(print), inputType: null, ends: [-2 * stage.supply.max, 2 * stage.supply.max], isLinear: true,
    figures: (scale) => [figureOf(parameter, print, scale)],
    physical: (scale, reading) => ({ value: countedHeadroom({ print, value: scale, stage }, reading, false) }),
  };
}

/** Slew rate and gain bandwidth: the larger the scale, the slower. */
function fastPart(dice: Dice, stage: DrawnStage, parameter: 'slewRate' | 'gainBandwidth'): DrawnPart {
  const print = drawPrint(dice, 'min');
  return {
    way: printed(print), inputType: null, ends: [1e-12, 1e3], isLinear: false,
    figures: (scale) => [figureOf(parameter, print, 1 / scale)],
    physical: (scale, reading) => ({ value: counted(parameter, { print, value: 1 / scale, stage }, reading) }),
  };
}

function stablePart(): DrawnPart {
  const print: Print = { kind: 'max', at25: false };
  return {
    way: 'limit', inputType: null, ends: [0.1, 1e3], isLinear: false,
    figures: (scale) => [figureOf('minimumStableGain', print, scale)],
    physical: (scale) => ({ value: scale }),
  };
}

/** A guaranteed usable current, or none and then each direction up to 1.5 × the heaviest head-room point of its side. */
function currentPart(dice: Dice): DrawnPart {
  const print: Print = { kind: 'min', at25: false };
  if (dice.chance(0.5)) {
    return {
      way: 'limit', inputType: null, ends: [1e-3, 1e9], isLinear: false,
      figures: (scale) => [figureOf('outputCurrent', print, 1 / scale)],
      physical: (scale) => ({ usable: { high: 1 / scale, low: 1 / scale } }),
    };
  }
  const lean = dice.ratio(0.3, 3);
  return {
    way: '1.5 × the heaviest head-room point', inputType: null, ends: [1e-3, 1e9], isLinear: false,
    figures: (scale) => [
      figureOf('outputHighHeadroom', { kind: 'max', at25: false }, 1e-3, { load: { kind: 'current', amperes: 1 / scale } }),
      figureOf('outputLowHeadroom', { kind: 'max', at25: false }, 1e-3, { load: { kind: 'current', amperes: lean / scale } }),
    ],
    physical: (scale, reading) => {
      const reach = reading === 'pessimistic' ? 1.5 : Number.POSITIVE_INFINITY;
      return { usable: { high: reach / scale, low: (reach * lean) / scale } };
    },
  };
}
