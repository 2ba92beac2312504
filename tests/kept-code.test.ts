import { spawnSync } from 'node:child_process';
import { cpSync, mkdirSync, mkdtempSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { BUILT, requireBuilt, ROOT } from './support/built.js';

/** The built command once more, where its packages and the shipped lists are found as from its own place. */
let copy = '';

beforeAll(() => {
  requireBuilt();
  mkdirSync(join(ROOT, '.cache'), { recursive: true });
  copy = mkdtempSync(join(ROOT, '.cache', 'kept-code-'));
  cpSync(BUILT, join(copy, 'railfit.mjs'));
  cpSync(join(ROOT, 'dist', 'railfit'), join(copy, 'railfit'), { recursive: true });
});

afterAll(() => rmSync(copy, { recursive: true, force: true }));

const run = (command: string): unknown => {
  const { status, stdout, stderr } = spawnSync(process.execPath, [command, 'shortlist', 'catalog/stages/soil-moisture-probe.yaml', '--json', '--catalog', join(copy, 'catalog.sqlite')], { cwd: ROOT, encoding: 'utf8', env: {} });
  return { status, stdout, stderr };
};

/** Asked in a process of its own: engine flags stay as they are here. */
function isTaken(folder: string): string {
  const script = `import(${JSON.stringify(join(ROOT, 'dist', 'src', 'cli', 'compiled.js'))}).then(({ compiled }) => console.log(compiled(${JSON.stringify(folder)}).isKept))`;
  return spawnSync(process.execPath, ['-e', script], { encoding: 'utf8' }).stdout.trim();
}

describe('the code kept at the build', () => {
  it('is taken by the engine that made it, and missing or damaged code changes no byte of an answer', () => {
    run(BUILT);
    const answer = run(BUILT);
    expect(answer).toMatchObject({ status: 0, stderr: '' });
    const file = join(copy, 'railfit', readdirSync(join(copy, 'railfit')).find((name) => name.endsWith('.code'))!);
    const code = readFileSync(file);
    expect(isTaken(join(ROOT, 'dist', 'railfit'))).toBe('true');
    expect(run(join(copy, 'railfit.mjs'))).toEqual(answer);
    const flipped = Buffer.from(code);
    for (const place of [200, code.length >> 1, code.length - 9]) flipped.writeUInt8(flipped.readUInt8(place) ^ 0xff, place);
    for (const damaged of [flipped, code.subarray(0, code.length >> 1), Buffer.alloc(0), Buffer.from('no code')]) {
      writeFileSync(file, damaged);
      expect(isTaken(join(copy, 'railfit'))).toBe('false');
      expect(run(join(copy, 'railfit.mjs'))).toEqual(answer);
    }
    rmSync(file);
    expect(run(join(copy, 'railfit.mjs'))).toEqual(answer);
  });

  it('and without the program the command says how to build it', () => {
    const alone = join(copy, 'alone.mjs');
    cpSync(BUILT, alone);
    const folder = join(copy, 'railfit');
    const refusal = { status: 5, stdout: '', stderr: `error: the program is not built: ${folder} holds none (exit 5)\n   fix: npm run build\n` };
    for (const name of readdirSync(folder)) rmSync(join(folder, name));
    expect(run(alone)).toEqual(refusal);
    rmSync(folder, { recursive: true });
    expect(run(alone)).toEqual(refusal);
  });
});
