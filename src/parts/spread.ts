import { weakest } from './basis.js';
import { TYPICAL_FACTOR } from './derating.js';
import type { Parameter } from './figures.js';
import type { PartUnderTest, Reading } from './reading.js';
import { factorText, nearestSupply, scalarReading, usable } from './select.js';

/** A figure with the least and the most of it that a part may have. `value` is the reading itself. */
export interface Spread extends Reading {
  /** Null for an assumed figure on the best reading: it may be whatever suits the stage. */
  readonly ends: { readonly least: number; readonly most: number } | null;
}

/**
 * Both ends of a figure whose limit is a minimum. Pessimistic: from the minimum (or the derated typical) to the typical (or
 * the minimum over the same derating). Optimistic: the printed value alone. Null when the figure is missing.
 */
export function spreadReading(test: PartUnderTest, parameter: Parameter): Spread | null {
  const reading = scalarReading(test, parameter);
  if (reading === null) return null;
  if (!Number.isFinite(reading.value)) return { ...reading, ends: null };
  if (test.outlook === 'optimistic') return { ...reading, ends: { least: reading.value, most: reading.value } };
  const most = mostOf(test, parameter, reading);
  return { ...reading, basis: weakest([reading.basis, most.basis]), how: most.how, ends: { least: reading.value, most: Math.max(reading.value, most.value) } };
}

/** The typical figure, else what a part with this minimum would have as typical. */
function mostOf(test: PartUnderTest, parameter: Parameter, reading: Reading): Pick<Reading, 'value' | 'basis' | 'how'> {
  const printed = reading.printed ?? reading.value;
  if (reading.kind === 'typ') return { value: printed, basis: 'derated', how: join(reading.how, 'up to the typical as printed') };
  const typicals = nearestSupply(usable(test, parameter).filter(({ kind }) => kind === 'typ'), test.operating.nominalSupply);
  if (typicals.length > 0) return { value: Math.max(...typicals.map(({ value }) => value)), basis: 'derated', how: join(reading.how, 'up to the typical') };
  const factor = TYPICAL_FACTOR[parameter] ?? 1;
  return { value: printed / factor, basis: 'estimated', how: join(reading.how, `up to the limit ${factorText(1 / factor)}`) };
}

const join = (...steps: (string | null)[]): string => steps.filter((step) => step !== null).join(', ');
