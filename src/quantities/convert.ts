import type { Dimension } from './dimensions.js';
import type { FieldKind } from './kinds.js';

/** dBu is against the voltage that puts 1 mW into 600 Ω; IEC 60268-17, common practice. */
const DBU_REFERENCE = Math.sqrt(0.6);

const SECONDS_PER_HOUR = 3600;

/**
 * A number in the SI unit of its dimension to the unit of the kind: Vpp and Vrms (of a sine) and dBV to Vpk, decibels
 * (20·log10) to V/V, kelvin to °C, ampere hours to coulomb.
 */
export function convert(value: number, dimension: Dimension, kind: FieldKind): number {
  if (kind === 'amplitude') return toPeak(value, dimension);
  if (dimension === 'dB') return 10 ** ((kind === 'ratio' ? Math.abs(value) : value) / 20);
  if (dimension === 'Ah') return value * SECONDS_PER_HOUR;
  if (dimension === 'K' && kind === 'temperature') return Number((value - 273.15).toPrecision(14));
  return value;
}

function toPeak(value: number, dimension: Dimension): number {
  if (dimension === 'Vpp') return value / 2;
  if (dimension === 'Vrms') return value * Math.SQRT2;
  if (dimension === 'dBV') return 10 ** (value / 20) * Math.SQRT2;
  if (dimension === 'dBu') return DBU_REFERENCE * 10 ** (value / 20) * Math.SQRT2;
  return value;
}
