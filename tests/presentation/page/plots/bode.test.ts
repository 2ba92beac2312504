import { describe, expect, it } from 'vitest';
import { gainCurves, gainRange } from '../../../../src/presentation/page/plots/bode-data.js';
import { plotsOf } from '../../../../src/presentation/page/plots/index.js';
import { lines, pageInput, plotNamed } from '../../../support/page.js';

const input = pageInput({}, { about: 'TEAM-0005' });
const loop = input.report.curves(input.chosen!).loop!;

describe('open-loop gain against noise gain', () => {
  it('names its curves: the limit and the typical one apart', () => {
    expect(gainCurves(loop).map(({ name }) => name)).toEqual(['open loop, limit', 'open loop, typical', 'noise gain 1/β', 'closed loop, signal']);
  });

  it('calls a guarded typical what it is', () => {
    const guarded = { ...loop, openLoop: [{ ...loop.openLoop[0]!, how: 'typical × 0.6' }] };
    expect(gainCurves(guarded)[0]!.name).toBe('open loop, counted on');
  });

  it('gives every series its own dash and marker', () => {
    const curves = gainCurves(loop);
    expect(new Set(curves.map(({ series }) => series.dash)).size).toBe(curves.length);
    expect(new Set(curves.map(({ series }) => series.marker)).size).toBe(curves.length);
  });

  it('shows whole decades, a tenth below the crossing up to beyond the DC gain', () => {
    expect(gainRange(loop)).toEqual([0.1, 1e6]);
  });

  it('finds crossing, margin and loop gain', () => {
    const { finding } = plotNamed(plotsOf(input), 'bode');
    const { crossing } = loop.openLoop[0]!;
    expect(finding).toContain(`The loop closes at ${(crossing!.frequency / 1e3).toPrecision(3)}\u00a0kHz with ${crossing!.phaseMargin.toPrecision(2)}°`);
    expect(finding).toContain(`at 2\u00a0kHz the loop gain is ${(20 * Math.log10(loop.loopGain!)).toPrecision(2)}\u00a0dB.`);
  });

  it('has all points in the CSV', () => {
    const [head, ...rows] = plotNamed(plotsOf(input), 'bode').csv.trimEnd().split('\r\n');
    expect(head!.split(',')[0]).toBe('frequency_Hz');
    expect(rows.length).toBe(loop.frequencies.length);
    expect(rows.every((row) => row.split(',').length === 5)).toBe(true);
  });

  it('is drawn as it was', async () => {
    await expect(lines(plotNamed(plotsOf(input), 'bode').svg)).toMatchFileSnapshot('golden/bode.svg');
  });
});
