import { describe, expect, it } from 'vitest';
import type { Figure, Parameter } from '../../src/parts/figures.js';
import type { Basis } from '../../src/parts/basis.js';
import { isFarSupply, scalarReading } from '../../src/parts/select.js';
import { assumed, AT_25, max, min, typ, under } from '../support/parts.js';

const between = (coldest: number, hottest: number): { operating: typeof AT_25 } => ({ operating: { ...AT_25, coldest, hottest } });
const NEAR = between(10, 40);
const FAR = between(10, 41);

/** Pessimistic and optimistic value and the basis. */
function read(parameter: Parameter, figures: readonly Figure[], rules = {}): [number | undefined, number | undefined, Basis | undefined] {
  const worst = scalarReading(under(figures, rules), parameter);
  const best = scalarReading(under(figures, { ...rules, outlook: 'optimistic' }), parameter);
  expect(worst?.basis).toBe(best?.basis);
  return [worst?.value, best?.value, worst?.basis];
}

describe('a figure on both readings', () => {
  it('is the limit on both, guaranteed', () => {
    expect(read('slewRate', [min('slewRate', 1e6)])).toEqual([1e6, 1e6, 'guaranteed']);
  });

  it.each<[Parameter, number]>([
    ['slewRate', 0.6], ['gainBandwidth', 0.6], ['offsetDrift', 3], ['quiescentCurrent', 1.4], ['voltageNoise', 1.25], ['currentNoise', 1.25],
    ['commonModeRejection', 1 / 3.16], ['supplyRejection', 1 / 3.16], ['openLoopGain', 1 / 3.16],
  ])('is derated on the pessimistic one when only typical: %s × %f', (parameter, factor) => {
    expect(read(parameter, [typ(parameter, 10)])).toEqual([10 * factor, 10, 'derated']);
  });

  it('is derated by half its magnitude for an input head-room', () => {
    expect(read('inputLowHeadroom', [typ('inputLowHeadroom', -0.2)])).toEqual([-0.1, -0.2, 'derated']);
    expect(read('inputHighHeadroom', [typ('inputHighHeadroom', 1)])).toEqual([1.5, 1, 'derated']);
  });

  it('is the limit where a typical is known too', () => {
    expect(read('slewRate', [typ('slewRate', 9e6), min('slewRate', 1e6)])).toEqual([1e6, 1e6, 'guaranteed']);
  });

  it('is the limit even where a typical one stands at the nominal supply', () => {
    expect(read('slewRate', [typ('slewRate', 9e6, { supply: 5 }), min('slewRate', 1e6, { supply: 30 })])).toEqual([1e6, 1e6, 'assumed']);
  });

  it('is missing when not printed', () => {
    expect(read('slewRate', [])).toEqual([undefined, undefined, undefined]);
  });
});

describe('a figure @ 25 °C', () => {
  const AT = { temperature: 25 };

  it('stands within 15 K, exactly 15 K included', () => {
    expect(read('slewRate', [min('slewRate', 1e6, AT)], NEAR)).toEqual([1e6, 1e6, 'guaranteed']);
  });

  it.each<[Parameter, number]>([['slewRate', 0.8], ['gainBandwidth', 0.8], ['quiescentCurrent', 1.3]])('is an estimate further away: %s × %f', (parameter, factor) => {
    const limit = parameter === 'quiescentCurrent' ? max(parameter, 10, AT) : min(parameter, 10, AT);
    expect(read(parameter, [limit], FAR)).toEqual([10 * factor, 10, 'estimated']);
    expect(read(parameter, [limit], between(9.9, 25))).toEqual([10 * factor, 10, 'estimated']);
  });

  it('has both factors when it is typical as well', () => {
    const [worst, best, basis] = read('slewRate', [typ('slewRate', 1e6, AT)], FAR);
    expect(worst).toBeCloseTo(1e6 * 0.6 * 0.8, 6);
    expect([best, basis]).toEqual([1e6, 'estimated']);
  });

  it('has no factor where the contract names none', () => {
    expect(read('openLoopGain', [min('openLoopGain', 1e5, AT)], FAR)).toEqual([1e5, 1e5, 'guaranteed']);
  });

  it('has no factor when no temperature is stated: a limit holds over the range', () => {
    expect(read('slewRate', [min('slewRate', 1e6)], FAR)).toEqual([1e6, 1e6, 'guaranteed']);
  });

  it('is preferred within 15 K, and the one over temperature beyond, cold or hot', () => {
    for (const parameter of ['slewRate', 'openLoopGain'] as const) {
      const both = [min(parameter, 1000, AT), min(parameter, 700, { temperature: 'over' })];
      expect(read(parameter, both, NEAR)[0]).toBe(1000);
      expect(read(parameter, both, FAR)).toEqual([700, 700, 'guaranteed']);
      expect(read(parameter, both, between(-20, 10))).toEqual([700, 700, 'guaranteed']);
    }
  });
});

describe('figures at several supplies', () => {
  it('are read at the nearest one as a ratio', () => {
    // 5/3 = 1.667 against 8.2/5 = 1.64.
    expect(read('slewRate', [min('slewRate', 1e6, { supply: 3 }), min('slewRate', 2e6, { supply: 8.2 })])[0]).toBe(2e6);
    expect(read('slewRate', [min('slewRate', 1e6, { supply: 3 }), min('slewRate', 2e6, { supply: 8.4 })])[0]).toBe(1e6);
  });

  it('count as rated at the nominal one when none is stated', () => {
    expect(read('slewRate', [min('slewRate', 3e6), min('slewRate', 1e6, { supply: 4 })])[0]).toBe(3e6);
  });

  it('are the worse one at equal distance', () => {
    expect(read('slewRate', [min('slewRate', 1e6, { supply: 2.5 }), min('slewRate', 2e6, { supply: 10 })])[0]).toBe(1e6);
  });

  it('are assumed outside half to twice the nominal one; exactly there they hold', () => {
    const at = (supply: number): Basis | undefined => read('slewRate', [min('slewRate', 1e6, { supply })])[2];
    expect([at(2.5), at(10)]).toEqual(['guaranteed', 'guaranteed']);
    expect([at(2.49), at(10.01)]).toEqual(['assumed', 'assumed']);
    expect(isFarSupply(min('slewRate', 1), 5)).toBe(false);
  });

  it('keep their value far away: only the basis falls', () => {
    expect(read('slewRate', [min('slewRate', 1e6, { supply: 30 })])).toEqual([1e6, 1e6, 'assumed']);
  });
});

describe('--strict', () => {
  it('drops typical figures and those the user assumed', () => {
    const strict = { strict: true };
    expect(read('slewRate', [typ('slewRate', 1e6)], strict)[0]).toBeUndefined();
    expect(read('slewRate', [assumed(min('slewRate', 1e6))], strict)[0]).toBeUndefined();
    expect(read('slewRate', [min('slewRate', 1e6, { temperature: 25 })], { ...strict, ...FAR })).toEqual([8e5, 1e6, 'estimated']);
  });
});

describe('a figure the user assumed', () => {
  it('can pass, not fail: at best it is as good as can be', () => {
    expect(read('slewRate', [assumed(min('slewRate', 1e6))])).toEqual([1e6, Infinity, 'assumed']);
    expect(read('quiescentCurrent', [assumed(max('quiescentCurrent', 1e-6))])).toEqual([1e-6, 0, 'assumed']);
    // Known as typical alone, and yet less of them is better.
    expect(read('outputResistance', [assumed(typ('outputResistance', 200))])).toEqual([200, 0, 'assumed']);
    expect(read('inputCapacitance', [assumed(typ('inputCapacitance', 5e-12))])).toEqual([5e-12, 0, 'assumed']);
    expect(read('phaseMargin', [assumed(typ('phaseMargin', 60))])).toEqual([60, Infinity, 'assumed']);
    expect(read('inputLowHeadroom', [assumed(max('inputLowHeadroom', 0.1))])).toEqual([0.1, -Infinity, 'assumed']);
  });
});
