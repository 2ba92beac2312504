import { foldId } from '../quantities/suggest.js';
import { suggest } from '../quantities/suggest.js';
import type { Part } from '../parts/part.js';
import type { CellFault } from './cell-fault.js';
import { columnLetter } from './column-letter.js';
import { idHabits } from './id-habits.js';
import type { ListColumn, ListOptions, ListRecord } from './list.js';

/** A part with the record it was read from, and the column each figure came from: `sources[i]` is that of `part.figures[i]`, null where the owner of the list declared it. */
export interface ReadPart {
  readonly part: Part;
  readonly record: ListRecord;
  readonly sources: readonly (ListColumn | null)[];
  readonly railOutputs: ListColumn | null;
  /** What was wrong with its cells. */
  readonly faults: readonly { readonly column: ListColumn; readonly fault: CellFault }[];
}

export interface IdentityFault {
  readonly record: ListRecord;
  readonly part: string;
  readonly field: 'id' | 'class';
  readonly fault: CellFault;
  readonly severity: 'error' | 'warning';
}

export interface Identities {
  /** Without identical repetitions. */
  readonly kept: readonly ReadPart[];
  readonly faults: readonly IdentityFault[];
}

/** Compares the ids of a list with each other and with the generic sets. Parts without a readable id take no part in it. */
export function checkIdentities(read: readonly ReadPart[], options: ListOptions, idColumn: number): Identities {
  const seen = new Map<string, ReadPart>();
  const faults: IdentityFault[] = [];
  const habits = idHabits(read.map(({ part }) => part.id));
  const add = ({ record, part }: ReadPart, found: Found): void => void faults.push({ record, part: part.id, ...found });
  const kept = read.filter((one) => {
    const { at, fault, repeated, twin } = compareIds(one, seen, (other) => oddness(other, { idColumn, habits }));
    if (fault !== null) add(at ?? one, fault);
    const habit = repeated || twin ? null : habits.fault(one.part.id);
    if (habit !== null) add(one, { field: 'id', severity: 'warning', fault: habit });
    for (const found of ownFaults(one.part, options)) add(one, found);
    return !repeated;
  });
  return { kept, faults };
}

/** What is wrong with the id and the class of a part whatever else is in the list. */
export function ownFaults(part: Part, options: ListOptions): Found[] {
  return [reserved(part, options), unknownClass(part, options.classes)].filter((found) => found !== null);
}

/** Ids that differ only in what is easily mistaken have the same key. */
export const likenessOf = (id: string): string => foldId(id.replace(/\s+/gu, ''));

export type Found = Pick<IdentityFault, 'field' | 'fault' | 'severity'>;

interface Compared {
  readonly fault: Found | null;
  /** Where the fault is told, when not at this row. */
  readonly at?: ReadPart;
  readonly repeated: boolean;
  /** Told with its twin already. */
  readonly twin: boolean;
}

/** How far an id is written from the habits of its list: stray blanks, another case. */
function oddness({ part: { id }, record }: ReadPart, { idColumn, habits }: { idColumn: number; habits: ReturnType<typeof idHabits> }): number {
  const cell = record.cells[idColumn - 1] ?? '';
  return (cell === cell.trim() ? 0 : 1) + (habits.isOtherCase(id) ? 2 : 0);
}

function compareIds(one: ReadPart, seen: Map<string, ReadPart>, odd: (part: ReadPart) => number): Compared {
  const { id } = one.part;
  const key = likenessOf(id);
  const earlier = id === '' ? undefined : seen.get(key);
  if (earlier === undefined) {
    if (id !== '') seen.set(key, one);
    return { fault: null, repeated: false, twin: false };
  }
  if (earlier.part.id === id) return { ...sameId(one, earlier), twin: false };
  if (!sameLetters(earlier.part.id, id)) return { fault: lookAlike(id, earlier), repeated: false, twin: true };
  const [wrong, right] = odd(earlier) > odd(one) ? [earlier, one] : [one, earlier];
  return { fault: clash(wrong, right), at: wrong, repeated: false, twin: true };
}

function sameLetters(a: string, b: string): boolean {
  const plain = (id: string): string => id.toLowerCase().replace(/\s+/gu, '');
  return plain(a) === plain(b);
}

function sameId(one: ReadPart, earlier: ReadPart): Pick<Compared, 'fault' | 'repeated'> {
  const differing = one.record.cells.flatMap((cell, index) => {
    const other = earlier.record.cells[index] ?? '';
    return cell.trim() === other.trim() ? [] : [`${columnLetter(index + 1)} (${quoted(other)}, then ${quoted(cell)})`];
  });
  const row = earlier.record.row;
  if (differing.length > 0) {
    const reason = `${one.part.id} is also in row ${row} and differs in ${differing.slice(0, 6).join(', ')}`;
    return { fault: error('I402', reason, 'keep one of the two rows'), repeated: true };
  }
  const fault = { code: 'I401', reason: `identical to row ${row} in all ${one.record.cells.length} columns; kept once`, fix: `delete row ${one.record.row}` };
  return { fault: { field: 'id', severity: 'warning', fault }, repeated: true };
}

/** A cell in quotes, so that commas inside it do not run into the list. */
const quoted = (cell: string): string => `"${cell.trim()}"`;

function clash(wrong: ReadPart, right: ReadPart): Found {
  return error('I403', `${wrong.part.id} is ${right.part.id} of row ${right.record.row} apart from case or spaces`, right.part.id);
}

function lookAlike(id: string, earlier: ReadPart): Found {
  const reason = `${id} looks like ${earlier.part.id} of row ${earlier.record.row}: O and 0, I and 1 are easily mistaken`;
  return { field: 'id', severity: 'warning', fault: { code: 'I404', reason, fix: earlier.part.id } };
}

function reserved({ id }: Part, { tier, genericIds }: ListOptions): Found | null {
  if (tier === 'generic') return null;
  const fix = 'another id; name the set in a class column';
  if (genericIds?.has(id) === true) return error('I405', `${id} is the id of a generic set that comes with railfit`, fix);
  return RESERVED.test(id) ? error('I405', `${id}: GX- is reserved for generic sets, also for those to come`, fix) : null;
}

const RESERVED = /^GX-/iu;

function unknownClass(part: Part, classes: ReadonlySet<string> | undefined): Found | null {
  if (part.class === null || classes === undefined || classes.has(part.class)) return null;
  const [near] = suggest(part.class, [...classes]);
  const reason = `${part.class} is no class of the generic sets, so nothing can be borrowed from it`;
  const fault = { code: 'I511', reason, ...(near === undefined ? {} : { fix: near }) };
  return { field: 'class', severity: 'warning', fault };
}

function error(code: string, reason: string, fix: string): Found {
  return { field: 'id', severity: 'error', fault: { code, reason, fix } };
}
