import type { Figure, LoadCondition } from '../parts/figures.js';
import { conditionKey, PARAMETERS } from '../parts/figures.js';
import type { CellFault } from './cell-fault.js';
import type { ColumnReading } from './column-reading.js';
import type { DecimalRule } from './decimal-mark.js';
import { contextOf, figureCellReader, readNumber } from './figure-cell.js';
import { formulaFault } from './formula-cell.js';
import type { ListColumn, ListRecord } from './list.js';
import type { RowContext } from './measured-cell.js';
import { measuredCellReader } from './measured-cell.js';
import type { MeasuredCell } from './measured-figures.js';
import type { DraftFigures } from './part-draft.js';
import { railWordsOf, readRailCell } from './rail-words.js';
import { isMissing } from './text-cell.js';

export interface FigureSink {
  readonly found: DraftFigures;
  readonly channels: number | null;
  readonly description: string | null;
  readonly report: (column: ListColumn, fault: CellFault, severity: 'error' | 'warning') => void;
}

type FigureReader = (record: ListRecord, sink: FigureSink) => void;
type ReadCell = (cell: string, row: RowContext) => MeasuredCell;

/** A reader of the figures of a record, for the columns of one list. */
export function figureReaders(columns: readonly ListColumn[], decimal: DecimalRule): FigureReader {
  const hasLoad = columns.some(({ reading }) => reading.kind === 'load');
  const readers = columns.flatMap((column) => {
    const read = valueReader(column.reading, decimal);
    return read === null ? [] : [{ column, read: remembered(read, isPerRow(column.reading, hasLoad)) }];
  });
  const places = Uint32Array.from(readers, ({ column }) => column.number - 1);
  const load = columns.find(({ reading }) => reading.kind === 'load');
  const rails = columns.filter(({ reading }) => reading.kind === 'rail');
  // The canonical CSV says everything in columns; the descriptions of ordinary lists say what their columns do not.
  const isOrdinary = columns.some(({ reading }) => reading.kind === 'measured' || reading.kind === 'rail');
  const description = isOrdinary ? columns.find(({ reading }) => reading.kind === 'identity' && reading.field === 'description') : undefined;
  return (record, sink) => {
    const row: RowContext = { load: load === undefined ? null : loadOf(load, record, { sink, decimal }), channels: sink.channels };
    const { cells } = record;
    for (let at = 0; at < places.length; at += 1) {
      const cell = cells[places[at] ?? 0] ?? '';
      // As most cells of a wide table are.
      if (cell === '') continue;
      const reader = readers[at];
      if (reader !== undefined) readCell(cell, reader.read, { column: reader.column, row, sink });
    }
    for (const column of rails) railCell(column, record, sink);
    const words = description === undefined || sink.found.rails !== null ? null : railWordsOf(sink.description ?? '');
    if (words !== null && description !== undefined) sink.found.rails = { words, column: description };
  };
}

/** Reads the figures a column's cells hold; null when it holds none. */
export function valueReader(reading: ColumnReading, decimal: DecimalRule): ReadCell | null {
  if (reading.kind === 'measured') return measuredCellReader(reading, decimal);
  if (reading.kind === 'known') return reading.field === null ? null : checkedReader(reading.field, reading.unit, decimal);
  if (reading.kind !== 'figure') return null;
  const { parameter, limit: kind, condition } = reading;
  const read = figureCellReader(reading, decimal);
  return (cell) => {
    const found = read(cell);
    if (!found.ok) return found;
    return { ok: true, figures: found.value === null ? [] : [{ parameter, kind, value: found.value, condition }], notes: found.notes };
  };
}

/** A quantity that is kept as text is still read, so that a slip in it is told. */
function checkedReader(field: Parameters<typeof readNumber>[1], unit: string | null, decimal: DecimalRule): ReadCell {
  return (cell) => {
    const read = readNumber(cell, field, contextOf(unit, decimal));
    const isRange = !read.ok && read.fault.code === 'I508';
    return read.ok || isRange ? { ok: true, figures: [], notes: [] } : read;
  };
}

/** Whether other cells of the row have a say in what a cell means. */
function isPerRow(reading: ColumnReading, hasLoad: boolean): boolean {
  return reading.kind === 'measured' && (reading.perPackage || hasLoad);
}

/** Values in a list repeat, so each text is read once; where the row has a say, once for each load and number of amplifiers. */
function remembered(read: ReadCell, perRow: boolean): ReadCell {
  const known = new Map<string, MeasuredCell>();
  return (cell, row) => {
    const key = perRow ? `${row.channels ?? ''} ${conditionKey(row.load === null ? {} : { load: row.load })} ${cell}` : cell;
    const earlier = known.get(key);
    if (earlier !== undefined) return earlier;
    const result = figuresIn(cell, read, row);
    if (known.size < MOST_REMEMBERED) known.set(key, result);
    return result;
  };
}

/** A formula is none, whatever the column. */
function figuresIn(cell: string, read: ReadCell, row: RowContext): MeasuredCell {
  const formula = formulaFault(cell);
  return formula === null ? read(cell, row) : { ok: false, fault: formula };
}

const MOST_REMEMBERED = 10_000;

interface CellReading {
  readonly column: ListColumn;
  readonly row: RowContext;
  readonly sink: FigureSink;
}

function readCell(cell: string, read: ReadCell, { column, row, sink }: CellReading): void {
  if (isMissing(cell)) return;
  const result = read(cell, row);
  if (!result.ok) return sink.report(column, result.fault, 'error');
  for (const figure of result.figures) addFigure(figure, column, sink);
  for (const note of result.notes) sink.report(column, { code: 'I515', reason: `${cell.trim()}: ${note}` }, 'warning');
}

function addFigure(figure: Figure, column: ListColumn, { found, report }: FigureSink): void {
  const earlier = found.add(figure, column);
  if (earlier === null || Math.abs(earlier.figure.value - figure.value) <= 1e-9 * Math.abs(figure.value)) return;
  const what = `${PARAMETERS[figure.parameter].words} ${figure.kind}`;
  const reason = `a second ${what}: column ${earlier.column.letter} "${earlier.column.header}" says another`;
  report(column, { code: 'I518', reason, fix: `keep one, or keep this column as text: --map "${column.letter}=text"` }, 'error');
}

function loadOf(column: ListColumn, record: ListRecord, { sink, decimal }: { sink: FigureSink; decimal: DecimalRule }): LoadCondition | null {
  const cell = record.cells[column.number - 1] ?? '';
  if (isMissing(cell) || column.reading.kind !== 'load') return null;
  const read = readNumber(cell, 'resistance', contextOf(column.reading.unit, decimal));
  if (read.ok && read.value > 0) return { kind: 'resistance', ohms: read.value, to: 'mid-supply' };
  sink.report(column, read.ok ? { code: 'I505', reason: 'a load of 0 Ω is a short circuit', fix: 'empty if unknown' } : read.fault, 'error');
  return null;
}

function railCell(column: ListColumn, record: ListRecord, { found, report }: FigureSink): void {
  const cell = record.cells[column.number - 1] ?? '';
  if (isMissing(cell) || column.reading.kind !== 'rail') return;
  const words = readRailCell(cell, column.reading.sense);
  if (words === null) return report(column, { code: 'I503', reason: `${cell.trim()} does not say which side goes to which rail`, fix: 'RRIO, RRI, RRO, ground sensing or no' }, 'error');
  const earlier = found.rails?.words;
  const merged = { inputs: earlier?.inputs ?? words.inputs, outputs: earlier?.outputs === true || words.outputs };
  found.rails = { words: merged, column: found.rails?.column ?? column };
}
