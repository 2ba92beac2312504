// The circuit does not depend on what a limit says: the stage taken over must be the one that is built.
import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import type { LimitsSpec, StageSpec } from '../../src/spec/spec.js';
import { buildStage, withLimits, type Built } from '../../src/stage/index.js';
import { DEMO, option, specOf } from '../support/stage-file.js';

const FOLDER = join(import.meta.dirname, '../../catalog/stages');
const STAGES = readdirSync(FOLDER).map((name) => ({ name, text: readFileSync(join(FOLDER, name), 'utf8') }));

function built(spec: StageSpec): Built {
  const result = buildStage(spec);
  if (!result.ok) throw new Error(result.problems.map(({ message }) => message).join('\n'));
  return { spec, stage: result.stage };
}

const scaled = (limits: LimitsSpec, name: keyof LimitsSpec, factor: number): LimitsSpec => {
  const limit = limits[name];
  return typeof limit === 'object' && 'value' in limit ? { ...limits, [name]: { ...limit, value: limit.value * factor } } : limits;
};

describe('a stage with other values of its limits', () => {
  it.each(STAGES)('is the one that is built: $name', ({ text }) => {
    const one = built(specOf(text));
    const names = Object.keys(one.spec.limits) as (keyof LimitsSpec)[];
    expect(names.length).toBeGreaterThan(0);
    for (const name of names.filter((limit) => limit !== 'startUp')) {
      for (const factor of [0.3, 3]) {
        const spec = { ...one.spec, limits: scaled(one.spec.limits, name, factor) };
        expect(JSON.stringify(withLimits(one, spec)), name).toBe(JSON.stringify(built(spec).stage));
      }
    }
  });

  it('has to be built where another limit is written, where a start-up is judged, and where anything else differs', () => {
    const one = built(specOf(DEMO));
    const { dcError, ...others } = one.spec.limits;
    expect(dcError).toBeDefined();
    expect(withLimits(one, { ...one.spec, limits: others })).toBeNull();
    expect(withLimits({ ...one, spec: { ...one.spec, limits: others } }, one.spec)).toBeNull();
    expect(withLimits(one, specOf(DEMO, [option('gain', '6')]))).toBeNull();
    const starting = built(specOf(DEMO, [option('limits.startUp', '1 ms')]));
    expect(withLimits(starting, { ...starting.spec, limits: scaled(starting.spec.limits, 'startUp', 2) })).toBeNull();
    expect(withLimits(starting, { ...starting.spec, limits: scaled(starting.spec.limits, 'dcError', 2) })?.asked.limits.dcError?.value).toBeCloseTo(0.04, 12);
  });
});
