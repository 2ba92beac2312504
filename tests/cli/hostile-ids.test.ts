// A list whose ids look like options, files and shell: every command an answer offers is pasted into a shell and asks what it says.
import { spawnSync } from 'node:child_process';
import { writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { beforeAll, describe, expect, it } from 'vitest';
import { BUILT, requireBuilt } from '../support/built.js';
import { makeWorkplace, type Workplace } from '../support/railfit.js';

const IDS = ['-X', '--json', "it's"];
const PROBE = 'soil-moisture-probe.yaml';
let place: Workplace;

beforeAll(async () => {
  requireBuilt();
  place = makeWorkplace();
  writeFileSync(join(place.folder, 'hostile.csv'), ['id,status,package', ...IDS.map((id) => `"${id}",approved,SO-8`), ''].join('\n'));
  const ran = await place.run(['import', 'hostile.csv']);
  expect(ran.exit, ran.stderr).toBe(0);
  return () => { place.remove(); };
}, 60_000);

const pasted = (text: string) =>
  spawnSync('sh', ['-c', `railfit() { '${process.execPath}' '${BUILT}' "$@"; }\n${text}\n`], { cwd: place.folder, encoding: 'utf8', env: { PATH: process.env['PATH'], HOME: place.folder, LANG: 'C.UTF-8', COLUMNS: '200', RAILFIT_CATALOG: place.catalog } });

describe('a part with a hostile id', () => {
  it.each(IDS)('%s: the commands of its explanation paste back', async (id) => {
    const ran = await place.run(['explain', '--', id, PROBE], { env: { COLUMNS: '200' } });
    expect(ran.stdout, ran.stderr).toContain(`${id.replace(/ +/gu, ' ')} cannot be decided`);
    const next = ran.stdout.slice(ran.stdout.lastIndexOf('\nNext')).replace('Next', '').split('\n').map((line) => line.trim()).filter((line) => line.startsWith('railfit explain'));
    expect(next.length).toBeGreaterThan(0);
    for (const line of next.slice(0, 1)) {
      const again = pasted(line.replace(/ {4,}\S.*$/u, ''));
      expect(again.stderr, line).toBe('');
      expect(again.status, line).toBe(4);
      expect(again.stdout.split('\n')[0], line).toBe(ran.stdout.split('\n')[0]);
    }
  }, 60_000);
});
