import { readFileSync } from 'node:fs';
import type { Problem } from '../quantities/problem.js';
import { readStage } from '../spec/read.js';
import { buildStage, type Stage } from '../stage/index.js';

/** A kept stage file as it is now: a stage, or why it is none any more. */
export type StageFile =
  /** `part`: the one the file itself names. */
  | { readonly ok: true; readonly stage: Stage; readonly part: string | null }
  /** `gone`: no such file. `unreadable`: there, but it cannot be opened. `wrong`: what is in it is no stage. */
  | { readonly ok: false; readonly cause: 'gone' | 'unreadable' | 'wrong'; readonly problems: readonly Problem[] };

/** Reads a stage file that was kept by its path; `name` is what messages call it. Never throws: what happens to a file is an answer. */
export function readStageFile(path: string, name: string): StageFile {
  const text = textOf(path);
  if (typeof text !== 'string') return text;
  const read = readStage(text, { file: name });
  if (!read.ok) return { ok: false, cause: 'wrong', problems: read.problems };
  const built = buildStage(read.spec);
  return built.ok ? { ...built, part: read.spec.part ?? null } : { ok: false, cause: 'wrong', problems: built.problems };
}

function textOf(path: string): string | Extract<StageFile, { ok: false }> {
  try {
    return new TextDecoder('utf-8', { fatal: true }).decode(readFileSync(path));
  } catch (error) {
    const { code } = error as { readonly code?: string };
    if (code === 'ENOENT' || code === 'ENOTDIR') return { ok: false, cause: 'gone', problems: [] };
    return { ok: false, cause: code?.startsWith('ERR_') === true ? 'wrong' : 'unreadable', problems: [] };
  }
}
