import { describe, expect, it } from 'vitest';
import { knownOf } from '../../src/checks/check.js';
import { dcError } from '../../src/checks/dc-error.js';
import { basisOf, currentsIn, hasDrift, totalOf, wholeBiasIn, type Total } from '../../src/checks/dc-error-sum.js';
import { rowOf, type Row } from '../../src/checks/in-numbers.js';
import type { DcErrorDemand } from '../../src/demands/index.js';
import type { Figure } from '../../src/parts/figures.js';
import { readingsOf } from '../../src/parts/readings.js';
import type { ClassWorst, Outlook } from '../../src/parts/reading.js';
import { max, min, typ, under } from '../support/parts.js';

const ASKED: DcErrorDemand = {
  check: 'dc-error', required: 1, unit: 'V', sense: 'at-most', because: '', source: '', noiseGain: 10, kelvin: 60, positive: 1e3, negative: 3e3, tolerance: 0,
  commonModeMove: 1, outputMove: 2, sourceSpread: 0, supply: { min: 4.5, nominal: 5, max: 5.5 }, temperature: 85, hottest: 85,
};

function row(figures: readonly Figure[], of: { readonly outlook?: Outlook; readonly classWorst?: ClassWorst; readonly demand?: Partial<DcErrorDemand> } = {}): Row {
  const asked = { ...ASKED, ...of.demand };
  return rowOf(dcError.inNumbers!, asked, knownOf(dcError.terms, { asked, readings: readingsOf(under(figures, { outlook: of.outlook ?? 'pessimistic', classWorst: of.classWorst ?? null })) }));
}
const sum = (...of: Parameters<typeof row>): Total => totalOf({ ...ASKED, ...of[1]?.demand }, row(...of));

const OVER = { temperature: 85 } as const;
const ALL = [
  max('offsetVoltage', 1e-3), max('offsetDrift', 5e-6), max('biasCurrent', 10e-9, OVER), max('offsetCurrent', 4e-9, OVER),
  min('commonModeRejection', 1e4), min('supplyRejection', 1e4), min('openLoopGain', 1e5),
];
const without = (parameter: string): Figure[] => ALL.filter((one) => one.parameter !== parameter);

describe('the DC error in numbers', () => {
  it('is the worst-case sum at the output, term by term (by hand)', () => {
    // 1 mV + 5 uV/K * 60 K + 10 nA * 2 kOhm + 2 nA * 4 kOhm + 1 V/10^4 + 0.5 V/10^4 + 2 V/10^5, times 10.
    const { known, missing, borrowed, weakness } = sum(ALL);
    expect(known).toBeCloseTo(10 * (1e-3 + 300e-6 + 20e-6 + 8e-6 + 100e-6 + 50e-6 + 20e-6), 12);
    expect([missing, borrowed, weakness]).toEqual([0, 0, 0]);
  });

  it('counts what is missing, and adds up the rest', () => {
    const { known, missing } = sum(without('supplyRejection').filter(({ parameter }) => parameter !== 'openLoopGain'));
    expect([missing, known < sum(ALL).known, known > 0]).toEqual([2, true, true]);
    expect(sum([]).missing).toBe(6);
  });

  it('stands on its weakest term, and says how much of it is borrowed', () => {
    const typical = sum([typ('offsetDrift', 1e-6), ...without('offsetDrift')]);
    expect([basisOf(typical), typical.borrowed]).toEqual(['derated', 0]);
    const lent = sum(without('supplyRejection'), { classWorst: { supplyRejection: 1e3 } });
    expect(basisOf(lent)).toBe('borrowed');
    expect(lent.borrowed).toBeCloseTo(10 * 0.5 / 1e3, 12);
  });

  it('charges no drift beside an offset rated over temperature', () => {
    const over = [max('offsetVoltage', 2e-3, { temperature: 'over' }), ...ALL.slice(1)];
    expect([hasDrift(row(over)), hasDrift(row(ALL))]).toEqual([false, true]);
    expect(sum(over).known).toBeCloseTo(sum(ALL).known + 10 * (1e-3 - 300e-6), 12);
  });

  it('takes the bias current for both where the pins may differ by all of it, and rests on it even at matched pins', () => {
    const alone = without('offsetCurrent');
    expect([currentsIn(ASKED, row(ALL)), currentsIn(ASKED, row(alone)), currentsIn(ASKED, row(alone, { classWorst: { offsetCurrent: 1e-9 } }))]).toEqual(['both', 'whole-bias', 'bias-and-class']);
    expect(currentsIn({ ...ASKED, positive: 0, negative: 0 }, row(ALL))).toBe('none');
    expect(wholeBiasIn(ASKED, row(alone))).toBeCloseTo(10 * 4e3 * 10e-9, 15);
    expect(wholeBiasIn(ASKED, row(alone, { outlook: 'optimistic' }))).toBeCloseTo(10 * 2e3 * 10e-9, 15);
    const matched = { positive: 2e3, negative: 2e3 };
    const typical = [...without('offsetCurrent').filter(({ parameter }) => parameter !== 'biasCurrent'), typ('biasCurrent', 10e-9, OVER)];
    expect(basisOf(sum(typical, { demand: matched }))).toBe('derated');
  });
});
