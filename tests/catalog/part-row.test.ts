import { join } from 'node:path';
import fc from 'fast-check';
import { expect, it } from 'vitest';
import { openCatalog } from '../../src/catalog/index.js';
import { PART_COLUMNS } from '../../src/catalog/part-columns.js';
import { partToRow, rowToPart } from '../../src/catalog/part-row.js';
import { arbitraryParts } from '../support/arbitrary-part.js';
import { list } from './lists.js';
import { temporaryFolder } from './temporary.js';

it('a part becomes one value per column and comes back as it was', { timeout: 60_000 }, () => {
  fc.assert(
    fc.property(arbitraryParts, (parts) => {
      for (const part of parts) {
        const row = partToRow(part);
        expect(row).toHaveLength(PART_COLUMNS.length);
        expect(rowToPart(row)).toEqual(part);
      }
    }),
  );
});

it('also through the file, to the last bit', { timeout: 60_000 }, async () => {
  const template = list(['id', 'A'], { tier: 'generic' });
  const catalog = await openCatalog(join(temporaryFolder(), 'catalog.sqlite'));
  let run = 0;
  fc.assert(
    fc.property(arbitraryParts, (parts) => {
      run += 1;
      catalog.seedGeneric({ ...template, parts, records: [], sha256: String(run) });
      expect(catalog.source().parts).toEqual(parts);
    }),
    { numRuns: 50 },
  );
  catalog.close();
});
