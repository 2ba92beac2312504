import { document, renderStages, suggest, type StagesReport } from '../index.js';
import type { Catalog, SavedStage } from '../catalog/index.js';
import type { Problem } from '../quantities/problem.js';
import { foundPath, keptPath, readStageFile, shownPath } from '../saved/index.js';
import { withCatalog } from './catalog-file.js';
import { EXIT } from './exit-code.js';
import { findPart } from './find-part.js';
import { failureWords } from './kept-stages.js';
import { commandProblem, RequestError } from './request-error.js';
import { styleFor, type CommonOptions, type Outcome, type Session } from './session.js';
import { readStageOf } from './stage-input.js';

export interface StagesOptions extends CommonOptions {
  /** The part chosen for the stages that are added; false takes the choice back. */
  readonly part?: string | false;
}

const ACTIONS = ['list', 'add', 'remove'] as const;
type Action = (typeof ACTIONS)[number];

/** `railfit stages [list | add FILE… | remove FILE…]`: the team's stage files, kept by path, each with the part chosen for it. */
export async function runStages(session: Session, words: readonly string[], options: StagesOptions): Promise<Outcome> {
  const [first = 'list', ...files] = words;
  const action = actionOf(first, files, options);
  if (action === 'add') await readAll(files);
  return withCatalog(session, options, (catalog) => {
    const done = action === 'add' ? add(catalog, files, options) : action === 'remove' ? remove(catalog, files) : [];
    const report: StagesReport = { done: action, files: done, stages: listed(catalog) };
    const text = options.json === true ? document('stages', { ...report }) : renderStages(report, styleFor(session, options));
    return { text, exit: EXIT.yes };
  });
}

function actionOf(word: string, files: readonly string[], options: StagesOptions): Action {
  const problems: Problem[] = [];
  const action = ACTIONS.find((one) => one === word);
  if (action === undefined) {
    const near = suggest(word, ACTIONS);
    const fix = near.length > 0 ? `did you mean railfit stages ${near.join(', ')}?` : `railfit stages add ${word}`;
    problems.push(commandProblem('C102', `stages: ${word} is none of ${ACTIONS.join(', ')}`, { fix }));
  } else if (action === 'list' && files.length > 0) problems.push(commandProblem('C102', 'stages list takes no file', { fix: 'railfit stages list' }));
  else if (action !== 'list' && files.length === 0) problems.push(commandProblem('C102', `stages ${action}: no FILE`, { fix: `railfit stages ${action} stage.yaml` }));
  else if (files.includes('-')) problems.push(commandProblem('C102', `stages ${action} -: only a file can be kept, standard input cannot`, { fix: `railfit stages ${action} stage.yaml` }));
  if (options.part !== undefined && action !== 'add') problems.push(commandProblem('C106', '--part belongs to stages add', { fix: 'railfit stages add stage.yaml --part ID', path: '--part' }));
  if (action === undefined || problems.length > 0) throw new RequestError(problems, EXIT.request);
  return action;
}

/** Only what is a stage is kept; what is wrong with any of the files is told at once. */
async function readAll(files: readonly string[]): Promise<void> {
  const refusals: RequestError[] = [];
  for (const file of files) {
    try {
      await readStageOf(file, {});
    } catch (error) {
      if (!(error instanceof RequestError)) throw error;
      refusals.push(error);
    }
  }
  const [first] = refusals;
  if (first !== undefined) throw new RequestError(refusals.flatMap(({ problems }) => problems), first.exit, `Nothing was saved. (exit ${first.exit})`);
}

function add(catalog: Catalog, files: readonly string[], { part }: StagesOptions): string[] {
  if (typeof part === 'string') {
    const found = findPart(catalog.source(), part, (id) => catalog.withdrawn(id));
    if (!found.ok) throw new RequestError([{ ...found.problem, place: { path: '--part' } }], EXIT.request);
  }
  const kept = new Map(catalog.savedStages().map((stage) => [stage.path, stage.part]));
  const stages = files.map((file): SavedStage => {
    const path = keptPath(file, catalog.file);
    return { path, part: part === undefined ? (kept.get(path) ?? null) : part === false ? null : part };
  });
  catalog.saveStages(stages);
  return stages.map(({ path }) => shown(path, catalog));
}

function remove(catalog: Catalog, files: readonly string[]): string[] {
  const kept = new Set(catalog.savedStages().map(({ path }) => path));
  const paths = files.map((file) => keptPath(file, catalog.file));
  const unknown = files.filter((_, at) => !kept.has(paths[at] ?? ''));
  if (unknown.length > 0) throw new RequestError(unknown.map((file) => notKept(file, [...kept].map((path) => shown(path, catalog)))), EXIT.request);
  catalog.removeStages(paths);
  return paths.map((path) => shown(path, catalog));
}

function notKept(file: string, kept: readonly string[]): Problem {
  const near = suggest(file, kept);
  const fix = near.length === 0 ? 'railfit stages lists what is saved' : `did you mean ${near.join(', ')}?`;
  return commandProblem('C112', `${file} is no saved stage`, { fix, path: file });
}

/** What is kept, with what the files are now. */
function listed(catalog: Catalog): StagesReport['stages'] {
  return catalog.savedStages().map(({ path, part }) => {
    const file = shown(path, catalog);
    const read = readStageFile(foundPath(path, catalog.file), file);
    return { file, part: (read.ok ? read.part : null) ?? part, name: read.ok ? read.stage.name : null, problem: read.ok ? null : failureWords(read) };
  });
}

const shown = (path: string, catalog: Catalog): string => shownPath(path, catalog.file, process.cwd());
