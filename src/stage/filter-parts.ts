import { formatQuantity } from '../quantities/format.js';
import type { Problem } from '../quantities/problem.js';
import { contradiction } from '../spec/contradiction.js';
import type { FilterSpec, StageSpec } from '../spec/spec.js';

/** Butterworth, where only a corner is written. */
const DEFAULT_Q = Math.SQRT1_2;

/** What is wanted of a filter, Hz and Q; null without a corner. */
export function wantedOf({ corner, q }: FilterSpec): { readonly frequency: number; readonly q: number } | null {
  return corner === undefined ? null : { frequency: corner.value, q: q?.value ?? DEFAULT_Q };
}

const NAMES = ['r1', 'r2', 'r3', 'c1', 'c2'] as const;
type PartName = (typeof NAMES)[number];
type Parts = Readonly<Partial<Record<PartName, number>>>;

/** Components as fitted; null unless all of them are written. */
export function fittedParts<Name extends PartName>(filter: FilterSpec, names: readonly Name[]): Readonly<Record<Name, number>> | null {
  const values = names.map((name) => filter[name]?.value);
  if (values.includes(undefined)) return null;
  return Object.fromEntries(names.map((name, at) => [name, values[at]])) as Record<Name, number>;
}

/** `R1 10 kΩ, R2 11.5 kΩ, C1 20 nF, C2 10 nF`. */
function partsText(parts: Parts): string {
  const names = NAMES.filter((name) => parts[name] !== undefined);
  return names.map((name) => `${name.toUpperCase()} ${formatQuantity(parts[name] ?? 0, name.startsWith('r') ? 'Ω' : 'F', { digits: 4 })}`).join(', ');
}

/** What a filter is made of and what that gives, one sentence. */
export function partsNote(parts: Parts, chosen: boolean, { corner, q }: { readonly corner: number; readonly q: number }): string {
  const gives = `${formatQuantity(corner, 'Hz', { digits: 4 })} at a Q of ${formatQuantity(q, '1', { digits: 4 })}`;
  return chosen ? `filter components chosen from E96 and E24: ${partsText(parts)}; they give ${gives}` : `the filter components as written give ${gives}`;
}

const PATHS = ['filter', 'filter.corner', 'filter.q', 'filter.r1', 'gain', 'source', 'resistors'];

/** The filter cannot be made, or is none: why, and what to write instead. */
export function noFilter(spec: StageSpec, message: string, fix: string): Problem {
  return contradiction(spec, { code: 'S211', paths: PATHS, message, fix });
}

/** Neither corner nor all components. */
export function notSaid(spec: StageSpec, names: string): Problem {
  return noFilter(spec, 'the filter is not said: neither its corner nor all of its components', `write filter: {corner: 1 kHz, q: 0.707}, or ${names}`);
}

/** No preferred values of reasonable size. */
export function notMade(spec: StageSpec, wanted: { readonly frequency: number; readonly q: number }): Problem {
  const what = `${formatQuantity(wanted.frequency, 'Hz')} at a Q of ${formatQuantity(wanted.q, '1')}`;
  return noFilter(spec, `no E96 resistors and E24 capacitors of 100 pF and more give ${what} with this gain and source`, 'write the components, or a smaller source resistance, gain or corner');
}

/** Written both ways, components must give the corner within `tolerance`, that of a resistor and a capacitor, and the Q within twice as much. */
export function partsAgainstCorner(spec: StageSpec, is: { readonly corner: number; readonly q: number }, tolerance: number): Problem | null {
  const { corner, q } = spec.filter ?? {};
  const isOff = (actual: number, wanted: number | undefined, within: number): boolean => wanted !== undefined && Math.abs(actual / wanted - 1) > within * (1 + 1e-9);
  if (!isOff(is.corner, corner?.value, tolerance) && !isOff(is.q, q?.value, 2 * tolerance)) return null;
  return contradiction(spec, {
    code: 'S210',
    paths: ['filter.corner', 'filter.q', 'filter', 'filter.r1'],
    message: `corner and components disagree: the components give ${formatQuantity(is.corner, 'Hz', { digits: 4 })} at a Q of ${formatQuantity(is.q, '1', { digits: 4 })}, more than their tolerances away`,
    fix: 'leave out corner and q, or the components',
  });
}
