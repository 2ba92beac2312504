// The sweep behind the figure "what the limit costs" looks at fewer parts and fewer values than `railfit sweep`: its answers must be the same.
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { beforeAll, describe, expect, it } from 'vitest';
import { reviewSweep } from '../../src/cli/review-sweep.js';
import { rerunOf } from '../../src/cli/rerun.js';
import { buildStage, readStage, readSwept, sweepOver, sweptOverride, sweptValues, type PartSource, type Stage, type StageSpec } from '../../src/index.js';
import { ROOT } from '../support/built.js';
import { PAGE_PARTS } from '../support/page.js';
import { viewSource } from '../support/two-paths.js';
import { sampleSource, STAGE_TEXT } from '../support/sample-report.js';

const asking = { strict: false, order: 'merit', assumed: [] } as const;

function stageOf(text: string): { readonly spec: StageSpec; readonly stage: Stage } {
  const read = readStage(text);
  if (!read.ok) throw new Error(read.problems.map(({ message }) => message).join('\n'));
  const built = buildStage(read.spec);
  if (!built.ok) throw new Error(built.problems.map(({ message }) => message).join('\n'));
  return { spec: read.spec, stage: built.stage };
}

/** More parts than the sample has: each with its offset, current, noise and speed scaled, so that they come in one after the other. */
const MANY = PAGE_PARTS.flatMap((part) => [0.3, 1, 4].map((factor) => ({
  ...part,
  id: `${part.id}-${factor}`,
  class: part.tier === 'generic' ? part.class : 'low-voltage-1mhz',
  figures: part.figures.map((figure) => (['offsetVoltage', 'quiescentCurrent', 'voltageNoise', 'gainBandwidth'].includes(figure.parameter) ? { ...figure, value: figure.value * factor } : figure)),
})));
const source: PartSource = sampleSource(MANY);

const LIMITS = {
  'limits.dcError': STAGE_TEXT,
  'limits.supplyCurrent': STAGE_TEXT.replace('dcError: 40 mV, ', ''),
  'limits.gainError': STAGE_TEXT.replace(', dcError: 40 mV, supplyCurrent: 90 µA', ''),
  'limits.outputNoise': STAGE_TEXT.replace('gainError: 1 %, dcError: 40 mV, supplyCurrent: 90 µA', 'outputNoise: 300 µVrms'),
} as const;

describe.each(Object.entries(LIMITS))('%s', { timeout: 120_000 }, (path, text) => {
  const { spec, stage } = stageOf(text);
  let found: NonNullable<ReturnType<typeof reviewSweep>>;
  beforeAll(() => {
    const swept = reviewSweep({ spec, stage, given: { text, overrides: [] }, source, asking, chosen: null });
    if (swept === null) throw new Error('nothing is swept');
    found = swept;
  }, 120_000);

  it('gives the same through views', () => {
    const views = viewSource(MANY);
    expect(reviewSweep({ spec, stage, given: { text, overrides: [] }, source: views, asking, chosen: null })).toEqual(found);
  });

  it('gives the counts, first choices and turns of the whole list', () => {
    const scale = path === 'limits.gainError' ? 100 : 1;
    const current = found.current! / scale;
    expect(found.over).toBe(path);
    const unit = { 'limits.dcError': 'V', 'limits.supplyCurrent': 'A', 'limits.gainError': '%', 'limits.outputNoise': 'Vrms' }[path] ?? '';
    const [from, to] = [current / 3, current * 3].map((end) => Number(end.toPrecision(6))) as [number, number];
    const field = readSwept(`${path}=${from * scale}${unit}..${to * scale}${unit}`, spec);
    if (!field.ok) throw new Error('no field');
    const rerun = rerunOf({ text, overrides: [] });
    const whole = sweepOver(source, { values: sweptValues({ from, to, steps: 13, scale: 'log' }), stageAt: (at) => rerun([sweptOverride(field.field, at)]) ?? 'no stage', asking });
    expect(found.points).toEqual(whole.points.map(({ value, state }) => ('counts' in state ? { value: value * scale, counts: state.counts, first: state.first } : { value, contradiction: true })));
    const turns = whole.turns.flatMap(({ at, from: before, to: after }) => ('counts' in before && 'counts' in after && before.first !== after.first ? [{ at, from: before.first, to: after.first }] : []));
    expect(found.turns.map(({ from: before, to: after }) => [before, after])).toEqual(turns.map(({ from: before, to: after }) => [before, after]));
    for (const [at, turn] of turns.entries()) expect(found.turns[at]!.at / scale / turn.at).toBeCloseTo(1, 6);
  });

  it('asks a list on which the limit decides something', () => {
    expect(new Set(found.points.map(({ counts }) => counts.fit)).size).toBeGreaterThan(1);
    expect(found.points[0]!.counts.fit + found.points[0]!.counts.undecided + found.points[0]!.counts.rejected).toBe(MANY.length);
  });
});

describe('a stage without a budget', () => {
  it('has no such figure', () => {
    const text = STAGE_TEXT.replace(/limits: .*\n/u, '');
    const { spec, stage } = stageOf(text);
    expect(reviewSweep({ spec, stage, given: { text, overrides: [] }, source, asking, chosen: null })).toBeNull();
  });
});

it('a demo stage is swept over its DC error, thirteen values of it', () => {
  const text = readFileSync(join(ROOT, 'catalog', 'stages', 'weather-mast.yaml'), 'utf8');
  const { spec, stage } = stageOf(text);
  const swept = reviewSweep({ spec, stage, given: { text, overrides: [] }, source, asking, chosen: null });
  expect(swept?.over).toBe('limits.dcError');
  expect(swept?.points).toHaveLength(13);
});
