import type { Figure, LimitKind, Parameter } from '../../src/parts/figures.js';
import type { Part } from '../../src/parts/part.js';

export type Band = readonly [low: number, high: number];

/** One plausibility relation: a number formed from figures of a part, and the band it has to lie in. */
export interface Relation {
  readonly name: string;
  readonly source: string;
  readonly unit: string;
  readonly band: Band | ((part: Part) => Band);
  /** None when a figure it needs is not known; several where it holds for each rail or each row. */
  readonly values: (part: Part) => readonly number[];
}

/** Temperature of a typical figure, K. */
export const ROOM = 298.15;
export const COMMON_PRACTICE = 'common practice, from memory';

export function figuresOf(part: Part, parameter: Parameter, kind?: LimitKind): Figure[] {
  return part.figures.filter((figure) => figure.parameter === parameter && (kind === undefined || figure.kind === kind));
}

/** The figure at room temperature, or without a temperature; null when it is not known. */
export function stated(part: Part, parameter: Parameter, kind: LimitKind): number | null {
  const cool = figuresOf(part, parameter, kind).filter(({ condition }) => (condition.temperature ?? 25) === 25);
  return cool[0]?.value ?? null;
}

/** What a sample of the part does: the typical figure, else the limit. */
export function central(part: Part, parameter: Parameter): number | null {
  return stated(part, parameter, 'typ') ?? stated(part, parameter, 'max') ?? stated(part, parameter, 'min');
}

/** What is guaranteed, else the typical figure. */
export function limit(part: Part, parameter: Parameter): number | null {
  return stated(part, parameter, 'max') ?? stated(part, parameter, 'min') ?? stated(part, parameter, 'typ');
}

/** `of` applied to the figures, all of which must be known; else no value. */
export function from<const N extends readonly (number | null)[]>(figures: N, of: (...known: { [K in keyof N]: number }) => number): number[] {
  return figures.includes(null) ? [] : [of(...(figures as unknown as { [K in keyof N]: number }))];
}

/** Two of the figures are the same slot but for their kind. */
export function sameCondition(one: Figure, other: Figure): boolean {
  return JSON.stringify(one.condition) === JSON.stringify(other.condition);
}

export const isFet = (part: Part): boolean => part.inputType === 'fet';
export const isBipolar = (part: Part): boolean => part.inputType === 'bipolar';
/** No 1/f noise: the offset is chopped or zeroed away. */
export const isChopped = (part: Part): boolean => central(part, 'noiseCorner') === 0;
export const decibel = (ratio: number): number => 20 * Math.log10(ratio);
