import { weakest, weaknessOf } from './basis.js';
import { DOUBLING_KELVIN, FET_BIAS_LIMIT } from './derating.js';
import { figureSlot, type Figure } from './figures.js';
import type { Operating, PartUnderTest, Reading } from './reading.js';
import { basisOf, bestPossible, derate, factorText, howRead, limitsFirst, nearestSupply, usable } from './select.js';

export type InputCurrent = 'biasCurrent' | 'offsetCurrent';

/**
 * Input currents over temperature: the figure rated at the lowest temperature at or above the stage's top; no stated
 * temperature means 25 °C. Of several there the strongest basis, then the worse value. If only a cooler one exists, FET inputs double per 10 K.
 */
export function inputCurrentReading(test: PartUnderTest, parameter: InputCurrent): Reading | null {
  return inputCurrentOf(test, parameter, () => inputDoubles(test));
}

/** The same where it is known whether currents of this input double. */
export function inputCurrentOf(test: PartUnderTest, parameter: InputCurrent, doubles: () => boolean): Reading | null {
  const all = nearestSupply(usable(test, parameter), test.operating.nominalSupply);
  const temperatures = all.map(ratedAt);
  const covering = temperatures.filter((rated) => rated >= test.operating.hottest);
  const rated = covering.length > 0 ? Math.min(...covering) : Math.max(...temperatures);
  const figure = worstOf(limitsFirst(all.filter((one) => ratedAt(one) === rated)), test.operating);
  if (figure === undefined) return null;
  return readCurrent(test, figure, covering.length === 0 && doubles() ? test.operating.hottest - rated : 0);
}

function worstOf(figures: readonly Figure[], operating: Operating): Figure | undefined {
  if (figures.length < 2) return figures[0];
  const rank = (figure: Figure): number => weaknessOf(basisOf(figure, operating));
  return [...figures].sort((a, b) => rank(a) - rank(b) || b.value - a.value)[0];
}

/** Degrees Celsius; the whole specified range counts as hot enough for anything. */
function ratedAt(figure: Figure): number {
  const rated = figure.condition.temperature;
  return rated === 'over' ? Number.POSITIVE_INFINITY : (rated ?? 25);
}

/** FET inputs, or inputs of unknown type whose bias current at its lowest temperature is below 1 nA; of several printed there one is enough. */
export function inputDoubles(test: PartUnderTest): boolean {
  if (test.part.inputType !== null) return test.part.inputType === 'fet';
  const printed = usable(test, 'biasCurrent');
  const coolest = Math.min(...printed.map(ratedAt));
  return limitsFirst(printed.filter((figure) => ratedAt(figure) === coolest)).some(({ value }) => value < FET_BIAS_LIMIT);
}

/** The word that tells a doubled current from a printed one. */
export const DOUBLING = 'doubling';

function readCurrent(test: PartUnderTest, figure: Figure, kelvin: number): Reading {
  const growth = 2 ** (kelvin / DOUBLING_KELVIN);
  const best = figure.assumed === true ? bestPossible(figure) : figure.value;
  const worst = figure.kind === 'typ' ? derate(figure) : figure.value;
  const value = test.outlook === 'optimistic' ? best : worst * growth;
  const steps = test.brief === true ? [] : [
    ...(figure.kind === 'typ' ? [`typical ${factorText(derate({ ...figure, value: 1 }))}`] : []),
    ...(kelvin > 0 ? [`${factorText(growth)} for ${Number(kelvin.toPrecision(4))} K, ${DOUBLING} per ${DOUBLING_KELVIN} K`] : []),
  ];
  const basis = weakest([basisOf(figure, test.operating), ...(kelvin > 0 ? (['estimated'] as const) : [])]);
  return { value, printed: figure.value, kind: figure.kind, basis, slot: figureSlot(figure), how: howRead(test.outlook, figure, steps.length === 0 ? null : steps.join(', ')) };
}
