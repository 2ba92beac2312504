import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import Database from 'better-sqlite3';
import { describe, expect, it } from 'vitest';
import { freshSize, rebuildDictionary } from '../../src/catalog/dictionary.js';
import { encoder } from '../../src/catalog/encoder.js';
import { openCatalog, type Catalog } from '../../src/catalog/index.js';
import { partToRow } from '../../src/catalog/part-row.js';
import { shortlist } from '../../src/engine.js';
import { buildStage, type Stage } from '../../src/stage/index.js';
import { genericList } from '../support/generic-list.js';
import { specOf } from '../support/stage-file.js';
import { printedAs } from '../support/two-paths.js';
import { ANY, listOf, nextList, plausible } from './plausible-lists.js';
import { temporaryFolder } from './temporary.js';

function stage(name: string): Stage {
  const built = buildStage(specOf(readFileSync(join(import.meta.dirname, `../../catalog/stages/${name}.yaml`), 'utf8')));
  if (!built.ok) throw new Error(name);
  return built.stage;
}

const STAGES = [stage('thermistor-bridge'), stage('reference-buffer')];

const FIRST = plausible(3, 24);
const OTHERS = plausible(4, 24);
const SECOND = nextList(FIRST, OTHERS, { kept: 10, changed: 16, fresh: 20 });

async function filled(options: { patience?: number } = {}): Promise<{ catalog: Catalog; file: string; database: Database.Database }> {
  const file = join(temporaryFolder(), 'catalog.sqlite');
  const catalog = await openCatalog(file, options);
  catalog.seedGeneric({ ...genericList, parts: genericList.parts.slice(0, 10), records: genericList.records.slice(0, 10) });
  catalog.importList(listOf(FIRST, 'first.csv'));
  return { catalog, file, database: new Database(file) };
}

/** Both answers from one state of the file, each from a connection of its own. */
async function agrees(file: string, options: { patience?: number } = {}): Promise<void> {
  const [rows, views] = [await openCatalog(file, options), await openCatalog(file, options)];
  const [whole, taken] = [rows.source(), views.screenSource()];
  for (const one of STAGES) {
    const expected = printedAs(shortlist(one, whole));
    expect(printedAs(shortlist(one, taken))).toEqual(expected);
  }
  expect(taken.parts).toEqual(whole.parts);
  rows.close();
  views.close();
}

describe('the dictionary of the approved list', () => {
  it('is written with the list, and answers as the rows do: after a new list, and after taking it back', async () => {
    const { catalog, file, database } = await filled();
    expect(freshSize(database)).toBe(FIRST.length);
    await agrees(file);
    catalog.importList(listOf(SECOND, 'second.csv'), ANY);
    expect(freshSize(database)).toBe(SECOND.length);
    await agrees(file);
    catalog.undo();
    expect(freshSize(database)).toBe(FIRST.length);
    await agrees(file);
    catalog.close();
  });

  it('is the same made from the list and made from the rows', async () => {
    const { catalog, database } = await filled();
    catalog.importList(listOf(SECOND, 'second.csv'), ANY);
    const kept = (): unknown[] => [...database.prepare('select * from dictionary_trait order by trait').all(), ...database.prepare('select * from dictionary_segment order by trait').all()];
    const written = kept();
    rebuildDictionary(database);
    expect(kept()).toEqual(written);
    catalog.close();
  });

  it('does not hold after any change of the part table, and is made anew when it is asked', async () => {
    const { catalog, file, database } = await filled();
    catalog.close();
    for (const change of ["update part set slew_rate_min = 1e9, slew_rate_points = null where tier = 'approved'", "delete from part where id in (select id from part where tier = 'approved' limit 3)"]) {
      database.exec(change);
      expect(freshSize(database)).toBeNull();
      await agrees(file);
      expect(freshSize(database)).not.toBeNull();
    }
  });

  it('is not touched by new generic sets: they are read as rows', async () => {
    const { catalog, file, database } = await filled();
    expect(catalog.seedGeneric({ ...genericList, sha256: 'other', parts: genericList.parts.slice(5, 20), records: genericList.records.slice(5, 20) })).toBe(true);
    expect(freshSize(database)).toBe(FIRST.length);
    await agrees(file);
    catalog.close();
  });

  it('is left as it was when making it is interrupted, and the answer stays right', async () => {
    const { catalog, file, database } = await filled();
    catalog.close();
    database.exec("update part set offset_voltage_max = 1e-6, offset_voltage_points = null where tier = 'approved'");
    const interrupted = database.transaction(() => {
      const { add, finish } = encoder(database, FIRST.length);
      FIRST.forEach((part, at) => {
        add(at + 1, partToRow(part));
        if (at === 12) throw new Error('interrupted');
      });
      finish();
    });
    expect(interrupted).toThrow('interrupted');
    expect(freshSize(database)).toBeNull();
    await agrees(file);
  });

  it('is done without while another process writes', async () => {
    const { catalog, file, database } = await filled();
    catalog.close();
    database.exec("update part set supply_voltage_max = 3 where tier = 'approved'");
    database.exec('begin immediate');
    await agrees(file, { patience: 20 });
    database.exec('rollback');
    expect(freshSize(database)).toBeNull();
  });

  it('keeps the catalog from being written while a question is answered from it', async () => {
    const { catalog } = await filled();
    catalog.screenSource();
    expect(() => catalog.undo()).toThrow(/being read for one question/u);
    catalog.close();
  });

  it('loses its views when a copy of the source is given other parts', async () => {
    const { catalog } = await filled();
    const source = catalog.screenSource();
    expect(source.screening?.views.map(({ size }) => size)).toEqual([24, 10]);
    expect({ ...source, parts: [] }.screening).toBeUndefined();
    catalog.close();
  });
});
