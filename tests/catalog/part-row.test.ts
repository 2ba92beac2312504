import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import fc from 'fast-check';
import { expect, it } from 'vitest';
import { openCatalog } from '../../src/catalog/index.js';
import { PART_COLUMNS } from '../../src/catalog/part-columns.js';
import { partToRow, rowToPart } from '../../src/catalog/part-row.js';
import type { ListOptions, ReadList } from '../../src/intake/list.js';
import { readList } from '../../src/intake/read-list.js';
import { compareFigures } from '../../src/parts/figure-order.js';
import type { Figure } from '../../src/parts/figures.js';
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
      catalog.seedGeneric({ ...template, parts, records: parts.map(() => template.records).flat(), sha256: String(run) });
      expect(catalog.source().parts).toEqual(parts);
    }),
    { numRuns: 50 },
  );
  catalog.close();
});

it('a figure nobody printed is stored as assumed, through the file, beside one that was printed', async () => {
  const file = join(temporaryFolder(), 'catalog.sqlite');
  const plain = list(['id,offset voltage max (mV),quiescent current typ (µA)', 'A,3,85']);
  const [part] = plain.parts;
  if (part === undefined) throw new Error('the list has a part');
  const assumed: readonly Figure[] = [
    { parameter: 'inputLowHeadroom', kind: 'typ', value: 0, condition: {}, assumed: true },
    { parameter: 'outputLowHeadroom', kind: 'typ', value: 0.02, condition: { load: { kind: 'resistance', ohms: 10_000, to: 'mid-supply' } }, assumed: true },
    { parameter: 'outputLowHeadroom', kind: 'typ', value: 0.05, condition: { load: { kind: 'resistance', ohms: 2000, to: 'mid-supply' } } },
    { parameter: 'temperature', kind: 'max', value: 85, condition: {}, assumed: true },
  ];
  const figures = [...part.figures, ...assumed].sort(compareFigures);
  const catalog = await openCatalog(file);
  catalog.importList({ ...plain, parts: [{ ...part, figures }] });
  catalog.close();
  const again = await openCatalog(file);
  expect(again.approvedPart('A')?.figures).toEqual(figures);
  // The same value, printed now: another part.
  const printed = figures.map((figure) => ({ parameter: figure.parameter, kind: figure.kind, value: figure.value, condition: figure.condition }));
  expect(again.importList({ ...plain, parts: [{ ...part, figures: printed }], sha256: 'b'.repeat(64) }).counts).toMatchObject({ changed: 1 });
  expect(again.approvedPart('A')?.figures.some((figure) => figure.assumed === true)).toBe(false);
  again.close();
});

it('the same bytes read in another way are other parts; read in the same way they are no change, and nothing is written', async () => {
  const file = join(temporaryFolder(), 'catalog.sqlite');
  const catalog = await openCatalog(file);
  const lines = ['Part number,Approval,Vos (mV),GBW (MHz),Iq (µA)', 'A,Approved,3,1,85', 'B,Approved,2,2,90'];
  const read = (options: Partial<ListOptions>): ReadList => {
    const result = readList(new TextEncoder().encode(`${lines.join('\n')}\n`), { file: 'list.csv', tier: 'approved', ...options });
    if (!result.ok) throw new Error(result.problems.map(({ message }) => message).join('; '));
    return result;
  };
  expect(catalog.importList(read({})).outcome).toBe('imported');
  const before = readFileSync(file);
  expect(catalog.importList(read({})).outcome).toBe('no-change');
  expect(readFileSync(file).equals(before)).toBe(true);
  const mapped = catalog.importList(read({ map: [{ column: 'C', header: 'Vos max (mV)' }] }));
  expect(mapped).toMatchObject({ outcome: 'imported', counts: { changed: 2 } });
  expect(catalog.importList(read({ declare: { temperature: [-40, 85] } }))).toMatchObject({ outcome: 'imported', counts: { changed: 2 } });
  expect(catalog.source().origin('A', 'temperature.max')).toEqual({ kind: 'assumption', text: 'declared for the whole list: temperature -40..85 °C' });
  catalog.close();
});
