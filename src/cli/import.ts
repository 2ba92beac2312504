import { writeFileSync } from 'node:fs';
import { readFile } from 'node:fs/promises';
import { basename } from 'node:path';
import { importJson, problemsCsv, renderImport, renderProblems, type ImportReport } from '../index.js';
import type { Catalog } from '../catalog/index.js';
import type { Problem } from '../quantities/problem.js';
import { fieldChanges } from '../intake/part-fields.js';
import { readList } from '../intake/read-list.js';
import type { ReadList, RefusedList } from '../intake/list.js';
import { withCatalog } from './catalog-file.js';
import { EXIT } from './exit-code.js';
import { commandProblem, RequestError } from './request-error.js';
import { styleFor, type CommonOptions, type Outcome, type Session } from './session.js';
import { unreadable } from './stage-input.js';
import { readStandardInput, STDIN, STDIN_NAME } from './standard-input.js';

export interface ImportCommandOptions extends CommonOptions {
  readonly dryRun?: boolean;
  readonly undo?: boolean;
  /** File that gets one line per problem. */
  readonly errors?: string;
}

/** `railfit import FILE`: the team's approved list, all or nothing. */
export async function runImport(session: Session, file: string | undefined, options: ImportCommandOptions): Promise<Outcome> {
  if (options.undo === true) return withCatalog(session, options, (catalog) => said(undone(catalog), session, options));
  if (file === undefined) throw new RequestError([commandProblem('C102', 'import: no FILE', { fix: 'railfit import approved.csv' })], EXIT.request);
  const bytes = await bytesOf(file);
  return withCatalog(session, options, (catalog) => {
    const list = readList(bytes, { file: file === STDIN ? STDIN_NAME : basename(file), tier: 'approved', genericIds: catalog.genericIds(), classes: catalog.classes() });
    // Before the import: when the file cannot be written, nothing has been done.
    if (options.errors !== undefined) writeProblems(options.errors, list.ok ? list.warnings : list.problems);
    return said(list.ok ? imported(catalog, list, options) : refused(list), session, options);
  });
}

async function bytesOf(file: string): Promise<Uint8Array> {
  try {
    return file === STDIN ? await readStandardInput() : await readFile(file);
  } catch (error) {
    throw new RequestError([unreadable(file, error)], EXIT.surroundings, `Nothing was imported. (exit ${EXIT.surroundings})`);
  }
}

function imported(catalog: Catalog, list: ReadList, options: ImportCommandOptions): ImportReport {
  const { outcome, counts, changed, removed } = catalog.importList(list, { dryRun: options.dryRun === true });
  const changes = changed.flatMap(({ before, after }) => fieldChanges(before, after).map((change) => ({ part: after.id, ...change })));
  return { outcome, file: list.file, sha256: list.sha256, counts, problems: list.warnings, changes, withdrawn: removed };
}

function refused(list: RefusedList): ImportReport {
  const counts = { rows: list.counts.rows, added: 0, changed: 0, removed: 0, unchanged: 0 };
  return { outcome: 'refused', file: list.file, sha256: null, counts, problems: list.problems, refused: { cells: list.counts.cells, parts: list.counts.parts } };
}

function undone(catalog: Catalog): ImportReport {
  const outcome = catalog.undo() ? 'undone' : 'no-change';
  const rows = catalog.source().parts.filter((part) => part.tier === 'approved').length;
  return { outcome, file: '', sha256: null, counts: { rows, added: 0, changed: 0, removed: 0, unchanged: rows }, problems: [] };
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
  if (exit === EXIT.data) return { text: '', talk: renderProblems(report.problems, style, { summary: summary.trimEnd(), ...written }), exit };
  return { text: summary, exit, ...(report.problems.length === 0 ? {} : { talk: renderProblems(report.problems, style, { summary: '', ...written }) }) };
}
