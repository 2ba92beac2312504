import { describe, expect, it } from 'vitest';
import type { StageSpec } from '../../src/spec/spec.js';
import { ENTRIES } from '../support/check-values.js';
import { judgingBy, verdictOrNull } from '../support/judged.js';
import { max, min, ohms, typ } from '../support/parts.js';
import { BUTTERWORTH, filterStage, photodiodeStage, step } from '../support/shaped-stages.js';
import { dc, load, midSupply, stageSpec, value } from '../support/stages.js';

const judge = judgingBy('settling');
const settles = (within: number, to: number): Partial<StageSpec> => ({ limits: { settling: { within: value(within), to: value(to) } } });
const entry = (id: string) => ENTRIES.find((one) => one.id === id)!;

describe('settling of one pole', () => {
  // 4 V, 2 V/µs, τ = 1/(2π·1 MHz), 12 bits: a follower of 1 MHz.
  const { expected, inputs } = entry('SLW-06');
  const time = expected as number;
  const to = inputs['eps'] as number;
  const FAST = [min('slewRate', 2e6), min('gainBandwidth', 1e6)];

  it('is SLW-06, with slewing and linear settling as terms', () => {
    const verdict = judge(stageSpec('follower', step(0.5, 4.5), settles(3e-6, to)), FAST);
    expect(verdict).toMatchObject({ outcome: 'pass', unit: 's', sense: 'at-most', basis: 'guaranteed', required: 3e-6 });
    expect((verdict.offered as number) / time).toBeCloseTo(1, 6);
    expect(verdict.terms.map(({ name }) => name)).toEqual(['slewing', 'linear settling']);
    expect(verdict.terms.reduce((sum, { value }) => sum + value, 0)).toBeCloseTo(verdict.offered as number, 15);
  });

  it('turns where the time is met exactly', () => {
    const of = (factor: number) => judge(stageSpec('follower', step(0.5, 4.5), settles(time * factor, to)), FAST).outcome;
    expect([of(1.001), of(0.999)]).toEqual(['pass', 'fail']);
  });

  it('decides at the slew rate of SLW-09, and at a bandwidth where the slew rate cannot mend it', () => {
    const spec = stageSpec('follower', step(0.5, 4.5), settles(3e-6, to));
    const open = judge(spec, [typ('slewRate', 2e6), min('gainBandwidth', 1e6)]);
    expect(open).toMatchObject({ outcome: 'unknown', reason: 'typical-only', decidesAt: { figure: 'slewRate', kind: 'min' } });
    expect(open.decidesAt!.value / (entry('SLW-09').expected as number)).toBeCloseTo(1, 6);
    expect(judge(spec, [min('slewRate', open.decidesAt!.value), min('gainBandwidth', 1e6)]).outcome).toBe('pass');
    const slow = judge(spec, [min('slewRate', 2e6), typ('gainBandwidth', 0.9e6)]);
    expect(slow).toMatchObject({ outcome: 'unknown', decidesAt: { figure: 'gainBandwidth' } });
    expect(judge(spec, [min('slewRate', 2e6), min('gainBandwidth', slow.decidesAt!.value * 1.0001)]).outcome).toBe('pass');
  });

  it('without a figure is undecided, or fails on what is certain', () => {
    const spec = stageSpec('follower', step(0.5, 4.5), settles(3e-6, to));
    expect(judge(spec, [min('gainBandwidth', 1e6)])).toMatchObject({ outcome: 'unknown', reason: 'missing-figure', missing: [{ figure: 'slewRate' }], decidesAt: { figure: 'slewRate' } });
    expect(judge(spec, [min('slewRate', 2e6)])).toMatchObject({ outcome: 'unknown', missing: [{ figure: 'gainBandwidth' }], decidesAt: { figure: 'gainBandwidth' } });
    expect(judge(spec, [])).toMatchObject({ outcome: 'unknown', decidesAt: null });
    expect(judge(spec, [min('slewRate', 1e6)])).toMatchObject({ outcome: 'fail', offered: null });
    expect(judge(spec, [min('gainBandwidth', 0.4e6)])).toMatchObject({ outcome: 'fail', offered: null });
  });

  it('is not asked without a limit, and nothing to settle needs no figure', () => {
    expect(verdictOrNull('settling', stageSpec('follower', step(0.5, 4.5)), FAST)).toBeNull();
    expect(judge(stageSpec('follower', dc(2, 2), settles(1e-6, 0.01)), []).outcome).toBe('pass');
  });
});

describe('settling into a capacitance', () => {
  const spec = stageSpec('follower', step(0, 5), { ...settles(20e-6, 1e-3), load: { to: 'ground', capacitance: value(10e-9) } });
  const figures = [min('slewRate', 5e6), min('gainBandwidth', 100e6)];

  it('slews no faster than the usable current charges it: SLW-24, 0.5 V/µs from 5 mA into 10 nF', () => {
    const rate = entry('SLW-24').expected as number;
    const verdict = judge(spec, [...figures, min('outputCurrent', 5e-3)]);
    expect(verdict.terms[0]!.value * rate).toBeCloseTo(5, 1);
    expect(verdict.terms[0]).toMatchObject({ slot: 'outputCurrent.min', figure: { value: 5e-3, unit: 'A' } });
  });

  it('loses what the resistive load takes', () => {
    const beside = { ...spec, load: load(2e3, 'ground', 10e-9) };
    expect(judge(beside, [...figures, min('outputCurrent', 5e-3)]).terms[0]!.value).toBeCloseTo(5 / 0.25e6, 6);
    // 2.5 mA go through the resistor at 5 V: nothing is left, and the output current check rejects the part.
    const none = judge(beside, [...figures, min('outputCurrent', 2e-3)]);
    expect(none).toMatchObject({ outcome: 'unknown', offered: null });
    expect(none.cautions.join()).toMatch(/never settles/u);
    expect(judgingBy('output-current')(beside, [min('outputCurrent', 2e-3)]).outcome).toBe('fail');
  });

  it('is undecided without a usable current, and takes 1.5 × the heaviest head-room point where there is one', () => {
    expect(judge(spec, figures)).toMatchObject({ outcome: 'unknown', missing: [{ figure: 'outputCurrent' }], decidesAt: { figure: 'outputCurrent' } });
    const points = [max('outputLowHeadroom', 0.1, ohms(500, 'mid-supply', 5)), max('outputHighHeadroom', 0.1, ohms(500, 'mid-supply', 5))];
    expect(judge(spec, [...figures, ...points])).toMatchObject({ outcome: 'pass', basis: 'estimated' });
  });
});

describe('settling of more poles', () => {
  it('of a filter is at least its own, whatever the amplifier: 6.586/ω0 to 1 % for Butterworth', () => {
    const ideal = 6.586425 / (2 * Math.PI * 1e4);
    const spec = filterStage('sallen-key-low-pass', BUTTERWORTH, { signal: step(2, 3), ...settles(ideal * 1.02, 0.01) });
    const fast = [min('slewRate', 1e9), min('gainBandwidth', 1e9)];
    expect((judge(spec, fast).offered as number) / ideal).toBeCloseTo(1, 4);
    expect(judge(spec, fast).outcome).toBe('pass');
    expect(judge({ ...spec, ...settles(ideal * 0.98, 0.01) }, fast).outcome).toBe('fail');
  });

  it('that slews takes as long as the walk through it: passed above, failed below, no estimate', () => {
    const spec = (within: number) => filterStage('sallen-key-low-pass', BUTTERWORTH, { signal: step(2, 3), ...settles(within, 0.01) });
    const slews = [min('slewRate', 0.02e6), min('gainBandwidth', 1e9)];
    const ideal = 6.586425 / (2 * Math.PI * 1e4);
    const time = judge(spec(ideal * 2), slews).offered as number;
    expect(time / ideal).toBeGreaterThan(1.05);
    expect(judge(spec(time * 1.001), slews)).toMatchObject({ outcome: 'pass', basis: 'guaranteed' });
    expect(judge(spec(time * 0.999), slews)).toMatchObject({ outcome: 'fail' });
    const turn = judge(spec(time * 1.001), [typ('slewRate', 0.021e6), min('gainBandwidth', 1e9)]);
    expect(turn).toMatchObject({ outcome: 'unknown', reason: 'typical-only', decidesAt: { figure: 'slewRate' } });
    expect(turn.decidesAt!.value / 0.02e6).toBeCloseTo(1, 1);
  });

  it('of a transimpedance stage counts the part’s own input, told when it is not known', () => {
    const spec = photodiodeStage({ amperes: 10e-6, farad: 50e-12, ohms: 1e5, capacitor: 4e-12 }, settles(10e-6, 0.01));
    const figures = [min('slewRate', 100e6), min('gainBandwidth', 10e6)];
    expect(judge(spec, figures)).toMatchObject({ outcome: 'pass', basis: 'assumed' });
    const known = judge(spec, [...figures, typ('inputCapacitance', 10e-12)]);
    expect(known.offered).not.toBe(judge(spec, figures).offered);
    expect(known.terms[1]!.how).toMatch(/10 pF of its own/u);
  });

  it('with a reference that moves nothing stays exact at its edge', () => {
    const spec = stageSpec('inverting', step(2, 3), { resistors: { feedback: value(1e4), input: value(1e4), tolerance: value(0) }, reference: midSupply(), ...settles((2 * Math.log(100)) / (2 * Math.PI * 1e6), 0.01) });
    expect(judge(spec, [min('slewRate', 1e9), min('gainBandwidth', 1e6)]).outcome).toBe('pass');
    expect(judge(spec, [min('slewRate', 1e9), min('gainBandwidth', 0.999e6)]).outcome).toBe('fail');
  });
});
