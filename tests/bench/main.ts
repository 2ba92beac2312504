import { spawnSync } from 'node:child_process';
import { existsSync, readdirSync, rmSync, writeFileSync } from 'node:fs';
import { cpus } from 'node:os';
import { join, resolve } from 'node:path';
import { writeList } from '../../src/intake/write-list.js';
import type { Part } from '../../src/parts/part.js';
import { dice } from '../simulate/random.js';
import { benchCatalog, shippedCatalog, SEED } from './catalog.js';
import { duckDbScript } from './duckdb.js';
import { answerFromRows, timeLibrary } from './library.js';
import { plausibleParts } from './plausible-part.js';
import { COUNT10, JOB } from './queries.js';
import { linesOf, PAGE, tableOf, targetTable } from './targets.js';
import { interleaved, TELLING, timed, type Measure } from './timing.js';
import { wholeJob } from './whole-job.js';

/** How many parts and runs; `--quick` fits into some two minutes on an idle machine. */
interface Sizes {
  readonly large: number;
  readonly middle: number;
  /** Judged part by part for the comparison of S9: slow. */
  readonly rows: number;
  readonly runs: number;
}

const FULL: Sizes = { large: 1_000_000, middle: 100_000, rows: 10_000, runs: 11 };
const QUICK: Sizes = { large: 10_000, middle: 1000, rows: 1000, runs: 3 };
const FOLDER = resolve('.cache/bench');
const STAGES = resolve('catalog/stages');
const STAGE = join(STAGES, 'soil-moisture-probe.yaml');
const COMMAND = resolve('dist/railfit.mjs');
const SELF = process.argv[1] ?? '';

const [word, file = '', stage = STAGE] = process.argv.slice(2);
if (word === '--library') await timeLibrary(file, stage);
else if (word === '--rows') await answerFromRows(file, stage);
else await bench(process.argv.slice(2));

async function bench(words: readonly string[]): Promise<void> {
  const sizes = sizesOf(words);
  say(`catalogs of ${sizes.middle} and ${sizes.large} parts, seed ${SEED}`);
  const files = { large: await benchCatalog(FOLDER, sizes.large), middle: await benchCatalog(FOLDER, sizes.middle), rows: await benchCatalog(FOLDER, sizes.rows), shipped: await shippedCatalog(FOLDER) };
  const measures = [...own(files), ...others(files, sizes)];
  const runs = interleaved(measures, sizes.runs, say);
  say('the answer from rows');
  const same = timed(process.execPath, [SELF, '--rows', files.rows]).output === shortlistOf(files.rows).output;
  say('the sweeps, once');
  runs.set('sweep shipped', [sweepOf(files.shipped)]);
  runs.set('sweep middle', [sweepOf(files.middle)]);
  if (hasShell()) {
    say('the whole job as SQL, once');
    runs.set('shortlist rows', [shortlistOf(files.rows)]);
    runs.set('shell whole job rows', [timed('sqlite3', ['-readonly', files.rows], wholeJob(STAGE))]);
  }
  const lines = linesOf(runs, { ...sizes, same });
  const text = [`${sizes.runs} runs, interleaved; medians. ${machine()}`, '', targetTable(lines), '', tableOf(runs), ''].join('\n');
  process.stdout.write(text);
  if (words.includes('--write')) writeFileSync(join(FOLDER, 'results.md'), text);
}

function sizesOf(words: readonly string[]): Sizes {
  const base = words.includes('--quick') ? QUICK : FULL;
  const told = (name: keyof Sizes): number => Number(words[words.indexOf(`--${name}`) + 1]);
  const size = (name: keyof Sizes): number => (words.includes(`--${name}`) && told(name) > 0 ? told(name) : base[name]);
  return { large: size('large'), middle: size('middle'), rows: size('rows'), runs: size('runs') };
}

interface Files {
  readonly large: string;
  readonly middle: string;
  readonly rows: string;
  readonly shipped: string;
}

function shortlistOf(catalog: string): ReturnType<typeof timed> {
  return timed(process.execPath, [...TELLING, COMMAND, 'shortlist', STAGE, '--json', '--catalog', catalog]);
}

/** A part that does not fit, with everything that would let it in. */
function explainOf(catalog: string): ReturnType<typeof timed> {
  return timed(process.execPath, [...TELLING, COMMAND, 'explain', 'GX-CMOS-1M-RRIO', STAGE, '--catalog', catalog]);
}

/** A hundred values of the limit most often bargained over. */
function sweepOf(catalog: string): ReturnType<typeof timed> {
  return timed(process.execPath, [...TELLING, COMMAND, 'sweep', STAGE, '--over', 'limits.dcError=5mV..100mV', '--steps', '100', '--catalog', catalog]);
}

function own({ large, middle, shipped }: Files): Measure[] {
  return [
    { name: 'empty node', run: () => timed(process.execPath, [...TELLING, '-e', '0']) },
    { name: 'shortlist shipped', run: () => shortlistOf(shipped) },
    { name: 'shortlist middle', run: () => shortlistOf(middle) },
    { name: 'shortlist large', run: () => shortlistOf(large) },
    { name: 'library large', run: () => timed(process.execPath, [SELF, '--library', large]) },
    { name: 'explain shipped', run: () => explainOf(shipped) },
    { name: 'explain middle', run: () => explainOf(middle) },
    ...readdirSync(STAGES).sort().map((stage) => ({ name: `${PAGE}${stage}`, run: () => pageOf(stage, shipped) })),
  ];
}

/** The review page of a shipped stage, written. */
function pageOf(stage: string, catalog: string): ReturnType<typeof timed> {
  return timed(process.execPath, [...TELLING, COMMAND, 'report', join(STAGES, stage), '--catalog', catalog, '-o', join(FOLDER, 'page.html'), '--force']);
}

function others({ large, middle, rows }: Files, sizes: Sizes): Measure[] {
  const duckDb = duckDbScript(FOLDER, large);
  if (duckDb === null) say('no DuckDB: the package cannot be had here');
  if (!hasShell()) say('no sqlite3 shell on this machine (Debian: apt-get install sqlite3): S1, S4 and S7 are not measured');
  const csv = listFile(sizes.middle);
  return [
    { name: 'node COUNT10 middle', run: () => timed(process.execPath, countScript(middle)) },
    { name: 'node COUNT10 large', run: () => timed(process.execPath, countScript(large)) },
    { name: `rows, part by part, ${sizes.rows}`, run: () => timed(process.execPath, [SELF, '--rows', rows]) },
    { name: 'import middle', run: () => importOf(csv) },
    ...(duckDb === null ? [] : [{ name: 'node + DuckDB COUNT10 large', run: () => timed(process.execPath, [duckDb]) }]),
    ...(hasShell() ? shell({ large, csv }) : []),
  ];
}

// A function, not a constant: the bench is awaited at the top of this file, before constants below it exist.
function hasShell(): boolean {
  return spawnSync('sqlite3', ['--version']).status === 0;
}

function shell({ large, csv }: { large: string; csv: string }): Measure[] {
  return [
    { name: 'shell COUNT10 large', run: () => timed('sqlite3', [large, COUNT10]) },
    { name: 'shell job large', run: () => timed('sqlite3', [large, JOB]) },
    {
      name: 'shell import middle',
      run() {
        const to = join(FOLDER, 'shell-import.sqlite');
        rmSync(to, { force: true });
        return timed('sqlite3', [to], `.mode csv\n.import ${csv} part\n`);
      },
    },
  ];
}

/** COUNT10 as a script of its own asks it, with nothing else to load. */
function countScript(file: string): string[] {
  return ['-e', `console.log(new (require('better-sqlite3'))(${JSON.stringify(file)}, { readonly: true }).prepare(${JSON.stringify(COUNT10)}).pluck().get())`];
}

function importOf(csv: string): ReturnType<typeof timed> {
  const to = join(FOLDER, 'import.sqlite');
  rmSync(to, { force: true });
  timed(process.execPath, [COMMAND, 'parts', '--catalog', to]);
  return timed(process.execPath, [...TELLING, COMMAND, 'import', csv, '--catalog', to]);
}

/** The parts of the middle catalog as a canonical CSV. */
function listFile(parts: number): string {
  const csv = join(FOLDER, `list-${parts}.csv`);
  if (existsSync(csv)) return csv;
  const drawn = plausibleParts(dice(SEED, 0));
  writeFileSync(csv, writeList(Array.from({ length: parts }, () => drawn.next().value as Part), { raw: true }));
  return csv;
}

/** No names, no paths. */
function machine(): string {
  return `${cpus().length} cores, Node ${process.versions.node}, SQLite shell ${spawnSync('sqlite3', ['--version'], { encoding: 'utf8' }).stdout.split(' ')[0] ?? 'none'}.`;
}

function say(text: string): void {
  process.stderr.write(`${text}\n`);
}
