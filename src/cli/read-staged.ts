import { stageList, type Catalog, type StagedList } from '../catalog/index.js';
import type { RefusedList } from '../intake/list.js';
import { openStream } from '../intake/list-stream.js';
import { isSheet } from '../intake/patch-sheet.js';
import { ListRefused, NeedsWhole } from '../intake/stream-errors.js';
import { answersOf, type ReadingOptions } from './import-options.js';
import { interruptible } from './interruptible.js';
import type { ListFile } from './list-file.js';
import { savedMappings } from './mapping-files.js';
import { progressBar } from './progress.js';
import type { Session } from './session.js';

/** Reads a canonical CSV row by row, in bounded memory. Null where the list has to be read as a whole. */
export async function readStaged({ name, source }: ListFile, catalog: Catalog, { session, options }: { session: Session; options: ReadingOptions }): Promise<StagedList | RefusedList | null> {
  // Saved stages are judged with all parts before and after.
  if (options.showMapping === true || catalog.savedStages().length > 0) return null;
  const stream = openStream(source, { file: name, tier: 'approved', genericIds: catalog.genericIds(), classes: catalog.classes(), mappings: savedMappings(session, options), ...answersOf(options) });
  if (stream === null || isSheet(stream.columns)) return null;
  const bar = progressBar(session, (text) => void process.stderr.write(text));
  try {
    return await interruptible(() => stageList(stream, bar.step('reading')));
  } catch (error) {
    if (error instanceof NeedsWhole) return null;
    if (error instanceof ListRefused) return error.list;
    throw error;
  } finally {
    bar.end();
  }
}
