import { PARAMETERS, type Parameter } from './figures.js';
import type { Part } from './part.js';
import { readingsOf } from './readings.js';
import type { ClassWorst, Operating } from './reading.js';

/** Figures that may be borrowed from a class: terms of the DC error and of the noise. */
export const BORROWABLE = ['commonModeRejection', 'supplyRejection', 'openLoopGain', 'offsetDrift', 'offsetCurrent', 'noiseCorner', 'currentNoise'] as const satisfies readonly Parameter[];

type Classes = ReadonlyMap<string, ClassWorst>;

/** The last answer about each list: many stages in a row stand in the same surroundings. */
const LAST = new WeakMap<readonly Part[], { readonly operating: Operating; readonly classes: Classes }>();

/** Per class, the worst figure of its generic sets under the stage's conditions. */
export function classesOf(parts: readonly Part[], operating: Operating): Classes {
  const last = LAST.get(parts);
  if (last !== undefined && isSame(last.operating, operating)) return last.classes;
  const classes = worstIn(parts, operating);
  LAST.set(parts, { operating, classes });
  return classes;
}

const isSame = (one: Operating, other: Operating): boolean => one.coldest === other.coldest && one.hottest === other.hottest && one.nominalSupply === other.nominalSupply;

function worstIn(parts: readonly Part[], operating: Operating): Classes {
  const classes = new Map<string, Partial<Record<Parameter, number>>>();
  for (const part of parts) {
    if (part.tier !== 'generic' || part.class === null) continue;
    const worst = classes.get(part.class) ?? {};
    widen(worst, part, operating);
    classes.set(part.class, worst);
  }
  return classes;
}

function widen(worst: Partial<Record<Parameter, number>>, part: Part, operating: Operating): void {
  const readings = readingsOf({ part, operating, strict: false, classWorst: null, outlook: 'pessimistic' });
  for (const parameter of BORROWABLE) {
    const value = readings.figure(parameter)?.value;
    if (value === undefined) continue;
    const smallerIsWorse = (PARAMETERS[parameter].kinds as readonly string[]).includes('min');
    const known = worst[parameter];
    worst[parameter] = known === undefined ? value : smallerIsWorse ? Math.min(known, value) : Math.max(known, value);
  }
}
