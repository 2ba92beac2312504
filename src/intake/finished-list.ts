import { createHash } from 'node:crypto';
import { compareFigures } from '../parts/figure-order.js';
import type { Figure } from '../parts/figures.js';
import type { Part } from '../parts/part.js';
import { classHeadrooms, proposeClasses } from './class-proposal.js';
import type { DecimalMark } from './decimal-mark.js';
import type { Declarations } from './declarations.js';
import { declarationWords, declared } from './declarations.js';
import type { DecodeResult } from './decode.js';
import type { ReadPart } from './identity.js';
import type { Layout } from './layout.js';
import type { ListColumn, ListOptions, ReadList } from './list.js';
import { listSources } from './list-sources.js';
import { headerFingerprint, mappedColumns } from './mapping.js';
import type { ProblemLog } from './problem-log.js';
import type { SplitText } from './split.js';

export interface FinishedReading {
  /** With what a saved mapping adds to them. */
  readonly options: ListOptions;
  readonly log: ProblemLog;
  readonly bytes: Uint8Array;
  readonly decoded: Extract<DecodeResult, { ok: true }>;
  readonly split: SplitText;
  readonly layout: Layout;
}

export interface Kept {
  readonly columns: readonly ListColumn[];
  readonly kept: readonly ReadPart[];
  readonly decimal: DecimalMark;
  readonly header: readonly string[];
}

/** A list without a fault, with what its owner declared, its classes lend, and how it was read. */
export function finishedList({ options, log, bytes, decoded, split, layout }: FinishedReading, { columns, kept, decimal, header }: Kept): ReadList {
  const known = kept.map((one) => one.part);
  const proposals = options.generic === undefined || !isOrdinary(columns) ? [] : proposeClasses(known, options.generic);
  const declare = options.declare ?? null;
  if (declare !== null) log.notes.push(`declared: ${declarationWords(declare)}; figures so completed are assumed.`);
  if (options.classWithin !== undefined) log.notes.push(`classes proposed within ${options.classWithin} decades were applied; what is borrowed from them is marked.`);
  const classes = new Map(proposals.filter(({ distance }) => distance <= (options.classWithin ?? -1)).map((one) => [one.part, one.class]));
  const lending = lender(options.generic ?? []);
  const finished = kept.map((one) => completed(one, { classes, lending, declare }));
  const isKept = isOrdinary(columns) || layout.headerRows.length > 1 || layout.headerRows[0] > 1 || layout.untilBlank;
  const titles = header.map((cell) => cell.replace(/\s+/gu, ' ').trim());
  const { words = new Map(), missing = [] } = options;
  return {
    ok: true,
    file: options.file,
    tier: options.tier,
    parts: finished.map(({ part }) => part),
    columns,
    records: kept.map(({ record }) => record),
    sources: listSources(columns, finished, declare === null ? null : declarationWords(declare)),
    sha256: createHash('sha256').update(bytes).digest('hex'),
    delimiter: split.delimiter,
    decimal: decimal.mark,
    warnings: log.list(),
    notes: log.notes,
    mapping: isKept ? { name: options.file, fingerprint: headerFingerprint(titles), encoding: decoded.encoding, delimiter: split.delimiter, decimal: decimal.mark, layout, columns: mappedColumns(columns), words, missing, declare, classWithin: options.classWithin ?? null } : null,
    proposals: options.classWithin === undefined ? proposals : proposals.filter(({ distance }) => distance > (options.classWithin ?? 0)),
  };
}

interface Completion {
  /** Classes proposed and applied, by id of the part. */
  readonly classes: ReadonlyMap<string, string>;
  /** The head-rooms of a class. */
  readonly lending: (name: string) => readonly Figure[];
  readonly declare: Declarations | null;
}

/** The figures a class lends, made once a class, so that its parts share them. */
function lender(generic: readonly Part[]): Completion['lending'] {
  const known = new Map<string, readonly Figure[]>();
  return (name) => {
    const figures = known.get(name) ?? classHeadrooms(name, generic);
    known.set(name, figures);
    return figures;
  };
}

/** A part with what was declared for the whole list, and with what its class lends where words stand for figures. */
function completed(one: ReadPart, { classes, lending, declare }: Completion): ReadPart {
  const name = one.part.class ?? classes.get(one.part.id) ?? null;
  const { railOutputs } = one;
  const lent = name === null || railOutputs === null ? [] : lending(name);
  if (declare === null && lent.length === 0 && name === one.part.class) return one;
  const all = [...one.part.figures, ...lent];
  const columns = [...one.sources, ...lent.map(() => railOutputs)];
  // What is declared anew stands behind the figures there were, in no column.
  const placed = (declare === null ? all : declared(all, declare)).map((figure, at) => ({ figure, column: columns[at] ?? null }));
  placed.sort((a, b) => compareFigures(a.figure, b.figure));
  return { ...one, part: { ...one.part, class: name, figures: placed.map(({ figure }) => figure) }, sources: placed.map(({ column }) => column) };
}

/** A list with any column the canonical CSV does not have. */
export function isOrdinary(columns: readonly ListColumn[]): boolean {
  return columns.some(({ reading: { kind } }) => kind === 'measured' || kind === 'rail' || kind === 'load' || kind === 'known');
}
