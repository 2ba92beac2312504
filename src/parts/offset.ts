import { figureSlot, type Figure } from './figures.js';
import type { PartUnderTest, Reading } from './reading.js';
import { basisOf, derate, factorText, howRead, limitsFirst, nearestSupply, usable } from './select.js';

/** The offset that counts, whether it already holds over temperature, and the supply it is rated at (null: not stated). */
export interface OffsetReading extends Reading {
  readonly overTemperature: boolean;
  readonly ratedSupply: number | null;
}

/** Limits before typical figures; one rated over temperature in place of the 25 °C one (and then excludes the drift term). Null when missing. */
export function offsetReading(test: PartUnderTest): OffsetReading | null {
  const all = limitsFirst(usable(test, 'offsetVoltage'));
  const over = all.filter((figure) => figure.condition.temperature === 'over');
  const figure = pick(over, test) ?? pick(all, test);
  if (figure === undefined) return null;
  const rated = figure.condition.temperature;
  const best = figure.assumed === true ? 0 : figure.value;
  const worst = figure.kind === 'typ' ? derate(figure) : figure.value;
  const value = test.outlook === 'pessimistic' ? worst : best;
  return {
    value,
    printed: figure.value,
    kind: figure.kind,
    basis: basisOf(figure, test.operating),
    slot: figureSlot(figure),
    how: test.brief === true ? null : howRead(test.outlook, figure, figure.kind === 'typ' ? `typical ${factorText(derate({ ...figure, value: 1 }))}` : null),
    overTemperature: rated === 'over',
    ratedSupply: figure.condition.supply ?? null,
  };
}

/** The nearest supply, then 25 °C before other temperatures, then the larger. */
function pick(figures: readonly Figure[], test: PartUnderTest): Figure | undefined {
  if (figures.length < 2) return figures[0];
  const near = [...nearestSupply(figures, test.operating.nominalSupply)].sort((a, b) => b.value - a.value);
  return near.find((figure) => (figure.condition.temperature ?? 25) === 25) ?? near[0];
}
