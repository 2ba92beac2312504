import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { rerunOf } from '../../src/cli/rerun.js';
import { overridesOf } from '../../src/cli/stage-input.js';
import { readStage, stageReader } from '../../src/spec/read.js';
import { buildStage } from '../../src/stage/index.js';
import { ROOT } from '../support/built.js';

const TEXT = readFileSync(join(ROOT, 'catalog', 'stages', 'soil-moisture-probe.yaml'), 'utf8');
const SETS = ['gain=6', 'limits.dcError=2 mV', 'resistors.feedback=100 kΩ', 'supply=3..3.6 V', 'signal.input=0.1..0.3 V', 'gain=lots', 'load.isolation=100 Ω', 'reference=mid-supply', 'limits={dcError: 5 mV}'];
const sets = fc.array(fc.constantFrom(...SETS), { maxLength: 3 });

describe('a stage under further options', () => {
  it('is read as a command with these options at its end reads it, in any order of asking', () => {
    const read = stageReader(TEXT);
    fc.assert(
      fc.property(fc.array(sets, { minLength: 1, maxLength: 4 }), (asked) => {
        for (const set of asked) {
          const { overrides } = overridesOf({ set });
          expect(read(overrides)).toEqual(readStage(TEXT, { overrides }));
        }
      }),
      { numRuns: 25 },
    );
  }, 60_000);

  it('is the stage that is built from it, over the options of the command', () => {
    const { overrides } = overridesOf({ set: ['gain=5'] });
    const rerun = rerunOf({ text: TEXT, overrides });
    const more = overridesOf({ set: ['limits.dcError=9 mV'] }).overrides;
    const spec = readStage(TEXT, { overrides: [...overrides, ...more] });
    const built = spec.ok ? buildStage(spec.spec) : null;
    expect(JSON.stringify(rerun(more))).toBe(JSON.stringify(built?.ok === true ? built.stage : null));
    expect(rerun(more)).toBe(rerun(more));
  });

  it('is null where the command would refuse it: what cannot be read, and what contradicts itself', () => {
    const rerun = rerunOf({ text: TEXT, overrides: [] });
    expect(rerun(overridesOf({ set: ['gain=lots'] }).overrides)).toBeNull();
    expect(rerun(overridesOf({ set: ['gain=80'] }).overrides)).toBeNull();
  });
});
