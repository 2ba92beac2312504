import type { FieldKind } from '../quantities/kinds.js';
import { parseQuantity } from '../quantities/parse.js';
import type { Problem } from '../quantities/problem.js';
import type { Quantity } from '../quantities/quantity.js';
import { fieldAt } from './schema.js';
import type { FieldRow } from './field.js';
import type { Override, StageSpec } from './spec.js';
import { isBand, standsAt, type Band } from './stands-at.js';
import { unknownPath } from './unknown-key.js';

/** A field that is swept: from one value to another, in `unit`, with what becomes of the ends it has in the stage. */
export interface SweptField {
  /** Dotted path in the stage file. */
  readonly path: string;
  readonly from: number;
  readonly to: number;
  readonly kind: FieldKind;
  /** Unit of the values, SI; dB for ratios. */
  readonly unit: string;
  readonly keeps: Kept;
}

/** How one value becomes the field: alone; as the upper end above the lower one; or with the tolerance the stage has (fractions). */
export type Kept =
  | { readonly kind: 'nothing'; readonly replaced: string | null }
  | { readonly kind: 'lower-end'; readonly lower: number }
  | { readonly kind: 'tolerance'; readonly below: number; readonly above: number };

export type SweptResult = { readonly ok: true; readonly field: SweptField } | { readonly ok: false; readonly problems: readonly Problem[] };

const OPTION = '--over';
/** Names the options have. */
const SHORT: Readonly<Record<string, string>> = { frequency: 'signal.frequency', input: 'signal.input', load: 'load.resistance', reference: 'reference.value', source: 'source.resistance' };

/** Reads `PATH=A..B`; `spec` is the stage that is swept, which says what ends the field has (null: not known yet). */
export function readSwept(text: string, spec: StageSpec | null): SweptResult {
  const at = text.indexOf('=');
  if (at <= 0) return refuse(`${text}: no field and range`, `${OPTION} supply=2.7V..5.5V`);
  const name = text.slice(0, at).trim();
  const path = SHORT[name] ?? name;
  const unknown = unknownPath(path);
  if (unknown !== null) return { ok: false, problems: [{ code: unknown.code, severity: 'error', message: unknown.message, ...(unknown.fix === undefined ? {} : { fix: unknown.fix }), place: { path: OPTION } }] };
  const row = fieldAt(path);
  const kind = row?.kind;
  if (row === undefined || kind === undefined || kind === 'count') return refuse(`${path} has no values between two others; what is swept is a quantity`, `${OPTION} limits.dcError="5 mV..50 mV"`);
  return readEnds({ path, row, kind, typed: text.slice(at + 1).trim() }, spec);
}

interface Asked {
  readonly path: string;
  readonly row: FieldRow;
  readonly kind: FieldKind;
  readonly typed: string;
}

function readEnds({ path, row, kind, typed }: Asked, spec: StageSpec | null): SweptResult {
  if (kind === 'ratio') return readDecibels(path, typed);
  const read = parseQuantity(typed, kind, { rms: path === 'limits.outputNoise' });
  if (!read.ok) return { ok: false, problems: [{ ...read.problem, severity: 'error', text: typed, place: { path: OPTION } }] };
  const { quantity } = read;
  const { min, max, tolerance, limit } = quantity;
  if (min === undefined || max === undefined || min >= max || tolerance === true || limit !== undefined) return refuse(`${path}=${typed}: two values are needed, the lower first`, example(path, row, quantity));
  return { ok: true, field: { path, kind, from: min, to: max, unit: unitOf(path, quantity), keeps: keptOf(path, spec) } };
}

/** Signal to noise and distortion are swept as they are spoken: in decibels. */
function readDecibels(path: string, typed: string): SweptResult {
  const ends = /^([-−+]?[\d.]+)\s*(?:dB)?\s*\.\.\s*([-−+]?[\d.]+)\s*dB$/u.exec(typed)?.slice(1).map((end) => Number(end.replace('−', '-')));
  const [from = Number.NaN, to = Number.NaN] = ends ?? [];
  const sample = path === 'limits.snr' ? '60..80 dB' : '-80..-50 dB';
  if (!(from < to)) return refuse(`${path}=${typed}: two values in dB are needed, the lower first`, `${OPTION} ${path}="${sample}"`);
  return { ok: true, field: { path, kind: 'ratio', from, to, unit: 'dB', keeps: { kind: 'nothing', replaced: null } } };
}

const example = (path: string, row: FieldRow, { nominal, echo }: Quantity): string =>
  `${OPTION} ${path}="${nominal === undefined || nominal <= 0 ? row.example : `${echo.split(' (')[0] ?? ''}..…`}"`;

const unitOf = (path: string, { unit }: Quantity): string => (path === 'limits.outputNoise' ? 'Vrms' : unit);

/** What the ends of the field become, by what the stage has there. */
function keptOf(path: string, spec: StageSpec | null): Kept {
  const found = spec === null ? null : standsAt(spec, path);
  if (found === null || !isBand(found)) return { kind: 'nothing', replaced: null };
  if (isTolerance(found)) return { kind: 'tolerance', below: 1 - found.min / found.nominal, above: found.max / found.nominal - 1 };
  // A supply that falls from one end to the other is held against supplies that stand still.
  if (path === 'supply') return { kind: 'nothing', replaced: found.text };
  return { kind: 'lower-end', lower: found.min };
}

/** `5 V ± 5 %`, not `3 V..4.2 V`. */
function isTolerance(band: Band): band is Band & { readonly nominal: number } {
  return band.nominal !== null && band.nominal > 0 && /[±%]/u.test(band.text);
}

/** The field at one value, as `--set` takes it. */
export function sweptOverride(field: SweptField, value: number): Override {
  return { path: field.path, text: sweptText(field, value), option: `${OPTION} ${field.path}` };
}

function sweptText(field: SweptField, value: number): string {
  const { keeps } = field;
  const print = (one: number): string => quantityText(field, one);
  if (keeps.kind === 'lower-end') return `${print(keeps.lower)}..${print(value)}`;
  if (keeps.kind === 'nothing') return print(value);
  const [above, below] = [percent(keeps.above), percent(keeps.below)];
  return `${print(value)} ${above === below ? `± ${above}` : `+${above}/-${below}`} %`;
}

/** A number and its unit as the stage file takes them. */
function quantityText({ kind, unit }: SweptField, value: number): string {
  if (kind === 'fraction' || kind === 'share') return `${percent(value)} %`;
  return kind === 'gain' || kind === 'number' ? String(value) : `${value} ${unit}`;
}

/** Without the noise of binary fractions. */
const percent = (fraction: number): string => String(Number((100 * fraction).toPrecision(15)));

function refuse(message: string, fix: string): SweptResult {
  return { ok: false, problems: [{ code: 'C114', severity: 'error', message, fix, place: { path: OPTION } }] };
}
