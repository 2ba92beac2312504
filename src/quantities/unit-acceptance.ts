import { toNumber } from './decimal.js';
import type { Dimension } from './dimensions.js';
import type { ReadFigure } from './figure.js';
import { convert } from './convert.js';
import { isPlausible } from './plausibility.js';
import { patched, type Reading } from './reading.js';
import { Refusal } from './refusal.js';
import { wrongKind } from './unit-refusals.js';
import type { UnitReading } from './unit-reading.js';
import { readUnit } from './units.js';

export type KnownUnit = UnitReading & { readonly dimension: Dimension };

/** Checks that a unit measures what the field holds and that its letter case leaves one reading. Throws Refusal. */
export function acceptUnit(unit: KnownUnit, read: ReadFigure, reading: Reading): KnownUnit {
  const accepted = asAccepted(unit, reading);
  if (accepted === null) return wrongKind(unit, read.figure, reading);
  if (unit.refusedPrefix) refusePeta(unit, read, reading);
  if (unit.alternatives !== undefined || (unit.wrongCase !== undefined && mOrM(unit))) refuseCase(unit, read, reading);
  return accepted;
}

/** The unit under which the kind takes it, or null: an rms voltage counts as a voltage only where the context says so. */
function asAccepted(unit: KnownUnit, reading: Reading): KnownUnit | null {
  if (reading.rule.dimensions.includes(unit.dimension)) return unit;
  // A count is a number alone; the unit 1 is supplied, never written.
  if (reading.rule.dimensions.length === 0 && unit.canonical === '1') return unit;
  const rms = reading.kind === 'voltage' && unit.dimension === 'Vrms' && reading.context.rms === true;
  return rms ? { ...unit, dimension: 'V' } : null;
}

const mOrM = (unit: KnownUnit): boolean => /^[mM]/.test(unit.prefix);

function refusePeta(unit: KnownUnit, read: ReadFigure, reading: Reading): never {
  const { figure } = read;
  const where = figure.unit ?? figure;
  throw new Refusal('Q003', `P in ${where === figure ? unit.canonical : figure.unit?.text} is peta (1e15) in SI`, {
    start: where.start,
    end: where.end,
    fix: patched(reading, figure, `${figure.sign}${figure.number.text} ${unit.canonical}`),
  });
}

function refuseCase(unit: KnownUnit, read: ReadFigure, reading: Reading): never {
  const { figure } = read;
  const where = figure.unit ?? figure;
  const right = unit.canonical.replace(/^[mM](?=\D)/, '');
  const doubt = mOrM(unit) ? `letter case is not reliable here, so ${unit.prefix.charAt(0)} may mean milli or mega` : 'it may also be a prefix';
  const message = `unit written ${unit.wrongCase}, not ${right}: ${doubt}`;
  const readings = plausibleSpellings(unit, read, reading);
  const fix = readings.map((spelling) => patched(reading, figure, spelling)).join(' or ');
  throw new Refusal('Q003', message, { start: where.start, end: where.end, fix: fix === '' ? undefined : fix });
}

/** The figure with m and with M before its unit, as far as each is plausible; both when neither is. */
export function plausibleSpellings(unit: KnownUnit, read: ReadFigure, reading: Reading): string[] {
  const number = `${read.figure.sign}${read.figure.number.text}`;
  const bare = unit.canonical.replace(/^[mM](?=[VAΩFHsWSJC])/, '');
  const spellings = unit.alternatives ?? ['M', 'm'].map((letter) => (bare === unit.canonical && !/^[mM]/.test(unit.prefix) ? unit.canonical : letter + bare));
  const plausible = spellings.filter((spelling) => isPlausible(valueIn(spelling, read, reading), reading.kind));
  return (plausible.length > 0 ? plausible : spellings).map((spelling) => `${number} ${spelling}`);
}

/** The figure's number read with another unit, in the kind's SI unit; NaN when the unit is none. */
export function valueIn(spelling: string, read: ReadFigure, reading: Reading): number {
  const unit = readUnit(spelling, reading.kind);
  if (unit?.dimension == null) return Number.NaN;
  const size = toNumber(read.number.mantissa, read.number.exponent + unit.exponent);
  return convert(read.figure.sign === '-' ? -size : size, unit.dimension, reading.kind);
}
