import type { Figure, Parameter } from '../../src/parts/figures.js';
import type { Part } from '../../src/parts/part.js';
import type { Dice } from '../simulate/random.js';
import { DIES } from '../support/generic-list.js';

/** How far a figure strays from that of its class: the standard deviation of its logarithm. What is absent does not stray. */
const STRAYS: Partial<Record<Parameter, number>> = {
  offsetVoltage: 0.7, offsetDrift: 0.5, biasCurrent: 0.8, offsetCurrent: 0.8, commonModeRejection: 0.4, supplyRejection: 0.4, openLoopGain: 0.4,
  voltageNoise: 0.3, noiseCorner: 0.4, currentNoise: 0.5, outputCurrent: 0.3, shortCircuitCurrent: 0.3, outputResistance: 0.3, inputCapacitance: 0.2,
};
/** Figures that rise and fall together with the speed of a part, and the exponent. */
const SPEEDS: Partial<Record<Parameter, number>> = { slewRate: 1, gainBandwidth: 1, unityCrossover: 1, quiescentCurrent: 0.8 };
/** Share of parts whose list lacks the figure. Supply and range are always printed. */
const MISSING = 0.06;
const ALWAYS: ReadonlySet<Parameter> = new Set(['supplyVoltage', 'quiescentCurrent', 'gainBandwidth']);
/** Points a list gives for one side of the output at most. */
const POINTS = 3;
const PACKAGES = ['SOT-23-5', 'SC-70-5', 'SO-8', 'VSSOP-8', 'TSSOP-14', 'SO-14'] as const;

/**
 * Parts as a large list might have them, without end: each strays from a generic set of its class, speed and current together, figures
 * rounded as datasheets round, some missing, dies in several packages. The same dice, the same parts.
 */
export function* plausibleParts(dice: Dice): Generator<Part> {
  for (let number = 1; ; ) {
    const die = dieOf(dice, number);
    const variants = dice.chance(0.3) ? dice.pick([2, 3]) : 1;
    for (let variant = 0; variant < variants; variant += 1, number += 1) {
      const channels = variant === 0 ? die.channels : dice.pick([1, 2, 4]);
      yield { ...die, id: idOf(number), channels, package: dice.pick(PACKAGES), price: priceOf(dice, die, channels ?? 1), family: variants === 1 ? null : `F-${idOf(number - variant)}` };
    }
  }
}

/** Of one length, so that their order as text is that of the numbers. */
const idOf = (number: number): string => `PN-${String(number).padStart(7, '0')}`;

function dieOf(dice: Dice, number: number): Part {
  const base = dice.pick(DIES);
  return {
    ...base,
    tier: 'approved',
    id: idOf(number),
    status: dice.pick(['approved', 'approved', 'approved', 'conditional', 'restricted', 'not-approved']),
    lifecycle: dice.pick(['active', 'active', 'active', 'nrnd', null]),
    class: dice.chance(0.7) ? base.class : null,
    inputType: dice.chance(0.8) ? base.inputType : null,
    description: null,
    figures: figuresOf(dice, base),
  };
}

function figuresOf(dice: Dice, base: Part): Figure[] {
  const speed = Math.exp(0.6 * normal(dice));
  const swing = dice.pick([0.7, 0.8, 0.9, 1, 1.1, 1.25, 1.5]);
  const factors = new Map<Parameter, number>();
  const present = new Map<Parameter, boolean>();
  const factor = (parameter: Parameter): number => {
    const known = factors.get(parameter) ?? factorOf(dice, parameter, { speed, swing });
    factors.set(parameter, known);
    return known;
  };
  const isPresent = (parameter: Parameter): boolean => {
    const known = present.get(parameter) ?? (ALWAYS.has(parameter) || !dice.chance(MISSING));
    present.set(parameter, known);
    return known;
  };
  return fewPoints(base.figures).filter(({ parameter }) => isPresent(parameter)).map((figure) => ({ ...figure, value: rounded(figure.value * factor(figure.parameter)) }));
}

function factorOf(dice: Dice, parameter: Parameter, { speed, swing }: { speed: number; swing: number }): number {
  const exponent = SPEEDS[parameter];
  if (exponent !== undefined) return speed ** exponent;
  if (parameter === 'outputLowHeadroom' || parameter === 'outputHighHeadroom') return swing;
  const strays = STRAYS[parameter];
  return strays === undefined ? 1 : Math.exp(strays * normal(dice));
}

/** The lightest, the heaviest and one between: a list does not print a whole curve. */
function fewPoints(figures: readonly Figure[]): Figure[] {
  return figures.filter((figure) => {
    const side = figures.filter(({ parameter, kind }) => parameter === figure.parameter && kind === figure.kind);
    if (side.length <= POINTS) return true;
    const at = side.indexOf(figure);
    return at === 0 || at === side.length - 1 || at === Math.floor(side.length / 2);
  });
}

function priceOf(dice: Dice, { price }: Part, channels: number): Part['price'] {
  if (price === null || dice.chance(0.1)) return null;
  const amount = Math.max(0.03, Math.round(price.amount * channels ** 0.6 * Math.exp(0.4 * normal(dice)) * 100) / 100);
  return { ...price, amount };
}

/** Two digits, as datasheets print. */
const rounded = (value: number): number => Number(value.toPrecision(2));

/** Sum of twelve uniform numbers less six: near enough to a normal one, and the same everywhere. */
function normal(dice: Dice): number {
  let sum = -6;
  for (let drawn = 0; drawn < 12; drawn += 1) sum += dice.even(0, 1);
  return sum;
}
