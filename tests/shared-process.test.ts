// The files of a run share two processes and the modules in them (tests/vitest.config.ts), so each leaves both as it found them.
import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';

const ROOT = join(import.meta.dirname, '..');
/** Commands of their own, and what the bench alone times with: no test loads them. */
const PROGRAMS = ['tests/bench/main.ts', 'tests/bench/timing.ts', 'tests/fuzz/main.ts', 'tests/simulate/main.ts'];

const sourcesUnder = (folder: string): string[] => readdirSync(join(ROOT, folder), { recursive: true, encoding: 'utf8' }).map((name) => `${folder}/${name.replaceAll('\\', '/')}`).filter((name) => name.endsWith('.ts') && !PROGRAMS.includes(name));
const TESTS = sourcesUnder('tests');
const SOURCES = [...sourcesUnder('src'), ...sourcesUnder('migrations')];

/** Where this is written, as `file: what`. */
const found = (files: readonly string[], pattern: RegExp): string[] => files.flatMap((file) => [...readFileSync(join(ROOT, file), 'utf8').matchAll(pattern)].map(([text]) => `${file}: ${text.trim()}`));

describe('a test leaves the process as it was', () => {
  it.each<[string, RegExp]>([
    ['no module is replaced, nothing is spied on, no clock is stopped', /\bvi\.(?:mock|doMock|hoisted|spyOn|stub\w+|useFakeTimers|resetModules)\b/gu],
    ['the environment is handed to a command, not changed', /\bprocess\.env(?:\.\w+|\[[^\]]+\])\s*(?:\?\?|\|\|)?=(?!=)|\bdelete process\.env|\bObject\.assign\(process\.env/gu],
    ['folder, mask, exit code and listeners stay', /\bprocess\.(?:chdir|umask|setuid|setgid|on|once|addListener)\(|\bprocess\.exitCode\s*=(?!=)/gu],
    ['nothing is put on what all share', /\bglobalThis(?:\.\w+|\[[^\]]+\])\s*=(?!=)|\bfc\.configureGlobal\b|\w\.prototype\.\w+\s*=(?!=)/gu],
  ])('%s', (_, pattern) => {
    expect(TESTS.length).toBeGreaterThan(400);
    expect(found(TESTS, pattern)).toEqual([]);
  });

  it('what several files use sets no hook when it is loaded, which happens once for all of them', () => {
    expect(found(TESTS.filter((file) => !file.endsWith('.test.ts')), /^(?:before|after)(?:Each|All)\(/gmu)).toEqual([]);
  });

  it('no module of the program holds what changes from one question to the next', () => {
    expect(SOURCES.length).toBeGreaterThan(300);
    expect(found(SOURCES, /^(?:export )?(?:let|var) [^\n=]*/gmu)).toEqual([]);
  });
});
