import type { Part } from '../../src/parts/part.js';
import type { Band, Relation } from './band-figures.js';
import { HAZARD_RELATIONS } from './hazard-bands.js';
import { INPUT_RELATIONS } from './input-bands.js';
import { NOISE_RELATIONS } from './noise-bands.js';
import { OUTPUT_RELATIONS } from './output-bands.js';
import { SPEED_RELATIONS } from './speed-bands.js';

/** A relation between the figures of one part that no amplifier of today breaks, and by what it is broken. */
export interface Violation {
  readonly relation: string;
  /** Author, title, year; or "common practice, from memory". */
  readonly source: string;
  readonly band: Band;
  readonly value: number;
  readonly unit: string;
}

export const RELATIONS: readonly Relation[] = [...SPEED_RELATIONS, ...NOISE_RELATIONS, ...INPUT_RELATIONS, ...OUTPUT_RELATIONS, ...HAZARD_RELATIONS];

/** Room for decimal figures in binary, relative. */
const ROUNDING = 1e-9;

/**
 * Every relation a part breaks, each named once with its worst value. A figure that is not known breaks nothing: the
 * relations that need it say nothing then.
 */
export function violations(part: Part): Violation[] {
  return RELATIONS.flatMap((relation) => violationOf(relation, part) ?? []);
}

function violationOf({ name, source, unit, band, values }: Relation, part: Part): Violation | null {
  const limits = typeof band === 'function' ? band(part) : band;
  const [low, high] = limits;
  const outside = (value: number): number => Math.max(low - value, value - high) - ROUNDING * Math.abs(value);
  const worst = values(part).reduce<number | null>((most, next) => (most === null || outside(next) > outside(most) ? next : most), null);
  return worst === null || outside(worst) <= 0 ? null : { relation: name, source, band: limits, value: worst, unit };
}
