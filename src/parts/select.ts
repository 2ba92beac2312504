import { weaker, weaknessOf, type Basis } from './basis.js';
import { COLD_HOT_FACTOR, derateHeadroom, SUPPLY_REACH, TEMPERATURE_REACH, TYPICAL_FACTOR } from './derating.js';
import { figureSlot, PARAMETERS, type Figure, type Parameter } from './figures.js';
import type { Operating, Outlook, PartUnderTest, Reading } from './reading.js';

/** The reading of a parameter by the ordinary rules: limits first, then nearest supply, strongest basis, temperature. Null when missing. */
export function scalarReading(test: PartUnderTest, parameter: Parameter, end?: RangeEnd): Reading | null {
  const all = usable(test, parameter).filter((figure) => end === undefined || figure.kind === end);
  const figure = preferred(nearestSupply(limitsFirst(all), test.operating.nominalSupply), test.operating);
  return figure === undefined ? null : readScalar(test, figure);
}

function preferred(figures: readonly Figure[], operating: Operating): Figure | undefined {
  // Most parts print one figure of a kind.
  if (figures.length < 2) return figures[0];
  const keyed = figures.map((figure) => ({ figure, key: preference(figure, operating) }));
  return keyed.sort((a, b) => compareKeys(a.key, b.key))[0]?.figure;
}

/** A typical figure counts only where no limit is known. */
export function limitsFirst(figures: readonly Figure[]): readonly Figure[] {
  if (figures.length < 2) return figures;
  const limits = figures.filter((figure) => figure.kind !== 'typ');
  return limits.length > 0 ? limits : figures;
}

/** Which end of a range parameter (supply, temperature) is meant; parameters with one limit need none. */
export type RangeEnd = 'min' | 'max';

/** Figures of a parameter that count at all: with `--strict`, limits only. */
export function usable(test: PartUnderTest, parameter: Parameter): Figure[] {
  test.look?.(parameter);
  return test.part.figures.filter(
    (figure) => figure.parameter === parameter && !(test.strict && (figure.kind === 'typ' || figure.assumed === true)),
  );
}

/** Of figures rated at several supplies, those rated nearest (as a ratio) to the nominal one; unstated counts as rated there. */
export function nearestSupply(figures: readonly Figure[], nominal: number): readonly Figure[] {
  if (figures.length < 2) return figures;
  const distance = (figure: Figure): number => Math.abs(Math.log((figure.condition.supply ?? nominal) / nominal));
  const least = Math.min(...figures.map(distance));
  return figures.filter((figure) => distance(figure) <= least + 1e-9);
}

/** Largest distance of the stage's temperatures from a rated one, K. */
export function distanceFrom(rated: number, operating: Operating): number {
  return Math.max(Math.abs(operating.coldest - rated), Math.abs(operating.hottest - rated));
}

/** True for a figure stated at 25 °C while the stage goes more than 15 K away. */
export function isAway(figure: Figure, operating: Operating): boolean {
  return figure.condition.temperature === 25 && distanceFrom(25, operating) > TEMPERATURE_REACH;
}

/** A figure rated at a supply outside half to twice the nominal one is only assumed to hold. */
export function isFarSupply(figure: Figure, nominal: number): boolean {
  const rated = figure.condition.supply;
  if (rated === undefined) return false;
  return rated < (nominal / SUPPLY_REACH) * (1 - 1e-9) || rated > nominal * SUPPLY_REACH * (1 + 1e-9);
}

/** Basis of a figure before temperature is looked at. */
export function basisOf(figure: Figure, operating: Operating): Basis {
  if (figure.assumed === true || isFarSupply(figure, operating.nominalSupply)) return 'assumed';
  return figure.kind === 'typ' ? 'derated' : 'guaranteed';
}

function readScalar(test: PartUnderTest, figure: Figure): Reading {
  const away = isAway(figure, test.operating) ? COLD_HOT_FACTOR[figure.parameter] : undefined;
  const basis = weaker(basisOf(figure, test.operating), away === undefined ? 'guaranteed' : 'estimated');
  const typical = figure.kind === 'typ' ? derate(figure) : figure.value;
  const best = figure.assumed === true ? bestPossible(figure) : figure.value;
  const value = test.outlook === 'optimistic' ? best : typical * (away ?? 1);
  return { value, printed: figure.value, kind: figure.kind, basis, slot: figureSlot(figure), how: test.brief === true ? null : howRead(test.outlook, figure, howOf(figure, away)) };
}

/** An assumed value can pass a check, not fail it: on the best reading it is as good as can be. */
export function bestPossible(figure: Pick<Figure, 'parameter' | 'kind'>): number {
  if (isMoreBetter(figure)) return Number.POSITIVE_INFINITY;
  return BELOW_ZERO.has(figure.parameter) ? Number.NEGATIVE_INFINITY : 0;
}

/** Parameters whose good end lies below zero: head-room beyond the rail, a range that begins in the cold. */
const BELOW_ZERO: ReadonlySet<Parameter> = new Set(['inputLowHeadroom', 'inputHighHeadroom', 'temperature']);
/** Parameters whose maximum is what a part endures: more of it is better. */
const ENDURED: ReadonlySet<Parameter> = new Set(['supplyVoltage', 'supplyAbsoluteMaximum', 'temperature', 'junctionTemperature', 'capacitiveLoad', 'inputOverdrive', 'overdriveCurrent', 'differentialInput']);

/** Parameters known as typical alone of which less is better. */
const BURDENS: ReadonlySet<Parameter> = new Set(['outputResistance', 'inputCapacitance']);

/** Whether a larger value of this figure is the better one. */
function isMoreBetter({ parameter, kind }: Pick<Figure, 'parameter' | 'kind'>): boolean {
  if (ENDURED.has(parameter)) return kind === 'max';
  return !TYP_MAX_PARAMETERS.has(parameter) && !BURDENS.has(parameter);
}

/** The pessimistic value of a typical figure. */
export function derate(figure: Figure): number {
  const parameter = figure.parameter;
  if (parameter === 'inputLowHeadroom' || parameter === 'inputHighHeadroom') return derateHeadroom(figure.value);
  return figure.value * (TYPICAL_FACTOR[parameter] ?? 1);
}

function howOf(figure: Figure, away: number | undefined): string | null {
  const steps: string[] = [];
  const isInput = figure.parameter === 'inputLowHeadroom' || figure.parameter === 'inputHighHeadroom';
  const factor = TYPICAL_FACTOR[figure.parameter];
  if (figure.kind === 'typ') steps.push(isInput ? 'typical + half its magnitude' : factor === undefined ? 'typical' : `typical ${factorText(factor)}`);
  if (away !== undefined) steps.push(`25 °C figure ${factorText(away)}`);
  return steps.length === 0 ? null : steps.join(', ');
}

/** How a value came about: on the optimistic reading it stands as printed, whatever the pessimistic one does to it. */
export function howRead(outlook: Outlook, figure: Figure, steps: string | null): string | null {
  if (outlook === 'pessimistic' || steps === null) return steps;
  return figure.kind === 'typ' ? 'typical as printed' : 'as printed';
}

/** A factor as engineers say it: × 3, ÷ 3.16. */
export function factorText(factor: number): string {
  return factor < 0.5 ? `÷ ${Number((1 / factor).toPrecision(3))}` : `× ${Number(factor.toPrecision(3))}`;
}

/** Smaller is preferred: strongest basis, then the temperature that covers the stage most closely, then the worse value. */
function preference(figure: Figure, operating: Operating): readonly number[] {
  const away = isAway(figure, operating) && COLD_HOT_FACTOR[figure.parameter] !== undefined;
  const basis = weaker(basisOf(figure, operating), away ? 'estimated' : 'guaranteed');
  const worse = isMoreBetter(figure) ? figure.value : -figure.value;
  return [weaknessOf(basis), temperatureRank(figure, operating), worse];
}

const OVER_RANK = 1e4;

/**
 * Smaller is preferred: a 25 °C figure within its reach, then stated temperatures at or above the stage's top, lowest
 * first, then the whole range, then cooler ones.
 */
export function temperatureRank(figure: Figure, operating: Operating): number {
  const rated = figure.condition.temperature;
  if (rated === undefined || rated === 'over') return OVER_RANK;
  if (rated === 25) return isAway(figure, operating) ? 2 * OVER_RANK - rated : -OVER_RANK;
  return rated >= operating.hottest ? rated : 2 * OVER_RANK - rated;
}

function compareKeys(a: readonly number[], b: readonly number[]): number {
  for (const [at, value] of a.entries()) {
    const difference = value - (b[at] ?? 0);
    if (difference !== 0) return difference;
  }
  return 0;
}

const TYP_MAX_PARAMETERS: ReadonlySet<Parameter> = new Set(
  (Object.keys(PARAMETERS) as Parameter[]).filter((name) => (PARAMETERS[name].kinds as readonly string[]).includes('max')),
);
