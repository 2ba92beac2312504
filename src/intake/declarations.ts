import type { Figure, Parameter } from '../parts/figures.js';
import { parseQuantity } from '../quantities/parse.js';

/** What the owner of a list states once for all of its parts; figures completed by it are assumed, never limits. */
export interface Declarations {
  /** Specified range of parts that state none, °C. */
  readonly temperature?: readonly [number, number];
  /** Temperature of offset figures that state none: a number of °C, or `over`. */
  readonly offsetVoltage?: number | 'over';
  readonly biasCurrent?: number | 'over';
  /** Temperature of all other figures that state none. */
  readonly limits?: number | 'over';
  readonly by?: string;
  /** ISO 8601. */
  readonly date?: string;
}

export type DeclarationResult = { readonly ok: true; readonly declarations: Declarations } | { readonly ok: false; readonly reason: string; readonly fix: string };

const NAMES = ['temperature', 'offsetVoltage', 'biasCurrent', 'limits', 'by', 'date'] as const;

/** Reads `temperature=-40..85 °C`, `offsetVoltage=25 °C`, `limits=over temperature`, `by=NAME`, `date=2024-02-17`. */
export function readDeclarations(texts: readonly string[]): DeclarationResult {
  let declarations: Declarations = {};
  for (const text of texts) {
    const [, key = '', value = ''] = /^\s*([^=]*?)\s*=\s*(.*?)\s*$/su.exec(text) ?? [];
    const name = NAMES.find((one) => one === key);
    const read = name === undefined || value === '' ? null : readOne(name, value);
    if (read === null) return { ok: false, reason: `"${text}" declares nothing that is known: ${NAMES.join(', ')}`, fix: 'temperature="-40..85 °C"' };
    declarations = { ...declarations, ...read };
  }
  return { ok: true, declarations };
}

function readOne(name: (typeof NAMES)[number], value: string): Declarations | null {
  if (name === 'by') return { by: value };
  if (name === 'date') return /^\d{4}-\d{2}-\d{2}$/u.test(value) ? { date: value } : null;
  if (name !== 'temperature') return /^over(?:\s+temp(?:erature)?)?$/iu.test(value) ? { [name]: 'over' } : single(name, value);
  const result = parseQuantity(value, 'temperature');
  const { min, max } = result.ok ? result.quantity : {};
  return min === undefined || max === undefined ? null : { temperature: [min, max] };
}

function single(name: 'offsetVoltage' | 'biasCurrent' | 'limits', value: string): Declarations | null {
  const result = parseQuantity(value.replace(/^at\s+/iu, ''), 'temperature');
  return result.ok && result.quantity.nominal !== undefined ? { [name]: result.quantity.nominal } : null;
}

/** The declarations as they were given: `temperature -40..85 °C, offsetVoltage at 25 °C, by A. Owner, 2024-02-17`. */
export function declarationWords({ temperature, offsetVoltage, biasCurrent, limits, by, date }: Declarations): string {
  const at = (value: number | 'over'): string => (value === 'over' ? 'over temperature' : `at ${value} °C`);
  return [
    ...(temperature === undefined ? [] : [`temperature ${temperature[0]}..${temperature[1]} °C`]),
    ...(offsetVoltage === undefined ? [] : [`offset voltage ${at(offsetVoltage)}`]),
    ...(biasCurrent === undefined ? [] : [`bias current ${at(biasCurrent)}`]),
    ...(limits === undefined ? [] : [`limits ${at(limits)}`]),
    ...(by === undefined ? [] : [`by ${by}`]),
    ...(date === undefined ? [] : [date]),
  ].join(', ');
}

/** The figures of a part completed: a declared condition where none is stated, a declared range where there is none. All marked assumed. */
export function declared(figures: readonly Figure[], declarations: Declarations): Figure[] {
  const completed = figures.map((figure) => withTemperature(figure, declarations));
  const { temperature } = declarations;
  if (temperature === undefined || figures.some(({ parameter }) => parameter === 'temperature')) return completed;
  const [min, max] = temperature;
  const range = (kind: 'min' | 'max', value: number): Figure => ({ parameter: 'temperature', kind, value, condition: {}, assumed: true });
  return [...completed, range('min', min), range('max', max)];
}

/** Parameters that are the same at any temperature, or say one themselves. */
const TIMELESS: ReadonlySet<Parameter> = new Set(['supplyVoltage', 'supplyAbsoluteMaximum', 'temperature', 'junctionTemperature', 'thermalResistance', 'minimumStableGain', 'offsetDrift']);

function withTemperature(figure: Figure, { offsetVoltage, biasCurrent, limits }: Declarations): Figure {
  const { parameter, condition } = figure;
  if (condition.temperature !== undefined || TIMELESS.has(parameter)) return figure;
  const stated = parameter === 'offsetVoltage' ? offsetVoltage : parameter === 'biasCurrent' || parameter === 'offsetCurrent' ? biasCurrent : limits;
  const usual = parameter === 'offsetVoltage' || parameter === 'biasCurrent' || parameter === 'offsetCurrent' ? 25 : 'over';
  // What is declared is what holds anyway: nothing is added to the figure.
  if (stated === undefined || stated === usual) return figure;
  const { gain, ...rest } = condition;
  return { ...figure, condition: { ...rest, temperature: stated, ...(gain === undefined ? {} : { gain }) }, assumed: true };
}
