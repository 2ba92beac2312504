import type Database from 'better-sqlite3';
import type { Part, PartSource, Tier } from '../parts/part.js';
import { guarded } from './catalog-error.js';
import { catalogHash } from './content.js';
import { partsInForce } from './in-force.js';
import type { CurrentImport } from './imports.js';
import { currentImport } from './imports.js';
import { cellFinder } from './list-cells.js';
import { originFinder } from './origins.js';

/** The parts in force, approved before generic, each tier by id. Read once; origins are looked up when asked for. */
export function partSource(database: Database.Database, file: string): PartSource {
  return guarded(file, () => database.transaction(() => readSource(database, file))());
}

interface KeptTier {
  readonly tier: Tier;
  readonly current: CurrentImport | null;
  readonly parts: readonly Part[];
}

function readSource(database: Database.Database, file: string): PartSource {
  const approved = readTier(database, 'approved');
  const generic = readTier(database, 'generic');
  const tierOf = new Map([generic, approved].flatMap((kept) => kept.parts.map((part): [string, KeptTier] => [part.id, kept])));
  const origin = originFinder(database);
  const cells = cellFinder(database);
  return {
    parts: [...approved.parts, ...generic.parts],
    sha256: catalogHash(approved.current?.contentSha256 ?? null, generic.current?.contentSha256 ?? null),
    origin(partId, slot) {
      const kept = tierOf.get(partId);
      if (kept === undefined || kept.current === null) return null;
      const { tier, current } = kept;
      return guarded(file, () => origin({ tier, from: current, partId, slot }));
    },
    cells(partId, figure) {
      const kept = tierOf.get(partId);
      const from = kept?.tier === 'approved' ? kept.current : null;
      return from === null ? [] : guarded(file, () => cells(from, partId, figure));
    },
  };
}

function readTier(database: Database.Database, tier: Tier): KeptTier {
  return { tier, current: currentImport(database, tier), parts: partsInForce(database, tier) };
}
