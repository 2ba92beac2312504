import type { Figure, Parameter } from '../parts/figures.js';
import type { Part, Tier } from '../parts/part.js';
import type { ClassWorst, Outlook, PartUnderTest, ReadingRules } from '../parts/reading.js';
import { readingsOf, type Readings } from '../parts/readings.js';
import { TRAIT_NUMBER } from '../parts/screen-view.js';
import { TRAITS, type Piece, type Trait } from '../parts/traits.js';
import { remembering, type BothReadings } from './remembering.js';

/** Where a stand-in gets its pieces; asked once a trait, in the order they are first looked at. */
export type PieceFinder = (trait: Trait) => Piece;

/** The rules of a run: all but what depends on the part's class. */
export interface StandInRules extends Omit<ReadingRules, 'classWorst'> {
  readonly classes: ReadonlyMap<string, ClassWorst>;
}

/**
 * A part of which only what is looked at exists. Whatever a check finds out about it, it found out from the pieces it asked for, so the
 * finding holds for every part that has them. One stand-in serves for one part after the other.
 */
export interface StandIn {
  readonly readings: BothReadings;
  /** Stands in for another part from now on. */
  readonly become: (find: PieceFinder) => void;
}

export function standIn(tier: Tier, rules: StandInRules): StandIn {
  // By trait; filled anew for every part, which a map takes longer for.
  const looked = TRAITS.map((): Piece | null => null);
  const figures: Figure[] = [];
  let finder: PieceFinder | null = null;
  const look = (trait: Trait): Piece => {
    const number = TRAIT_NUMBER.get(trait) ?? 0;
    const known = looked[number] ?? null;
    if (known !== null) return known;
    if (finder === null) throw new RangeError('a stand-in that stands in for no part');
    const piece = finder(trait);
    looked[number] = piece;
    if ('figures' in piece) figures.push(...piece.figures);
    return piece;
  };
  const part = partLike(tier, figures, look);
  const plain = (outlook: Outlook): Readings => readingsOf(testOf(part, { ...rules, outlook, look: (parameter) => void look(parameter) }));
  const readings = remembering({ pessimistic: plain('pessimistic'), optimistic: plain('optimistic') }, look);
  return {
    readings,
    become(find) {
      readings.start();
      looked.fill(null);
      figures.length = 0;
      finder = find;
    },
  };
}

/** Fields of the identity are looked at through getters, figures by `PartUnderTest.look`. */
function partLike(tier: Tier, figures: readonly Figure[], look: (trait: Trait) => Piece): Part {
  const word = <Name extends Exclude<Trait, Parameter>>(name: Name): Part[Name] => (look(name) as Pick<Part, Name>)[name];
  return {
    id: '', tier, description: null, figures,
    get status() { return word('status'); },
    get lifecycle() { return word('lifecycle'); },
    get package() { return word('package'); },
    get channels() { return word('channels'); },
    get qualification() { return word('qualification'); },
    get class() { return word('class'); },
    get family() { return word('family'); },
    get price() { return word('price'); },
    get inputType() { return word('inputType'); },
    get inputClamp() { return word('inputClamp'); },
    get phaseReversal() { return word('phaseReversal'); },
    get crossoverFree() { return word('crossoverFree'); },
  };
}

type Seen = Pick<PartUnderTest, 'operating' | 'strict' | 'outlook'> & Pick<StandInRules, 'classes'> & { readonly look: (parameter: Parameter) => void };

function testOf(part: Part, { operating, strict, outlook, look, classes }: Seen): PartUnderTest {
  return {
    part, operating, strict, outlook, look, brief: true,
    get classWorst() {
      const name = part.class;
      return name === null ? null : (classes.get(name) ?? null);
    },
  };
}
