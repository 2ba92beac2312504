import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { CHECK_IDS, deriveDemands } from '../../src/demands/index.js';
import type { Part } from '../../src/parts/part.js';
import { ORDERS } from '../../src/ranking/index.js';
import { buildStage, type Stage } from '../../src/stage/index.js';
import { plausibleParts } from '../bench/plausible-part.js';
import { temporaryFolder } from '../catalog/temporary.js';
import { dice } from '../simulate/random.js';
import { specOf } from '../support/stage-file.js';
import { arbitraryParts } from '../support/arbitrary-part.js';
import { genericList } from '../support/generic-list.js';
import { ALL_TOPOLOGIES, stageFile } from '../support/topology-stages.js';
import { writeCatalog } from './sql-form/catalog.js';
import { drawCatalog, drawSqlStage } from './sql-form/draw.js';
import { askedBeyondSql, NOT_IN_SQL } from './sql-form/statement.js';
import { threeForms } from './sql-form/three-forms.js';

/**
 * A second opinion that shares no code with the checks: SQLite works out every verdict from the part table, by SQL written from the contract. Not in it
 * are phase margin, noise, distortion, supply ripple, settling and frequency error (a search, an integral or a march over time each), a slew rate whose need
 * goes by the bandwidth of the part, and transimpedance stages (gain bandwidth and stable gain go by its own input). Stages drawn here ask none of these.
 * Nor does SQL say what is told beside a verdict, or which rejected parts are nearest.
 */
function stageOf(text: string): Stage | null {
  const built = buildStage(specOf(text));
  return built.ok ? built.stage : null;
}

const FOLDER = join(import.meta.dirname, '../../catalog/stages');
const PLAIN = { strict: false, order: 'merit', assumed: [] } as const;

async function catalogOf(parts: Parameters<typeof writeCatalog>[1]): Promise<string> {
  const file = join(temporaryFolder(), 'catalog.sqlite');
  await writeCatalog(file, parts);
  return file;
}

describe('the catalog answered by SQL', () => {
  it('says the same of every part as rows and dictionary, with the same tally, order and bytes, for any catalog and any stage it can answer', async () => {
    const seen = new Map<string, Set<string>>();
    await fc.assert(
      fc.asyncProperty(fc.nat(1e6), arbitraryParts, fc.boolean(), fc.constantFrom(...ORDERS), async (seed, any, strict, order) => {
        const stage = stageOf(drawSqlStage(dice(seed, 3)));
        fc.pre(stage !== null);
        const { approved, generic } = drawCatalog(seed, 20);
        const file = await catalogOf({ approved: [...approved, ...any.map((part) => ({ ...part, tier: 'approved' as const }))], generic });
        const { rows, dictionary, sql, answer } = await threeForms(file, stage, { strict, order, assumed: [] });
        expect(sql.parts).toEqual(rows.parts);
        expect(sql.tally).toEqual(rows.tally);
        expect(sql.lines).toEqual(rows.lines);
        expect(sql.json).toBe(rows.json);
        expect(dictionary).toEqual(rows);
        for (const [check, [outcome]] of answer.parts.flatMap(({ verdicts }) => Object.entries(verdicts))) seen.set(check, (seen.get(check) ?? new Set()).add(outcome));
      }),
      { numRuns: 25, seed: 5 },
    );
    // Each check that SQL answers was met with every outcome, so that agreement says something.
    const answered = CHECK_IDS.filter((check) => !(NOT_IN_SQL as readonly string[]).includes(check));
    expect([...seen.keys()].sort()).toEqual([...answered].sort());
    for (const check of answered) expect([check, [...(seen.get(check) ?? [])].sort()]).toEqual([check, ['fail', 'pass', 'unknown']]);
  }, 300_000);

  it('says the same on a bare stage of each topology it can answer', async () => {
    const file = await catalogOf(drawCatalog(1, 20));
    const beyond: string[] = [];
    for (const { topology } of ALL_TOPOLOGIES) {
      const stage = stageOf(stageFile(topology))!;
      if (askedBeyondSql(deriveDemands(stage)).length > 0) beyond.push(topology);
      else {
        const { rows, dictionary, sql } = await threeForms(file, stage, PLAIN);
        expect({ topology, ...sql }).toEqual({ topology, ...rows });
        expect({ topology, ...dictionary }).toEqual({ topology, ...rows });
      }
    }
    expect(beyond).toEqual(['transimpedance']);
  }, 120_000);

  it('puts what fits into the same order, on the stages that ship and that it can answer', async () => {
    const plausible = plausibleParts(dice(12, 0));
    const approved = Array.from({ length: 50 }, () => plausible.next().value as Part);
    const file = await catalogOf({ approved, generic: genericList.parts.filter((_, at) => at % 3 === 0) });
    const answered: string[] = [];
    for (const [at, name] of readdirSync(FOLDER).entries()) {
      const stage = stageOf(readFileSync(join(FOLDER, name), 'utf8'))!;
      if (askedBeyondSql(deriveDemands(stage)).length > 0) continue;
      answered.push(name);
      for (const order of [ORDERS[at % 4]!, ORDERS[(at + 2) % 4]!]) {
        const { rows, dictionary, sql } = await threeForms(file, stage, { ...PLAIN, order });
        expect(rows.lines.length, name).toBeGreaterThan(3);
        expect({ name, order, ...sql }).toEqual({ name, order, ...rows });
        expect(dictionary).toEqual(rows);
      }
    }
    expect(answered).toEqual(['bus-current.yaml', 'reference-buffer.yaml', 'thermistor-bridge.yaml', 'vent-motor-control.yaml', 'vent-vibration-pickup.yaml', 'water-meter.yaml']);
  }, 180_000);

  it('refuses a stage that asks what no SQL answers', async () => {
    const stage = stageOf(stageFile('follower', 'load: {capacitance: 1 nF}'))!;
    await expect(threeForms(await catalogOf(drawCatalog(1, 2)), stage, PLAIN)).rejects.toThrow('no SQL answers phase-margin');
  });
});
