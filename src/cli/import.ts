import { writeFileSync } from 'node:fs';
import { importJson, problemsCsv, renderDifference, renderImport, renderProblems, type ImportReport } from '../index.js';
import type { Catalog, GuardName, IncomingList, StagedList } from '../catalog/index.js';
import type { Problem } from '../quantities/problem.js';
import type { ReadList, RefusedList } from '../intake/list.js';
import { withCatalog } from './catalog-file.js';
import { EXIT } from './exit-code.js';
import { differenceOf } from './import-difference.js';
import { guardProblems } from './import-guards.js';
import type { ReadingOptions } from './import-options.js';
import { importPatch, sheetProblem } from './import-patch.js';
import { importWatched } from './import-watched.js';
import { watchingStages } from './kept-stages.js';
import { openListFile, type ListFile } from './list-file.js';
import { keepMapping, mappingText, readWhole, refusedUnread, tellReading } from './read-approved.js';
import { readStaged } from './read-staged.js';
import { commandProblem, RequestError } from './request-error.js';
import { styleFor, type Outcome, type Session } from './session.js';

export interface ImportCommandOptions extends ReadingOptions {
  readonly dryRun?: boolean;
  readonly undo?: boolean;
  /** The file is a look-up sheet: its filled cells are added to the list in force. */
  readonly patch?: boolean;
  /** Guards that are accepted by name. */
  readonly accept?: readonly GuardName[];
  /** File that gets one line per problem. */
  readonly errors?: string;
}

/** `railfit import FILE`: the team's approved list, all or nothing. */
export async function runImport(session: Session, file: string | undefined, options: ImportCommandOptions): Promise<Outcome> {
  if (options.undo === true) return withCatalog(session, options, (catalog) => said(undone(catalog), session, options));
  if (file === undefined) throw new RequestError([commandProblem('C102', 'import: no FILE', { fix: 'railfit import approved.csv' })], EXIT.request);
  const opened = await openListFile(file);
  try {
    if (options.patch === true) return await patched(opened, session, options);
    return await withCatalog(session, options, (catalog) => taken(opened, catalog, { session, options, file }));
  } finally {
    opened.close();
  }
}

interface Importing {
  readonly session: Session;
  readonly options: ImportCommandOptions;
  readonly file: string;
}

/** Reads a list and takes it in. */
async function taken(opened: ListFile, catalog: Catalog, { session, options, file }: Importing): Promise<Outcome> {
  const list = (await readStaged(opened, catalog, { session, options })) ?? (await readWhole(opened, catalog, { session, options }));
  if (!list.ok || 'rows' in list) return staged(list, catalog, { session, options });
  if (options.showMapping === true) return { text: mappingText(list) ?? '', exit: EXIT.yes };
  tellReading(list, session, options);
  tellProblems(list.warnings, options);
  const sheet = sheetProblem(list, file);
  const report = sheet === null ? await imported(catalog, list, { session, options }) : notAList(list, sheet);
  const isIn = report.outcome === 'imported' || report.outcome === 'no-change';
  const unkept = isIn ? keepMapping(list.mapping, session, options) : [];
  return said({ ...report, problems: [...report.problems, ...unkept] }, session, options);
}

/** What was refused, or read with nothing to tell about the reading. */
async function staged(list: StagedList | RefusedList, catalog: Catalog, { session, options }: Omit<Importing, 'file'>): Promise<Outcome> {
  if (!list.ok) {
    tellReading(list, session, options);
    tellProblems(list.problems, options);
    return said(refused(list), session, options);
  }
  try {
    tellProblems(list.warnings, options);
    return said(await imported(catalog, list, { session, options }), session, options);
  } finally {
    list.close();
  }
}

/** Before the import: when the file of problems cannot be written, nothing has been done. */
function tellProblems(problems: readonly Problem[], { errors }: ImportCommandOptions): void {
  if (errors !== undefined) writeProblems(errors, problems);
}

/** The filled cells of a look-up sheet. */
async function patched(opened: ListFile, session: Session, options: ImportCommandOptions): Promise<Outcome> {
  const tooLarge = refusedUnread(opened, options);
  if (tooLarge !== null) return said(refused(tooLarge), session, options);
  const sheet = { bytes: opened.bytes(), name: opened.name };
  return withCatalog(session, options, async (catalog) => {
    const report = await importPatch(sheet, catalog, { session, dryRun: options.dryRun === true, accept: new Set(options.accept ?? []) });
    if (options.errors !== undefined) writeProblems(options.errors, report.problems);
    return said(report, session, options);
  });
}

function notAList({ file, parts: { length } }: ReadList, problem: Problem): ImportReport {
  return { outcome: 'refused', file, sha256: null, counts: { rows: length, added: 0, changed: 0, removed: 0, unchanged: 0 }, problems: [problem] };
}

async function imported(catalog: Catalog, list: IncomingList, { session, options }: { session: Session; options: ImportCommandOptions }): Promise<ImportReport> {
  const accepted = new Set(options.accept ?? []);
  const { result, stages } = await importWatched(catalog, list, { session, accept: accepted, dryRun: options.dryRun === true });
  const { outcome, counts } = result;
  const report = { file: list.file, counts, problems: [...list.warnings, ...guardProblems({ list, result, catalog, accepted })], ...(stages === undefined ? {} : { stages }) };
  const difference = outcome === 'no-change' ? {} : { difference: differenceOf(list, result, catalog) };
  if (outcome !== 'held') return { ...report, ...difference, outcome, sha256: list.sha256 };
  return { ...report, ...difference, outcome: 'refused', sha256: null, held: true };
}

function refused(list: RefusedList): ImportReport {
  const counts = { rows: list.counts.rows, added: 0, changed: 0, removed: 0, unchanged: 0 };
  return { outcome: 'refused', file: list.file, sha256: null, counts, problems: list.problems, refused: { cells: list.counts.cells, parts: list.counts.parts } };
}

function undone(catalog: Catalog): ImportReport {
  const { result, stages } = watchingStages(catalog, () => catalog.undo(), (did) => (did ? catalog.source() : null));
  const rows = catalog.approvedCount();
  const report = { file: '', sha256: null, counts: { rows, added: 0, changed: 0, removed: 0, unchanged: rows }, problems: [], ...(stages === undefined ? {} : { stages }) };
  return { ...report, outcome: result ? 'undone' : 'no-change' };
}

/** What stops the list is told before what does not, so that the latter is what is cut. */
function errorsFirst(problems: readonly Problem[]): readonly Problem[] {
  return [...problems.filter(({ severity }) => severity === 'error'), ...problems.filter(({ severity }) => severity !== 'error')];
}

function writeProblems(path: string, problems: readonly Problem[]): void {
  try {
    writeFileSync(path, problemsCsv(problems));
  } catch {
    throw new RequestError([commandProblem('E503', `${path}: cannot be written`, { fix: 'name another file', path: '--errors' })], EXIT.surroundings, `Nothing was imported. (exit ${EXIT.surroundings})`);
  }
}

function said(report: ImportReport, session: Session, options: ImportCommandOptions): Outcome {
  const exit = report.outcome === 'refused' ? EXIT.data : EXIT.yes;
  if (options.json === true) return { text: importJson(report), exit };
  const summary = renderImport(report, styleFor(session, options));
  const style = styleFor(session, options, 'stderr');
  const written = options.errors === undefined || report.problems.length === 0 ? {} : { written: options.errors };
  if (exit === EXIT.data) return { text: '', talk: renderDifference(report, style) + renderProblems(errorsFirst(report.problems), style, { summary: summary.trimEnd(), ...written }), exit };
  return { text: summary, exit, ...(report.problems.length === 0 ? {} : { talk: renderProblems(report.problems, style, { summary: '', ...written }) }) };
}
