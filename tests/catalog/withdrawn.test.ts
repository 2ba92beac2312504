import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { openCatalog, type Catalog } from '../../src/catalog/index.js';
import { list } from './lists.js';
import { temporaryFolder } from './temporary.js';

const HEADER = 'id,slew rate min (V/µs)';
const MARCH = list([HEADER, 'A,1', 'B,2', 'C,3', 'D,4', 'E,5', 'F,6'], { file: 'march.csv' });
const APRIL = list([HEADER, 'F,6', 'E,5', 'D,4', 'C,3', 'B,2.5', 'A,1'], { file: 'april.csv' });
const MAY = list([HEADER, 'A,1', 'C,3', 'D,4', 'E,5', 'F,6', 'G,7'], { file: 'may.csv' });

async function catalogOf(...lists: readonly typeof MARCH[]): Promise<Catalog> {
  const catalog = await openCatalog(join(temporaryFolder(), 'catalog.sqlite'));
  for (const one of lists) expect(catalog.importList(one).outcome).toBe('imported');
  return catalog;
}

describe('a withdrawn part', () => {
  it('is told with the list that no longer had it, as it was last, down to the cell', async () => {
    const catalog = await catalogOf(MARCH, APRIL, MAY);
    const was = catalog.withdrawn('B');
    expect(was).toMatchObject({ by: { file: 'may.csv', sha256: MAY.sha256 }, takenBack: false, part: { id: 'B', tier: 'approved' } });
    expect(was?.part.figures).toMatchObject([{ parameter: 'slewRate', value: 2.5e6 }]);
    expect(was?.origin('slewRate.min')).toMatchObject({ file: 'april.csv', sha256: APRIL.sha256, line: 6, row: 6, columnLetter: 'B', cell: '2.5' });
    expect(was?.origin('gainBandwidth.typ')).toBeNull();
    catalog.close();
  });

  it('is in force again after an undo, and those the undone list had brought are told as taken back', async () => {
    const catalog = await catalogOf(MARCH, APRIL, MAY);
    catalog.undo();
    expect(catalog.withdrawn('B')).toBeNull();
    expect(catalog.withdrawn('G')).toMatchObject({ by: { file: 'may.csv' }, takenBack: true, part: { id: 'G' } });
    expect(catalog.withdrawn('G')?.origin('slewRate.min')).toMatchObject({ file: 'may.csv', line: 7, cell: '7' });
    catalog.close();
  });

  it('is not one that is on the list, a generic set, or one that never was', async () => {
    const catalog = await catalogOf(MARCH);
    catalog.seedGeneric(list(['id', 'GX-1'], { tier: 'generic' }));
    for (const id of ['A', 'GX-1', 'Z']) expect(catalog.withdrawn(id)).toBeNull();
    catalog.close();
  });
});

describe('origins over several imports', () => {
  const cellOf = (catalog: Catalog, id: string): unknown => {
    const origin = catalog.source().origin(id, 'slewRate.min');
    return origin?.kind === 'cell' ? [origin.file, origin.line, origin.cell] : origin;
  };

  it('every figure points into the list in force, changed or not; after an undo into the one before', async () => {
    const catalog = await catalogOf(MARCH, APRIL);
    expect(['A', 'B', 'F'].map((id) => cellOf(catalog, id))).toEqual([['april.csv', 7, '1'], ['april.csv', 6, '2.5'], ['april.csv', 2, '6']]);
    catalog.undo();
    expect(['A', 'B', 'F'].map((id) => cellOf(catalog, id))).toEqual([['march.csv', 2, '1'], ['march.csv', 3, '2'], ['march.csv', 7, '6']]);
    expect(catalog.importList(APRIL).outcome).toBe('imported');
    expect(cellOf(catalog, 'B')).toEqual(['april.csv', 6, '2.5']);
    catalog.close();
  });

  it('a figure whose column its header does not tell points to the column it was read from', async () => {
    const catalog = await openCatalog(join(temporaryFolder(), 'catalog.sqlite'));
    const plain = list(['id,slew rate min (V/µs),remark', 'A,1,0.5 (1 typ)'], { file: 'mixed.csv' });
    const [part] = plain.parts;
    if (part === undefined) throw new Error('the list has a part');
    const typical = { parameter: 'slewRate', kind: 'typ', value: 1e6, condition: {} } as const;
    const figures = [...part.figures, typical];
    const others = new Map([[1, new Map([['slewRate.typ', 1]])]]);
    const sources = { usual: new Map([['slewRate.typ', 3], ['temperature.max', 0]]), others, declared: 'temperature -40..85 °C' };
    catalog.importList({ ...plain, parts: [{ ...part, figures }, { ...part, id: 'B' }], records: [...plain.records, ...plain.records], sources });
    expect(catalog.source().origin('A', 'slewRate.typ')).toMatchObject({ columnLetter: 'C', header: 'remark', cell: '0.5 (1 typ)' });
    expect(catalog.source().origin('A', 'slewRate.min')).toMatchObject({ columnLetter: 'B', cell: '1' });
    expect(catalog.source().origin('B', 'slewRate.typ')).toMatchObject({ columnLetter: 'A', cell: 'A' });
    expect(catalog.source().origin('A', 'temperature.max')).toEqual({ kind: 'assumption', text: 'declared for the whole list: temperature -40..85 °C' });
    catalog.close();
  });
});
