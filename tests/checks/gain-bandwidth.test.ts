import { describe, expect, it } from 'vitest';
import { min, typ } from '../support/parts.js';
import { judgingBy, verdictOrNull } from '../support/judged.js';
import { BUTTERWORTH, filterStage, photodiodeStage } from '../support/shaped-stages.js';
import { between, dc, resistors, stageSpec, value } from '../support/stages.js';

const judge = judgingBy('gain-bandwidth');
const SPEC = stageSpec('non-inverting', dc(0.1, 0.3, 2e3), { resistors: resistors(70e3, 10e3) });
const NEED = (8 * 2e3) / Math.sqrt(0.99 ** -2 - 1);

describe('gain bandwidth', () => {
  it.each([[NEED * 1.001, 'pass'], [NEED, 'pass'], [NEED * 0.999, 'fail']])('needs NG·f/√((1-ε)⁻²-1): %f Hz %s', (hertz, outcome) => {
    expect(judge(SPEC, [min('gainBandwidth', hertz)])).toMatchObject({ outcome, offered: hertz, sense: 'at-least', unit: 'Hz' });
  });

  it('of a typical figure counts 0.6 of it, @ 25 °C and away 0.48', () => {
    const warm = { ...SPEC, temperature: between(25, 60) };
    expect(judge(SPEC, [typ('gainBandwidth', NEED / 0.6)])).toMatchObject({ outcome: 'pass', basis: 'derated' });
    expect(judge(warm, [typ('gainBandwidth', NEED / 0.48, { temperature: 25 })])).toMatchObject({ outcome: 'pass', basis: 'estimated' });
    expect(judge(warm, [typ('gainBandwidth', NEED / 0.49, { temperature: 25 })]).outcome).toBe('unknown');
  });

  it('is undecided without the figure and not asked without a frequency', () => {
    expect(judge(SPEC, [])).toMatchObject({ outcome: 'unknown', reason: 'missing-figure', missing: [{ figure: 'gainBandwidth', kind: 'min' }] });
    expect(verdictOrNull('gain-bandwidth', stageSpec('follower', dc(1, 2)), [])).toBeNull();
  });
});

describe('gain bandwidth of a transimpedance stage', () => {
  const spec = photodiodeStage({ amperes: 1e-6, farad: 20e-12, ohms: 1e5, top: 1e6 }, { limits: { gainError: value(1 - Math.SQRT1_2) } });
  /** TIA-08, without any capacitance of the part's own. */
  const BARE = 13_908_686.66;

  it('counts the part’s own input capacitance in what it needs', () => {
    const own = judge(spec, [min('gainBandwidth', 30e6), typ('inputCapacitance', 5e-12)]);
    expect(own).toMatchObject({ outcome: 'pass', basis: 'derated', cautions: [] });
    const w = 2 * Math.PI * 1e6;
    const b = w * w * 1e5 * 25e-12 + Math.SQRT2 * w;
    expect(own.required as number).toBeCloseTo((b + Math.sqrt(b * b - 4 * w * w)) / (4 * Math.PI), 0);
    expect(judge(spec, [min('gainBandwidth', (own.required as number) * 0.999), typ('inputCapacitance', 5e-12)]).outcome).toBe('fail');
  });

  it('not known is not counted: assumed, and from where on it would be too much is said', () => {
    const open = judge(spec, [min('gainBandwidth', 1.5 * BARE)]);
    expect(open).toMatchObject({ outcome: 'pass', basis: 'assumed' });
    expect((open.required as number) / BARE).toBeCloseTo(1, 6);
    const picofarad = Number(/from ([\d.]+) pF on/u.exec(open.cautions[0] ?? '')?.[1]);
    const at = (factor: number) => judge(spec, [min('gainBandwidth', 1.5 * BARE), typ('inputCapacitance', picofarad * 1e-12 * factor)]).outcome;
    expect([at(1), at(1.02)]).toEqual(['pass', 'fail']);
    expect(judge(spec, [min('gainBandwidth', BARE * 0.999)])).toMatchObject({ outcome: 'fail', cautions: [] });
  });
});

it('gain bandwidth of a filter turns where the exact cubic does: GBW-33, 132.83 kHz', () => {
  const spec = filterStage('sallen-key-low-pass', BUTTERWORTH);
  expect([132_840, 132_820].map((hertz) => judge(spec, [min('gainBandwidth', hertz)]).outcome)).toEqual(['pass', 'fail']);
});
