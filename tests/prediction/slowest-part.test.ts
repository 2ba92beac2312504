import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { predict } from '../../src/engine.js';
import type { Form } from '../../src/prediction/index.js';
import { readStage } from '../../src/spec/read.js';
import { buildStage, type Stage } from '../../src/stage/index.js';
import { genericList, genericSet } from '../support/generic-list.js';

// A part far too slow and too weak for most stages: every answer is a number or a reason, and there is an answer.

const STAGES = join(import.meta.dirname, '../../catalog/stages');

function stageOf(name: string): Stage {
  const spec = readStage(readFileSync(join(STAGES, name), 'utf8'), { file: name, overrides: [] });
  const built = spec.ok ? buildStage(spec.spec) : spec;
  if (!built.ok || !('stage' in built)) throw new Error(`${name} is no stage`);
  return built.stage;
}

describe('the slowest and weakest set that ships', () => {
  const part = genericSet('GX-NANO-ECO');
  const source = { parts: genericList.parts, sha256: genericList.sha256, origin: () => null };

  it.each(readdirSync(STAGES).filter((name) => name.endsWith('.yaml')))('on %s: numbers or reasons', { timeout: 60_000 }, (name) => {
    const { typical, worst } = predict(stageOf(name), source, { part }).prediction;
    const said = ({ results }: Form): unknown[] => Object.values(results).map((one) => (one.value === null ? one.reason : Number.isFinite(one.value)));
    for (const one of [...said(typical), ...said(worst)]) expect(one === true || (typeof one === 'string' && one !== '')).toBe(true);
  });

  it('has no current left for the load capacitance of the probe, and says so', () => {
    const { worst } = predict(stageOf('soil-moisture-probe.yaml'), source, { part }).prediction;
    expect(worst.results.settling).toEqual({ value: null, reason: 'the load takes all the current the output has: none is left to charge its capacitance' });
    expect(worst.results.frequency).toBeUndefined();
  });
});
