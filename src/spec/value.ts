import type { FieldKind } from '../quantities/kinds.js';
import { parseQuantity } from '../quantities/parse.js';
import type { Quantity, QuantityProblem, ReadingContext } from '../quantities/quantity.js';
import type { Draft } from './draft.js';
import type { Bounds } from './field.js';
import type { Complaint } from './problems.js';
import { leafAt, refuse } from './refuse.js';
import { field } from './schema.js';
import type { Interval, Swing, Value } from './spec.js';

/** A field read as one figure, within its bounds; undefined when absent or refused (the problem is then noted). */
export function readValue(draft: Draft, path: string, as: ReadAs = {}): Value | undefined {
  const read = readQuantity(draft, path, as);
  return read === undefined ? undefined : valueFrom(draft, path, read);
}

/** The one figure of a quantity; undefined with the problem noted when it has ends or is impossible. */
export function valueFrom(draft: Draft, path: string, read: Quantity): Value | undefined {
  const value = isOpen(read) ? limitOf(read, path) : isSpread(read) ? undefined : read.nominal;
  if (value === undefined) return refuse(draft, path, isOpen(read) ? openEnd(read, path) : spread(read, path));
  return withinBounds(draft, path, [value]) ? { value, text: plainEcho(read) } : undefined;
}

/** A field read as a figure with its ends: one value, a tolerance or a range. The middle of a range is its nominal. */
export function readInterval(draft: Draft, path: string): Interval | undefined {
  const read = readQuantity(draft, path);
  if (read === undefined) return undefined;
  const interval = intervalOf(read);
  if (interval === undefined) return refuse(draft, path, openEnd(read, path));
  return withinBounds(draft, path, [interval.min, interval.max]) ? interval : undefined;
}

/** A field read as the extremes of a signal; one value is a signal that stands still. */
export function readSwing(draft: Draft, path: string): Swing | undefined {
  const interval = readInterval(draft, path);
  return interval === undefined ? undefined : { min: interval.min, max: interval.max, text: interval.text };
}

/** A field that needs two figures that differ; `what` names them. */
export function readRange(draft: Draft, path: string, what: string): Swing | undefined {
  const read = readSwing(draft, path);
  if (read === undefined || read.min < read.max) return read;
  const { accepted, example } = field(path);
  return refuse(draft, path, { code: 'S112', message: `${read.text} is one figure where ${what} are expected; accepted: ${accepted}`, fix: example });
}

export interface ReadAs {
  readonly kind?: FieldKind;
  readonly context?: ReadingContext;
  /** Rewrites the text before it is read, keeping every character's place (a leading ± is blanked). */
  readonly prepare?: (text: string) => string;
}

/** The quantity in a field, or undefined with the problem noted. */
export function readQuantity(draft: Draft, path: string, as: ReadAs = {}): Quantity | undefined {
  const leaf = leafAt(draft, path);
  if (leaf === undefined) return undefined;
  const kind = as.kind ?? field(path).kind ?? 'voltage';
  const text = (as.prepare ?? defaultPreparation(kind))(leaf.text);
  const result = parseQuantity(text, kind, as.context);
  if (!result.ok) return refuse(draft, path, { ...(impossible(result.problem, leaf.text, path) ?? withHelp(result.problem, path)), span: result.problem.span });
  const { note, echo } = result.quantity;
  if (note !== undefined) draft.notes.push(`${path} ${leaf.text}: read as ${echo} (${note})`);
  return result.quantity;
}

/** Both ends; undefined when the text leaves one open. */
export function intervalOf(quantity: Quantity): Interval | undefined {
  if (isOpen(quantity)) return undefined;
  const { nominal, echo } = quantity;
  const min = quantity.min ?? nominal;
  const max = quantity.max ?? nominal;
  if (min === undefined || max === undefined) return undefined;
  return { min, nominal: nominal ?? (min + max) / 2, max, text: echo };
}

/** Notes S110 for a figure no stage can have; true when all are possible. */
export function withinBounds(draft: Draft, path: string, figures: readonly number[]): boolean {
  const { bounds, example } = field(path);
  if (bounds === undefined || figures.every((figure) => isWithin(figure, bounds))) return true;
  refuse(draft, path, { code: 'S110', message: `${leafAt(draft, path)?.text ?? ''}: ${bounds.why}`, fix: example });
  return false;
}

function isWithin(figure: number, { above, from, below, to }: Bounds): boolean {
  return (above === undefined || figure > above) && (from === undefined || figure >= from) && (below === undefined || figure < below) && (to === undefined || figure <= to);
}

/** `max 5 mV`, `±300 µV`: one end only. */
function isOpen({ limit, nominal, min, max }: Quantity): boolean {
  return limit !== undefined || (nominal === undefined && (min === undefined || max === undefined));
}

function isSpread({ min, max }: Quantity): boolean {
  return min !== undefined || max !== undefined;
}

/** The bound, where the field takes one of this side. */
function limitOf(quantity: Quantity, path: string): number | undefined {
  const { limit } = field(path);
  if (limit === undefined || (quantity.limit !== undefined && quantity.limit !== limit)) return undefined;
  return quantity[limit];
}

function spread(quantity: Quantity, path: string): Complaint {
  const { accepted, example } = field(path);
  const wording = quantity.tolerance === true ? 'carries a tolerance' : 'is a range';
  return { code: 'S112', message: `${quantity.text.trim()} ${wording}; accepted: ${accepted}`, fix: withoutTolerance(quantity) ?? example };
}

function openEnd(quantity: Quantity, path: string): Complaint {
  const { accepted, example } = field(path);
  if (quantity.limit === 'typ') return { code: 'S112', message: `${quantity.text.trim()} is only typical; a stage says what it must stand`, fix: example };
  const side = quantity.limit === 'min' || quantity.max === undefined ? 'upper' : 'lower';
  return { code: 'S112', message: `${quantity.text.trim()} leaves the ${side} end open; accepted: ${accepted}`, fix: example };
}

/** `4.7 kΩ ±5 %` → `4.7 kΩ`. */
function withoutTolerance(quantity: Quantity): string | undefined {
  return quantity.tolerance === true ? /^(.*?) [±+]/.exec(quantity.echo)?.[1] : undefined;
}

/** The echo of the figure itself: `at most 5 mV` → `5 mV`. */
function plainEcho(quantity: Quantity): string {
  return quantity.echo.replace(/^(?:magnitude )?at (?:most|least) /, '');
}

/** A sign, a zero or a whole hundred percent that the field can never have: the reason of the field says more than a plausible range. */
function impossible(problem: QuantityProblem, text: string, path: string): Complaint | null {
  const { bounds, example, kind } = field(path);
  const meant = text.slice(...problem.span);
  const isOut = problem.code === 'Q010' && (kind === 'fraction' || kind === 'share' || !/[1-9]/.test(meant));
  if (bounds === undefined || (problem.code !== 'Q019' && !isOut)) return null;
  return { code: 'S110', message: `${meant}: ${bounds.why}`, fix: problem.code === 'Q019' ? (problem.fix ?? example) : example };
}

/** What is accepted and an example, where the quantity itself has no fix to offer. */
function withHelp(problem: QuantityProblem, path: string): Complaint {
  if (problem.fix !== undefined) return { code: problem.code, message: problem.message, fix: problem.fix };
  const { accepted, example } = field(path);
  return { code: problem.code, message: `${problem.message}; accepted: ${accepted}`, fix: example };
}

/** A tolerance or an error limit may carry its sign: `±1 %`. */
function defaultPreparation(kind: FieldKind): (text: string) => string {
  if (kind !== 'fraction') return (text) => text;
  return (text) => text.replace(/^\s*(?:±|\+\/?-)\s*(?=[\d.])/, (sign) => ' '.repeat(sign.length));
}
