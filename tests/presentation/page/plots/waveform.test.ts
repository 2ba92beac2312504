import { describe, expect, it } from 'vitest';
import { plotsOf } from '../../../../src/presentation/page/plots/index.js';
import { lines, pageInput, plotNamed, PREDICTION } from '../../../support/page.js';

describe('predicted waveform', () => {
  it('says how far the output is off', () => {
    const { t, ideal, typical, worst } = PREDICTION.waveform!;
    const farthest = (values: readonly number[]): string => (1e3 * Math.max(...values.map((value, at) => Math.abs(value - ideal[at]!)))).toPrecision(3);
    const { finding, csv } = plotNamed(plotsOf(pageInput()), 'waveform');
    expect(finding).toBe(`Of 2.4\u00a0V peak to peak the output is off by up to ${farthest(typical!)}\u00a0mV with typical figures and ${farthest(worst!)}\u00a0mV at the guaranteed worst.`);
    expect(csv.trimEnd().split('\r\n').length).toBe(t.length + 1);
  });

  it('leaves out an outcome its figures do not say', () => {
    const prediction = { ...PREDICTION, waveform: { ...PREDICTION.waveform!, worst: null } };
    const { table, svg } = plotNamed(plotsOf({ ...pageInput(), prediction }), 'waveform');
    expect(table.columns).toEqual(['time', 'ideal', 'typical']);
    expect(svg).not.toContain('guaranteed');
  });

  it('draws where the output clips at the lowest supply', () => {
    const input = pageInput();
    const { output } = input.report.curves(input.chosen!).swing[0]!;
    expect(plotNamed(plotsOf(input), 'waveform').svg).toContain(`clips at ${(3 - output.worst.high!).toPrecision(3)}\u00a0V on 3\u00a0V`);
  });

  it.each([['without a prediction', undefined], ['without a waveform', { ...PREDICTION, waveform: null }], ['with neither outcome', { ...PREDICTION, waveform: { ...PREDICTION.waveform!, typical: null, worst: null } }]])('is left out %s', (_why, prediction) => {
    const { prediction: _given, ...rest } = pageInput();
    const plots = plotsOf(prediction === undefined ? rest : { ...rest, prediction });
    expect(plots.map(({ id }) => id)).not.toContain('waveform');
  });

  it('is drawn as it was', async () => {
    await expect(lines(plotNamed(plotsOf(pageInput()), 'waveform').svg)).toMatchFileSnapshot('golden/waveform.svg');
  });
});
