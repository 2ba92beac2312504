import { figureSlot } from '../index.js';
import type { Catalog, ColumnSubject, CurrentImport, Guard, GuardName, ImportResult, IncomingList, ScaledColumn } from '../catalog/index.js';
import { sourceColumn } from '../intake/list-sources.js';
import type { ListColumn } from '../intake/list.js';
import type { Problem } from '../quantities/problem.js';

export interface GuardContext {
  readonly list: IncomingList;
  readonly result: ImportResult;
  readonly catalog: Pick<Catalog, 'columnsOf' | 'columnOf' | 'originIn'>;
  readonly accepted: ReadonlySet<GuardName>;
}

/** What the guards have against a list, each with the option that accepts it; a warning once it is accepted. */
export function guardProblems(context: GuardContext): Problem[] {
  return context.result.guards.flatMap((guard) => wordsOf(guard, context).map((words) => problemOf(guard.name, words, context)));
}

interface Words {
  readonly code: string;
  readonly message: string;
  /** What else could be done. */
  readonly instead: string;
  readonly column?: ListColumn | undefined;
}

function problemOf(name: GuardName, { code, message, instead, column }: Words, { list, accepted }: GuardContext): Problem {
  const isAccepted = accepted.has(name);
  const place = column === undefined ? { file: list.file } : { file: list.file, row: 1, column: column.number, columnLetter: column.letter, header: column.header };
  return {
    code,
    severity: isAccepted ? 'warning' : 'error',
    message: isAccepted ? `${message}; accepted` : message,
    ...(isAccepted ? {} : { fix: `${instead}; if it is meant so: --accept ${name}` }),
    place,
  };
}

function wordsOf(guard: Guard, context: GuardContext): Words[] {
  switch (guard.name) {
    case 'older':
      return [{ code: 'I703', message: `this very file was in force before and ${guard.since} has replaced it since; its older figures would come back`, instead: 'the latest file, or --undo to take the last import back' }];
    case 'removed': {
      const share = Math.round((100 * guard.removed) / guard.of);
      return [{ code: 'I701', message: `${guard.removed} of the ${guard.of} parts in force (${share} %) are not in this list and would be withdrawn: ${someOf(context.result.removed)}`, instead: 'the whole list' }];
    }
    case 'scaled':
      return groups(guard.columns).map((columns) => scaledWords(columns, context));
    case 'lifecycle':
      return [{ code: 'I702', message: `the lifecycle of ${guard.better.length} of ${guard.of} known parts goes back towards active: ${someOf(guard.better)}`, instead: 'the lifecycle the makers publish', column: context.list.columns.find(({ reading }) => reading.kind === 'identity' && reading.field === 'lifecycle') }];
  }
}

/** Columns that moved by the same power are one cause. */
function groups(columns: readonly ScaledColumn[]): ScaledColumn[][] {
  return [...new Set(columns.map(({ power }) => power))].map((power) => columns.filter((column) => column.power === power));
}

function scaledWords(columns: readonly ScaledColumn[], context: GuardContext): Words {
  const [first] = columns;
  const found = columns.map(({ subject }) => columnOf(subject, context.list));
  const names = found.map((column) => `"${column?.header ?? ''}"`);
  const known = columns.map(({ scaled, known: of }) => `${scaled} of ${of}`);
  const counts = new Set(known).size === 1 ? (known[0] ?? '') : known.join(', ');
  const message = [
    `${listed(names)} ${names.length === 1 ? 'is' : 'are'} exactly ${factorWords(first?.power ?? 0)} the last import in ${counts} known parts`,
    ...columns.flatMap((column, at) => headerWords(column, found[at], context)),
    ...(columns.every((column) => isUntouched(column, context)) ? ['the figures as written are the same'] : []),
  ].join('; ');
  return { code: 'I602', message, instead: 'correct the unit in the header', column: found[0] };
}

const factorWords = (power: number): string => (power > 0 ? `${10 ** power} times` : `1/${10 ** -power} of`);

/** The header of the last import, where it was another one. */
function headerWords({ subject }: ScaledColumn, column: ListColumn | undefined, { result, catalog }: GuardContext): string[] {
  const before = result.previous === null ? undefined : columnBefore(subject, result.previous, catalog);
  return before === undefined || column === undefined || before.header === column.header ? [] : [`the header went from "${before.header}" to "${column.header}"`];
}

/** The cells say what they said; only what they are read as is another figure. Judged on the changed parts that are told in full. */
function isUntouched({ subject }: ScaledColumn, { list, result, catalog }: GuardContext): boolean {
  const { previous } = result;
  const column = columnOf(subject, list);
  if (previous === null || column === undefined || subject.kind === 'price') return false;
  const slot = slotOf(subject);
  const origins = result.changed.map(({ after, cells }) => ({ origin: catalog.originIn(previous, after.id, slot), now: cells[column.number - 1]?.trim() }));
  return origins.length > 0 && origins.every(({ origin, now }) => origin?.kind === 'cell' && origin.cell.trim() === now);
}

function columnOf(subject: ColumnSubject, list: IncomingList): ListColumn | undefined {
  if (subject.kind === 'price') return list.columns.find(isPrice);
  return sourceColumn(list, slotOf(subject)) ?? undefined;
}

function columnBefore(subject: ColumnSubject, previous: CurrentImport, catalog: GuardContext['catalog']): ListColumn | undefined {
  if (subject.kind === 'price') return catalog.columnsOf(previous).find(isPrice);
  return catalog.columnOf(previous, slotOf(subject)) ?? undefined;
}

const isPrice = ({ reading }: ListColumn): boolean => reading.kind === 'price';

const slotOf = ({ parameter, limit, condition }: Extract<ColumnSubject, { kind: 'figure' }>): string => figureSlot({ parameter, kind: limit, condition });

const NAMED = 6;

function someOf(ids: readonly string[]): string {
  const left = ids.length - NAMED;
  return left <= 0 ? ids.join(', ') : `${ids.slice(0, NAMED).join(', ')} and ${left} more`;
}

function listed(names: readonly string[]): string {
  return names.length < 2 ? (names[0] ?? '') : `${names.slice(0, -1).join(', ')} and ${names.at(-1) ?? ''}`;
}
