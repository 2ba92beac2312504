import { describe, expect, it } from 'vitest';
import { assumedFigure } from '../../src/parts/assumption.js';
import type { Figure } from '../../src/parts/figures.js';
import type { StageSpec } from '../../src/spec/spec.js';
import { judgingBy, verdictOrNull } from '../support/judged.js';
import { FULL, max } from '../support/parts.js';
import { dc, fourResistors, legs, resistors, source, stageSpec, swing, value } from '../support/stages.js';

const judge = judgingBy('overdrive');
const follower = (more: Partial<StageSpec> = {}): StageSpec => stageSpec('follower', dc(1, 2), { avoid: ['overdrive'], ...more });
const rated = (...figures: readonly Figure[]): Figure[] => [...FULL, ...figures];

describe('overdrive', () => {
  it('is asked with avoid only', () => {
    expect(verdictOrNull('overdrive', follower({ avoid: [], overdrive: value(0.5) }), FULL)).toBeNull();
  });

  it('cannot be decided where the stage does not say how far its inputs go', () => {
    expect(judge(follower(), rated(max('inputOverdrive', 1)))).toMatchObject({ outcome: 'unknown', reason: 'not-said', required: null });
  });

  it('is held against the rating beyond a rail, met exactly is met', () => {
    const at = (volts: number): string => judge(follower({ overdrive: value(volts) }), rated(max('inputOverdrive', 0.3))).outcome;
    expect([0.299, 0.3, 0.301].map(at)).toEqual(['pass', 'pass', 'fail']);
  });

  it('or against the current a resistance in series lets through', () => {
    const at = (ohms: number): string => judge(follower({ overdrive: value(5), source: source(ohms) }), rated(max('inputOverdrive', 0.3), max('overdriveCurrent', 10e-3))).outcome;
    expect([499, 500, 501].map(at)).toEqual(['fail', 'pass', 'pass']);
  });

  it('takes the larger of the two', () => {
    const verdict = judge(follower({ overdrive: value(0.25), source: source(10) }), rated(max('inputOverdrive', 0.3), max('overdriveCurrent', 10e-3)));
    expect(verdict).toMatchObject({ outcome: 'pass', offered: 0.3, slot: 'inputOverdrive.max' });
  });

  it('is unknown without the figure, and tells where it would turn', () => {
    expect(judge(follower({ overdrive: value(0.5) }), FULL)).toMatchObject({ outcome: 'unknown', missing: [{ figure: 'inputOverdrive' }], decidesAt: { figure: 'inputOverdrive', value: 0.5 } });
    const current = judge(follower({ overdrive: value(0.5), source: source(1e3) }), rated(max('inputOverdrive', 0.3)));
    expect(current).toMatchObject({ outcome: 'unknown', missing: [{ figure: 'overdriveCurrent' }], decidesAt: { figure: 'overdriveCurrent', value: 0.5e-3, unit: 'A' } });
  });

  it('takes a current assumed for the run, which is without bound on the best reading', () => {
    const spec = follower({ overdrive: value(5), source: source(1e3) });
    const assumed = (amperes: number): string => judge(spec, [...FULL, assumedFigure('overdriveCurrent', amperes)]).outcome;
    expect([6e-3, 4e-3].map(assumed)).toEqual(['pass', 'unknown']);
  });

  it('asks nothing of a stage whose inputs stay within the rails', () => {
    expect(judge(follower({ overdrive: value(0) }), FULL).outcome).toBe('pass');
    expect(judge(follower({ overdrive: value(0), sequencing: 'supply-first' }), FULL).outcome).toBe('pass');
  });
});

describe('signal before supply', () => {
  const required = (spec: StageSpec): unknown => judge(spec, FULL).required;
  it('stands as far above V+ as the signal goes', () => {
    expect(required(follower({ sequencing: 'signal-first' }))).toBe(2);
    expect(required(follower({ sequencing: 'signal-first', overdrive: value(2.5) }))).toBe(2.5);
  });

  it('reaches the pins of a difference stage through the smaller of its input resistors', () => {
    const spec = stageSpec('difference', legs(swing(2, 3), swing(0, 0.5)), { resistors: fourResistors({ r1: 20e3, r2: 20e3, r3: 10e3, r4: 10e3 }, 0), avoid: ['overdrive'], sequencing: 'signal-first', source: source(1e3) });
    expect(judge(spec, rated(max('overdriveCurrent', 1e-3)))).toMatchObject({ outcome: 'pass', required: 3, offered: 11 });
  });

  it('reaches the − input of an inverting stage through its input resistor', () => {
    const spec = stageSpec('inverting', dc(-1, -0.5), { resistors: resistors(1e4, 5e3, 0), avoid: ['overdrive'], overdrive: value(1) });
    expect(judge(spec, rated(max('overdriveCurrent', 1e-3)))).toMatchObject({ outcome: 'pass', required: 1, offered: 5 });
  });
});
