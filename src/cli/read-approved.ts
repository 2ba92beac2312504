import { isatty } from 'node:tty';
import type { Catalog } from '../catalog/index.js';
import type { ClassProposal } from '../intake/class-proposal.js';
import { mappingDocument } from '../intake/csvw.js';
import type { ListOptions, ListResult, RefusedList } from '../intake/list.js';
import type { ListMapping } from '../intake/mapping.js';
import { readList, refusedBySize } from '../intake/read-list.js';
import { isWorkbook, readWorkbook } from '../intake/workbook.js';
import { renderImportNotes } from '../index.js';
import type { Problem } from '../quantities/problem.js';
import { EXIT } from './exit-code.js';
import { answersOf, type ReadingOptions } from './import-options.js';
import { interruptible } from './interruptible.js';
import type { ListFile } from './list-file.js';
import { saveMapping, savedMappings } from './mapping-files.js';
import { progressBar } from './progress.js';
import { RequestError } from './request-error.js';
import { styleFor, type Session } from './session.js';

export interface ApprovedFile {
  readonly bytes: Uint8Array;
  /** For messages and origins. */
  readonly name: string;
}

/** Reads the team's list with what the command line, a saved mapping and, on a terminal, the person at it say about it. */
export async function readApproved({ bytes, name }: ApprovedFile, catalog: Catalog, { session, options }: { session: Session; options: ReadingOptions }): Promise<ListResult> {
  const asked: ListOptions = {
    file: name,
    tier: 'approved',
    genericIds: catalog.genericIds(),
    classes: catalog.classes(),
    mappings: savedMappings(session, options),
    previous: (id) => catalog.approvedPart(id),
    generic: catalog.genericParts(),
    ...answersOf(options),
    ...(isWorkbook(bytes) ? { workbook: await readWorkbook(bytes, { large: options.large === true }) } : {}),
  };
  const read = await watched(bytes, asked, session);
  if (read.ok || read.questions.length === 0 || !mayAsk(session, options)) return read;
  const { answerQuestions } = await import('./guided/import-questions.js');
  const { isInterruption } = await import('./guided/prompts.js');
  try {
    return await answerQuestions(read, { bytes, asked, style: styleFor(session, options, 'stderr') });
  } catch (error) {
    if (isInterruption(error)) throw new RequestError([], EXIT.interrupted, `interrupted: nothing was imported (exit ${EXIT.interrupted})`);
    throw error;
  }
}

/** The same of a file that is not read yet, and is not when it is too large for a text. */
export async function readWhole(opened: ListFile, catalog: Catalog, context: { session: Session; options: ReadingOptions }): Promise<ListResult> {
  return refusedUnread(opened, context.options) ?? readApproved({ bytes: opened.bytes(), name: opened.name }, catalog, context);
}

/** A text over the limit, refused by its size alone. A workbook has limits of its own. */
export function refusedUnread({ name, source }: ListFile, { large }: Pick<ReadingOptions, 'large'>): RefusedList | null {
  const refused = refusedBySize({ file: name, length: source.length }, { large: large === true });
  if (refused === null) return null;
  for (const start of source.chunks()) return isWorkbook(start) ? null : refused;
  return refused;
}

/** With a bar for a long list, and so that Ctrl-C ends it at once. */
async function watched(bytes: Uint8Array, asked: ListOptions, session: Session): Promise<ListResult> {
  const bar = progressBar(session, (text) => void process.stderr.write(text));
  try {
    return await interruptible(() => readList(bytes, { ...asked, progress: bar.step('reading') }));
  } finally {
    bar.end();
  }
}

/** Questions need a person: never in a pipe, with --json, or when they were declined. */
function mayAsk(session: Session, { json, input }: ReadingOptions): boolean {
  return json !== true && input !== false && isatty(0) && session.stderr.isTTY;
}

/** What is told beside the result: how the file was read, classes proposed. Nothing with --json. */
export function tellReading(list: ListResult, session: Session, options: ReadingOptions): void {
  if (options.json === true) return;
  const notes = [...list.notes, ...(list.ok ? proposalNotes(list.proposals) : [])];
  if (isWorthTelling(list)) session.tell(renderImportNotes(notes, styleFor(session, options, 'stderr')));
}

/** The canonical CSV needs no word about how it was read. */
const isWorthTelling = (list: ListResult): boolean => (list.ok ? list.mapping !== null : list.notes.length > 1);

const SHOWN = 10;

function proposalNotes(proposals: readonly ClassProposal[]): string[] {
  if (proposals.length === 0) return [];
  const shown = proposals.slice(0, SHOWN).map(({ part, class: name, distance }) => `${part} → ${name} (${distance.toFixed(2)})`);
  const more = proposals.length > SHOWN ? `, … and ${proposals.length - SHOWN} more` : '';
  return [`classes proposed by the figures, distance in decades, none applied: ${shown.join(', ')}${more}. --classes 0.3 applies those within 0.3; a part with a class may borrow what its list does not say.`];
}

/** Keeps the mapping of a list that was taken in, and says where; a warning when it cannot be kept, since the list is in by then. */
export function keepMapping(mapping: ListMapping | null, session: Session, options: ReadingOptions): readonly Problem[] {
  if (mapping === null) return [];
  try {
    const path = saveMapping(mapping, session, options);
    if (path !== null && options.json !== true) session.tell(renderImportNotes([`how the columns were read is kept in ${path}; edit it by hand, or see it with railfit import FILE --show-mapping`], styleFor(session, options, 'stderr')));
    return [];
  } catch (error) {
    if (!(error instanceof RequestError)) throw error;
    return error.problems.map((problem) => ({ ...problem, severity: 'warning', message: `the list was imported, but how it was read is not kept: ${problem.message}` }));
  }
}

/** The mapping of a list as the document that is kept; null for a list that needs none or was refused. */
export function mappingText(list: ListResult): string | null {
  return list.ok && list.mapping !== null ? mappingDocument(list.mapping) : null;
}
