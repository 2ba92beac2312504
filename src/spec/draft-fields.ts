import type { FieldRow } from './field.js';
import { acceptedKeys, field, FIELDS } from './schema.js';
import type { SignalSpec, Topology } from './spec.js';

/** A field as a draft writes it: in one line (live or left out), as a block of further fields, or told as another way to say it. */
export type DraftField =
  | { readonly kind: 'line'; readonly row: FieldRow; readonly text: string; readonly isLive: boolean; readonly parts: readonly FieldRow[] }
  | { readonly kind: 'block'; readonly row: FieldRow; readonly fields: readonly DraftField[] }
  | { readonly kind: 'instead'; readonly rows: readonly FieldRow[]; readonly of: string };

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
const BLOCKS: readonly string[] = ['resistors', 'signal', 'limits', 'wishes', 'margins'];

function fieldsAt(level: string, plan: DraftPlan): readonly DraftField[] {
  const rows = acceptedKeys(level).map((key) => field(level === '' ? key : `${level}.${key}`));
  return rows.filter(({ path }) => belongs(path, plan)).flatMap((row): DraftField[] => {
    const pair = insteadOf(row.path, plan);
    if (pair === null) return [draftField(row, plan)];
    return pair.paths[0] === row.path ? [{ kind: 'instead', rows: pair.paths.map(field), of: pair.of }] : [];
  });
}

function draftField(row: FieldRow, plan: DraftPlan): DraftField {
  if (BLOCKS.includes(row.path)) return { kind: 'block', row, fields: fieldsAt(row.path, plan) };
  const written = plan.live.get(row.path);
  const parts = FIELDS.filter(({ path }) => path.startsWith(`${row.path}.`));
  return { kind: 'line', row, text: written ?? plan.examples[row.path] ?? wholeExample(row, parts), isLive: written !== undefined, parts };
}

/** A map in one line shows all its keys. */
function wholeExample(row: FieldRow, parts: readonly FieldRow[]): string {
  if (parts.length === 0) return row.example;
  return `{${parts.map(({ path, example }) => `${path.slice(row.path.length + 1)}: ${example}`).join(', ')}}`;
}

const SECOND_INPUTS = ['signal.positive', 'signal.negative', 'signal.differential', 'signal.commonMode'];
const ONE_INPUT = ['signal.input', 'signal.amplitude', 'signal.center'];

/** False for what this topology or coupling refuses. */
function belongs(path: string, { topology, coupling }: DraftPlan): boolean {
  if (topology === 'follower' && path === 'resistors') return false;
  if (coupling === 'ac' && (path === 'signal.input' || path === 'signal.center')) return false;
  if (topology === 'difference') return !ONE_INPUT.includes(path);
  return !SECOND_INPUTS.includes(path) && path !== 'resistors.positiveInput' && path !== 'resistors.toReference';
}

interface Instead {
  readonly paths: readonly string[];
  readonly of: string;
}

/** Two ways to say one thing: the way that is not taken is told, since its line alone would contradict the other. */
function insteadOf(path: string, { live, coupling, topology, examples }: DraftPlan): Instead | null {
  const has = (one: string): boolean => live.has(one);
  const ways: readonly (readonly [boolean, Instead])[] = [
    [topology !== 'difference' && coupling === 'dc', { paths: ['signal.amplitude', 'signal.center'], of: 'input' }],
    [has('signal.differential'), { paths: ['signal.positive', 'signal.negative'], of: 'differential and commonMode' }],
    [has('signal.positive'), { paths: ['signal.differential', 'signal.commonMode'], of: 'positive and negative' }],
    [has('signal.output') && !has('gain'), { paths: ['gain'], of: 'signal.output' }],
    [!has('signal.output') && examples['signal.output'] === undefined, { paths: ['signal.output'], of: 'gain, or as a cross-check' }],
  ];
  return ways.find(([applies, { paths }]) => applies && paths.includes(path))?.[1] ?? null;
}
