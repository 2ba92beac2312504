import { describe, expect, it } from 'vitest';
import { min, typ } from '../support/parts.js';
import { judgingBy, verdictOrNull } from '../support/judged.js';
import { between, dc, resistors, stageSpec } from '../support/stages.js';

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
