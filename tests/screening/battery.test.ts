import { describe, expect, it } from 'vitest';
import { ENTRIES } from '../support/check-values.js';
import { judged } from '../support/judged.js';
import { max, typ } from '../support/parts.js';
import { dc, load, stageSpec, value } from '../support/stages.js';

const battery = { capacity: value(0.22 * 3600), usable: value(0.85), others: value(10e-6) };
const spec = stageSpec('follower', dc(1, 2), { battery });

describe('battery life with a part', () => {
  it('is PWR-06: 30 µA of amplifier and 10 µA of others', () => {
    const { batteryHours } = judged(spec, [max('quiescentCurrent', 30e-6)]);
    expect(batteryHours!.hours).toBeCloseTo(ENTRIES.find(({ id }) => id === 'PWR-06')!.expected as number, 6);
    expect(batteryHours).toMatchObject({ amplifier: 30e-6, network: 0, others: 10e-6 });
  });

  it('counts every section of the package, the load, and a typical current × 1.4', () => {
    const { batteryHours } = judged({ ...spec, load: load(1e6) }, [typ('quiescentCurrent', 10e-6)], { identity: { channels: 2 } });
    expect(batteryHours!.amplifier).toBeCloseTo(28e-6, 15);
    expect(batteryHours!.network).toBeCloseTo(1.5e-6, 15);
    expect(batteryHours!.hours).toBeCloseTo((0.22 * 0.85) / 39.5e-6, 6);
  });

  it('is none without a battery, or with the current not known', () => {
    expect(judged(stageSpec('follower', dc(1, 2)), [max('quiescentCurrent', 30e-6)]).batteryHours).toBeNull();
    expect(judged(spec, []).batteryHours).toBeNull();
  });
});
