import type { Price } from '../parts/part.js';
import type { DecimalRule } from './decimal-mark.js';
import type { CellFault } from './cell-fault.js';
import { contextOf, numberReader } from './figure-cell.js';
import type { ColumnReading } from './header.js';
import type { CellReader } from './part-draft.js';
import { isMissing } from './text-cell.js';

/** A reader for one price column: an amount in the currency of the header, or of the cell. */
export function priceCell(column: Extract<ColumnReading, { kind: 'price' }>, decimal: DecimalRule): CellReader {
  const read = numberReader('price', contextOf(column.currency, decimal));
  return (draft, cell, report) => {
    if (isMissing(cell)) return;
    const number = read(cell);
    if (!number.ok) return report(number.fault, 'error');
    const price: Price = { amount: number.value, currency: number.quantity.unit, quantity: column.quantity };
    if (price.amount < 0) return report({ code: 'I504', reason: 'a price cannot be below zero' }, 'error');
    if (price.amount === 0) return report(ZERO_PRICE, 'warning');
    if (draft.price !== null) return report(SECOND_PRICE, 'warning');
    draft.price = price;
    const { note } = number.quantity;
    if (note !== undefined) report({ code: 'I515', reason: `${cell.trim()}: ${note}` }, 'warning');
  };
}

const ZERO_PRICE: CellFault = {
  code: 'I506',
  reason: 'price 0 looks like "not known" and is kept as unknown; it would win every price comparison',
  fix: 'empty if unknown',
};

const SECOND_PRICE: CellFault = {
  code: 'I514',
  reason: 'a part has one price here: the first price column counts, this one is kept as text',
};
