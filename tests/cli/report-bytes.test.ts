// The same inputs give the same bytes wherever and however the command runs: another folder, time zone, language, terminal.
import { execFileSync } from 'node:child_process';
import { cpSync, mkdirSync, mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { BUILT, requireBuilt, ROOT } from '../support/built.js';

const STAGES = ['weather-mast.yaml', 'leaf-wetness.yaml'];
const PATIENCE = 120_000;

let folder: string;
const at = (...names: string[]): string => join(folder, ...names);

function report(cwd: string, env: Readonly<Record<string, string>>): string {
  const catalog = at(`catalog-${cwd}.sqlite`);
  const run = (...words: string[]): void => { execFileSync(process.execPath, [BUILT, ...words], { cwd: at(cwd), env: { PATH: process.env['PATH'], RAILFIT_CATALOG: catalog, SOURCE_DATE_EPOCH: '1773480600', ...env }, stdio: 'pipe' }); };
  run('import', 'demo-approved.csv');
  run('report', ...STAGES, '-o', 'review.html');
  return readFileSync(at(cwd, 'review.html'), 'utf8');
}

beforeAll(() => {
  requireBuilt();
  folder = mkdtempSync(join(tmpdir(), 'railfit-bytes-'));
  for (const cwd of ['here', 'elsewhere']) {
    mkdirSync(at(cwd));
    for (const stage of STAGES) cpSync(join(ROOT, 'catalog', 'stages', stage), at(cwd, stage));
    cpSync(join(ROOT, 'catalog', 'demo-approved.csv'), at(cwd, 'demo-approved.csv'));
  }
});
afterAll(() => { rmSync(folder, { recursive: true, force: true }); });

describe('the page of several stages', () => {
  it('is the same in another folder, time zone, language and terminal', { timeout: PATIENCE }, () => {
    const one = report('here', { TZ: 'UTC', LANG: 'C.UTF-8' });
    const other = report('elsewhere', { TZ: 'Pacific/Kiritimati', LANG: 'de_DE.UTF-8', LC_ALL: 'de_DE.UTF-8', COLUMNS: '40', FORCE_COLOR: '3' });
    expect(one).toContain('2026-03-14T09:30:00Z');
    expect(other === one).toBe(true);
  });
});
