import type { Confirmation, JudgedPart } from '../screening/index.js';
import { lookupsOf, type LookupContext, type PartLookups } from './part-lookups.js';

/** One datasheet to open: a part, or the packages and channel counts of one die. */
export interface Datasheet {
  /** Family where the list says one, else the id. */
  readonly name: string;
  /** In the order of their worth. */
  readonly parts: readonly PartLookups[];
  /** Different figures to look up in it. */
  readonly figures: number;
}

/** What to look up, most worth first, and what that settles. */
export interface LookupList {
  readonly datasheets: readonly Datasheet[];
  /** Undecided parts of the team's list that look-ups settle, their figures and their datasheets. */
  readonly settled: { readonly parts: number; readonly figures: number; readonly datasheets: number };
  /** Best place the first could take; null when nothing is settled. */
  readonly firstRank: number | null;
  /** Undecided parts of the list that no look-up settles, with the checks that stay open. */
  readonly unsettled: readonly PartLookups[];
  /** Undecided generic sets: classes, with no datasheet to look into. */
  readonly generic: number;
  /** Fits of the list that stand on figures to confirm; a matter of its own. */
  readonly confirm: readonly { readonly part: string; readonly rank: number; readonly confirm: readonly Confirmation[] }[];
}

/** The list over all undecided parts: approved ones by the best place they could take, then by how many parts one datasheet settles, then by the fewest figures. */
export function lookupList(context: LookupContext, undecided: readonly JudgedPart[]): LookupList {
  const own = undecided.filter(({ part }) => part.tier === 'approved').map((one) => lookupsOf(context, one));
  const settled = own.filter(isSettled);
  const datasheets = sheetsOf(settled).sort(compareWorth);
  const figures = datasheets.reduce((sum, sheet) => sum + sheet.figures, 0);
  return {
    datasheets,
    settled: { parts: settled.length, figures, datasheets: datasheets.length },
    firstRank: datasheets[0] === undefined ? null : bestRank(datasheets[0]),
    unsettled: own.filter((one) => !isSettled(one)),
    generic: undecided.length - own.length,
    confirm: context.fit.flatMap(({ part, rank, confirm }) => (part.tier === 'approved' && confirm.length > 0 ? [{ part: part.id, rank, confirm }] : [])),
  };
}

const isSettled = ({ settles, remains }: PartLookups): boolean => settles && remains.length === 0;

function sheetsOf(parts: readonly PartLookups[]): Datasheet[] {
  const sheets = new Map<string, PartLookups[]>();
  for (const one of parts) {
    const name = one.part.family ?? one.part.id;
    sheets.set(name, [...(sheets.get(name) ?? []), one]);
  }
  return [...sheets].map(([name, members]) => ({ name, parts: [...members].sort(compareParts), figures: figuresIn(members) }));
}

/** The variants of a die share their figures. */
function figuresIn(parts: readonly PartLookups[]): number {
  return new Set(parts.flatMap(({ lookups }) => lookups.map(({ figure, kind, condition }) => JSON.stringify([figure, kind, condition])))).size;
}

const placeIn = ({ place }: PartLookups): number => place?.best ?? Number.MAX_SAFE_INTEGER;
const bestRank = ({ parts }: Datasheet): number => Math.min(...parts.map(placeIn));

function compareParts(a: PartLookups, b: PartLookups): number {
  return placeIn(a) - placeIn(b) || a.lookups.length - b.lookups.length || byName(a.part.id, b.part.id);
}

/** What an answer is worth. */
function compareWorth(a: Datasheet, b: Datasheet): number {
  return usable(a) - usable(b) || bestRank(a) - bestRank(b) || b.parts.length - a.parts.length || a.figures - b.figures || byName(a.name, b.name);
}

/** Parts the team may use as they are come before those with a condition, and both before what is restricted. */
function usable({ parts }: Datasheet): number {
  return Math.min(...parts.map(({ part: { status } }) => ['approved', null, 'conditional', 'restricted', 'not-approved'].indexOf(status)));
}

const byName = (a: string, b: string): number => (a < b ? -1 : Number(a > b));
