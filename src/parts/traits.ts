import { PARAMETERS, type Figure, type Parameter } from './figures.js';
import type { Part } from './part.js';

const WORDS = ['status', 'lifecycle', 'package', 'channels', 'qualification', 'class', 'family', 'price', 'inputType', 'inputClamp', 'phaseReversal', 'crossoverFree'] as const;
type Word = (typeof WORDS)[number];

/** What a verdict or the order can depend on: all figures of a parameter together, or one field of the identity. */
export type Trait = Parameter | Word;

/** Every trait, in a fixed order. */
export const TRAITS: readonly Trait[] = [...(Object.keys(PARAMETERS) as Parameter[]), ...WORDS];

/** What a part has of one trait: the figures of a parameter with their conditions, or the field. Equal pieces decide alike. */
export type Piece = { readonly figures: readonly Figure[] } | { readonly [Name in Word]?: Part[Name] };

export const isParameter = (trait: Trait): trait is Parameter => trait in PARAMETERS;

/** The piece of a part. */
export function pieceOf(part: Part, trait: Trait): Piece {
  if (isParameter(trait)) return { figures: part.figures.filter(({ parameter }) => parameter === trait) };
  return { [trait]: part[trait] };
}
