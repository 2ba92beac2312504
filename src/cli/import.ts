import { readFileSync, writeFileSync } from 'node:fs';
import { basename } from 'node:path';
import { importJson, problemsCsv, renderImport, renderProblems, type ImportReport } from '../index.js';
import type { Catalog } from '../catalog/index.js';
import { readList } from '../intake/read-list.js';
import type { ReadList, RefusedList } from '../intake/list.js';
import { withCatalog } from './catalog-file.js';
import { EXIT } from './exit-code.js';
import { commandProblem, RequestError } from './request-error.js';
import { styleFor, type CommonOptions, type Outcome, type Session } from './session.js';
import { unreadable } from './stage-input.js';

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
  const bytes = bytesOf(file);
  return withCatalog(session, options, (catalog) => {
    const list = readList(bytes, { file: basename(file), tier: 'approved', genericIds: catalog.genericIds(), classes: catalog.classes() });
    const report = list.ok ? imported(catalog, list, options) : refused(list);
    if (options.errors !== undefined) writeProblems(options.errors, report);
    return said(report, session, options);
  });
}

function bytesOf(file: string): Uint8Array {
  try {
    return readFileSync(file === '-' ? 0 : file);
  } catch (error) {
    throw new RequestError([unreadable(file, error)], EXIT.surroundings, `Nothing was imported. (exit ${EXIT.surroundings})`);
  }
}

function imported(catalog: Catalog, list: ReadList, options: ImportCommandOptions): ImportReport {
  const { outcome, counts } = catalog.importList(list, { dryRun: options.dryRun === true });
  return { outcome, file: list.file, sha256: list.sha256, counts, problems: list.warnings };
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

function writeProblems(path: string, report: ImportReport): void {
  try {
    writeFileSync(path, problemsCsv(report.problems));
  } catch {
    throw new RequestError([commandProblem('E503', `${path}: cannot be written`, { fix: 'name another file', path: '--errors' })], EXIT.surroundings);
  }
}

function said(report: ImportReport, session: Session, options: CommonOptions): Outcome {
  const exit = report.outcome === 'refused' ? EXIT.data : EXIT.yes;
  if (options.json === true) return { text: importJson(report), exit };
  const summary = renderImport(report, styleFor(session, options));
  const style = styleFor(session, options, 'stderr');
  if (exit === EXIT.data) return { text: '', talk: renderProblems(report.problems, style, summary.trimEnd()), exit };
  return { text: summary, exit, ...(report.problems.length === 0 ? {} : { talk: renderProblems(report.problems, style, '') }) };
}
