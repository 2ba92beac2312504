import { describe, expect, it } from 'vitest';
import { curvesOf, type Curves } from '../../src/curves/index.js';
import { deriveDemands } from '../../src/demands/index.js';
import type { Part } from '../../src/parts/part.js';
import { judging } from '../../src/screening/index.js';
import type { Stage } from '../../src/stage/index.js';
import { PAGE_PARTS } from '../support/page.js';
import { sampleReport, sampleStage } from '../support/sample-report.js';
import { BENCHES, built } from '../support/twelve.js';

const [PART] = PAGE_PARTS as [Part];
const curvesAt = (stage: Stage, part: Part = PART): Curves => curvesOf(judging(deriveDemands(stage), [part], false), stage, part);
const near = (curves: Curves, frequency: number, values: (loop: NonNullable<Curves['loop']>) => readonly number[]): number => {
  const { loop } = curves;
  const at = loop!.frequencies.findIndex((one) => one >= frequency * 0.9999);
  return values(loop!)[at]!;
};

describe('loop', () => {
  const curves = curvesAt(sampleStage());

  it('crosses at the limit of the gain bandwidth over the noise gain, 20 dB a decade, and at the typical one', () => {
    const [limit, typical] = curves.loop!.openLoop;
    expect(limit).toMatchObject({ kind: 'limit', gainBandwidth: 0.3e6, how: null });
    expect(typical).toMatchObject({ kind: 'typical', gainBandwidth: 1e6 });
    // Two poles, 65° at unity gain: the crossover stands a little below 0.3 MHz / 8.
    expect(limit!.crossing!.frequency).toBeCloseTo(37.5e3, -3);
    expect(limit!.crossing!.frequency).toBeLessThan(37.5e3);
    expect(limit!.crossing!.gain).toBeCloseTo(8, 6);
    expect(limit!.crossing!.rateOfClosure).toBeGreaterThan(20);
    expect(limit!.crossing!.rateOfClosure).toBeLessThan(20.2);
    expect(limit!.crossing!.phaseMargin).toBeGreaterThan(85);
  });

  it('says what loop gain is left at the top of the band', () => {
    // GBW/(f·NG) = 0.3 MHz / (2 kHz · 8) = 18.75, with A0 = 100 000 far above.
    expect(curves.loop!.loopGain).toBeCloseTo(18.75, 1);
  });

  it('holds the open-loop gain at its DC figure and the noise gain at 8', () => {
    expect(near(curves, 1, ({ openLoop }) => openLoop[0]!.gain) / 1e5).toBeCloseTo(1 / Math.hypot(1, 1 / 3), 2);
    expect(near(curves, 100, ({ noiseGain }) => noiseGain)).toBeCloseTo(8, 9);
  });

  it('has the closed loop 3 dB down near the crossover', () => {
    const { frequency } = curves.loop!.openLoop[0]!.crossing!;
    const down = near(curves, frequency, ({ closedLoop }) => closedLoop) / 8;
    expect(down).toBeGreaterThan(0.64);
    expect(down).toBeLessThan(0.72);
  });

  it.each(BENCHES.filter(({ topology }) => topology !== 'integrator').map((bench) => [`${bench.topology}: ${bench.name}`, bench] as const))('closes on the gain of the stage: %s', (_name, bench) => {
    const stage = built(bench, '');
    const { closedLoop, frequencies } = curvesAt(stage).loop!;
    // Well inside of the band, clear of a bypass across the reference, which turns a fraction of the gain at low frequency.
    const plateau = closedLoop[frequencies.findIndex((frequency) => frequency >= 100)]!;
    // Driven at the + input the gain is the noise gain; a bypass takes the reference's resistance out of both, not out of the gain at DC.
    const expected = stage.gainUnit === 'V/A' ? 1 : stage.gain > 1 && bench.topology !== 'difference' ? stage.noiseGain.nominal : Math.abs(stage.gain);
    expect(plateau / expected).toBeCloseTo(1, 1);
  });

  it('integrates: 1/(2πfRC)', () => {
    const bench = BENCHES.find(({ topology }) => topology === 'integrator')!;
    const stage = built(bench, '');
    const curves = curvesAt(stage);
    const { response } = stage;
    if (response.kind !== 'integrator') throw new Error('no integrator');
    const frequency = 1e3;
    expect(near(curves, frequency, ({ closedLoop }) => closedLoop) * 2 * Math.PI * frequency * response.resistance * response.capacitance).toBeCloseTo(1, 1);
  });

  it('is none without a gain bandwidth, nor where the stage closes no loop', () => {
    const blank = { ...PART, figures: PART.figures.filter(({ parameter }) => parameter !== 'gainBandwidth') };
    expect(curvesAt(sampleStage(), blank).loop).toBeNull();
  });
});

describe('swing', () => {
  it('has one window a supply end, with signal and head-room there', () => {
    const stage = sampleStage();
    const { swing } = curvesAt(stage);
    expect(swing.map(({ supply }) => supply)).toEqual([3, 4.2]);
    for (const { output, input } of swing) {
      expect(output.signal).toEqual(stage.output);
      expect(input.signal).toEqual({ min: 0.025, max: 0.33 });
      expect(input.worst).toEqual({ low: -0.1, high: 1.2 });
    }
  });

  it('leaves between signal and rail what the verdict calls spare', () => {
    const report = sampleReport();
    const chosen = report.fit[0]!;
    const verdict = chosen.verdicts.find(({ check }) => check === 'output-high')!;
    const { output, supply } = report.curves(chosen).swing.find((window) => window.supply === verdict.worstAt!['supply'])!;
    expect(supply - output.worst.high! - output.error! - output.signal.max).toBeCloseTo(verdict.spare!, 12);
  });

  it('does not know a head-room that is not there', () => {
    const blank = { ...PART, figures: PART.figures.filter(({ parameter }) => parameter !== 'outputHighHeadroom') };
    expect(curvesAt(sampleStage(), blank).swing[0]!.output.worst.high).toBeNull();
  });

  it('places a crossover region against ground at each supply', () => {
    const crossing = { ...PART, figures: [...PART.figures, { parameter: 'inputCrossover', kind: 'min', value: 1, condition: {} } as const, { parameter: 'inputCrossover', kind: 'max', value: 1.5, condition: {} } as const] };
    expect(curvesAt(sampleStage(), crossing).swing.map(({ input }) => input.crossover)).toEqual([{ min: 1.5, max: 2 }, { min: 2.7, max: 3.2 }]);
  });
});
