import type { Parameter } from '../parts/figures.js';
import { PARAMETERS } from '../parts/figures.js';
import type { CellFault } from './cell-fault.js';

// Figures that may be below zero: an input may go beyond its rail, and a temperature below freezing.
const SIGNED: ReadonlySet<Parameter> = new Set(['inputLowHeadroom', 'inputHighHeadroom', 'inputCrossover', 'temperature']);

// Figures that may be zero without being negative: a load that pulls to the rail itself, no 1/f corner.
const MAY_BE_ZERO: ReadonlySet<Parameter> = new Set(['outputLowHeadroom', 'outputHighHeadroom', 'noiseCorner']);

// Printed with the sign of a direction; the figure is the magnitude.
const MAGNITUDE: ReadonlySet<Parameter> = new Set(['biasCurrent', 'offsetCurrent', 'offsetVoltage', 'offsetDrift']);

export type PossibleResult =
  | { readonly ok: true; readonly value: number; readonly note?: string }
  | { readonly ok: false; readonly fault: CellFault };

/** The number as it is kept, or why no amplifier can have it. `value` is in the SI unit of the parameter. */
export function possible(parameter: Parameter, value: number): PossibleResult {
  // -0 and 0 are the same figure and must be the same bytes.
  if (SIGNED.has(parameter)) return { ok: true, value: value === 0 ? 0 : value };
  if (value === 0) return MAY_BE_ZERO.has(parameter) ? { ok: true, value: 0 } : { ok: false, fault: zeroFault(parameter) };
  const most = MOST[parameter];
  if (most !== undefined && value > most.value) return { ok: false, fault: tooLarge(value, most) };
  if (parameter === 'minimumStableGain' && value < 1) return { ok: false, fault: gainFault() };
  if (value > 0) return { ok: true, value };
  if (MAGNITUDE.has(parameter)) return { ok: true, value: -value, note: 'the sign is a direction; the magnitude is kept' };
  return { ok: false, fault: { code: 'I504', reason: `${PARAMETERS[parameter].words} cannot be below zero`, fix: 'the magnitude' } };
}

/** More than this no amplifier has; wide, to catch a wrong prefix (common practice). */
const MOST: Readonly<Partial<Record<Parameter, { readonly value: number; readonly unit: string; readonly scale: number; readonly words: string }>>> = {
  quiescentCurrent: { value: 0.1, unit: 'mA', scale: 1e3, words: ' per channel' },
  supplyVoltage: { value: 200, unit: 'V', scale: 1, words: ' of supply' },
  offsetVoltage: { value: 1, unit: 'V', scale: 1, words: ' of offset' },
};

function tooLarge(value: number, { unit, scale, words, value: most }: { readonly value: number; readonly unit: string; readonly scale: number; readonly words: string }): CellFault {
  const fix = `${Number((value * scale / 1000).toPrecision(12))} ${unit}, or another unit in the header`;
  return { code: 'Q010', reason: `${Number((value * scale).toPrecision(12))} ${unit}${words} is more than any amplifier has (limit ${most * scale} ${unit})`, fix };
}

function zeroFault(parameter: Parameter): CellFault {
  const words = PARAMETERS[parameter].words;
  return { code: 'I505', reason: `${words} of 0 is not possible; it would decide checks it knows nothing about`, fix: 'empty if unknown' };
}

function gainFault(): CellFault {
  return { code: 'I505', reason: 'a noise gain below 1 does not exist', fix: '1' };
}
