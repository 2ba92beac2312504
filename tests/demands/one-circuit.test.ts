// Stages that differ in what a budget says share what the others ask: it must be what each stage would ask by itself.
import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { circuitMark, deriveDemands, markOf, oneCircuit, type Demands } from '../../src/demands/index.js';
import { buildStage, withLimits, type Built, type Stage } from '../../src/stage/index.js';
import { specOf } from '../support/stage-file.js';

const FOLDER = join(import.meta.dirname, '../../catalog/stages');
const STAGES = readdirSync(FOLDER).map((name) => ({ name }));

const CHANGES: readonly (readonly [path: string, value: string])[] = [
  ['limits.dcError', '3 mV'], ['limits.dcError', '90 mV'], ['limits.supplyCurrent', '70 µA'], ['limits.outputNoise', '50 µVrms'], ['limits.outputNoise', '2 mVrms'],
  ['limits.phaseMargin', '61°'], ['limits.gainError', '0.7 %'], ['limits.swingLoss', '30 mV'], ['limits.distortion', '2 %'],
];

function builtFrom(name: string, override?: readonly [string, string]): Built {
  const spec = specOf(readFileSync(join(FOLDER, name), 'utf8'), override === undefined ? [] : [{ path: override[0], text: override[1], option: '--set' }]);
  const built = buildStage(spec);
  if (!built.ok) throw new Error(built.problems.map(({ message }) => message).join('\n'));
  return { spec, stage: built.stage };
}

/** Changed step by step, as a sweep does it: each from the one before, where the file writes that limit. */
function changed(name: string): { shared: Stage; alone: Stage }[] {
  const start = builtFrom(name);
  let last = start;
  const steps: { shared: Stage; alone: Stage }[] = [];
  for (const change of CHANGES) {
    const limit = change[0].replace('limits.', '');
    if (!(limit in start.spec.limits)) continue;
    const { spec, stage: alone } = builtFrom(name, change);
    const shared = withLimits(last, { ...last.spec, limits: { ...start.spec.limits, [limit]: (spec.limits as Record<string, unknown>)[limit] } });
    if (shared === null) continue;
    last = { spec: { ...last.spec, limits: shared.asked.limits }, stage: shared };
    steps.push({ shared, alone });
  }
  return steps;
}

const told = (demands: Demands): Record<string, string> => Object.fromEntries(Object.entries(demands).map(([name, one]) => [name, markOf(one, 'function')]));

describe('stages of one circuit', () => {
  it.each(STAGES)('ask what each asks by itself, on $name', ({ name }) => {
    const steps = changed(name);
    expect(steps.length).toBeGreaterThan(0);
    deriveDemands(builtFrom(name).stage);
    for (const { shared, alone } of steps) {
      expect(told(deriveDemands(shared))).toEqual(told(deriveDemands(alone)));
      expect(oneCircuit(shared).mark()).toBe(circuitMark(alone));
    }
  });

  it('share what looks at no budget, and nothing where the circuit changes with a limit', () => {
    const name = 'soil-moisture-probe.yaml';
    const { spec, stage } = builtFrom(name);
    const other = builtFrom(name, ['limits.dcError', '90 mV']).spec.limits;
    const moved = withLimits({ spec, stage }, { ...spec, limits: other });
    if (moved === null) throw new Error('not the same circuit');
    const [before, after] = [deriveDemands(stage), deriveDemands(moved)];
    expect(after['output-low']).toBe(before['output-low']);
    expect(after['dc-error']).not.toBe(before['dc-error']);
    expect(after['dc-error']?.required).toBe(0.09);
    const swung = withLimits({ spec, stage }, { ...spec, limits: builtFrom(name, ['limits.gainError', '0.7 %']).spec.limits });
    if (swung === null) throw new Error('built anew');
    expect(swung.vertices).toBe(stage.vertices);
    expect(oneCircuit(swung)).not.toBe(oneCircuit(stage));
    expect(oneCircuit(stage)).not.toBe(oneCircuit(builtFrom(name).stage));
  });
});
