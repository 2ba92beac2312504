import { readFileSync } from 'node:fs';
import Database from 'better-sqlite3';
import { openCatalog } from '../../src/catalog/index.js';
import { shortlist } from '../../src/engine.js';
import { shortlistJson } from '../../src/presentation/json.js';
import { readStage } from '../../src/spec/read.js';
import type { Override } from '../../src/spec/spec.js';
import { buildStage, type Stage } from '../../src/stage/index.js';
import { COUNT10 } from './queries.js';

export function stageOf(file: string, overrides: readonly Override[] = []): Stage {
  const read = readStage(readFileSync(file, 'utf8'), { file, overrides });
  if (!read.ok) throw new Error(read.problems[0]?.message);
  const built = buildStage(read.spec);
  if (!built.ok) throw new Error(built.problems[0]?.message);
  return built.stage;
}

const tell = (name: string, from: number): void => void process.stderr.write(`${name} ${(performance.now() - from).toFixed(3)}\n`);

/** In this process: the first answer, the same again, one limit changed, and COUNT10 warm. Told on stderr, ms. */
export async function timeLibrary(file: string, stageFile: string): Promise<void> {
  const catalog = await openCatalog(file);
  const source = catalog.screenSource();
  for (const [name, limit] of [['first', undefined], ['again', undefined], ['changed', '80 µA']] as const) {
    const stage = stageOf(stageFile, limit === undefined ? [] : [{ path: 'limits.supplyCurrent', text: limit, option: '--set' }]);
    const from = performance.now();
    shortlist(stage, source).fit.slice(0, 20);
    tell(name, from);
  }
  const database = new Database(file, { readonly: true });
  const count = database.prepare(COUNT10).pluck();
  count.get();
  const from = performance.now();
  count.get();
  tell('count', from);
  catalog.close();
}

/** The answer from rows, part by part, on stdout as the command prints it. */
export async function answerFromRows(file: string, stageFile: string): Promise<void> {
  const catalog = await openCatalog(file);
  const from = performance.now();
  const answer = shortlistJson(shortlist(stageOf(stageFile), catalog.source()), { top: 20, all: false });
  tell('rows', from);
  process.stdout.write(answer);
  catalog.close();
}
