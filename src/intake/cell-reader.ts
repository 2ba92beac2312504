import { control } from './control-characters.js';
import type { ColumnReading } from './column-reading.js';
import type { DecimalRule } from './decimal-mark.js';
import { numberReader } from './figure-cell.js';
import type { IdentityField } from './header-words.js';
import type { ListOptions } from './list.js';
import type { CellReader } from './part-draft.js';
import { readPartId } from './part-id.js';
import { priceCell } from './price-cell.js';
import { spreadsheetDamage } from './spreadsheet-damage.js';
import { readText } from './text-cell.js';
import { lifecycleCell, requiredStatusCell, STATEMENT_CELLS, statusCell } from './word-cells.js';

/** A reader for the cells of one column that are no figures; null when the column has none. */
export function cellReader(reading: ColumnReading, options: ListOptions, decimal: DecimalRule): CellReader | null {
  if (reading.kind === 'identity') return identityReader(reading.field, options);
  if (reading.kind === 'statement') return STATEMENT_CELLS[reading.statement];
  if (reading.kind === 'price') return priceCell(reading, decimal);
  return null;
}

function identityReader(field: IdentityField, { tier, words }: ListOptions): CellReader {
  if (field === 'id') return readPartId;
  if (field === 'status') return tier === 'approved' ? requiredStatusCell(words ?? new Map()) : statusCell;
  if (field === 'lifecycle') return lifecycleCell;
  if (field === 'channels') return channelsReader();
  return (draft, cell, report) => {
    const text = readText(cell);
    const fault = text === null ? null : (control(text) ?? (field === 'package' || /^#{2,}$/u.test(text) ? spreadsheetDamage(text) : null));
    if (fault !== null) return report(fault, 'error');
    draft[field] = text;
  };
}

const WORDS: Readonly<Record<string, number>> = { single: 1, dual: 2, quad: 4, one: 1, two: 2, four: 4 };

function channelsReader(): CellReader {
  const read = numberReader('count', {});
  return (draft, cell, report) => {
    if (readText(cell) === null) return;
    const word = WORDS[cell.trim().toLowerCase()];
    if (word !== undefined) return void (draft.channels = word);
    const number = read(cell);
    if (!number.ok && /[^\d.,]/u.test(cell.trim())) return report(number.fault, 'error');
    if (number.ok && Number.isInteger(number.value) && number.value > 0 && number.value <= MOST_CHANNELS) draft.channels = number.value;
    else report({ code: 'I513', reason: `${cell.trim()} is not a number of amplifiers in one package`, fix: '1, 2 or 4; empty if unknown' }, 'error');
  };
}

/** No package holds more amplifiers than this (common practice: one, two or four). */
const MOST_CHANNELS = 8;
