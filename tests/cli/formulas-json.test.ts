import { describe, expect, it } from 'vitest';
import { DOCUMENTS } from '../../src/presentation/schemas/index.js';
import { withWorkplace } from '../support/railfit.js';

const PROBE = 'soil-moisture-probe.yaml';

const workplace = withWorkplace(['import', 'approved.csv']);

describe('explain --formulas --json', () => {
  it('carries relation, numbers and source of the checks, as the text does; without the option nothing of it', async () => {
    const words = ['explain', 'HOUSE-01', PROBE];
    const { stdout } = await workplace().run([...words, '--formulas', '--json']);
    const document = JSON.parse(stdout) as { formulas: { check: string; relation: string; numbers: string | null; source: string }[]; verdicts: { check: string }[] };
    expect(DOCUMENTS.explanation.safeParse(document).error?.issues ?? []).toEqual([]);
    const text = (await workplace().run([...words, '--formulas'])).stdout.replace(/\s+/gu, ' ');
    expect(document.formulas.length).toBeGreaterThan(10);
    for (const { check, relation, numbers, source } of document.formulas) {
      expect(document.verdicts.map((verdict) => verdict.check)).toContain(check);
      for (const told of [relation, numbers ?? relation, source]) expect(text).toContain(told);
    }
    expect((await workplace().run([...words, '--json'])).stdout).not.toContain('"formulas"');
  }, 60_000);
});
