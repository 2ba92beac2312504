import type { Draft } from './draft.js';
import type { Interval, ReferenceSpec, Value } from './spec.js';
import { leafAt, refuse, refuseAbsent } from './refuse.js';
import { intervalOf, readQuantity, readValue } from './value.js';
import { field } from './schema.js';
import { unknownWord } from './words.js';

type Level = Pick<ReferenceSpec, 'kind' | 'value'>;

/** What the signal rests on: a word, a voltage with its ends, or a map with tolerance, resistance and bypass. */
export function readReference(draft: Draft): ReferenceSpec | undefined {
  const tolerance = readValue(draft, 'reference.tolerance');
  const resistance = readValue(draft, 'reference.resistance');
  const bypass = readValue(draft, 'reference.bypass');
  if (!draft.fields.has('reference.value')) return withoutValue(draft);
  const level = readLevel(draft);
  if (level === undefined) return undefined;
  const spread = withTolerance(draft, level, tolerance);
  if (spread === undefined) return undefined;
  return { ...spread, ...(resistance === undefined ? {} : { resistance }), ...(bypass === undefined ? {} : { bypass }) };
}

function withoutValue(draft: Draft): undefined {
  const written = [...draft.fields.keys()].some((path) => path === 'reference' || path.startsWith('reference.'));
  if (!written) return undefined;
  return refuseAbsent(draft, 'reference.value');
}

function readLevel(draft: Draft): Level | undefined {
  const text = leafAt(draft, 'reference.value')?.text.trim() ?? '';
  if (text === 'ground') return { kind: 'ground', value: { min: 0, nominal: 0, max: 0, text: 'ground' } };
  if (text === 'mid-supply') return { kind: 'mid-supply', value: { min: 1, nominal: 1, max: 1, text: 'mid-supply' } };
  if (/^mid-supply\b/.test(text)) return refuse(draft, 'reference.value', { code: 'S104', message: 'a tolerance of mid-supply is written as a map', fix: '{value: mid-supply, tolerance: 1 %}' });
  if (!/\d/.test(text)) return refuse(draft, 'reference.value', unknownWord(text, 'reference.value'));
  return readVoltage(draft);
}

function readVoltage(draft: Draft): Level | undefined {
  const quantity = readQuantity(draft, 'reference.value');
  if (quantity === undefined) return undefined;
  const value = intervalOf(quantity);
  if (value === undefined) return refuse(draft, 'reference.value', { code: 'S112', message: `${quantity.text} leaves an end open; accepted: ${field('reference.value').accepted}`, fix: '2.5 V ± 1 %' });
  const isGround = value.min === 0 && value.max === 0;
  return isGround ? { kind: 'ground', value: { ...value, text: 'ground' } } : { kind: 'voltage', value };
}

function withTolerance(draft: Draft, level: Level, tolerance: Value | undefined): Level | undefined {
  if (tolerance === undefined) return level;
  if (level.kind === 'ground') return refuse(draft, 'reference.tolerance', { code: 'S108', message: 'ground has no tolerance: it is where voltages are counted from', fix: 'leave it out' });
  if (level.value.min !== level.value.max) return refuse(draft, 'reference.tolerance', { code: 'S109', message: `the tolerance is written twice: reference.value is ${level.value.text} already`, fix: 'leave one of the two out' });
  return { ...level, value: spread(level.value, tolerance) };
}

function spread({ nominal, text }: Interval, tolerance: Value): Interval {
  const [low, high] = [nominal * (1 - tolerance.value), nominal * (1 + tolerance.value)];
  return { min: Math.min(low, high), nominal, max: Math.max(low, high), text: `${text} ±${tolerance.text}` };
}
