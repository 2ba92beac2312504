// Every command README.md shows in a block of the shell, pasted in order into one: what a reader has written by then (the example stage
// and nothing else) is there, and each ends as the README says.
import { spawnSync } from 'node:child_process';
import { cpSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { BUILT, requireBuilt, ROOT } from '../support/built.js';

const README = readFileSync(join(ROOT, 'README.md'), 'utf8');

/** Lines of the shell's blocks; the walk through the demo has a test of its own. */
function commands(): string[] {
  const sections = README.split(/^## /mu).filter((text) => !text.startsWith('A walk through the demo\n'));
  const blocks = sections.flatMap((text) => [...text.matchAll(/^```sh\n([\s\S]*?)^```$/gmu)].map(([, body = '']) => body));
  return blocks.flatMap((body) => body.split('\n')).filter((line) => line.startsWith('railfit '));
}

const ON_A_TERMINAL = 'railfit draft --ask';
const COMMANDS = commands().filter((line) => !line.startsWith(ON_A_TERMINAL));

let folder: string;
beforeAll(() => {
  requireBuilt();
  folder = mkdtempSync(join(tmpdir(), 'railfit-readme-'));
  cpSync(join(ROOT, 'catalog'), join(folder, 'catalog'), { recursive: true });
  writeFileSync(join(folder, 'stage.yaml'), /\n```yaml\n([\s\S]*?)```/u.exec(README)?.[1] ?? '');
});
afterAll(() => { rmSync(folder, { recursive: true, force: true }); });

describe('the commands of README.md', () => {
  it('are many, and one of them is asked on a terminal', () => {
    expect(COMMANDS.length).toBeGreaterThan(25);
    expect(commands().filter((line) => line.startsWith(ON_A_TERMINAL))).toHaveLength(1);
  });

  it.each(COMMANDS)('%s', (line) => {
    const script = `railfit() { '${process.execPath}' '${BUILT}' "$@"; }\n${line}\n`;
    const ran = spawnSync('bash', ['-c', script], { cwd: folder, encoding: 'utf8', env: { PATH: process.env['PATH'], HOME: folder, LANG: 'C.UTF-8', RAILFIT_CATALOG: join(folder, 'own.sqlite') } });
    expect(ran.status, ran.stderr).toBe(Number(/# exit (\d+)/u.exec(line)?.[1] ?? 0));
  }, 120_000);
});
