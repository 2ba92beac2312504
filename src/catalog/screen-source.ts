import type Database from 'better-sqlite3';
import type { PartSource, Screening } from '../parts/part.js';
import { viewOf, type ScreenView } from '../parts/screen-view.js';
import { once } from '../quantities/once.js';
import { CatalogError, guarded } from './catalog-error.js';
import { catalogHash } from './content.js';
import { freshSize, hasDictionary, rebuildDictionary } from './dictionary.js';
import { countInForce, isInForce, partInForce, partsInForce } from './in-force.js';
import { currentImport } from './imports.js';
import { cellFinder } from './list-cells.js';
import { originFinder } from './origins.js';
import { storedView } from './screen-view.js';

/**
 * The parts in force through views: the approved list through its dictionary, made anew when it does not hold any more, else from its rows;
 * the generic sets from their rows. A transaction stays open, so that all of it is read from one state of the catalog.
 */
export function screenSource(database: Database.Database, file: string): PartSource {
  return guarded(file, () => {
    renewDictionary(database, file);
    if (!database.inTransaction) database.exec('begin');
    return sourceOf(database, file);
  });
}

/** Another process may be at the catalog, or it may not be written: then the rows serve. */
function renewDictionary(database: Database.Database, file: string): void {
  if (database.inTransaction || !hasDictionary(database) || freshSize(database) !== null || countInForce(database, 'approved') === 0) return;
  try {
    guarded(file, () => rebuildDictionary(database));
  } catch (error) {
    if (!(error instanceof CatalogError) || !WITHOUT.has(error.code)) throw error;
  }
}

const WITHOUT: ReadonlySet<string> = new Set(['locked', 'readOnly', 'diskFull']);

function sourceOf(database: Database.Database, file: string): PartSource {
  const generic = partsInForce(database, 'generic');
  const genericIds = new Set(generic.map(({ id }) => id));
  const imports = { approved: currentImport(database, 'approved'), generic: currentImport(database, 'generic') };
  const [origin, cells] = [originFinder(database), cellFinder(database)];
  const approvedRows = once(() => guarded(file, () => partsInForce(database, 'approved')));
  const all = once(() => [...approvedRows(), ...generic]);
  const size = hasDictionary(database) ? freshSize(database) : null;
  const approved: ScreenView = size === null ? viewOf('approved', approvedRows()) : storedView(database, size);
  const isApproved = isInForce(database, 'approved');
  const source: PartSource = {
    get parts() { return all(); },
    sha256: catalogHash(imports.approved?.contentSha256 ?? null, imports.generic?.contentSha256 ?? null),
    origin(partId, slot) {
      // An id that a later set took from the list is still that of the list.
      const tier = genericIds.has(partId) && !isApproved(partId) ? 'generic' : 'approved';
      const from = imports[tier];
      return from === null ? null : guarded(file, () => origin({ tier, from, partId, slot }));
    },
    cells(partId, figure) {
      const from = partInForce(database, 'approved', partId) === null ? null : imports.approved;
      return from === null ? [] : guarded(file, () => cells(from, partId, figure));
    },
  };
  return withScreening(source, {
    views: [approved, viewOf('generic', generic)],
    generic,
    find: (id) => guarded(file, () => partInForce(database, 'approved', id)) ?? generic.find((one) => one.id === id) ?? null,
  });
}

/** Not enumerable: a copy of the source with other parts in it, as `--assume` makes one, must not keep views of these. */
function withScreening(source: PartSource, screening: Screening): PartSource {
  return Object.defineProperty(source, 'screening', { value: screening, enumerable: false });
}
