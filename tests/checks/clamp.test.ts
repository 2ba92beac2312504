import { describe, expect, it } from 'vitest';
import type { Figure } from '../../src/parts/figures.js';
import type { SignalSpec, StageSpec } from '../../src/spec/spec.js';
import { judgingBy, verdictOrNull } from '../support/judged.js';
import { FULL, max, min, replacing, typ } from '../support/parts.js';
import { dc, exactly, resistors, stageSpec, value } from '../support/stages.js';
import { oscillatorStage } from '../support/shaped-stages.js';

const judge = judgingBy('clamp');
const AVOID: Partial<StageSpec> = { avoid: ['clamp'] };
const step = (low: number, high: number): SignalSpec => ({ ...dc(low, high), shape: 'step' });
const follower = (volts: number): StageSpec => stageSpec('follower', step(1, 1 + volts), AVOID);
const stands = (spec: StageSpec, inputClamp: boolean | null, figures: readonly Figure[] = FULL): string => judge(spec, figures, { identity: { inputClamp } }).outcome;

describe('input clamp', () => {
  it('is asked with avoid only', () => {
    expect(verdictOrNull('clamp', { ...follower(2), avoid: [] }, FULL, { identity: { inputClamp: true } })).toBeNull();
  });

  it('does not matter where the amplifier holds its inputs together', () => {
    const steady = stageSpec('follower', dc(1, 2, 1e3), AVOID);
    expect([stands(steady, true), stands(steady, null), stands(steady, false)]).toEqual(['pass', 'pass', 'pass']);
    expect(judge(steady, FULL).required).toBe(0);
  });

  it('is the whole step of a follower: conducting from 0.5 V, in earnest from 0.7 V', () => {
    expect([0.499, 0.5, 0.501, 0.7, 0.701].map((volts) => stands(follower(volts), true))).toEqual(['pass', 'pass', 'unknown', 'unknown', 'fail']);
    expect(judge(follower(2), FULL, { identity: { inputClamp: true } })).toMatchObject({ required: 2, offered: 0.7, unit: 'V', sense: 'at-least' });
  });

  it('is unknown where the list is silent, from 0.5 V on', () => {
    expect([0.5, 0.501].map((volts) => stands(follower(volts), null))).toEqual(['pass', 'unknown']);
    expect(judge(follower(2), FULL)).toMatchObject({ reason: 'missing-figure', missing: [{ figure: 'inputClamp' }] });
    expect(stands(follower(2), false)).toBe('pass');
  });

  it('is held against a differential rating', () => {
    const rated = [...FULL, max('differentialInput', 2)];
    expect([1.999, 2, 2.001].map((volts) => stands(follower(volts), null, rated))).toEqual(['pass', 'pass', 'fail']);
    expect(stands(follower(2.001), false, rated)).toBe('fail');
    expect(judge(follower(0.6), [...FULL, max('differentialInput', 0.4)], { identity: { inputClamp: true } })).toMatchObject({ outcome: 'fail', offered: 0.4 });
  });

  it('is a step referred to the input behind a gain: noise gain at its lower corner', () => {
    const spec = stageSpec('non-inverting', step(0.1, 0.4), { resistors: resistors(9e3, 1e3, 0), ...AVOID });
    expect(judge(spec, FULL).required).toBeCloseTo(0.3, 12);
  });
});

describe('a part that slews', () => {
  // 2 V peak about 2.5 V at 10 kHz: 125.66 mV/µs; the inputs part by up to the 4 V of the swing.
  const sine = stageSpec('follower', dc(0.5, 4.5, 10e3), AVOID);
  const slope = 2 * Math.PI * 10e3 * 2;
  const rate = (one: Figure) => replacing('slewRate', one);

  it('lets its inputs part', () => {
    const at = (share: number): unknown[] => {
      const { outcome, required } = judge(sine, rate(min('slewRate', slope * share)), { identity: { inputClamp: true } });
      return [outcome, required];
    };
    expect(at(1.001)).toEqual(['pass', 0]);
    expect(at(1)).toEqual(['pass', 0]);
    expect(at(0.999)).toEqual(['fail', 4]);
    expect(judge(sine, rate(min('slewRate', slope / 2)), { identity: { inputClamp: true } }).notes?.[0]).toContain('while it slews the inputs stand up to 4 V apart');
  });

  it('cannot be decided on a typical slew rate that reaches before its derating only', () => {
    const typical = rate(typ('slewRate', slope * 1.2));
    expect([stands(sine, true, typical), stands(sine, false, typical)]).toEqual(['unknown', 'pass']);
  });

  it('may slew where its slew rate is not known', () => {
    expect(judge(sine, rate(min('gainBandwidth', 2e6)), { identity: { inputClamp: true } })).toMatchObject({ outcome: 'unknown', missing: [{ figure: 'slewRate', kind: 'min' }] });
    expect(stands(sine, false, replacing('slewRate'))).toBe('pass');
  });
});

describe('other ways', () => {
  it('an oscillator parts its inputs by its thresholds', () => {
    const verdict = judge(oscillatorStage(1e3, { supply: exactly(3), ...AVOID }), FULL, { identity: { inputClamp: true } });
    expect(verdict.outcome).toBe('fail');
    expect(verdict.required).toBeCloseTo(1, 12);
  });

  it('an overload parts them by what the feedback no longer takes up', () => {
    const over = (more: Partial<StageSpec>) => judge(stageSpec('non-inverting', dc(0.1, 0.4), { overdrive: value(0.5), ...AVOID, ...more }), FULL).required;
    // 5.5 V at the input, 5 V at the output over a noise gain of 10 at the other.
    expect(over({ resistors: resistors(9e3, 1e3, 0) })).toBeCloseTo(5.5 - 0.5, 12);
    expect(judge(stageSpec('follower', dc(1, 2), { overdrive: value(0.6), ...AVOID }), FULL).required).toBeCloseTo(0.6, 12);
  });

  it('an inverting stage by the share of its input resistor', () => {
    // Input 5.5 V, output 0 V, equal resistors, + input at 2.5 V: the − input stands at 2.75 V. Input −0.5 V, output 5 V: 2.25 V.
    const spec = stageSpec('inverting', dc(1, 4), { resistors: resistors(1e4, 1e4, 0), reference: { kind: 'voltage', value: { min: 2.5, nominal: 2.5, max: 2.5, text: '2.5 V' } }, overdrive: value(0.5), ...AVOID });
    expect(judge(spec, FULL).required).toBeCloseTo(0.25, 12);
  });
});
