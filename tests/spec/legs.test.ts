import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { readStage } from '../../src/spec/read.js';
import type { StageSpec } from '../../src/spec/spec.js';
import { option, problemsOf, specOf } from '../support/stage-file.js';
import { stageFile } from '../support/topology-stages.js';

const summing = (legs: string, more = ''): string => stageFile('summing', `legs: ${legs}${more}`);
const told = (text: string): string[] => problemsOf(text).map(({ code, place, message, fix }) => `${code} ${place?.path ?? ''}: ${message} | ${fix ?? ''}`);
const legsOf = (spec: StageSpec): unknown[] => (spec.legs ?? []).map(({ name, level, resistance, gain }) => [name, level.kind === 'signal' ? [level.swing.min, level.swing.max] : level.kind, resistance?.value ?? gain?.value]);

const THREE = '{command: {input: 0.5..4.5 V, resistance: 100 kΩ}, trim: {input: 0..1 V, gain: -0.15}, centre: {input: supply, resistance: 100 kΩ}}';

describe('legs', () => {
  it('keep the names and the order of the file', () => {
    expect(legsOf(specOf(summing(THREE)))).toEqual([['command', [0.5, 4.5], 100e3], ['trim', [0, 1], 0.15], ['centre', 'supply', 100e3]]);
  });

  it('rest on ground, the reference or the supply, or stand still', () => {
    const legs = '{a: {input: ground, resistance: 1k}, b: {input: reference, resistance: 1k}, c: {input: 1.2 V, resistance: 1k}, 2nd_leg-x: {input: 20 mV ± 5 %, gain: 2}}';
    expect(legsOf(specOf(summing(legs)))).toEqual([['a', [0, 0], 1e3], ['b', 'reference', 1e3], ['c', [1.2, 1.2], 1e3], ['2nd_leg-x', [0.019, 0.021], 2]]);
  });

  it('AC-coupled swing about zero', () => {
    const spec = specOf(summing('{pump: {amplitude: 200 mVpp, resistance: 10k}, rest: {input: ground, gain: 1}}', '\nsignal: {coupling: ac}'));
    expect(legsOf(spec)).toEqual([['pump', [-0.1, 0.1], 10e3], ['rest', [0, 0], 1]]);
  });

  it('have a place each in the file', () => {
    expect(specOf(summing(THREE)).positions).toMatchObject({ 'legs.trim': { line: 4 }, 'legs.trim.gain': { line: 4 } });
  });

  it('may be twelve', () => {
    const many = (count: number): string => `{${Array.from({ length: count }, (_, at) => `l${String(at)}: {input: 0..1 V, gain: 1}`).join(', ')}}`;
    expect(specOf(summing(many(12))).legs).toHaveLength(12);
    expect(told(summing(many(13)))).toEqual(['S110 legs: 13 legs: a summing stage has at most 12 | two stages, or legs that are wired together as one']);
  });
});

describe('legs are refused', () => {
  it.each([
    ['{}', 'S102 legs: legs is missing'],
    ['5 V', 'S103 legs: legs is one value here'],
    ['{trim: 0..1 V}', 'S103 legs.trim: legs.trim is one value here; accepted: a map: {input: 0.5..4.5 V, resistance: 100 kΩ}'],
    ['{trim: {input: 0..1 V}}', 'S102 legs.trim.resistance: legs.trim.resistance is missing; accepted: a resistance: 100 kΩ | legs: {trim: {resistance: 100 kΩ}}'],
    ['{trim: {resistance: 10k}}', 'S102 legs.trim.input: legs.trim.input is missing'],
    ['{trim: {input: 0..1 V, resistance: 10k, gain: 2}}', 'S108 legs.trim.resistance: the leg is written twice: by its resistance and by its gain | keep resistance, or gain'],
    ['{trim: {input: 0..1 V, resistence: 10k, gain: 2}}', 'S101 legs.trim.resistence: resistence is not a key of legs.trim, did you mean resistance? accepted: input, amplitude, resistance, gain | resistance'],
    ['{trim: {input: 0..1 V, resistance: 0}}', 'S110 legs.trim.resistance: 0: a leg of 0 Ω is a short circuit into the summing node'],
    ['{trim: {input: 0..1 V, gain: 0}}', 'S110 legs.trim.gain: 0: a gain of 0 leaves no signal'],
    ['{trim: {amplitude: 1 Vpk, resistance: 10k}}', 'S108 legs.trim.amplitude: a DC-coupled leg is written by its extremes against ground; an amplitude alone needs coupling: ac'],
    ['{trim: {input: vcc, resistance: 10k}, a: {input: 1 V, gain: 1}}', 'S104 legs.trim.input: vcc is not one of the words taken here, did you mean supply?'],
    ['{trim: {input: 10 mA, resistance: 10k}}', 'Q004 legs.trim.input: a current where a voltage is expected'],
    ['{trim: {input: supply, resistance: 10k}}', 'S102 legs: no leg carries a voltage: all of them rest on supply, reference or ground'],
    ['{supply: {input: supply, resistance: 10k}, a: {input: 1 V, gain: 1}}', 'S113 legs.supply: supply is no name for a leg, since it means something else in a stage; taken: supply, reference, current, bus, load, input, temperature | supply-leg'],
    ['{"wind trim": {input: 1 V, gain: 1}, a: {input: 1 V, gain: 1}}', 'S113 legs.wind trim: wind trim is no name for a leg: letters, digits, - and _, at most 40 of them | wind-trim'],
    ['{a: {input: 1 V, gain: 1}, a: {input: 1 V, gain: 1}}', 'S109 legs.a: legs.a is written twice'],
  ])('%s', (legs, said) => {
    const problems = told(summing(legs));
    expect(problems).toHaveLength(1);
    expect(problems[0]).toContain(said);
  });

  it.each([
    ['{a: {input: 0..1 V, gain: 1}}', 'S108 legs.a.input: AC-coupled: amplitude only; extremes against ground do not pass a capacitor | amplitude: 100 mVpk'],
    ['{a: {amplitude: 1 Vpk, gain: 1}, b: {input: supply, gain: 1}}', 'S108 legs.b.input: AC-coupled: behind its capacitor a leg to the supply is a leg to ground, since neither moves | ground'],
  ])('AC-coupled: %s', (legs, said) => {
    expect(told(summing(legs, '\nsignal: {coupling: ac}'))).toEqual([said]);
  });

  it('no name breaks the reading, and a good one is kept', () => {
    fc.assert(
      fc.property(fc.oneof(fc.string({ unit: 'binary', minLength: 1 }), fc.stringMatching(/^[\w-]{1,45}$/u), fc.constantFrom('__proto__', 'constructor', 'toString')), (name) => {
        const read = readStage(summing(`{${JSON.stringify(name)}: {input: 0..1 V, gain: 1}}`));
        if (read.ok) expect(read.spec.legs?.[0]?.name).toBe(name);
        else expect(read.problems.every(({ code }) => ['S113', 'S100', 'S103'].includes(code))).toBe(true);
        expect(read.ok).toBe(/^[\w-]{1,40}$/u.test(name) && !['supply', 'reference', 'current', 'bus', 'load', 'input', 'temperature'].includes(name));
      }),
    );
  });
});

describe('options on legs', () => {
  const file = summing(THREE);

  it('change one figure and keep the order', () => {
    const spec = specOf(file, [option('legs.command.resistance', '220 kΩ')]);
    expect(legsOf(spec)).toEqual([['command', [0.5, 4.5], 220e3], ['trim', [0, 1], 0.15], ['centre', 'supply', 100e3]]);
    expect(spec.positions['legs.command.resistance']).toEqual({ option: '--set legs.command.resistance' });
    expect(spec.notes).toEqual([]);
  });

  it('replace one way to say it by the other, and say so', () => {
    const spec = specOf(file, [option('legs.trim.resistance', '220 kΩ')]);
    expect(legsOf(spec)[1]).toEqual(['trim', [0, 1], 220e3]);
    expect(spec.notes).toEqual(['--set legs.trim.resistance=220 kΩ: legs.trim.gain -0.15 of the file dropped']);
  });

  it('replace a whole leg in its place, or add one at the end', () => {
    const spec = specOf(file, [option('legs.command', '{input: 0..2 V, gain: 1}'), option('legs.extra', '{input: ground, resistance: 47k}')]);
    expect(legsOf(spec).map((leg) => (leg as unknown[])[0])).toEqual(['command', 'trim', 'centre', 'extra']);
    expect(legsOf(spec)[0]).toEqual(['command', [0, 2], 1]);
  });

  it.each([
    ['legs.trim.resistence', 'S101', 'legs.trim.resistance'],
    ['legs.trim.colour', 'S101', 'leave it out'],
    ['legs.load.gain', 'S113', 'load-leg'],
    ['legs.wind trim.gain', 'S113', 'wind-trim'],
    ['legs.', 'S113', 'trim'],
  ])('%s is refused with %s', (path, code, fix) => {
    expect(problemsOf(file, [option(path, '1')]).map((problem) => [problem.code, problem.fix])).toEqual([[code, fix]]);
  });

  it('may be named by mayChange', () => {
    expect(specOf(summing(THREE, '\nmayChange: [legs.trim.gain, limits.dcError]')).mayChange).toEqual(['legs.trim.gain', 'limits.dcError']);
    expect(told(summing(THREE, '\nmayChange: [legs.trim.gian]'))[0]).toContain('| legs.trim.gain');
  });
});
