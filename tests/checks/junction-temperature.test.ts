import { describe, expect, it } from 'vitest';
import { ENTRIES } from '../support/check-values.js';
import { judgingBy, verdictOrNull } from '../support/judged.js';
import { max, typ } from '../support/parts.js';
import { between, dc, load, stageSpec, value } from '../support/stages.js';

const judge = judgingBy('junction-temperature');
const { expected, inputs } = ENTRIES.find(({ id }) => id === 'PWR-05')!;
const POWER = inputs['P_W'] as number;
/** 50.66 mW at 5 V, all of it quiescent. */
const HOT = [max('thermalResistance', 200), max('quiescentCurrent', POWER / 5)];
const ONE = { identity: { channels: 1 } };
const spec = (limit?: number) => stageSpec('follower', dc(1, 2), { temperature: between(-20, 85), limits: limit === undefined ? {} : { junctionTemperature: value(limit) } });

describe('junction temperature', () => {
  it('is PWR-05, ambient and each power a term', () => {
    const verdict = judge(spec(100), HOT, ONE);
    expect(verdict).toMatchObject({ outcome: 'pass', unit: '°C', sense: 'at-most', margin: null });
    expect(verdict.offered).toBeCloseTo(expected as number, 9);
    expect(verdict.terms.map(({ name }) => name)).toEqual(['ambient', 'quiescent current']);
  });

  it('turns at the limit, and at the thermal resistance it tells', () => {
    expect([95.133, 95.131].map((limit) => judge(spec(limit), HOT, ONE).outcome)).toEqual(['pass', 'fail']);
    const verdict = judge(spec(100), HOT, ONE);
    expect(verdict.turnsAt!.value).toBeCloseTo(15 / POWER, 6);
    const missing = judge(spec(100), [HOT[1]!], ONE);
    expect(missing).toMatchObject({ outcome: 'unknown', missing: [{ figure: 'thermalResistance' }], decidesAt: { figure: 'thermalResistance', kind: 'max' }, known: 85 });
  });

  it('counts every section, and one where their number is not known', () => {
    expect(judge(spec(100), HOT, { identity: { channels: 2 } })).toMatchObject({ outcome: 'fail' });
    expect(judge(spec(100), HOT)).toMatchObject({ outcome: 'pass', basis: 'assumed' });
  });

  it('adds the worst of the output: PWR-02, 6.25 mW through 1 kΩ', () => {
    const loaded = { ...stageSpec('follower', dc(0, 5), { load: load(1e3) }), limits: { junctionTemperature: value(100) } };
    expect(judge(loaded, [max('thermalResistance', 200), max('quiescentCurrent', 0)], ONE).offered).toBeCloseTo(25 + 200 * 6.25e-3, 9);
  });

  it('without a limit is asked only of parts that state both figures, and the lower limit counts', () => {
    expect(verdictOrNull('junction-temperature', spec(), HOT, ONE)).toBeNull();
    expect(judge(spec(), [...HOT, max('junctionTemperature', 95)], ONE)).toMatchObject({ outcome: 'fail', required: 95 });
    expect(verdictOrNull('junction-temperature', spec(), [...HOT, max('junctionTemperature', 150)], ONE), 'far below its own maximum').toBeNull();
    expect(judge(spec(150), [...HOT, max('junctionTemperature', 125)], ONE)).toMatchObject({ outcome: 'pass', required: 125 });
  });

  it('of a typical current is derated, and a hot ambient alone fails', () => {
    expect(judge(spec(98), [max('thermalResistance', 200), typ('quiescentCurrent', POWER / 5)], ONE)).toMatchObject({ outcome: 'unknown', reason: 'typical-only' });
    expect(judge(spec(80), [], ONE)).toMatchObject({ outcome: 'fail', offered: null, known: 85 });
  });
});
