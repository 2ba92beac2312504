import type { FieldRow } from './field.js';
import { acceptedKeys, field, FIELDS } from './schema.js';
import { inOneLine } from './one-line.js';
import { belongsTo, ONE_INPUT } from './ownership.js';
import type { SignalSpec, Topology } from './spec.js';

/** A field as a draft writes it: in one line (live or left out), as a block of further fields, or told as something that goes with another one. */
export type DraftField =
  | { readonly kind: 'line'; readonly row: FieldRow; readonly text: string; readonly isLive: boolean; readonly parts: readonly FieldRow[] }
  | { readonly kind: 'block'; readonly row: FieldRow; readonly fields: readonly DraftField[] }
  | { readonly kind: 'told'; readonly rows: readonly FieldRow[]; readonly lead: string };

export interface DraftPlan {
  readonly topology: Topology;
  readonly coupling: SignalSpec['coupling'];
  /** Texts by dotted path: what is written, and examples for what is not. */
  readonly live: ReadonlyMap<string, string>;
  readonly examples: Readonly<Record<string, string>>;
}

/** The top level of a draft, in the order of the table of fields. */
export function draftKeysOf(plan: DraftPlan): readonly DraftField[] {
  return fieldsAt('', plan);
}

/** Maps whose keys each stand alone; of the others some keys need another one, so they are written in one line. */
const BLOCKS: readonly string[] = ['resistors', 'capacitors', 'signal', 'limits', 'wishes', 'margins'];

function fieldsAt(level: string, plan: DraftPlan): readonly DraftField[] {
  const rows = acceptedKeys(level).map((key) => field(level === '' ? key : `${level}.${key}`));
  return rows.filter(({ path }) => belongs(path, plan)).flatMap((row): DraftField[] => {
    const told = toldWith(row.path, plan);
    if (told === null) return [draftField(row, plan)];
    return told.paths[0] === row.path ? [{ kind: 'told', rows: told.paths.map(field), lead: told.lead }] : [];
  });
}

function draftField(row: FieldRow, plan: DraftPlan): DraftField {
  if (BLOCKS.includes(row.path)) return { kind: 'block', row, fields: fieldsAt(row.path, plan) };
  const written = plan.live.get(row.path) ?? inOneLine(row.path, plan.live);
  const parts = FIELDS.filter(({ path }) => path.startsWith(`${row.path}.`) && belongs(path, plan));
  return { kind: 'line', row, text: written ?? plan.examples[row.path] ?? wholeExample(row, parts), isLive: written !== undefined, parts };
}

/** A map in one line shows all its keys. */
function wholeExample(row: FieldRow, parts: readonly FieldRow[]): string {
  if (parts.length === 0) return row.example;
  return `{${parts.map(({ path, example }) => `${path.slice(row.path.length + 1)}: ${example}`).join(', ')}}`;
}

/** False for what this topology or coupling refuses. */
function belongs(path: string, { topology, coupling }: DraftPlan): boolean {
  const refused = coupling === 'ac' ? ['signal.input', 'signal.center', 'legs.NAME.input'] : ['legs.NAME.amplitude'];
  return belongsTo(path, topology) && !refused.includes(path);
}

interface Told {
  readonly paths: readonly string[];
  readonly lead: string;
}

/** Two ways to say one thing, and what needs another field: the line alone would be refused, so it is only told. */
function toldWith(path: string, { live, coupling, topology, examples }: DraftPlan): Told | null {
  const has = (one: string): boolean => live.has(one);
  const ways: readonly (readonly [boolean, Told])[] = [
    [ONE_INPUT.includes(topology) && coupling === 'dc', { paths: ['signal.amplitude', 'signal.center'], lead: 'In place of input' }],
    [has('signal.differential'), { paths: ['signal.positive', 'signal.negative'], lead: 'In place of differential and commonMode' }],
    [has('signal.positive'), { paths: ['signal.differential', 'signal.commonMode'], lead: 'In place of positive and negative' }],
    [has('signal.output') && !has('gain'), { paths: ['gain'], lead: 'In place of signal.output' }],
    [!has('signal.output') && examples['signal.output'] === undefined, { paths: ['signal.output'], lead: 'In place of gain, or as a cross-check' }],
    [topology === 'sallen-key-low-pass', { paths: ['resistors.feedback', 'resistors.input'], lead: 'With a gain above 1' }],
    [topology === 'integrator' && coupling === 'ac', { paths: ['limits.dcError'], lead: 'With integrator.window' }],
    [true, { paths: ['limits.supplyRipple'], lead: 'With supplyRipple' }],
    [true, { paths: ['signal.edge'], lead: 'With shape step or pulse' }],
    [true, { paths: ['signal.duty'], lead: 'With shape pulse' }],
  ];
  return ways.find(([applies, { paths }]) => applies && paths.includes(path))?.[1] ?? null;
}
