import type { Condition, LimitKind, LoadCondition } from '../parts/figures.js';
import { PARAMETERS } from '../parts/figures.js';
import type { CellFault } from './cell-fault.js';
import type { CellEnds } from './cell-ends.js';
import { readEnds } from './cell-ends.js';
import type { MeasuredReading } from './column-reading.js';
import { commonModeCell } from './common-mode-cell.js';
import type { DecimalRule } from './decimal-mark.js';
import type { MeasuredCell, Value } from './measured-figures.js';
import { figuresOf } from './measured-figures.js';
import { targetParameter } from './target.js';
import { withUnit } from './unit-offer.js';

/** What the other cells of the row say about a figure. */
export interface RowContext {
  /** From a load column; null without one, or where it is empty. */
  readonly load: LoadCondition | null;
  readonly channels: number | null;
}

/** A reader for the cells of a measured column: every figure a cell holds, in the SI unit, with its limit kind; never a limit that was not said. */
export function measuredCellReader(column: MeasuredReading, decimal: DecimalRule): (cell: string, row: RowContext) => MeasuredCell {
  return (cell, row) => commonModeCell(cell, column, decimal) ?? plainCell(cell, column, { row, decimal });
}

interface Around {
  readonly row: RowContext;
  readonly decimal: DecimalRule;
}

function plainCell(cell: string, column: MeasuredReading, { row, decimal }: Around): MeasuredCell {
  const parameter = targetParameter(column.target);
  const read = readEnds(cell, { column, parameter, decimal });
  if (!read.ok) return { ok: false, fault: withUnit(read.fault, cell, { parameter, unit: column.unit }) };
  const values = column.target === 'supplyRange' || column.target === 'temperatureRange' ? rangeValues(cell, read.ends) : kindValues(cell, read.ends, column);
  if (!values.ok) return values;
  const scaled = perAmplifier(values.values, column, row);
  if (scaled === null) return { ok: true, figures: [], notes: ['a figure of the whole package; not kept, because its number of amplifiers is not known'] };
  const notes = read.ends.note === undefined ? values.notes : [read.ends.note, ...values.notes];
  return figuresOf(scaled, { column, condition: conditionOf(column, row), notes });
}

function perAmplifier(values: readonly Value[], { perPackage }: MeasuredReading, { channels }: RowContext): readonly Value[] | null {
  if (!perPackage) return values;
  return channels === null ? null : values.map(([kind, value]) => [kind, value / channels] as const);
}

/** The load of its own column, where the header names none, belongs to the swings of the row. */
function conditionOf({ condition, target }: MeasuredReading, { load }: RowContext): Condition {
  const isSwing = target === 'bothSwings' || target === 'outputLowHeadroom' || target === 'outputHighHeadroom' || target === 'outputHighVoltage';
  return isSwing && load !== null && condition.load === undefined ? withLoad(condition, load) : condition;
}

/** One order of keys, so that equal conditions are equal as JSON. */
function withLoad({ supply, ...rest }: Condition, load: LoadCondition): Condition {
  return { ...(supply === undefined ? {} : { supply }), load, ...rest };
}

type Values = { readonly ok: true; readonly values: readonly Value[]; readonly notes: readonly string[] } | { readonly ok: false; readonly fault: CellFault };

function rangeValues(cell: string, { min, nominal, max, limit }: CellEnds): Values {
  const values: Value[] = [...(min === undefined ? [] : [['min', min] as const]), ...(max === undefined ? [] : [['max', max] as const])];
  if (values.length > 0 && limit !== 'typ') return { ok: true, values, notes: [] };
  const reason = `${cell.trim()} is one figure (${nominal ?? ''}) where a range is expected, from the lowest to the highest`;
  return { ok: false, fault: { code: 'I508', reason, fix: 'the range, such as 1.8..5.5, or min or max before the figure' } };
}

/** Figures with their kinds. A plain figure is what the header says; where it says nothing it is typical, never a limit. */
function kindValues(cell: string, { min, nominal, max, limit }: CellEnds, { target, limit: header, order }: MeasuredReading): Values {
  const kinds = kindsOf(target);
  const plain: LimitKind = limit === 'typ' ? 'typ' : (header ?? (kinds.includes('typ') ? 'typ' : (kinds[0] ?? 'typ')));
  if (limit === undefined && min !== undefined && max !== undefined && nominal === undefined) return severalFault(cell);
  if (header !== null && order === null && contradicts({ min, nominal, max, limit }, header)) return kindFault(cell, limit ?? (min === undefined ? 'max' : 'min'), header);
  const found: Value[] = [];
  if (min !== undefined) found.push(['min', min]);
  if (nominal !== undefined) found.push([plain, nominal]);
  if (max !== undefined) found.push(['max', max]);
  const kept = found.filter(([kind]) => kinds.includes(kind));
  const lost = found.filter(([kind]) => !kinds.includes(kind)).map(([kind]) => kind);
  return { ok: true, values: kept, notes: lost.map((kind) => `its ${kind} is kept as text; no check reads it`) };
}

/** One figure, and of another kind than the header says. */
function contradicts({ min, nominal, max, limit }: CellEnds, header: LimitKind): boolean {
  if (nominal !== undefined && (min !== undefined || max !== undefined)) return false;
  const stated = limit ?? (nominal !== undefined ? null : min !== undefined ? 'min' : 'max');
  return stated !== null && stated !== header;
}

/** An output high voltage turns over when it becomes a distance from V+. */
function kindsOf(target: MeasuredReading['target']): readonly LimitKind[] {
  return target === 'outputHighVoltage' ? ['min', 'typ'] : PARAMETERS[targetParameter(target)].kinds;
}

function kindFault(cell: string, stated: LimitKind, header: LimitKind): Values {
  return { ok: false, fault: { code: 'I507', reason: `${cell.trim()} says ${stated}, the header says ${header}`, fix: `move it to a column named ${stated}` } };
}

function severalFault(cell: string): Values {
  return { ok: false, fault: { code: 'I508', reason: `${cell.trim()} is a range where one figure is expected`, fix: 'one figure, or each with its word: 2 typ, 5 max' } };
}
