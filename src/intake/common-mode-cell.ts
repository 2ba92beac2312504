import type { Parameter } from '../parts/figures.js';
import { parseQuantity } from '../quantities/parse.js';
import type { MeasuredReading } from './column-reading.js';
import type { DecimalRule } from './decimal-mark.js';
import { contextOf } from './figure-cell.js';
import type { MeasuredCell } from './measured-figures.js';
import { difference, figuresOf } from './measured-figures.js';
import type { RailVoltage } from './rail-voltage.js';
import { rangeEnds, readRailVoltage } from './rail-voltage.js';

/** Reads a cell about the range of the inputs; null for a column that measures something else. */
export function commonModeCell(cell: string, column: MeasuredReading, decimal: DecimalRule): MeasuredCell | null {
  const { target } = column;
  if (target === 'commonModeRange') return commonModeRange(cell, column, decimal);
  if (target === 'commonModeLow') return commonModeEnd(readRailVoltage(cell), 'low', { cell, column, decimal });
  if (target === 'commonModeHigh') return commonModeEnd(readRailVoltage(cell), 'high', { cell, column, decimal });
  if (target === 'commonModeHighFromRail') return commonModeEnd(fromRail(cell), 'high', { cell, column, decimal });
  return null;
}

interface EndReading {
  readonly cell: string;
  readonly column: MeasuredReading;
  readonly decimal: DecimalRule;
}

function fromRail(cell: string): RailVoltage {
  const read = readRailVoltage(cell);
  return { rail: 'high', text: read.text };
}

function commonModeRange(cell: string, column: MeasuredReading, decimal: DecimalRule): MeasuredCell {
  const ends = rangeEnds(cell);
  if (ends === null) return { ok: false, fault: { code: 'I508', reason: `${cell.trim()} is not the range of an input, from its lowest to its highest voltage`, fix: '-0.1 to V+ - 1.5' } };
  const low = commonModeEnd(ends[0], 'low', { cell, column, decimal });
  if (!low.ok) return low;
  const high = commonModeEnd(ends[1], 'high', { cell, column, decimal });
  return high.ok ? { ok: true, figures: [...low.figures, ...high.figures], notes: [] } : high;
}

/** The head-room of one end: from its own rail, or from ground and the supply it was measured at. */
function commonModeEnd({ rail, text }: RailVoltage, side: 'low' | 'high', { cell, column, decimal }: EndReading): MeasuredCell {
  const parameter: Parameter = side === 'low' ? 'inputLowHeadroom' : 'inputHighHeadroom';
  const limit = /\btyp/iu.test(cell) ? 'typ' : column.limit;
  const result = parseQuantity(text.replace(/\s*(?:min|typ|max)\.?$/iu, ''), 'voltage', contextOf(column.unit ?? 'V', decimal));
  const value = result.ok ? result.quantity.nominal : undefined;
  if (!result.ok || value === undefined) {
    const reason = result.ok ? `${cell.trim()} is not one end of a range` : result.problem.message;
    return { ok: false, fault: { code: result.ok ? 'I508' : result.problem.code, reason, fix: side === 'low' ? '0, or -0.1' : 'V+ - 1.5' } };
  }
  const { supply } = column.condition;
  const headroom = side === 'low' ? fromLow(rail, value) : fromHigh(rail, value, supply);
  if (headroom === null) return { ok: false, fault: { code: 'I521', reason: `${cell.trim()}: whether it counts from ground or from V+ is not said`, fix: side === 'low' ? '-0.1' : 'V+ - 1.5' } };
  const kind = limit === null || limit === 'typ' ? 'typ' : 'max';
  return figuresOf([[kind, headroom]], { column: { ...column, target: parameter }, condition: column.condition, notes: [] });
}

const fromLow = (rail: RailVoltage['rail'], value: number): number | null => (rail === 'high' ? null : value);

function fromHigh(rail: RailVoltage['rail'], value: number, supply: number | undefined): number | null {
  if (rail === 'high') return -value;
  return supply === undefined || rail === 'low' ? null : difference(supply, value);
}
