import { describe, expect, it } from 'vitest';
import { plotsOf } from '../../../../src/presentation/page/plots/index.js';
import { currentOf, unitOf } from '../../../../src/presentation/page/plots/limit-cost.js';
import { lines, pageInput, plotNamed, SWEEP } from '../../../support/page.js';

describe('what a limit costs', () => {
  it.each([
    ['limits.dcError', 'V'], ['limits.outputNoise', 'Vrms'], ['limits.supplyCurrent', 'A'], ['supply', 'V'], ['signal.frequency', 'Hz'], ['load.resistance', 'Ω'], ['load.capacitance', 'F'], ['temperature', '°C'], ['gain', 'V/V'], ['limits.phaseMargin', '°'], ['wishes.channels', ''],
  ])('%s is in %s', (path, unit) => {
    expect(unitOf(path)).toBe(unit);
  });

  it('knows where the stage stands', () => {
    const { stage } = pageInput().report;
    expect(['limits.dcError', 'signal.frequency', 'gain', 'load.resistance', 'limits.settling', 'limits.snr', 'temperature'].map((path) => currentOf(stage, path))).toEqual([0.04, 2000, 8, 10e3, null, null, null]);
  });

  it('says how many are left, where the stage stands and the nearest turn', () => {
    expect(plotNamed(plotsOf(pageInput()), 'limit-cost').finding).toBe('Between 2\u00a0mV and 80\u00a0mV of limits.dcError, 0 to 5 parts fit, the stage stands at 40\u00a0mV; the nearest turn is at 36\u00a0mV, from which TEAM-0012 comes first.');
  });

  it('has the points as they were tried', () => {
    const { table, csv } = plotNamed(plotsOf(pageInput()), 'limit-cost');
    expect(table.rows[0]).toEqual(['2\u00a0mV', '0', '1', '5', 'nothing fits']);
    expect(csv.split('\r\n')[1]).toBe('0.002,0,1,5,');
  });

  it('takes a single point', () => {
    const sweep = { ...SWEEP, points: SWEEP.points.slice(0, 1), turns: [], current: 2e-3 };
    expect(plotNamed(plotsOf({ ...pageInput(), sweep }), 'limit-cost').finding).toContain('the first choice does not change');
  });

  it('is drawn as it was', async () => {
    await expect(lines(plotNamed(plotsOf(pageInput()), 'limit-cost').svg)).toMatchFileSnapshot('golden/limit-cost.svg');
  });
});
