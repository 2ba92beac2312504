/** A number in the unit it is spoken in. */
export interface Spoken {
  readonly value: number;
  readonly unit: string;
}

/** Below this a ratio is nothing: −200 dB. */
const NOTHING = 1e-10;

/** Ratios of some checks are spoken in decibels or percent; all else as it is. */
export function spoken(check: string, value: number, unit: string): Spoken {
  if (check === 'distortion' || (check === 'noise' && unit === 'V/V')) return { value: 20 * Math.log10(Math.max(Math.abs(value), NOTHING)), unit: 'dB' };
  if (check === 'frequency-error') return { value: 100 * value, unit: '%' };
  return { value, unit };
}
