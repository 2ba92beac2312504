import { beforeAll, describe, expect, it } from 'vitest';
import { DOCUMENTS } from '../../src/presentation/schemas/index.js';
import { requireBuilt } from '../support/built.js';
import { makeWorkplace, type Workplace } from '../support/railfit.js';

const PROBE = 'soil-moisture-probe.yaml';
let place: Workplace;

beforeAll(async () => {
  requireBuilt();
  place = makeWorkplace();
  await place.run(['import', 'approved.csv']);
  return () => { place.remove(); };
}, 60_000);

describe('explain --formulas --json', () => {
  it('carries relation, numbers and source of the checks, as the text does; without the option nothing of it', async () => {
    const words = ['explain', 'HOUSE-01', PROBE];
    const { stdout } = await place.run([...words, '--formulas', '--json']);
    const document = JSON.parse(stdout) as { formulas: { check: string; relation: string; numbers: string | null; source: string }[]; verdicts: { check: string }[] };
    expect(DOCUMENTS.explanation.safeParse(document).error?.issues ?? []).toEqual([]);
    const text = (await place.run([...words, '--formulas'])).stdout.replace(/\s+/gu, ' ');
    expect(document.formulas.length).toBeGreaterThan(10);
    for (const { check, relation, numbers, source } of document.formulas) {
      expect(document.verdicts.map((verdict) => verdict.check)).toContain(check);
      for (const told of [relation, numbers ?? relation, source]) expect(text).toContain(told);
    }
    expect((await place.run([...words, '--json'])).stdout).not.toContain('"formulas"');
  }, 60_000);
});
