import type { Parameter } from '../parts/figures.js';
import type { HeadroomQuestion, HeadroomReading } from '../parts/headroom-curve.js';
import type { Reading } from '../parts/reading.js';
import type { Readings } from '../parts/readings.js';
import type { Piece, Trait } from '../parts/traits.js';

/** The readings of one part after the other in both outlooks. */
export interface BothReadings {
  readonly pessimistic: Readings;
  readonly optimistic: Readings;
  /** Whether anything that was asked of the pessimistic readings since `start` may read otherwise in the optimistic ones: if not, they say the same of the part. */
  readonly differ: () => boolean;
  readonly start: () => void;
}

/** One thing read in both outlooks; one and the same object where they say the same. */
interface Twice<Made> {
  readonly worst: Made;
  readonly best: Made;
}

/** Readings that depend on the figures of their own parameter alone: made once per distinct piece, however many parts have it. */
export function remembering({ pessimistic, optimistic }: Pick<BothReadings, 'pessimistic' | 'optimistic'>, look: (trait: Trait) => Piece): BothReadings {
  // By what was read: pieces are many, and a memory for each would cost more than reading them.
  const memories = new Map<string, Map<Piece, Twice<unknown>>>();
  let isSame = true;
  const twice = <Made>(trait: Trait, { key, make, alike }: Remembered<Made>): Twice<Made> => {
    const piece = look(trait);
    let memory = memories.get(key);
    if (memory === undefined) memories.set(key, (memory = new Map<Piece, Twice<unknown>>()));
    const known = memory.get(piece);
    if (known !== undefined) return known as Twice<Made>;
    const [worst, best] = [make(pessimistic), make(optimistic)];
    const made = { worst, best: alike(worst, best) ? worst : best };
    memory.set(piece, made);
    return made;
  };
  /** What is read of a piece in one outlook. */
  const inWorst = <Made>(trait: Trait, remembered: Remembered<Made>): Made => {
    const { worst, best } = twice(trait, remembered);
    if (worst !== best) isSame = false;
    return worst;
  };
  const inBest = <Made>(trait: Trait, remembered: Remembered<Made>): Made => twice(trait, remembered).best;
  /** What is not remembered reads alike only where there is nothing. */
  const plainly = <Made>(made: Made): Made => {
    if (made !== null) isSame = false;
    return made;
  };
  return {
    pessimistic: readingsBy(pessimistic, inWorst, plainly),
    optimistic: readingsBy(optimistic, inBest, (made) => made),
    differ: () => !isSame,
    start: () => void (isSame = true),
  };
}

/** What is read of one piece, and when both outlooks read the same. */
interface Remembered<Made> {
  /** Tells it from all else that is read of this trait. */
  readonly key: string;
  readonly make: (plain: Readings) => Made;
  readonly alike: (worst: Made, best: Made) => boolean;
}

type Remember = <Made>(trait: Trait, remembered: Remembered<Made>) => Made;

function readingsBy(plain: Readings, remembered: Remember, plainly: <Made>(made: Made) => Made): Readings {
  const figure: Readings['figure'] = (parameter, end) =>
    DEPENDENT.has(parameter)
      ? plainly(plain.figure(parameter, end))
      : remembered(parameter, { key: end === undefined ? parameter : `${parameter} ${end}`, make: (of) => of.figure(parameter, end), alike: areAlike });
  const ofClass: Readings['ofClass'] = (parameter) => plainly(plain.ofClass(parameter));
  return {
    identity: plain.identity,
    brief: plain.brief,
    figure,
    inputCurrents: (parameter) => remembered(parameter, { key: `${parameter} both`, make: (of) => of.inputCurrents(parameter), alike: (worst, best) => areAlike(worst.steady, best.steady) && areAlike(worst.doubling, best.doubling) }),
    inputDoubles: () => plain.inputDoubles(),
    figureOrClass: (parameter) => figure(parameter) ?? ofClass(parameter),
    ofClass,
    figureOrAssumed: (parameter, assumed, end) => figure(parameter, end) ?? plainly(plain.figureOrAssumed(parameter, assumed, end)),
    spread: (parameter) => remembered(parameter, { key: `${parameter} spread`, make: (of) => of.spread(parameter), alike: bothNull }),
    offset: () => remembered('offsetVoltage', { key: 'offset', make: (of) => of.offset(), alike: areAlike }),
    headroom: (side) => remembered(HEADROOM[side], { key: `${side} curve`, make: (of) => answered(of.headroom(side)), alike: () => false }),
    currentFromHeadroom: (side, supply) => remembered(HEADROOM[side], { key: `${side} current ${supply}`, make: (of) => of.currentFromHeadroom(side, supply), alike: bothNull }),
    bounded: (worst, best) => plainly(plain.bounded(worst, best)),
  };
}

/** Input currents depend on the type of the input and on each other. */
const DEPENDENT: ReadonlySet<Parameter> = new Set(['biasCurrent', 'offsetCurrent']);
const HEADROOM = { low: 'outputLowHeadroom', high: 'outputHighHeadroom' } as const;

/** Both outlooks choose the same figure: of it only the value and what it stands on can differ. */
function areAlike(worst: Reading | null, best: Reading | null): boolean {
  if (worst === null || best === null) return worst === best;
  return Object.is(worst.value, best.value) && worst.basis === best.basis;
}

const bothNull = (worst: unknown, best: unknown): boolean => worst === null && best === null;

/** The vertices of a stage are asked about again and again. */
function answered(curve: (question: HeadroomQuestion) => HeadroomReading): (question: HeadroomQuestion) => HeadroomReading {
  const known = new Map<HeadroomQuestion, HeadroomReading>();
  return (question) => {
    const found = known.get(question) ?? curve(question);
    known.set(question, found);
    return found;
  };
}
