import type { Dimension } from './dimensions.js';
import type { FieldKind } from './kinds.js';

/** What a field kind accepts (rule Q-1). Numbers are in `unit`. */
export interface KindRule {
  /** As in "a current where a voltage is expected". */
  readonly expected: string;
  /** Unit of the numbers in a Quantity. */
  readonly unit: string;
  readonly dimensions: readonly Dimension[];
  /** Plausible magnitude (temperature: value), both ends included. Zero is inside too unless `zero` is false. */
  readonly plausible: readonly [low: number, high: number];
  readonly zero?: false;
  readonly signed?: true;
  /** ± alone is a limit on the magnitude. */
  readonly magnitude?: true;
  /** A number without unit is complete; a bare k or G scales it. */
  readonly unitless?: true;
  /** Prefixes (SI letter) that may stand without a unit; m and M never may, except written `meg`. */
  readonly barePrefixes?: string;
  /** Unit offered when none was written. */
  readonly usual: string;
  /** A whole value of this kind for fixes. */
  readonly sample: string;
}

/**
 * The plausible ranges are common practice around op-amp stages, chosen wide: they are there to catch a wrong prefix,
 * not to judge a design.
 */
export const KIND_RULES: Readonly<Record<FieldKind, KindRule>> = {
  supply: { expected: 'a voltage', unit: 'V', dimensions: ['V'], plausible: [0.1, 1000], zero: false, usual: 'V', sample: '5 V' },
  voltage: { expected: 'a voltage', unit: 'V', dimensions: ['V'], plausible: [1e-9, 1000], signed: true, usual: 'V', sample: '5 V' },
  offset_limit: { expected: 'a voltage', unit: 'V', dimensions: ['V'], plausible: [1e-9, 10], magnitude: true, usual: 'mV', sample: '3 mV' },
  amplitude: { expected: 'an amplitude', unit: 'Vpk', dimensions: ['Vpk', 'Vpp', 'Vrms', 'dBV', 'dBu'], plausible: [1e-9, 1000], usual: 'Vpk', sample: '1 Vpk' },
  current: { expected: 'a current', unit: 'A', dimensions: ['A'], plausible: [1e-17, 1000], signed: true, magnitude: true, usual: 'µA', sample: '60 µA' },
  resistance: { expected: 'a resistance', unit: 'Ω', dimensions: ['Ω'], plausible: [1e-6, 1e12], barePrefixes: 'kMGT', usual: 'Ω', sample: '10 kΩ' },
  capacitance: { expected: 'a capacitance', unit: 'F', dimensions: ['F'], plausible: [1e-17, 1], barePrefixes: 'pnµ', usual: 'pF', sample: '100 pF' },
  frequency: { expected: 'a frequency', unit: 'Hz', dimensions: ['Hz'], plausible: [0.01, 1e11], usual: 'Hz', sample: '1 kHz' },
  gbw: { expected: 'a frequency', unit: 'Hz', dimensions: ['Hz'], plausible: [10, 1e11], usual: 'MHz', sample: '1 MHz' },
  slew: { expected: 'a slew rate', unit: 'V/s', dimensions: ['V/s'], plausible: [10, 1e11], usual: 'V/µs', sample: '1.5 V/µs' },
  vnoise: { expected: 'a noise density', unit: 'V/√Hz', dimensions: ['V/√Hz'], plausible: [1e-10, 1e-4], usual: 'nV/√Hz', sample: '15 nV/√Hz' },
  inoise: { expected: 'a noise density', unit: 'A/√Hz', dimensions: ['A/√Hz'], plausible: [1e-17, 1e-8], usual: 'fA/√Hz', sample: '5 fA/√Hz' },
  gain: { expected: 'a gain', unit: 'V/V', dimensions: ['V/V', 'dB'], plausible: [1e-6, 1e7], zero: false, signed: true, unitless: true, usual: 'V/V', sample: '10 V/V' },
  ratio: { expected: 'a ratio', unit: 'V/V', dimensions: ['V/V', 'dB'], plausible: [1, 1e10], zero: false, usual: 'dB', sample: '100 dB' },
  fraction: { expected: 'a fraction', unit: '1', dimensions: ['1'], plausible: [1e-9, 1], magnitude: true, usual: '%', sample: '1 %' },
  drift: { expected: 'a drift', unit: 'V/K', dimensions: ['V/K'], plausible: [1e-10, 0.1], signed: true, magnitude: true, usual: 'µV/°C', sample: '2 µV/°C' },
  tempco: { expected: 'a fraction per degree', unit: '1/K', dimensions: ['1/K'], plausible: [1e-10, 0.1], signed: true, magnitude: true, usual: 'ppm/°C', sample: '50 ppm/°C' },
  temperature: { expected: 'a temperature', unit: '°C', dimensions: ['°C', 'K'], plausible: [-200, 300], signed: true, usual: '°C', sample: '25 °C' },
  thermal: { expected: 'a thermal resistance', unit: 'K/W', dimensions: ['K/W'], plausible: [1e-3, 1e4], usual: 'K/W', sample: '120 K/W' },
  time: { expected: 'a time', unit: 's', dimensions: ['s'], plausible: [1e-15, 1e6], usual: 'µs', sample: '10 µs' },
  price: { expected: 'a price', unit: 'currency', dimensions: ['currency'], plausible: [1e-6, 1e6], usual: 'USD', sample: '0.42 USD' },
  count: { expected: 'a count', unit: '1', dimensions: [], plausible: [1, 1e6], unitless: true, usual: '', sample: '2' },
  charge: { expected: 'a charge', unit: 'C', dimensions: ['Ah', 'C'], plausible: [1e-3, 1e7], usual: 'mAh', sample: '500 mAh' },
  share: { expected: 'a share of one', unit: '1', dimensions: ['1'], plausible: [1e-9, 1], unitless: true, usual: '%', sample: '0.3' },
  number: { expected: 'a plain number', unit: '1', dimensions: [], plausible: [1e-6, 1e6], unitless: true, usual: '', sample: '0.707' },
  angle: { expected: 'an angle', unit: '°', dimensions: ['°'], plausible: [1e-6, 360], signed: true, usual: '°', sample: '45°' },
};
