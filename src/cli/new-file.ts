import { existsSync, renameSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { dirname } from 'node:path';
import type { Problem } from '../quantities/problem.js';
import { EXIT } from './exit-code.js';
import { commandProblem, RequestError } from './request-error.js';

/** Why a file of this name cannot be made; null when it can. Looks only: another program may still be quicker. */
export function newFileProblem(file: string, force: boolean): Problem | null {
  if (existsSync(file)) {
    if (statSync(file).isDirectory()) return commandProblem('E503', `${file}: it is a folder`, { fix: 'name a file in it', path: '-o' });
    return force ? null : exists(file);
  }
  const folder = dirname(file);
  return existsSync(folder) && statSync(folder).isDirectory() ? null : commandProblem('E503', `${file}: there is no folder ${folder}`, { fix: 'name a file in a folder that is there', path: '-o' });
}

/** Writes a file whole or not at all, and none over another one unless forced. */
export function writeNewFile(file: string, text: string, force: boolean): void {
  const problem = newFileProblem(file, force);
  if (problem !== null) throw refusedFile(problem);
  const part = `${file}.${process.pid}.part`;
  try {
    writeFileSync(force ? part : file, text, { flag: 'wx' });
    if (force) renameSync(part, file);
  } catch (error) {
    throw refusedFile(failed(error, { file, part: force ? part : file }));
  }
}

function failed(error: unknown, { file, part }: { file: string; part: string }): Problem {
  const code = error instanceof Error && 'code' in error ? String(error.code) : '';
  if (code === 'EEXIST') return exists(part);
  rmSync(part, { force: true });
  const reasons: Record<string, string> = { EACCES: 'no permission to write there', EPERM: 'no permission to write there', EROFS: 'the disk is read-only', ENOSPC: 'the disk is full' };
  return commandProblem('E503', `${file}: ${reasons[code] ?? `cannot be written (${code})`}`, { fix: 'name another file', path: '-o' });
}

function exists(file: string): Problem {
  return commandProblem('C110', `${file} exists and is not written over`, { fix: 'another name, or --force', path: '-o' });
}

/** One exit code for a name that is taken, another for surroundings that do not let it be written. */
export function refusedFile(problem: Problem): RequestError {
  const exit = problem.code === 'C110' ? EXIT.request : EXIT.surroundings;
  return new RequestError([problem], exit, `Nothing was written. (exit ${exit})`);
}
