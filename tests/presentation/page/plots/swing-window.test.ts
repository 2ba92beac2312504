import { describe, expect, it } from 'vitest';
import type { SwingWindow } from '../../../../src/curves/index.js';
import { plotsOf } from '../../../../src/presentation/page/plots/index.js';
import { lanesOf } from '../../../../src/presentation/page/plots/swing-window.js';
import { lines, pageInput, plotNamed } from '../../../support/page.js';

const WINDOW: SwingWindow = {
  supply: 5,
  output: { signal: { min: 0.5, max: 4.5 }, error: 0.02, worst: { low: 0.03, high: 0.04 }, best: { low: 0.02, high: 0.02 } },
  input: { signal: { min: 1, max: 2 }, worst: { low: -0.1, high: null }, crossover: null },
};

describe('swing window', () => {
  it('turns head-rooms into voltages against ground; beyond a rail, and not known', () => {
    const [output, input] = lanesOf(WINDOW);
    expect(output!.band).toEqual({ low: 0.03, high: 4.96 });
    expect(input!.band).toEqual({ low: -0.1, high: null });
  });

  it('finds the tightest side in the numbers of its verdict', () => {
    const input = pageInput();
    const tightest = Math.min(...input.chosen!.verdicts.filter(({ check }) => /^(?:in|out)put-(?:low|high)$/u.test(check)).map(({ spare }) => spare!));
    const { finding } = plotNamed(plotsOf(input), 'swing-window');
    expect(finding).toMatch(/^The (?:in|out)put towards V[+−] has the least room: \d/u);
    expect(finding).toContain(`${Math.round(tightest * 1e3)}\u00a0mV spare`);
  });

  it('says what is short', () => {
    const { finding } = plotNamed(plotsOf(pageInput({ 'signal.input': '25 mV..380 mV' }, { about: 'TEAM-0005' })), 'swing-window');
    expect(finding).toMatch(/^The output towards V\+ is \d+(?:\.\d+)?\u00a0mV short on a supply of 3\u00a0V\.$/u);
  });

  it('says what is not known', () => {
    const input = pageInput();
    const part = { ...input.chosen!.part, id: 'NO-ROOM', figures: input.chosen!.part.figures.filter(({ parameter }) => parameter !== 'outputHighHeadroom') };
    const { finding, table } = plotNamed(plotsOf(pageInput({}, { parts: [part] })), 'swing-window');
    expect(finding).toBe('The output towards V+ cannot be decided for NO-ROOM: its head-room there is not known.');
    expect(table.rows[0]!.at(-1)).toBe('not known');
  });

  it('is drawn as it was', async () => {
    await expect(lines(plotNamed(plotsOf(pageInput()), 'swing-window').svg)).toMatchFileSnapshot('golden/swing-window.svg');
  });
});
