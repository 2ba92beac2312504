import { toNumber } from './decimal.js';
import type { ReadFigure } from './figure.js';
import { formatPercent } from './format.js';
import { isPlausible } from './plausibility.js';
import { patched, type Reading } from './reading.js';
import { Refusal } from './refusal.js';
import type { KnownUnit } from './unit-acceptance.js';
import { valueIn } from './unit-acceptance.js';
import { readUnit } from './units.js';

/** Supplies the unit of a figure that has none or only a prefix (rule Q-8): header, zero, unitless kind, bare prefix. Throws Refusal. */
export function supplyUnit(read: ReadFigure, reading: Reading): KnownUnit {
  const { unit } = read;
  if (unit?.dimension != null) return { ...unit, dimension: unit.dimension };
  if (unit === null) return withoutPrefix(read, reading);
  if (reading.header !== null) return onHeader(read, reading);
  const { rule } = reading;
  const spelledOut = unit.prefix.length > 1;
  if (/^[mM]$/.test(unit.prefix) && (rule.unit !== '1' || reading.kind === 'count' || reading.kind === 'fraction')) refuseBareM(read, reading);
  const allowed = rule.barePrefixes?.includes(unit.canonical) ?? (rule.unitless === true && rule.unit === 'V/V' && unit.exponent > 0);
  if (unit.refusedPrefix) refusePetaAlone(read, reading);
  if (!allowed && !(spelledOut && reading.kind === 'resistance')) refuseNone(read, reading);
  return { ...unit, dimension: rule.dimensions[0] ?? '1', canonical: unit.canonical + rule.unit };
}

function withoutPrefix(read: ReadFigure, reading: Reading): KnownUnit {
  const { rule, header, kind } = reading;
  if (header?.dimension != null) return { ...header, dimension: header.dimension };
  const isZero = /^[0.]*$/.test(read.number.mantissa);
  const zeroIsEnough = isZero && kind !== 'temperature' && kind !== 'price';
  const base = zeroIsEnough || rule.unitless ? baseUnit(reading) : null;
  return base ?? refuseNone(read, reading);
}

function baseUnit({ rule }: Reading): KnownUnit {
  return { dimension: rule.dimensions[0] ?? '1', exponent: 0, canonical: rule.unit, prefix: '', notes: [] };
}

/** A prefix in the cell scales a plain header unit; on top of a prefixed one it makes two scale factors. */
function onHeader(read: ReadFigure, reading: Reading): KnownUnit {
  const { header } = reading;
  const { unit, figure } = read;
  if (header?.dimension == null || unit === null) return refuseNone(read, reading);
  if (header.exponent === 0 && /^[VAΩFHsWSJ]/.test(header.canonical)) {
    return { ...header, ...unit, dimension: header.dimension, canonical: unit.canonical + header.canonical };
  }
  const typed = reading.text.slice(figure.start, figure.end);
  const scaled = toNumber(read.number.mantissa, read.number.exponent + unit.exponent);
  const isLikely = isPlausible(valueIn(header.canonical, { ...read, number: { ...read.number, exponent: read.number.exponent + unit.exponent } }, reading), reading.kind);
  const fix = `${figure.sign}${isLikely ? scaled : figure.number.text} ${header.canonical}`;
  throw new Refusal('Q012', `${typed}: ${unit.prefix} on top of the header unit ${header.canonical} makes two scale factors`, {
    start: figure.unit?.start ?? figure.start,
    end: figure.end,
    fix: patched(reading, figure, fix),
  });
}

/** Rule Q-8: both readings in numbers, and what to type for each that is plausible. */
function refuseBareM(read: ReadFigure, reading: Reading): never {
  const { figure } = read;
  const { kind, rule } = reading;
  const number = `${figure.sign}${figure.number.text}`;
  const typed = reading.text.slice(figure.start, figure.end);
  const symbol = kind === 'amplitude' ? 'Vpk' : (rule.dimensions[0] ?? '');
  const spellings = ['M', 'm'].map((letter) => ({ letter, text: `${number} ${letter}${symbol}` }));
  const known = readUnit(`m${symbol}`, kind) !== null;
  const plausible = spellings.filter(({ letter }) => known && isPlausible(valueIn(letter + symbol, read, reading), kind));
  const texts = plausible.map(({ text }) => text);
  if (kind === 'resistance' && texts.length > 1) texts.splice(1, 0, `${number}meg`);
  const fixes = (texts.length > 0 ? texts : usualTexts(number, reading)).map((text) => patched(reading, figure, text));
  const named = kind === 'resistance' ? `SI and IEC 60062 read mega (${number} MΩ), SPICE reads milli (${number} mΩ)` : 'SPICE reads milli, SI reads mega';
  throw new Refusal('Q002', `${typed} has no unit: ${named}`, { start: figure.unit?.start ?? figure.start, end: figure.end, fix: listed(fixes) });
}

function refusePetaAlone(read: ReadFigure, reading: Reading): never {
  const { figure } = read;
  const fix = patched(reading, figure, `${figure.sign}${figure.number.text} p${reading.rule.dimensions[0] ?? ''}`);
  throw new Refusal('Q003', 'P is peta (1e15) in SI', { start: figure.unit?.start ?? figure.start, end: figure.end, fix });
}

function refuseNone(read: ReadFigure, reading: Reading): never {
  const { figure, unit } = read;
  const { kind, rule } = reading;
  const number = `${figure.sign}${figure.number.text}`;
  const typed = reading.text.slice(figure.start, figure.end);
  const scaled = unit === null ? usualTexts(number, reading) : [`${number} ${unit.canonical}${rule.dimensions[0] ?? ''}`];
  const fix = listed(scaled.map((text) => patched(reading, figure, text)));
  if (kind === 'price') {
    throw new Refusal('Q001', `${typed} has no currency`, { start: figure.start, end: figure.end, fix: `${fix}, or set a default currency` });
  }
  if (rule.unit === '1' && kind !== 'fraction' && unit !== null) {
    const value = toNumber(read.number.mantissa, read.number.exponent + unit.exponent);
    const plain = kind !== 'count' || Number.isInteger(value) ? String(value) : undefined;
    throw new Refusal('Q011', `${unit.prefix} is not read on ${rule.expected}`, { start: figure.unit?.start ?? figure.start, end: figure.end, fix: plain });
  }
  const which = kind === 'ratio' ? ': dB or V/V?' : `; ${rule.expected} is expected`;
  throw new Refusal('Q001', `${typed} has no unit${which}`, { start: figure.start, end: figure.end, fix });
}

function usualTexts(number: string, { kind, rule, context }: Reading): string[] {
  if (kind === 'amplitude') return [`${number} Vpk`, `${number} Vpp`, `${number} Vrms`];
  if (kind === 'fraction' && /^0?\.\d+$/.test(number)) return [formatPercent(Number(number), { digits: 12 }), `${number} %`];
  if (kind === 'ratio' && /^[\d.]+(?:[eE]\d+)?$/.test(number) && Number(number) > 200) return [`${number} V/V`];
  if (kind !== 'resistance') return [rule.usual === '' ? number : `${number} ${rule.usual}`];
  const plain = /^\d+$/.test(number) && context.decimal !== 'comma' ? Number(number) : 0;
  if (plain < 1000) return /^\d+$/.test(number) ? [`${number} Ω`, `${number}R`] : [`${number} Ω`];
  const kilo = String(plain / 1000);
  return kilo.includes('.') ? [`${number} Ω`, `${kilo}k`, kilo.replace('.', 'k')] : [`${number} Ω`, `${kilo}k`];
}

const listed = (texts: readonly string[]): string => texts.join(', ').replace(/, ([^,]*)$/, ' or $1');
