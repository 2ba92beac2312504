import type { LimitKind, Parameter } from '../parts/figures.js';
import { PARAMETERS } from '../parts/figures.js';
import type { Doubt } from './cross-checks.js';
import { checkedFigure } from './cross-checks.js';
import type { ReadPart } from './identity.js';

/** Parameters whose sizes lie close together in a list; currents and bandwidths may span decades and are checked against each other. */
const CLOSE: readonly Parameter[] = ['supplyVoltage', 'offsetVoltage', 'offsetDrift', 'voltageNoise', 'outputLowHeadroom', 'outputHighHeadroom', 'shortCircuitCurrent'];
const LEAST_ROWS = 5;
/** The other rows stay within this factor of their median. */
const SPREAD = 12;

/** Figures a thousand or a million times off the median of a column whose other figures lie close together: a slip of the prefix. */
export function medianWarnings(read: readonly ReadPart[]): Doubt[] {
  return CLOSE.flatMap((parameter) => (['typ', 'max', 'min'] as const).flatMap((kind) => columnDoubts(read, parameter, kind)));
}

/** The values alone are gathered first: of a long list, keeping more for each would cost more than the list itself. */
function columnDoubts(read: readonly ReadPart[], parameter: Parameter, kind: LimitKind): Doubt[] {
  const values = new Float64Array(read.length);
  let count = 0;
  for (const one of read) {
    const value = checkedFigure(one, parameter, [kind])?.value ?? 0;
    if (value > 0) values[count++] = value;
  }
  if (count < LEAST_ROWS) return [];
  const sorted = values.subarray(0, count).sort();
  const median = sorted[Math.floor(count / 2)] ?? 1;
  const far = sorted.reduce((sum, value) => sum + Number(!isWithin(value / median, SPREAD)), 0);
  return far === 0 || far * 4 > count ? [] : read.flatMap((one) => doubtOf(one, { parameter, kind, median }));
}

function doubtOf(one: ReadPart, { parameter, kind, median }: { readonly parameter: Parameter; readonly kind: LimitKind; readonly median: number }): Doubt[] {
  const found = checkedFigure(one, parameter, [kind]);
  if (found === null || found.value <= 0) return [];
  const power = [1e3, 1e-3, 1e6, 1e-6].find((factor) => isWithin(found.value / median / factor, 2));
  if (power === undefined || isWithin(found.value / median, SPREAD)) return [];
  const reason = `${PARAMETERS[parameter].words} ${power > 1 ? `${power}` : `1/${1 / power}`} times the median of its column: a slip of the prefix`;
  return [{ one, column: found.column, fault: { code: 'I608', reason, fix: 'check the unit of the cell' } }];
}

const isWithin = (ratio: number, factor: number): boolean => ratio >= 1 / factor && ratio <= factor;
