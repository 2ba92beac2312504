import type { ImportReport } from '../index.js';
import type { Catalog } from '../catalog/index.js';
import type { ReadList } from '../intake/list.js';
import { patchList } from '../intake/patch-list.js';
import { readList } from '../intake/read-list.js';
import { isSheet } from '../intake/patch-sheet.js';
import type { Problem } from '../quantities/problem.js';
import { differenceOf } from './import-difference.js';
import { guardProblems } from './import-guards.js';
import type { GuardName } from '../catalog/index.js';
import { importWatched } from './import-watched.js';
import type { ApprovedFile } from './read-approved.js';
import type { Session } from './session.js';

export interface PatchOptions {
  readonly session: Session;
  readonly dryRun: boolean;
  readonly accept: ReadonlySet<GuardName>;
}

/** `railfit import FILE --patch`: the filled cells of a look-up sheet added to the list in force, all or nothing. */
export async function importPatch({ bytes, name }: ApprovedFile, catalog: Catalog, { session, dryRun, accept }: PatchOptions): Promise<ImportReport> {
  const base = catalog.listInForce();
  if (base === null) return refusedPatch(name, [{ code: 'I806', severity: 'error', message: 'no list is in force that a look-up sheet could add to', fix: 'railfit import approved.csv first', place: { file: name } }]);
  const sheet = readList(bytes, { file: name, tier: 'approved', genericIds: catalog.genericIds(), classes: catalog.classes() });
  if (!sheet.ok) return { ...refusedPatch(name, sheet.problems.map(emptied), sheet.counts.rows), refused: { cells: sheet.counts.cells, parts: sheet.counts.parts } };
  const patch = patchList(base.list, sheet);
  if (!patch.ok) return refusedPatch(name, patch.problems, sheet.parts.length);
  const { list, cells, parts } = patch;
  const { result, stages } = await importWatched(catalog, list, { session, accept, dryRun, basedOn: base.from.id });
  const { counts, outcome } = result;
  const problems = [...warningsOf(list), ...guardProblems({ list, result, catalog, accepted: accept })];
  const about = { file: name, counts, problems, patch: { cells, parts, list: base.from.file }, ...(stages === undefined ? {} : { stages }) };
  if (outcome === 'no-change') return { ...about, outcome, sha256: sheet.sha256 };
  const difference = differenceOf(list, result, catalog);
  if (outcome === 'held') return { ...about, difference, outcome: 'refused', sha256: null, held: true };
  return { ...about, difference, outcome, sha256: sheet.sha256 };
}

/** The column of words is no column of the list. */
const warningsOf = ({ warnings }: ReadList): readonly Problem[] => warnings.filter(({ place }) => place?.header === undefined || !isSheet([{ number: 0, letter: '', header: place.header, reading: { kind: 'text' } }]));

/** A sheet without rows withdraws nothing. */
function emptied(problem: Problem): Problem {
  if (problem.code !== 'I104') return problem;
  return { ...problem, code: 'I802', message: 'the sheet has a header and no part: nothing is filled', fix: 'a row for each part, as the sheet was written' };
}

function refusedPatch(file: string, problems: readonly Problem[], rows = 0): ImportReport {
  const counts = { rows, added: 0, changed: 0, removed: 0, unchanged: 0 };
  return { outcome: 'refused', file, sha256: null, counts, problems };
}

/** A look-up sheet given as if it were the list: replacing the list with it would withdraw most of it. */
export function sheetProblem(list: ReadList, path: string): Problem | null {
  if (!isSheet(list.columns)) return null;
  return { code: 'I805', severity: 'error', message: `${list.file} is a look-up sheet: it fills cells of the list and does not replace it`, fix: `railfit import ${path} --patch`, place: { file: list.file, line: 1 } };
}
