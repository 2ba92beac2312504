import { chosenJson, explain, junitXml, renderChosen, type ChosenReport, type ChosenStage } from '../index.js';
import type { Catalog } from '../catalog/index.js';
import type { Problem } from '../quantities/problem.js';
import { foundPath, keptPath, readStageFile, shownPath } from '../saved/index.js';
import { withCatalog } from './catalog-file.js';
import { EXIT, exitOfOutcome, type ExitCode } from './exit-code.js';
import { findPart } from './find-part.js';
import { judgingInput, type JudgingOptions } from './judging-input.js';
import { failureWords } from './kept-stages.js';
import { writeNewFile } from './new-file.js';
import { commandProblem, RequestError } from './request-error.js';
import { styleFor, type Outcome, type Session } from './session.js';

export interface CheckOptions extends JudgingOptions {
  /** Instead of the parts chosen for the stages. */
  readonly part?: string;
  /** Where the same goes as a JUnit file; `-`: to stdout, in place of the text. */
  readonly junit?: string;
}

/** `railfit check STAGE…`: do the parts chosen for these stages still fit; without a stage, for every saved one. */
export async function runCheck(session: Session, files: readonly string[], options: CheckOptions): Promise<Outcome> {
  const problems = [...(options.already ?? []), ...requestProblems(files, options)];
  if (problems.length > 0) throw new RequestError(problems, EXIT.request);
  return withCatalog(session, options, (catalog) => {
    const asked = askedStages(catalog, files);
    if (asked.length === 0) throw new RequestError([commandProblem('C103', 'no stage is saved, and none is named', { fix: 'railfit stages add stage.yaml --part ID, or railfit check stage.yaml --part ID' })], EXIT.request);
    const input = judgingInput(catalog, options);
    const stages = asked.map((one) => judged(one, { catalog, ...input, wanted: options.part }));
    const exit = worstOf(stages.map((one) => exitOfStage(one, files.length === 0)), stages);
    return { text: written({ stages }, session, { ...options, named: files.length > 0 }), exit };
  });
}

function written(report: ChosenReport, session: Session, options: CheckOptions & { readonly named: boolean }): string {
  const { junit } = options;
  // A build keeps one file of this name and writes it again each time.
  if (junit !== undefined && junit !== '-') writeNewFile(junit, junitXml(report, options), true);
  if (options.json === true) return chosenJson(report);
  return junit === '-' ? junitXml(report, options) : renderChosen(report, styleFor(session, options));
}

function requestProblems(files: readonly string[], { part, junit, json }: CheckOptions): Problem[] {
  if (junit === '-' && json === true) return [...requestProblems(files, part === undefined ? {} : { part }), commandProblem('C106', '--json and --junit -: stdout takes one form', { fix: '--junit FILE', path: '--junit' })];
  const stdin = files.includes('-') ? [commandProblem('C102', 'check -: a stage is named by its file, since the chosen part is kept with its path', { fix: 'railfit explain PART -' })] : [];
  return part !== undefined && files.length === 0 ? [...stdin, commandProblem('C106', '--part asks for the stage it is checked on', { fix: `railfit check stage.yaml --part ${part}`, path: '--part' })] : stdin;
}

interface AskedStage {
  readonly path: string;
  readonly name: string;
  /** The part `railfit stages` keeps for it. */
  readonly saved: string | null;
}

/** The stages named, in their order, each with the part saved for it; all saved ones when none is named. */
function askedStages(catalog: Catalog, files: readonly string[]): AskedStage[] {
  const kept = catalog.savedStages();
  if (files.length === 0) return kept.map((one) => ({ path: foundPath(one.path, catalog.file), name: shownPath(one.path, catalog.file, process.cwd()), saved: one.part }));
  const chosen = new Map(kept.map((one) => [one.path, one.part]));
  return files.map((file) => ({ path: file, name: file, saved: chosen.get(keptPath(file, catalog.file)) ?? null }));
}

interface Judging extends ReturnType<typeof judgingInput> {
  readonly catalog: Catalog;
  readonly wanted: string | undefined;
}

/** A shell that finds no file for a pattern hands over the pattern itself. */
const isPattern = (name: string): boolean => /[*?[]/u.test(name);
const NO_MATCH = 'no file matches this pattern, so the shell passed it on as it is: write the folder as seen from here, such as railfit check catalog/stages/*.yaml';

/** The part asked for goes before the one the stage file names, and that before the one that is saved. */
function judged({ path, name, saved }: AskedStage, { catalog, source, asking, wanted }: Judging): ChosenStage {
  const read = readStageFile(path, name);
  const part = wanted ?? (read.ok ? read.part : null) ?? saved;
  if (!read.ok) return { file: name, part, reason: read.cause, words: read.cause === 'gone' && isPattern(name) ? NO_MATCH : failureWords(read) };
  if (part === null) return { file: name, part, reason: 'not-chosen', words: `no part is chosen for it: part: ID in the file, or railfit stages add ${name} --part ID` };
  const found = findPart(source, part, (id) => catalog.withdrawn(id));
  if (found.ok) return { file: name, part, explanation: explain(read.stage, source, { part: found.part, asking }) };
  return { file: name, part, reason: catalog.withdrawn(part) === null ? 'unknown-part' : 'withdrawn', words: found.problem.message };
}

/** A withdrawn part is a "no": the choice was good once. What keeps the question from being asked is a wrong request. Among all saved stages one without a choice is no fault. */
function exitOfStage(one: ChosenStage, all: boolean): ExitCode {
  if ('explanation' in one) return exitOfOutcome(one.explanation.judged.outcome);
  if (one.reason === 'withdrawn') return EXIT.no;
  return all && one.reason === 'not-chosen' ? EXIT.yes : EXIT.request;
}

/** The worst of the stages: wrong before undecided before "no". Where no stage has a choice, nothing was checked. */
function worstOf(exits: readonly ExitCode[], stages: readonly ChosenStage[]): ExitCode {
  if (stages.every((one) => 'reason' in one && one.reason === 'not-chosen')) return EXIT.request;
  return WORST_FIRST.find((exit) => exits.includes(exit)) ?? EXIT.yes;
}

const WORST_FIRST = [EXIT.request, EXIT.undecided, EXIT.no] as const;
