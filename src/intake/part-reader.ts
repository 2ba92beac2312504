import { compareFigures } from '../parts/figure-order.js';
import type { Part } from '../parts/part.js';
import type { CellFault } from './cell-fault.js';
import { cellReader } from './cell-reader.js';
import { figureReaders } from './figure-readers.js';
import type { ListColumn, ListOptions, ListRecord } from './list.js';
import { standInOrder } from './ordered-columns.js';
import { DraftFigures, emptyDraft, type PlacedFigure } from './part-draft.js';
import { railFigures } from './rail-words.js';
import { missingIn } from './text-cell.js';
import type { DecimalRule } from './decimal-mark.js';

/** Told about each cell that is wrong, or was read with a note. */
export type Report = (column: ListColumn, fault: CellFault, severity: 'error' | 'warning') => void;

/** A part, and the column each of its figures was read from: `sources[i]` is that of `part.figures[i]`. */
export interface PartReading {
  readonly part: Part;
  readonly sources: readonly ListColumn[];
  /** Outputs to the rails in words: a class may lend the numbers. */
  readonly railOutputs: ListColumn | null;
}

export type PartReader = (record: ListRecord, report: Report) => PartReading;

/** A reader of records for the columns of one list. Every cell is read, also after a fault, so that all faults are told at once. */
export function partReader(columns: readonly ListColumn[], options: ListOptions, decimal: DecimalRule): PartReader {
  const words = columns.flatMap((column) => {
    const read = cellReader(column.reading, options, decimal);
    return read === null ? [] : [{ column, read }];
  });
  const figures = figureReaders(columns, decimal);
  const isInOrder = standInOrder(columns);
  // Rows of a list are much alike: a row whose figures stand where those of the row before stood shares their columns.
  let sources: readonly ListColumn[] = [];
  return (written, report) => {
    const record = withoutOwnMissing(written, options.missing);
    const draft = emptyDraft(options.tier);
    for (const { column, read } of words) {
      read(draft, record.cells[column.number - 1] ?? '', (fault, severity) => report(column, fault, severity));
    }
    const found = new DraftFigures(isInOrder);
    figures(record, { found, channels: draft.channels, description: draft.description, report });
    addRails(found);
    const placed = isInOrder ? found : sorted(found);
    draft.figures = placed.figures;
    sources = alike(placed.columns, sources) ? sources : placed.columns;
    return { part: draft, sources, railOutputs: found.rails?.words.outputs === true && !isSwingKnown(found) ? found.rails.column : null };
  };
}

const alike = (columns: readonly ListColumn[], sources: readonly ListColumn[]): boolean =>
  columns.length === sources.length && columns.every((column, index) => column === sources[index]);

/** In canonical order. */
function sorted({ figures, columns }: DraftFigures): Pick<DraftFigures, 'figures' | 'columns'> {
  const placed = figures.flatMap((figure, at): PlacedFigure[] => {
    const column = columns[at];
    return column === undefined ? [] : [{ figure, column }];
  });
  placed.sort((a, b) => compareFigures(a.figure, b.figure));
  return { figures: placed.map(({ figure }) => figure), columns: placed.map(({ column }) => column) };
}

/** A list's own words for "not known" are empty cells to whoever reads them; the raw record keeps them. */
function withoutOwnMissing(record: ListRecord, own: readonly string[] | undefined): ListRecord {
  if (own === undefined || own.length === 0) return record;
  return { ...record, cells: record.cells.map((cell) => (missingIn(cell, own) ? '' : cell)) };
}

/** Words stand only where the list has no figure. */
function addRails(found: DraftFigures): void {
  const { rails } = found;
  if (rails === null) return;
  for (const figure of railFigures(rails.words)) if (!found.has(figure.parameter)) found.add(figure, rails.column);
}

const isSwingKnown = (found: DraftFigures): boolean => found.has('outputLowHeadroom') || found.has('outputHighHeadroom');
