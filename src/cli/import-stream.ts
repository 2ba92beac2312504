import { CatalogError, type Catalog, type IncomingList } from '../catalog/index.js';
import type { ImportReport } from '../index.js';
import type { RefusedList } from '../intake/list.js';
import { openStream } from '../intake/list-stream.js';
import { isSheet } from '../intake/patch-sheet.js';
import { ListRefused, NeedsWhole } from '../intake/stream-errors.js';
import type { ImportCommandOptions } from './import.js';
import { answersOf } from './import-options.js';
import type { ListFile } from './list-file.js';
import { savedMappings } from './mapping-files.js';
import type { Outcome, Session } from './session.js';

export interface StreamImporting {
  readonly session: Session;
  readonly options: ImportCommandOptions;
  readonly imported: (catalog: Catalog, list: IncomingList, context: { session: Session; options: ImportCommandOptions }) => Promise<ImportReport>;
  readonly refused: (list: RefusedList) => ImportReport;
  readonly said: (report: ImportReport, session: Session, options: ImportCommandOptions) => Outcome;
}

/**
 * Takes a canonical CSV in while it is read, in bounded memory. Null where the list has to be read as a whole, also when the catalog
 * does not let itself be written: what is wrong with the list is told first.
 */
export async function importStream({ name, source }: ListFile, catalog: Catalog, { session, options, imported, refused, said }: StreamImporting): Promise<Outcome | null> {
  // Saved stages are judged with all parts before and after, and a file of problems is written before the catalog is.
  if (options.showMapping === true || options.errors !== undefined || catalog.savedStages().length > 0) return null;
  const list = openStream(source, { file: name, tier: 'approved', genericIds: catalog.genericIds(), classes: catalog.classes(), mappings: savedMappings(session, options), ...answersOf(options) });
  if (list === null || isSheet(list.columns)) return null;
  try {
    return said(await imported(catalog, list, { session, options }), session, options);
  } catch (error) {
    if (error instanceof NeedsWhole || error instanceof CatalogError) return null;
    if (error instanceof ListRefused) return said(refused(error.list), session, options);
    throw error;
  }
}
