import type { Figure, Parameter } from '../parts/figures.js';
import type { Part } from '../parts/part.js';

/** A class a part may belong to, by its figures; proposed with the distance, never applied unasked. */
export interface ClassProposal {
  readonly part: string;
  readonly class: string;
  /** Root mean square of the decades between figures of the part and of the nearest set of the class. */
  readonly distance: number;
  readonly compared: number;
}

/** Figures that tell classes apart, whatever the conditions they are rated under. */
const COMPARED: readonly Parameter[] = ['gainBandwidth', 'slewRate', 'quiescentCurrent', 'offsetVoltage', 'biasCurrent', 'voltageNoise', 'supplyVoltage'];
const LEAST_COMPARED = 3;

/** The nearest class of each part that has none; nothing for a part with too few figures to compare. */
export function proposeClasses(parts: readonly Part[], generic: readonly Part[]): ClassProposal[] {
  const sets = generic.flatMap((set) => (set.class === null ? [] : [{ class: set.class, profile: profileOf(set) }]));
  return parts.flatMap((part) => {
    if (part.class !== null) return [];
    const nearest = nearestOf(profileOf(part), sets);
    return nearest === null ? [] : [{ part: part.id, ...nearest }];
  });
}

/** Decades of each compared parameter in turn, NaN where it is not known; a plain row of numbers, because a long list compares millions. */
type Profile = Float64Array;

interface ClassProfile {
  readonly class: string;
  readonly profile: Profile;
}

/** Of sets that are equally near the one whose class comes first. */
function nearestOf(profile: Profile, sets: readonly ClassProfile[]): Omit<ClassProposal, 'part'> | null {
  let best: Omit<ClassProposal, 'part'> | null = null;
  for (const set of sets) {
    let [sum, compared] = [0, 0];
    for (let at = 0; at < profile.length; at += 1) {
      const apart = (profile[at] ?? Number.NaN) - (set.profile[at] ?? Number.NaN);
      if (Number.isNaN(apart)) continue;
      sum += apart * apart;
      compared += 1;
    }
    if (compared < LEAST_COMPARED) continue;
    const distance = Math.sqrt(sum / compared);
    if (best === null || distance < best.distance || (distance === best.distance && set.class < best.class)) best = { class: set.class, distance, compared };
  }
  return best;
}

/** One size per parameter: the typical figure where there is one, else the limit. */
function profileOf({ figures }: Part): Profile {
  const profile = new Float64Array(COMPARED.length).fill(Number.NaN);
  const typical = new Uint8Array(COMPARED.length);
  for (const figure of figures) {
    const at = COMPARED.indexOf(figure.parameter);
    if (at < 0 || !(figure.value > 0) || (figure.parameter === 'supplyVoltage' && figure.kind !== 'max')) continue;
    const isFirst = Number.isNaN(profile[at]);
    if (!isFirst && (figure.kind !== 'typ' || typical[at] === 1)) continue;
    profile[at] = sizeOf(figure);
    typical[at] = Number(figure.kind === 'typ');
  }
  return profile;
}

/** A limit lies about half a decade on the safe side of the typical figure (common practice). */
function sizeOf({ kind, parameter, value }: Figure): number {
  const size = Math.log10(value);
  if (kind === 'typ' || parameter === 'supplyVoltage') return size;
  return kind === 'max' ? size - 0.3 : size + 0.2;
}

/** The head-room points of a class, worst of its sets, that outputs to the rails in words may borrow: typical and assumed. */
export function classHeadrooms(name: string, generic: readonly Part[]): Figure[] {
  const worst = new Map<string, Figure>();
  for (const set of generic.filter((part) => part.class === name)) {
    for (const figure of set.figures) {
      if (figure.parameter !== 'outputLowHeadroom' && figure.parameter !== 'outputHighHeadroom') continue;
      const key = `${figure.parameter} ${JSON.stringify(figure.condition)}`;
      const known = worst.get(key);
      if (known === undefined || known.value < figure.value) worst.set(key, { ...figure, kind: 'typ', assumed: true });
    }
  }
  return [...worst.values()];
}
