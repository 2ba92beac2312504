import type { LimitKind, Parameter } from '../parts/figures.js';
import { PARAMETERS } from '../parts/figures.js';
import { parseQuantity } from '../quantities/parse.js';
import type { Quantity, ReadingContext } from '../quantities/quantity.js';
import type { CellFault } from './cell-fault.js';
import type { MeasuredReading } from './column-reading.js';
import type { DecimalRule } from './decimal-mark.js';
import { contextOf, wordFault } from './figure-cell.js';

/** The figures of one cell; absent ends were not given. */
export interface CellEnds {
  readonly min?: number | undefined;
  readonly nominal?: number | undefined;
  readonly max?: number | undefined;
  /** Set when the cell itself says the kind of its one figure. */
  readonly limit?: LimitKind | undefined;
  readonly note?: string;
}

export type EndsResult = { readonly ok: true; readonly ends: CellEnds } | { readonly ok: false; readonly fault: CellFault };

interface Reading {
  readonly column: MeasuredReading;
  readonly parameter: Parameter;
  readonly decimal: DecimalRule;
}

/** Every figure of one cell: `0.5/3.0` in the order the header declares, `2 (5 max)`, `<10`, `1.8...5.5`, `8.5 typ`. */
export function readEnds(cell: string, { column, parameter, decimal }: Reading): EndsResult {
  const { field } = PARAMETERS[parameter];
  const context = contextOf(column.unit, decimal);
  const pair = PAIR.exec(cell.trim());
  if (pair !== null) {
    const texts = pair.slice(1).filter((text: string | undefined) => text !== undefined);
    if (column.order !== null && column.order.length === texts.length) return ordered(cell, texts, { order: column.order, parameter, context });
    if (texts.length === 2 && field !== 'temperature') return undeclared(cell, texts, parameter);
  }
  if (!/\p{N}/u.test(cell)) return { ok: false, fault: ownWord(wordFault(cell, field), cell) };
  const result = parseQuantity(cell, field, context);
  if (!result.ok) return { ok: false, fault: faultOf(result.problem) };
  return { ok: true, ends: endsOf(result.quantity) };
}

/** A word of the list's own for "not known" can be declared. */
function ownWord(fault: CellFault, cell: string): CellFault {
  return fault.code === 'I502' ? { ...fault, fix: `empty, or --missing "${cell.trim()}" where it means "not known"` } : fault;
}

/** Figures parted by slashes, none of them worded; a unit (`V/µs`) is not taken for one. */
const PAIR = /^([^/a-zA-Z]*\d[^/]*?)\s*\/\s*([-+−±]?\s*\d[^/]*?)(?:\s*\/\s*([-+−±]?\s*\d[^/]*?))?$/u;

function endsOf({ min, nominal, max, limit, tolerance, note }: Quantity): CellEnds {
  // A tolerance says what is possible about the value, which is one figure.
  const ends = tolerance === true ? { min, max } : { min, nominal, max };
  return { ...ends, limit, ...(note === undefined ? {} : { note }) };
}

interface Ordered {
  readonly order: readonly LimitKind[];
  readonly parameter: Parameter;
  readonly context: ReadingContext;
}

function ordered(cell: string, texts: readonly string[], { order, parameter, context }: Ordered): EndsResult {
  const ends: { min?: number; nominal?: number; max?: number } = {};
  const last = /[^\d.,\s]+$/u.exec(texts.at(-1) ?? '')?.[0] ?? '';
  for (const [index, text] of texts.entries()) {
    // A unit behind the last figure covers those before it.
    const result = parseQuantity(/\d$/u.test(text) ? `${text} ${last}`.trim() : text, PARAMETERS[parameter].field, context);
    if (!result.ok) return { ok: false, fault: faultOf(result.problem) };
    const kind = order[index] ?? 'typ';
    const { nominal, max } = result.quantity;
    const value = nominal ?? (text.startsWith('±') ? max : undefined);
    if (value === undefined) return { ok: false, fault: { code: 'I508', reason: `${text} is not one figure`, fix: `two figures in the order ${order.join('/')}` } };
    // An offset may stand with the sign of its direction, and its order is that of the magnitudes.
    ends[kind === 'typ' ? 'nominal' : kind] = parameter === 'offsetVoltage' ? Math.abs(value) : value;
  }
  const rising = [ends.min, ends.nominal, ends.max].filter((value) => value !== undefined);
  if (rising.every((value, index) => index === 0 || (rising[index - 1] ?? value) <= value)) return { ok: true, ends: { ...ends, limit: rising.length === 1 ? order[0] : undefined } };
  const [first = '', second = ''] = texts;
  const reason = `the header says ${order.join('/')}, but ${first} is ${order[0] === 'max' ? 'smaller' : 'larger'} than ${second}`;
  return { ok: false, fault: { code: 'Q007', reason, fix: `${texts.toReversed().join('/')} if the two were swapped` } };
}

/** Two figures, and the header does not say which is which. What is offered are the kinds the parameter has. */
function undeclared(cell: string, [first = '', second = '']: readonly string[], parameter: Parameter): EndsResult {
  const kinds: readonly LimitKind[] = PARAMETERS[parameter].kinds;
  const other = kinds.find((kind) => kind !== 'typ') ?? 'max';
  if (parameter === 'supplyVoltage') return { ok: false, fault: { code: 'Q009', reason: `${cell.trim()}: two figures with a slash; the lowest and the highest, or two options?`, fix: `${first}..${second}` } };
  const order = Number(first) > Number(second) ? `; ${first} > ${second} would fit typ/min` : '';
  const reason = `two figures, and the header does not say which is which${other === 'min' ? order : ''}`;
  return { ok: false, fault: { code: 'Q009', reason, fix: `${first} typ, ${second} ${other}` } };
}

function faultOf({ code, message, fix, span }: { code: string; message: string; fix?: string; span: readonly [number, number] }): CellFault {
  return { code, reason: message, ...(fix === undefined ? {} : { fix }), span };
}
