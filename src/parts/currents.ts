import { weaker, weaknessOf } from './basis.js';
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
  const chosen = chosenOf(test, parameter);
  if (chosen === null) return null;
  return readCurrent(test, chosen.figure, chosen.cooler > 0 && inputDoubles(test) ? chosen.cooler : 0);
}

/** An input current as it is of an input whose currents do not double over temperature, and of one whose do: one and the same object where that says the same. */
export interface BothCurrents {
  readonly steady: Reading | null;
  readonly doubling: Reading | null;
}

/** Figures of the current's own alone. */
export function inputCurrents(test: PartUnderTest, parameter: InputCurrent): BothCurrents {
  const chosen = chosenOf(test, parameter);
  if (chosen === null) return NEITHER;
  const steady = readCurrent(test, chosen.figure, 0);
  return { steady, doubling: chosen.cooler > 0 ? readCurrent(test, chosen.figure, chosen.cooler) : steady };
}

const NEITHER: BothCurrents = { steady: null, doubling: null };

/** The figure that counts, and by how many kelvin the stage is hotter than anything it is rated at. */
function chosenOf(test: PartUnderTest, parameter: InputCurrent): { readonly figure: Figure; readonly cooler: number } | null {
  const all = nearestSupply(usable(test, parameter), test.operating.nominalSupply);
  const temperatures = all.map(ratedAt);
  const covering = temperatures.filter((rated) => rated >= test.operating.hottest);
  const rated = covering.length > 0 ? Math.min(...covering) : Math.max(...temperatures);
  const figure = worstOf(limitsFirst(all.filter((one) => ratedAt(one) === rated)), test.operating);
  return figure === undefined ? null : { figure, cooler: covering.length === 0 ? test.operating.hottest - rated : 0 };
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
  const growth = kelvin === 0 ? 1 : 2 ** (kelvin / DOUBLING_KELVIN);
  const best = figure.assumed === true ? bestPossible(figure) : figure.value;
  const worst = figure.kind === 'typ' ? derate(figure) : figure.value;
  const value = test.outlook === 'optimistic' ? best : worst * growth;
  const steps = test.brief === true ? [] : [
    ...(figure.kind === 'typ' ? [`typical ${factorText(derate({ ...figure, value: 1 }))}`] : []),
    ...(kelvin > 0 ? [`${factorText(growth)} for ${Number(kelvin.toPrecision(4))} K, ${DOUBLING} per ${DOUBLING_KELVIN} K`] : []),
  ];
  const basis = weaker(basisOf(figure, test.operating), kelvin > 0 ? 'estimated' : 'guaranteed');
  return { value, printed: figure.value, kind: figure.kind, basis, slot: figureSlot(figure), how: test.brief === true ? null : howRead(test.outlook, figure, steps.length === 0 ? null : steps.join(', ')) };
}
