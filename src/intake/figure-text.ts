import type { Parameter } from '../parts/figures.js';
import { PARAMETERS } from '../parts/figures.js';
import { parseQuantity } from '../quantities/parse.js';
import { exactDecimal } from './exact.js';

/** A figure as a cell under its canonical header unit, with every digit it takes to read the same number back. */
export function figureText(parameter: Parameter, value: number): string {
  const { headerUnit } = PARAMETERS[parameter];
  if (headerUnit === 'dB') return decibels(parameter, value);
  return exactDecimal(value, EXPONENTS[headerUnit] ?? 0);
}

// Powers of ten between the canonical header units and the SI units the figures are kept in; units not named are SI.
const EXPONENTS: Readonly<Record<string, number>> = {
  mV: -3, 'V/µs': 6, MHz: 6, 'µV/K': -6, pA: -12, 'nV/√Hz': -9, 'fA/√Hz': -15, 'µA': -6, mA: -3, pF: -12, 'µs': -6,
};

/** Decibels when some decimal of at most 17 digits is exactly this ratio, else the ratio with its own unit. */
function decibels(parameter: Parameter, value: number): string {
  const level = 20 * Math.log10(value);
  for (let digits = 1; digits <= 17; digits += 1) {
    const text = exactDecimal(Number(level.toPrecision(digits)), 0);
    if (level >= 0 && readsAs(parameter, text, value)) return text;
  }
  return `${exactDecimal(value, 0)} V/V`;
}

function readsAs(parameter: Parameter, text: string, value: number): boolean {
  const { field, headerUnit } = PARAMETERS[parameter];
  const result = parseQuantity(text, field, { headerUnit });
  return result.ok && result.quantity.nominal === value;
}
