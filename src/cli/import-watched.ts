import type { StageChange } from '../index.js';
import type { Catalog, GuardName, ImportResult, IncomingList } from '../catalog/index.js';
import { interruptible } from './interruptible.js';
import { sourceWith, watchingStages } from './kept-stages.js';
import { progressBar } from './progress.js';
import type { Session } from './session.js';

export interface WatchedImport {
  readonly session: Session;
  readonly accept: ReadonlySet<GuardName>;
  readonly dryRun: boolean;
  /** The import a patched list was made from. */
  readonly basedOn?: number;
}

/** The import itself, with a bar on the terminal and an open ear for Ctrl-C; and how the saved stages are answered before and after. */
export async function importWatched(catalog: Catalog, list: IncomingList, { session, accept, dryRun, basedOn }: WatchedImport): Promise<{ result: ImportResult; stages?: readonly StageChange[] }> {
  const bar = progressBar(session, (text) => void process.stderr.write(text));
  const progress = { comparing: bar.step('comparing'), writing: bar.step('writing') };
  try {
    return await interruptible(() =>
      watchingStages(
        catalog,
        () => catalog.importList(list, { dryRun, accept, progress, ...(basedOn === undefined ? {} : { basedOn }) }),
        // What is not written, or not yet, is judged as if it were.
        ({ outcome }) => (outcome === 'no-change' ? null : outcome === 'imported' ? catalog.source() : sourceWith(list, catalog)),
      ),
    );
  } finally {
    bar.end();
  }
}
