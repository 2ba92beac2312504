import { writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { beforeAll, describe, expect, it } from 'vitest';
import { requireBuilt } from '../support/built.js';
import { makeWorkplace, type Workplace } from '../support/railfit.js';

// The frozen table of exit codes, each met by a real command line. 70 has its own test (fault.test.ts), 130 stands in interrupt.test.ts.

const PROBE = 'soil-moisture-probe.yaml';
let place: Workplace;

beforeAll(async () => {
  requireBuilt();
  place = makeWorkplace();
  expect((await place.run(['import', 'approved.csv'])).exit).toBe(0);
  writeFileSync(join(place.folder, 'broken.yaml'), 'topology: follower\nsupply: 5\n');
  writeFileSync(join(place.folder, 'not-a-catalog.sqlite'), 'no catalog\n');
  return () => { place.remove(); };
});

const CASES: readonly (readonly [exit: number, why: string, words: readonly string[]])[] = [
  [0, 'something fits', ['shortlist', PROBE]],
  [0, 'the part fits', ['explain', 'HOUSE-01', PROBE]],
  [0, 'demands are derived', ['demands', PROBE]],
  [0, 'the catalog is listed', ['parts']],
  [0, 'the part is shown', ['part', 'HOUSE-01']],
  [0, 'the list is as it was', ['import', 'approved.csv']],
  [0, 'a dry run', ['import', 'approved-next.csv', '-n']],
  [0, 'help', ['help']],
  [0, 'help of a topic', ['help', 'exit-codes']],
  [0, 'nothing is asked', []],
  [0, 'the version', ['--version']],
  [1, 'nothing fits', ['shortlist', PROBE, '--set', 'limits.supplyCurrent=100 nA']],
  [1, 'the part does not fit', ['explain', 'HOUSE-06', PROBE]],
  [1, 'nothing matches', ['parts', 'no-such-word']],
  [1, 'no such part to show', ['part', 'HOUSE-99']],
  [2, 'unknown command', ['shortlsit', PROBE]],
  [2, 'unknown option', ['shortlist', PROBE, '--gian', '8']],
  [2, 'options without a command', ['--ascii']],
  [2, 'a quantity with two readings', ['shortlist', PROBE, '--load', '10M']],
  [2, 'a stage file that is wrong', ['shortlist', 'broken.yaml']],
  [2, 'a stage that contradicts itself', ['demands', PROBE, '--gain', '40']],
  [2, 'no stage', ['shortlist']],
  [2, 'unknown part to explain', ['explain', 'HOUSE-99', PROBE]],
  [2, 'no part to explain', ['explain', PROBE]],
  [2, 'no list to import', ['import']],
  [2, 'a list too many', ['import', 'approved.csv', 'approved-next.csv']],
  [2, 'a word outside its list', ['shortlist', PROBE, '--order', 'best']],
  [2, 'a check that does not exist', ['parts', '--failing', 'dc-eror', '--stage', PROBE]],
  [2, 'no such help', ['help', 'nothing-of-the-kind']],
  [2, 'a catalog without a name', ['parts', '--catalog', '']],
  [3, 'the list is refused', ['import', 'refused.csv']],
  [3, 'the list is refused, also when nothing would be written', ['import', 'refused.csv', '--dry-run']],
  [4, 'nothing fits, one cannot be decided', ['shortlist', PROBE, '--strict', '--set', 'limits.supplyCurrent=45 µA', '--set', 'limits.dcError=5 mV']],
  [4, 'the part cannot be decided', ['explain', 'HOUSE-03', PROBE]],
  [5, 'no such stage file', ['demands', 'nowhere.yaml']],
  [5, 'no such list', ['import', 'nowhere.csv']],
  [5, 'a folder for a stage file', ['demands', '.']],
  [5, 'another file for a catalog', ['parts', '--catalog', 'not-a-catalog.sqlite']],
];

describe('exit codes', () => {
  it.each(CASES)('%i: %s', async (exit, _why, words) => {
    const ran = await place.run(words);
    expect(ran.exit, ran.stdout + ran.stderr).toBe(exit);
    // A problem is told on stderr and says its code; an answer, also "no", is on stdout.
    if (exit === 2 || exit === 3 || exit === 5) {
      expect(ran.stdout).toBe('');
      expect(ran.stderr).toContain(`(exit ${exit})`);
    }
  });

  it.each(CASES.filter(([, , words]) => words.length > 1))('%i with --json: %s, and stdout is one document', async (exit, _why, words) => {
    const ran = await place.run([...words, '--json']);
    expect(ran.exit).toBe(exit);
    const document = JSON.parse(ran.stdout) as { schema: string; schemaVersion: number; problems?: unknown[] };
    expect(document.schema).toMatch(/^railfit\/[a-z]+$/u);
    expect(document.schemaVersion).toBe(1);
    expect(ran.stdout.endsWith('}\n')).toBe(true);
    expect(ran.stderr).toBe('');
    if (exit === 2 || exit === 5) expect(document).toMatchObject({ schema: 'railfit/problems', problems: expect.arrayContaining([expect.objectContaining({ severity: 'error' })]) as unknown });
    if (exit === 3) expect(document).toMatchObject({ schema: 'railfit/import', outcome: 'refused' });
  });
});
