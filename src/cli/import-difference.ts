import { figureSlot, type ColumnTally, type ListDifference, type PartChange } from '../index.js';
import type { Catalog, ChangedPart, ImportResult } from '../catalog/index.js';
import { canonicalHeader } from '../intake/canonical-header.js';
import { columnKey } from '../intake/columns.js';
import { STATEMENTS } from '../intake/header-words.js';
import { sourceColumn } from '../intake/list-sources.js';
import type { ListColumn, PatchedCell, ReadList } from '../intake/list.js';
import { fieldChanges } from '../intake/part-fields.js';

/** What a list changes, figure by figure with the cell of the new list, and the columns that only one of the two has. */
export function differenceOf(list: ReadList, { added, changed, removed, previous }: ImportResult, catalog: Pick<Catalog, 'columnsOf'>): ListDifference {
  const indices = indicesOf(list, new Set(changed.map(({ after }) => after.id)));
  const changes = changed.flatMap((pair) =>
    fieldChanges(pair.before, pair.after).map((change): PartChange => ({ part: pair.after.id, ...change, ...placeOf(list, { pair, field: change.field, index: indices.get(pair.after.id) }) })),
  );
  return { added, withdrawn: removed, changes, columns: columnChanges(list, previous === null ? list.columns : catalog.columnsOf(previous)) };
}

interface ChangedField {
  readonly pair: ChangedPart;
  readonly field: string;
  /** Of the part in the new list. */
  readonly index: number | undefined;
}

function placeOf(list: ReadList, { pair, field, index }: ChangedField): Pick<PartChange, 'cell' | 'at'> {
  const sheet = sheetCell(list, { pair, field, index });
  if (sheet !== undefined) return { cell: `${sheet.columnLetter}${sheet.row}`, at: `${sheet.file}#cell=${sheet.row},${sheet.column}` };
  const row = index === undefined ? undefined : list.records[index]?.row;
  const column = list.columns.find((one) => fieldOf(one) === field) ?? figureColumn(list, { pair, field, index });
  if (column === null || row === undefined) return { cell: null, at: null };
  return { cell: `${column.letter}${row}`, at: `${list.file}#cell=${row},${column.number}` };
}

/** The cell of a look-up sheet the new value stands in. */
function sheetCell(list: ReadList, { pair, field, index }: ChangedField): PatchedCell | undefined {
  const cells = index === undefined ? undefined : list.patched?.get(index);
  if (cells === undefined) return undefined;
  const figure = pair.after.figures.find(({ parameter, kind, condition }) => canonicalHeader(parameter, kind, condition) === field);
  const statement = (Object.keys(STATEMENTS) as (keyof typeof STATEMENTS)[]).find((one) => STATEMENTS[one] === field);
  return cells[figure === undefined ? (statement ?? field) : figureSlot(figure)];
}

/** The column of a figure that is named by its canonical header; of one that is gone, the column it would stand in. */
function figureColumn(list: ReadList, { pair, field, index }: ChangedField): ListColumn | null {
  const figure = [...pair.after.figures, ...pair.before.figures].find(({ parameter, kind, condition }) => canonicalHeader(parameter, kind, condition) === field);
  return figure === undefined ? null : sourceColumn(list, figureSlot(figure), index);
}

/** Where these parts stand in the list. */
function indicesOf({ parts }: ReadList, wanted: ReadonlySet<string>): ReadonlyMap<string, number> {
  return new Map(parts.flatMap(({ id }, index): [string, number][] => (wanted.has(id) ? [[id, index]] : [])));
}

/** The field a column is read into, named as a change names it; null for figures, and for a text of its own. */
function fieldOf({ reading }: ListColumn): string | null {
  if (reading.kind === 'identity') return reading.field;
  if (reading.kind === 'statement') return STATEMENTS[reading.statement];
  return reading.kind === 'price' ? 'price' : null;
}

/** Columns that only one of the lists has, by what they say or by their header; each once. */
function columnChanges(list: ReadList, before: readonly ListColumn[]): ListDifference['columns'] {
  const only = (these: readonly ListColumn[], those: readonly ListColumn[]): ListColumn[] => {
    const known = new Set(those.flatMap((column) => [column.header, columnKey(column)]));
    return these.filter((column) => column.header !== '' && !known.has(column.header) && !known.has(columnKey(column)));
  };
  const added = only(list.columns, before);
  return { added: headers(added), removed: headers(only(before, list.columns)), tallies: added.flatMap((column) => tallyOf(column, list)) };
}

const headers = (columns: readonly ListColumn[]): string[] => [...new Set(columns.map(({ header }) => header))];

/** More different cells than these are no answer to "what does it say". */
const MOST_TALLIED = 4;

/** What a new column that is kept as text says, where it says few things. */
function tallyOf({ number, letter, header, reading }: ListColumn, { records }: ReadList): ColumnTally[] {
  if (reading.kind !== 'text' && reading.kind !== 'known') return [];
  const counts = new Map<string, number>();
  for (const { cells } of records) {
    const cell = (cells[number - 1] ?? '').trim();
    counts.set(cell, (counts.get(cell) ?? 0) + 1);
    if (counts.size > MOST_TALLIED) return [{ header, letter, values: null }];
  }
  return [{ header, letter, values: [...counts].map(([value, parts]) => ({ value, parts })) }];
}
