import { spawn, type ChildProcess } from 'node:child_process';
import { cpSync, mkdirSync, mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { beforeAll } from 'vitest';
import { BUILT, requireBuilt, ROOT } from './built.js';

/** How one run of the built command ended. */
export interface Ran {
  readonly exit: number | null;
  readonly stdout: string;
  readonly stderr: string;
}

export interface RunOptions {
  /** Added to the clean environment; undefined takes a variable out. */
  readonly env?: Readonly<Record<string, string | undefined>>;
  /** Standard input; closed at once when absent. */
  readonly input?: string | Uint8Array;
  /** Run by a user whom permissions bind. */
  readonly unprivileged?: boolean;
}

/** A temporary folder with the demo stages, the house lists and a catalog of its own, where the built command runs. */
export interface Workplace {
  readonly folder: string;
  readonly catalog: string;
  run(words: readonly string[], options?: RunOptions): Promise<Ran>;
  /** Started, not waited for. */
  start(words: readonly string[], options?: RunOptions): ChildProcess;
  remove(): void;
}

const isRoot = process.getuid?.() === 0;
/** The user and group without rights of most systems. */
const NOBODY = 65534;

export function makeWorkplace(): Workplace {
  const folder = mkdtempSync(join(tmpdir(), 'railfit-'));
  cpSync(join(ROOT, 'catalog', 'stages'), folder, { recursive: true });
  for (const list of ['approved.csv', 'approved-next.csv', 'approved-short.csv', 'refused.csv']) cpSync(join(ROOT, 'tests', 'golden', list), join(folder, list));
  mkdirSync(join(folder, 'home'));
  const catalog = join(folder, 'catalog.sqlite');
  const start = (words: readonly string[], options: RunOptions = {}): ChildProcess =>
    spawn(process.execPath, [BUILT, ...words], {
      cwd: folder,
      env: environment(folder, { RAILFIT_CATALOG: catalog, ...options.env }),
      stdio: 'pipe',
      ...(options.unprivileged === true && isRoot ? { uid: NOBODY, gid: NOBODY } : {}),
    });
  return {
    folder,
    catalog,
    start,
    run: (words, options = {}) => ended(start(words, options), options.input),
    remove: () => { rmSync(folder, { recursive: true, force: true }); },
  };
}

/** A workplace for the tests of one file or group, where the built command ran with these words once; gone after the last test. */
export function withWorkplace(words: readonly string[], patience = 60_000): () => Workplace {
  let place: Workplace | null = null;
  beforeAll(async () => {
    requireBuilt();
    place = makeWorkplace();
    await place.run(words);
    return () => { place?.remove(); };
  }, patience);
  return () => {
    if (place === null) throw new Error('the workplace is there from the first test on');
    return place;
  };
}

/** Nothing of the shell the tests run in: no colour, terminal, locale or catalog variable but those named. */
function environment(folder: string, more: Readonly<Record<string, string | undefined>>): NodeJS.ProcessEnv {
  const all: NodeJS.ProcessEnv = { PATH: process.env['PATH'], HOME: join(folder, 'home'), TMPDIR: folder, LANG: 'C.UTF-8', ...more };
  return Object.fromEntries(Object.entries(all).filter(([, value]) => value !== undefined));
}

/** Waits for a command that was started, with all it writes. */
export function ended(child: ChildProcess, input?: string | Uint8Array): Promise<Ran> {
  const out: Buffer[] = [];
  const err: Buffer[] = [];
  child.stdout?.on('data', (chunk: Buffer) => out.push(chunk));
  child.stderr?.on('data', (chunk: Buffer) => err.push(chunk));
  // A command that does not read its input may be gone before it is written.
  child.stdin?.on('error', () => undefined);
  child.stdin?.end(input);
  return new Promise((resolve, reject) => {
    child.on('error', reject);
    child.on('close', (exit) => { resolve({ exit, stdout: Buffer.concat(out).toString('utf8'), stderr: Buffer.concat(err).toString('utf8') }); });
  });
}
