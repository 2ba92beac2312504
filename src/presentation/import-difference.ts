import type { ImportCounts } from './import-json.js';

/** A field of a part that another list says differently: canonical header and cells; null where a list says nothing. */
export interface PartChange {
  readonly part: string;
  readonly field: string;
  readonly was: string | null;
  readonly now: string | null;
  /** The cell of the new list, as a spreadsheet names it (`M6`); null when the new list has no such column. */
  readonly cell?: string | null;
  /** The same as an RFC 7111 pointer. */
  readonly at?: string | null;
}

/** What a new column that is kept as text says: its cells and in how many parts each; null when they are too many to be told. */
export interface ColumnTally {
  readonly header: string;
  readonly letter: string;
  readonly values: readonly { readonly value: string; readonly parts: number }[] | null;
}

/** What is different from the list before. */
export interface ListDifference {
  /** New ids. */
  readonly added: readonly string[];
  /** Ids withdrawn. */
  readonly withdrawn: readonly string[];
  readonly changes: readonly PartChange[];
  /** Headers that only one of the lists has. */
  readonly columns: {
    readonly added: readonly string[];
    readonly removed: readonly string[];
    /** Of the added ones, those that no check reads. */
    readonly tallies: readonly ColumnTally[];
  };
}

/** One line for each thing that is different; ten of a kind, the rest counted. */
export function differenceLines({ added, withdrawn, changes, columns }: ListDifference, counts: ImportCounts): string[] {
  return [
    ...(added.length === counts.rows ? [] : idLines('added', added)),
    ...changeLines(changes),
    ...idLines('withdrawn', withdrawn),
    ...newColumnLines(columns),
    ...idLines('column gone', columns.removed.map(quoted)),
  ];
}

const NAMED = 10;

function changeLines(changes: readonly PartChange[]): string[] {
  const lines = changes.slice(0, NAMED).map(({ part, field, was, now, cell }) => {
    const place = cell == null ? '' : ` (${cell})`;
    return `  changed  ${part}: ${field}: ${was ?? 'empty'} → ${now ?? 'empty'}${place}`;
  });
  const left = changes.length - NAMED;
  return left <= 0 ? lines : [...lines, `  … and ${left} more field${left === 1 ? '' : 's'} changed`];
}

function idLines(label: string, ids: readonly string[]): string[] {
  if (ids.length === 0) return [];
  const more = ids.length <= NAMED ? '' : `, … and ${ids.length - NAMED} more`;
  return [`  ${label}  ${ids.slice(0, NAMED).join(', ')}${more}`];
}

/** Columns that are read on one line; each that is kept as text, with what it says, on its own. */
function newColumnLines({ added, tallies }: ListDifference['columns']): string[] {
  const text = new Set(tallies.map(({ header }) => header));
  const told = tallies.slice(0, NAMED).map((tally) => `  new column  ${quoted(tally.header)}${valuesOf(tally)}, kept as text`);
  const left = tallies.length - NAMED;
  return [...idLines('new column', added.filter((header) => !text.has(header)).map(quoted)), ...told, ...(left <= 0 ? [] : [`  … and ${left} more new column${left === 1 ? '' : 's'} kept as text`])];
}

function valuesOf({ values }: ColumnTally): string {
  return values === null ? '' : ` (${values.map(({ value, parts }) => `${value === '' ? 'empty' : value} ${parts}`).join(', ')})`;
}

const quoted = (header: string): string => `"${header}"`;
