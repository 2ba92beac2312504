import { formatQuantity } from './format.js';
import { toNumber } from './decimal.js';
import { DIMENSIONS } from './dimensions.js';
import { readNumber } from './number.js';
import type { Figure } from './syntax.js';
import { patched, type Reading } from './reading.js';
import { Refusal } from './refusal.js';
import { suggest } from './suggest.js';
import type { UnitReading } from './unit-reading.js';
import { readUnit } from './units.js';

/** Refuses a unit that is not read (Q011), naming the ones people write out of habit. */
export function unknownUnit(figure: Figure, reading: Reading): never {
  const typed = (figure.unit?.text ?? figure.number.text).replaceAll(' ', '');
  const where = figure.unit ?? figure.number;
  refuseTwoPrefixes(typed, figure, reading);
  const { message, replacement } = explain(typed, figure, reading);
  const fix = replacement === null ? undefined : patched(reading, figure, replacement);
  throw new Refusal(refusalCode(typed, reading), message, { start: where.start, end: where.end, fix });
}

function refusalCode(typed: string, reading: Reading): string {
  if (/^dbv$/i.test(typed)) return 'Q003';
  return reading.kind === 'amplitude' && /v(?:ac)?$/i.test(typed) ? 'Q014' : 'Q011';
}

/** `kMΩ`, `µµF`: two prefixes on one unit. Lengths (mm, km) are not meant. */
function refuseTwoPrefixes(typed: string, figure: Figure, reading: Reading): void {
  const [, first = '', rest = ''] = /^([fpnuµmkKMGT])([fpnuµkKMGTm].*)$/.exec(typed) ?? [];
  if (first === '' || /^[mkµnK]m$/.test(typed) || readUnit(rest, reading.kind) === null) return;
  const where = figure.unit ?? figure;
  throw new Refusal('Q012', `${typed} has two prefixes, ${first} and ${rest.charAt(0)}`, { start: where.start, end: where.end });
}

interface Explanation {
  readonly message: string;
  readonly replacement: string | null;
}

function explain(unit: string, figure: Figure, reading: Reading): Explanation {
  const number = figure.sign + figure.number.text;
  if (/^(?:°|deg)?(?:F|[fF]ahrenheit)$/.test(unit)) return fahrenheit(figure, reading);
  if (unit === 'E') return { message: 'E is not a unit here (it starts an exponent)', replacement: reading.kind === 'resistance' ? `${number} Ω or ${number}R` : null };
  if (/^dbm$/i.test(unit)) return { message: 'dBm is a power, not a ratio or an amplitude', replacement: reading.kind === 'amplitude' ? `${number} dBV` : `${number} dB` };
  if (/^dbv$/i.test(unit)) return { message: `${unit} is dBV (against 1 V) or, as an old spelling, dBu (against 0.775 V)`, replacement: `${number} dBV` };
  const volts = reading.kind === 'amplitude' ? /^(.*V)ac$/i.exec(unit)?.[1] : undefined;
  if (volts !== undefined) return { message: `${unit} does not say peak, peak-to-peak or rms`, replacement: `${number} ${volts}pk` };
  if (unit === 'rpm') return rpm(figure, reading);
  if (unit.endsWith("$")) return { message: `${unit} does not say which currency: an ISO 4217 code does`, replacement: reading.kind === 'price' ? `${number} USD` : null };
  // Any letter is one slip away from a unit of one letter; that is no likeness.
  const near = suggest(unit, [reading.rule.usual, ...(COMMON[reading.kind] ?? [])].filter((word) => Math.min(word.length, unit.length) > 1));
  const typed = figure.unit === null ? figure.number.text : unit;
  return { message: `unknown unit ${typed} where ${reading.rule.expected} is expected`, replacement: near[0] === undefined ? null : `${number} ${near[0]}` };
}

const COMMON: Partial<Record<Reading['kind'], readonly string[]>> = {
  supply: ['mV'],
  voltage: ['mV', 'µV'],
  offset_limit: ['µV', 'V'],
  amplitude: ['Vpp', 'Vrms', 'mVpk', 'mVpp', 'mVrms'],
  current: ['mA', 'nA', 'pA', 'A'],
  resistance: ['kΩ', 'MΩ', 'ohm', 'kohm', 'Mohm'],
  capacitance: ['nF', 'µF', 'F'],
  frequency: ['kHz', 'MHz', 'mHz'],
  gbw: ['kHz', 'Hz', 'GHz'],
  slew: ['V/ms', 'mV/µs', 'V/us'],
  vnoise: ['µV/√Hz', 'nV/rtHz'],
  inoise: ['pA/√Hz', 'fA/rtHz'],
  price: ['EUR', 'GBP', 'CHF', 'JPY'],
  time: ['ms', 'ns', 's'],
  charge: ['Ah', 'µAh', 'A·s'],
};

function typedNumber(figure: Figure, reading: Reading): number {
  const { mantissa, exponent } = readNumber(figure.number.text, { start: figure.number.start, decimal: reading.context.decimal });
  return toNumber(mantissa, exponent) * (figure.sign === '-' ? -1 : 1);
}

function fahrenheit(figure: Figure, reading: Reading): Explanation {
  const message = '°F is not accepted';
  if (figure.number.type !== 'number') return { message, replacement: null };
  const celsius = ((typedNumber(figure, reading) - 32) * 5) / 9;
  if (!Number.isFinite(celsius)) return { message, replacement: null };
  const text = formatQuantity(celsius, '°C', { digits: 4 });
  // In a range the other end would be left in °F.
  const isAlone = reading.text.trim() === reading.text.slice(figure.start, figure.end);
  return { message: `${message}; ${reading.text.slice(figure.start, figure.end)} is ${text}`, replacement: isAlone ? text : null };
}

function rpm(figure: Figure, reading: Reading): Explanation {
  const hertz = figure.number.type === 'number' ? typedNumber(figure, reading) / 60 : Number.NaN;
  const isFrequency = reading.kind === 'frequency' || reading.kind === 'gbw';
  return { message: 'unknown unit rpm', replacement: isFrequency && Number.isFinite(hertz) ? formatQuantity(hertz, 'Hz', { digits: 4 }) : null };
}

/** Refuses a unit that measures something else (Q-19), with what is missing when that is plain. */
export function wrongKind(unit: UnitReading & { dimension: NonNullable<UnitReading['dimension']> }, figure: Figure, reading: Reading): never {
  const number = figure.sign + figure.number.text;
  const where = figure.unit ?? figure;
  const refuse = (code: string, message: string, replacement?: string): never => {
    throw new Refusal(code, message, { start: where.start, end: where.end, fix: replacement });
  };
  const { kind, rule } = reading;
  const given = DIMENSIONS[unit.dimension];
  const message = `${given} where ${rule.expected} is expected`;
  const whole = (text: string): string => patched(reading, figure, `${number} ${text}`);
  if (kind === 'amplitude' && unit.dimension === 'V') {
    refuse('Q014', `${number} ${unit.canonical} peak, peak-to-peak or rms?`, ['pk', 'pp', 'rms'].map((end) => whole(unit.canonical + end)).join(', ').replace(/, ([^,]*)$/, ' or $1'));
  }
  if ((kind === 'vnoise' || kind === 'inoise') && /^[VA]\/Hz$/.test(unit.dimension)) {
    const density = unit.canonical.replace('/Hz', '');
    refuse('Q004', `${figure.unit?.text ?? ''}: the square root is missing`, `${whole(`${density}/√Hz`)} or ${whole(`${density}/rtHz`)}`);
  }
  if (kind === 'vnoise' && unit.dimension === 'A/√Hz') refuse('Q011', 'current noise where voltage noise is expected');
  if (kind === 'inoise' && unit.dimension === 'V/√Hz') refuse('Q011', 'voltage noise where current noise is expected');
  if (kind === 'vnoise' && unit.dimension === 'V') refuse('Q004', message, `${whole(`${unit.canonical}/√Hz`)}; peak-to-peak noise has its own field`);
  if (kind === 'inoise' && unit.dimension === 'A') refuse('Q004', message, whole(`${unit.canonical}/√Hz`));
  if (kind === 'charge' && unit.dimension === 'A') refuse('Q004', message, whole(`${unit.canonical}h`));
  if (kind === 'slew' && unit.dimension === 'V') refuse('Q004', message, whole(`${unit.canonical}/µs`));
  if (kind === 'drift' && unit.dimension === 'V') refuse('Q004', message, whole(`${unit.canonical}/°C`));
  if (kind === 'tempco' && unit.dimension === '1') refuse('Q004', message, whole(`${unit.canonical}/°C`));
  if (kind === 'thermal' && (unit.dimension === 'K' || unit.dimension === '°C')) refuse('Q004', message, whole('K/W'));
  if (kind === 'temperature' && unit.dimension === '°') refuse('Q004', message, whole('°C'));
  if (unit.canonical === '%' && rule.dimensions.length > 0 && !DIMENSIONLESS.has(kind)) {
    refuse('Q021', 'a tolerance without a value', `${rule.sample} ±${figure.number.text} %`);
  }
  return refuse('Q004', message);
}

/** Kinds for which a percentage is not a tolerance that lost its value. */
const DIMENSIONLESS = new Set<string>(['gain', 'ratio', 'fraction', 'tempco', 'drift', 'temperature', 'price', 'count']);
