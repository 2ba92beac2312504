import { describe, expect, it } from 'vitest';
import { slewingPart } from '../../src/checks/input-pair.js';
import type { DistortionDemand, Loop, SlewingDemand } from '../../src/demands/index.js';
import type { InputType } from '../../src/parts/part.js';
import { readingsOf } from '../../src/parts/readings.js';
import { ENTRIES } from '../support/check-values.js';
import { min, partOf, typ, under } from '../support/parts.js';

const entry = (id: string) => ENTRIES.find((one) => one.id === id)!;
const asked = (slewRate: number, frequency = 10e3) => slewingOf({ frequency, slewRate });
const slewingOf = (of: Partial<SlewingDemand>) => ({ slewing: { frequency: 10e3, slewRate: 0.5e6, noiseGainAt: () => 1, countsInput: false, remembers: false, ...of } }) as Partial<DistortionDemand> as DistortionDemand;
const part = (inputType: InputType | null, outlook: 'pessimistic' | 'optimistic', rate = 1e6) => {
  const figures = [min('slewRate', rate), min('gainBandwidth', 1e6)];
  return readingsOf(under(figures, { outlook, part: partOf(figures, { inputType }) }));
};
const valueOf = (...of: Parameters<typeof slewingPart>): number => slewingPart(...of).terms[0]!.value;

describe('distortion of the input pair', () => {
  it('of a bipolar pair at half its slew rate is SLW-16', () => {
    expect(valueOf(asked(0.5e6), part('bipolar', 'pessimistic')) / (entry('SLW-16').expected as number)).toBeCloseTo(1, 3);
  });

  it('of an unknown pair is the bipolar one at worst and the FET one, 8.5 dB better, at best', () => {
    const [worst, best] = [valueOf(asked(0.1e6), part(null, 'pessimistic')), valueOf(asked(0.1e6), part(null, 'optimistic'))];
    expect(worst).toBe(valueOf(asked(0.1e6), part('bipolar', 'pessimistic')));
    expect(best).toBe(valueOf(asked(0.1e6), part('fet', 'optimistic')));
    expect(20 * Math.log10(worst / best)).toBeCloseTo(8.5, 1);
    expect(slewingPart(asked(0.1e6), part(null, 'pessimistic')).terms[0]!.basis).toBe('estimated');
    expect(slewingPart(asked(0.1e6), part('fet', 'pessimistic')).terms[0]!.basis).toBe('guaranteed');
  });

  it('beyond the limit is that of a slewing sine, SLW-14 and SLW-11, never less than at the limit', () => {
    expect(valueOf(asked(1e6), part('bipolar', 'pessimistic', 0.75e6)) / (entry('SLW-14').expected as number)).toBeCloseTo(1, 2);
    expect(valueOf(asked(1e6), part('bipolar', 'pessimistic', 0.4e6)) / (entry('SLW-11').expected as number)).toBeCloseTo(1, 2);
    expect(valueOf(asked(1.000001e6), part('bipolar', 'pessimistic'))).toBeGreaterThanOrEqual(valueOf(asked(1e6), part('bipolar', 'pessimistic')));
  });

  it('needs slew rate and bandwidth, and nothing of a signal that does not slew', () => {
    expect(slewingPart(asked(1e5), readingsOf(under([]))).missing.map(({ figure }) => figure)).toEqual(['slewRate', 'gainBandwidth']);
    expect(slewingPart({ slewing: null } as DistortionDemand, readingsOf(under([])))).toEqual({ terms: [], missing: [], cautions: [] });
    expect(slewingPart(asked(0), readingsOf(under([]))).missing).toEqual([]);
  });

  it('goes by the noise gain with the part at hand, its own input told where it counts', () => {
    const grows = slewingOf({ countsInput: true, noiseGainAt: ({ inputCapacitance, gainBandwidth }: Loop) => (gainBandwidth / 1e6) * (1 + inputCapacitance / 10e-12) });
    const figures = [min('slewRate', 1e6), min('gainBandwidth', 1e6)];
    const judged = (...more: Parameters<typeof under>[0][number][]) => slewingPart(grows, readingsOf(under([...figures, ...more], { part: partOf([...figures, ...more], { inputType: 'bipolar' }) }))).terms[0]!;
    expect(judged(typ('inputCapacitance', 20e-12)).value / judged().value).toBeCloseTo(3, 9);
    expect([judged().basis, judged().how?.includes('not counted')]).toEqual(['assumed', true]);
    expect(judged(typ('inputCapacitance', 20e-12)).how).toContain('20 pF of its own');
  });

  it('beyond the limit says of a stage that remembers that the closed form is one without memory', () => {
    const cautions = (remembers: boolean, slewRate: number) => slewingPart(slewingOf({ remembers, slewRate }), part('bipolar', 'pessimistic')).cautions;
    expect(cautions(true, 1.1e6).join()).toContain('without memory');
    expect([cautions(true, 0.9e6), cautions(false, 1.1e6)]).toEqual([[], []]);
  });
});
