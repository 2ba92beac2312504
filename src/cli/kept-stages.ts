import type { PartSource, StageChange, StageStanding } from '../index.js';
import type { Catalog, IncomingList } from '../catalog/index.js';
import type { Problem } from '../quantities/problem.js';
import { foundPath, judgeAgain, shownPath, type JudgedAgain, type KeptStage, type StageAnswer, type StageFile } from '../saved/index.js';

/** The team's stage files, where they are now and as the user would type them. */
export function keptStages(catalog: Pick<Catalog, 'file' | 'savedStages'>): KeptStage[] {
  return catalog.savedStages().map(({ path, part }) => ({ path: foundPath(path, catalog.file), name: shownPath(path, catalog.file, process.cwd()), part }));
}

/** Runs something that may change the list in force, and tells how the saved stages are answered before and after. Nothing is judged when none is saved. */
export function watchingStages<R>(catalog: Catalog, work: () => R, after: (result: R) => PartSource | null): { result: R; stages?: readonly StageChange[] } {
  const stages = keptStages(catalog);
  if (stages.length === 0) return { result: work() };
  const before = catalog.source();
  const result = work();
  const now = after(result);
  return now === null ? { result } : { result, stages: judgeAgain(stages, before, now).map(changeOf) };
}

/** What the catalog would answer from with this list in force. */
export function sourceWith(list: IncomingList, catalog: Pick<Catalog, 'source'>): PartSource {
  const source = catalog.source();
  const parts = ('parts' in list ? [...list.parts] : Array.from(list.rows(), (one) => one.part())).sort((a, b) => (a.id < b.id ? -1 : Number(a.id > b.id)));
  return { parts: [...parts, ...source.parts.filter(({ tier }) => tier === 'generic')], sha256: source.sha256, origin: () => null };
}

function changeOf(judged: JudgedAgain): StageChange {
  const { kept } = judged;
  const about = { file: kept.name, part: kept.part };
  if ('failed' in judged) return { ...about, outcome: 'not-judged', before: null, after: null, reason: failureWords(judged.failed) };
  return { ...about, outcome: judged.isOther ? 'other' : 'same', before: standingOf(judged.before), after: standingOf(judged.after) };
}

function standingOf({ fits, undecided, rejected, chosen }: StageAnswer): StageStanding {
  return { first: fits[0] ?? null, fit: fits.length, undecided: undecided.length, rejected, chosen };
}

/** Why a kept stage file is no stage now. */
export function failureWords({ cause, problems }: Extract<StageFile, { ok: false }>): string {
  if (cause === 'gone') return 'the file is gone';
  if (cause === 'unreadable') return 'the file cannot be read';
  const [first, ...others] = problems;
  return first === undefined ? 'it is not UTF-8' : `it no longer reads: ${placed(first)}${first.message}${others.length === 0 ? '' : `, and ${others.length} more`}`;
}

const placed = ({ place }: Problem): string => (place?.line === undefined ? '' : `line ${place.line}: `);
