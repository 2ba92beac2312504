import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import Database from 'better-sqlite3';
import { describe, expect, it } from 'vitest';
import { freshSize } from '../../src/catalog/dictionary.js';
import { encoder } from '../../src/catalog/encoder.js';
import { openCatalog, type Catalog } from '../../src/catalog/index.js';
import { partToRow } from '../../src/catalog/part-row.js';
import type { Part } from '../../src/parts/part.js';
import { buildStage, type Stage } from '../../src/stage/index.js';
import { type Told, threeForms } from '../screening/sql-form/three-forms.js';
import { genericList } from '../support/generic-list.js';
import { specOf } from '../support/stage-file.js';
import { ANY, listOf, nextList, plausible } from './plausible-lists.js';
import { temporaryFolder } from './temporary.js';

/** The same three answers as `tests/screening/sql-form.test.ts`, after all that can happen to a catalog. What SQL reads is the part table itself. */
/** Without the capacitance of its cable: that asks for a phase margin, which SQL does not answer. */
function stage(): Stage {
  const text = readFileSync(join(import.meta.dirname, '../../catalog/stages/soil-moisture-probe.yaml'), 'utf8').replace(', capacitance: 100 pF', '');
  const built = buildStage(specOf(text));
  if (!built.ok) throw new Error('the probe contradicts itself');
  return built.stage;
}

const FIRST = plausible(3, 40);
const OTHERS = plausible(4, 40);
const SECOND = nextList(FIRST, OTHERS, { kept: 15, changed: 30, fresh: 32 });

async function filled(): Promise<{ catalog: Catalog; file: string }> {
  const file = join(temporaryFolder(), 'catalog.sqlite');
  const catalog = await openCatalog(file);
  catalog.seedGeneric({ ...genericList, parts: genericList.parts.slice(0, 12), records: genericList.records.slice(0, 12) });
  catalog.importList(listOf(FIRST, 'first.csv'));
  return { catalog, file };
}

/** What all three forms say of the catalog as it stands. */
async function agreed(file: string): Promise<Told> {
  const { rows, dictionary, sql } = await threeForms(file, stage(), { strict: false, order: 'merit', assumed: [] });
  expect(sql).toEqual(rows);
  expect(dictionary).toEqual(rows);
  return rows;
}

const approved = ({ parts }: Told): string[] => Object.keys(parts).filter((name) => name.startsWith('approved ')).map((name) => name.slice('approved '.length)).sort();
const idsOf = (parts: readonly Part[]): string[] => parts.map(({ id }) => id).sort();

describe('SQL, rows and dictionary on one catalog', () => {
  it('say the same after an update with withdrawals, and the first answer again after taking it back', async () => {
    const { catalog, file } = await filled();
    const first = await agreed(file);
    expect(approved(first)).toEqual(idsOf(FIRST));
    catalog.importList(listOf(SECOND, 'second.csv'), ANY);
    const second = await agreed(file);
    expect(approved(second)).toEqual(idsOf(SECOND));
    expect(second.tally).not.toEqual(first.tally);
    catalog.undo();
    expect(await agreed(file)).toEqual({ ...first, json: expect.stringContaining('"schema": "railfit/shortlist"') as string });
    catalog.close();
  }, 60_000);

  it('say the same after rows were changed and withdrawn by hand', async () => {
    const { catalog, file } = await filled();
    catalog.close();
    const first = await agreed(file);
    const database = new Database(file);
    database.exec("update part set slew_rate_min = 1, slew_rate_points = null where tier = 'approved' and id < 'PN-0000012'");
    database.exec("update part set withdrawn_at = import_id where tier = 'approved' and id > 'PN-0000030'");
    database.close();
    const then = await agreed(file);
    expect(approved(then)).toEqual(idsOf(FIRST).filter((id) => id <= 'PN-0000030'));
    expect(then.tally['slew-rate']![0]).toBeGreaterThan(first.tally['slew-rate']![0]);
  }, 60_000);

  it('say the same after the making of the dictionary was interrupted, and once more when it is made', async () => {
    const { catalog, file } = await filled();
    catalog.close();
    const database = new Database(file);
    database.exec("update part set offset_voltage_max = 1e-6, offset_voltage_points = null where tier = 'approved'");
    const interrupted = database.transaction(() => {
      const { add } = encoder(database, FIRST.length);
      FIRST.forEach((part, at) => {
        add(at + 1, partToRow(part));
        if (at === 20) throw new Error('interrupted');
      });
    });
    expect(interrupted).toThrow('interrupted');
    expect(freshSize(database)).toBeNull();
    const first = await agreed(file);
    expect(freshSize(database)).toBe(FIRST.length);
    expect(await agreed(file)).toEqual(first);
    database.close();
  }, 60_000);
});
