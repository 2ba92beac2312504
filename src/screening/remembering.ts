import type { Parameter } from '../parts/figures.js';
import type { HeadroomQuestion, HeadroomReading } from '../parts/headroom-curve.js';
import type { Readings } from '../parts/readings.js';
import type { Piece, Trait } from '../parts/traits.js';

/** Readings that depend on the figures of their own parameter alone: made once per distinct piece, however many parts have it. */
export function remembering(plain: Readings, look: (trait: Trait) => Piece): Readings {
  const memories = new Map<Piece, Map<string, unknown>>();
  const once = <Made>(trait: Trait, key: string, make: () => Made): Made => {
    const piece = look(trait);
    let memory = memories.get(piece);
    if (memory === undefined) memories.set(piece, (memory = new Map<string, unknown>()));
    const known = memory.get(key);
    if (known !== undefined) return known as Made;
    const made = make();
    memory.set(key, made);
    return made;
  };
  const figure: Readings['figure'] = (parameter, end) =>
    DEPENDENT.has(parameter) ? plain.figure(parameter, end) : once(parameter, end ?? 'figure', () => plain.figure(parameter, end));
  return {
    identity: plain.identity,
    brief: plain.brief,
    figure,
    inputCurrent: (parameter, doubles) => once(parameter, doubles ? 'doubling' : 'steady', () => plain.inputCurrent(parameter, doubles)),
    inputDoubles: () => plain.inputDoubles(),
    figureOrClass: (parameter) => figure(parameter) ?? plain.figureOrClass(parameter),
    ofClass: (parameter) => plain.ofClass(parameter),
    figureOrAssumed: (parameter, assumed, end) => figure(parameter, end) ?? plain.figureOrAssumed(parameter, assumed, end),
    spread: (parameter) => once(parameter, 'spread', () => plain.spread(parameter)),
    offset: () => once('offsetVoltage', 'offset', () => plain.offset()),
    headroom: (side) => once(HEADROOM[side], 'curve', () => answered(plain.headroom(side))),
    currentFromHeadroom: (side, supply) => once(HEADROOM[side], `current ${supply}`, () => plain.currentFromHeadroom(side, supply)),
    bounded: (worst, best) => plain.bounded(worst, best),
  };
}

/** Input currents depend on the type of the input and on each other. */
const DEPENDENT: ReadonlySet<Parameter> = new Set(['biasCurrent', 'offsetCurrent']);
const HEADROOM = { low: 'outputLowHeadroom', high: 'outputHighHeadroom' } as const;

/** The vertices of a stage are asked about again and again. */
function answered(curve: (question: HeadroomQuestion) => HeadroomReading): (question: HeadroomQuestion) => HeadroomReading {
  const known = new Map<HeadroomQuestion, HeadroomReading>();
  return (question) => {
    const found = known.get(question) ?? curve(question);
    known.set(question, found);
    return found;
  };
}
