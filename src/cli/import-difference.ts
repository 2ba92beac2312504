import { figureSlot, type ColumnTally, type ListDifference, type PartChange } from '../index.js';
import type { Catalog, ChangedPart, ImportResult, IncomingList } from '../catalog/index.js';
import { canonicalHeader } from '../intake/canonical-header.js';
import { columnKey } from '../intake/columns.js';
import { STATEMENTS } from '../intake/header-words.js';
import { sourceColumn } from '../intake/list-sources.js';
import type { ListColumn, PatchedCell } from '../intake/list.js';
import { fieldChanges } from '../intake/part-fields.js';
import { textTallies, type TextTally } from '../intake/text-tally.js';

/** What a list changes, figure by figure with the cell of the new list, and the columns that only one of the two has. */
export function differenceOf(list: IncomingList, { added, changed, removed, previous }: ImportResult, catalog: Pick<Catalog, 'columnsOf'>): ListDifference {
  const changes = changed.flatMap((pair) =>
    fieldChanges(pair.before, pair.after).map((change): PartChange => ({ part: pair.after.id, ...change, ...placeOf(list, { pair, field: change.field }) })),
  );
  return { added, withdrawn: removed, changes, columns: columnChanges(list, previous === null ? list.columns : catalog.columnsOf(previous)) };
}

interface ChangedField {
  readonly pair: ChangedPart;
  readonly field: string;
}

function placeOf(list: IncomingList, { pair, field }: ChangedField): Pick<PartChange, 'cell' | 'at'> {
  const sheet = sheetCell(list, { pair, field });
  if (sheet !== undefined) return { cell: `${sheet.columnLetter}${sheet.row}`, at: `${sheet.file}#cell=${sheet.row},${sheet.column}` };
  const column = list.columns.find((one) => fieldOf(one) === field) ?? figureColumn(list, { pair, field });
  if (column === null) return { cell: null, at: null };
  return { cell: `${column.letter}${pair.row}`, at: `${list.file}#cell=${pair.row},${column.number}` };
}

/** The cell of a look-up sheet the new value stands in. */
function sheetCell(list: IncomingList, { pair, field }: ChangedField): PatchedCell | undefined {
  const cells = list.patched?.get(pair.index);
  if (cells === undefined) return undefined;
  const figure = pair.after.figures.find(({ parameter, kind, condition }) => canonicalHeader(parameter, kind, condition) === field);
  const statement = (Object.keys(STATEMENTS) as (keyof typeof STATEMENTS)[]).find((one) => STATEMENTS[one] === field);
  return cells[figure === undefined ? (statement ?? field) : figureSlot(figure)];
}

/** The column of a figure that is named by its canonical header; of one that is gone, the column it would stand in. */
function figureColumn(list: IncomingList, { pair, field }: ChangedField): ListColumn | null {
  const figure = [...pair.after.figures, ...pair.before.figures].find(({ parameter, kind, condition }) => canonicalHeader(parameter, kind, condition) === field);
  return figure === undefined ? null : sourceColumn(list, figureSlot(figure), pair.index);
}

/** The field a column is read into, named as a change names it; null for figures, and for a text of its own. */
function fieldOf({ reading }: ListColumn): string | null {
  if (reading.kind === 'identity') return reading.field;
  if (reading.kind === 'statement') return STATEMENTS[reading.statement];
  return reading.kind === 'price' ? 'price' : null;
}

/** Columns that only one of the lists has, by what they say or by their header; each once. */
function columnChanges(list: IncomingList, before: readonly ListColumn[]): ListDifference['columns'] {
  const only = (these: readonly ListColumn[], those: readonly ListColumn[]): ListColumn[] => {
    const known = new Set(those.flatMap((column) => [column.header, columnKey(column)]));
    return these.filter((column) => column.header !== '' && !known.has(column.header) && !known.has(columnKey(column)));
  };
  const added = only(list.columns, before);
  const tallies = talliesOf(list);
  return { added: headers(added), removed: headers(only(before, list.columns)), tallies: added.flatMap((column) => tallyOf(column, tallies.get(column.number))) };
}

const headers = (columns: readonly ListColumn[]): string[] => [...new Set(columns.map(({ header }) => header))];

/** What a new column that is kept as text says, where it says few things. */
function tallyOf({ header, letter }: ListColumn, tally: TextTally | undefined): ColumnTally[] {
  return tally === undefined ? [] : [{ header, letter, values: tally?.map(([value, parts]) => ({ value, parts })) ?? null }];
}

/** What its columns of text say, counted while it was read or now. */
function talliesOf(list: IncomingList): ReadonlyMap<number, TextTally> {
  if ('tallies' in list) return list.tallies;
  const tallies = textTallies(list.columns);
  for (const record of list.records) tallies.add(record);
  return tallies.found();
}
