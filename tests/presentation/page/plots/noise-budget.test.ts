import { describe, expect, it } from 'vitest';
import { plotsOf } from '../../../../src/presentation/page/plots/index.js';
import { noiseShares } from '../../../../src/presentation/page/plots/noise-budget.js';
import { lines, pageInput, plotNamed } from '../../../support/page.js';

const input = pageInput();
const verdict = input.chosen!.verdicts.find(({ check }) => check === 'noise')!;

describe('noise budget', () => {
  it('shares the square: 3 and 4 are 36 % and 64 %', () => {
    const term = { slot: null, basis: 'guaranteed', figure: null, how: null } as const;
    expect(noiseShares({ terms: [{ name: 'R', value: 3, ...term }, { name: 'amplifier voltage noise', value: 4, ...term }] })).toEqual([
      { name: 'amplifier voltage noise', rms: 4, square: 0.64, isPart: true },
      { name: 'R', rms: 3, square: 0.36, isPart: false },
    ]);
  });

  it('comes to what the verdict offers', () => {
    expect(Math.hypot(...noiseShares(verdict).map(({ rms }) => rms))).toBeCloseTo(verdict.offered as number, 12);
  });

  it('says what a part without noise would leave', () => {
    const sources = noiseShares(verdict);
    const left = Math.hypot(...sources.filter(({ isPart }) => !isPart).map(({ rms }) => rms));
    expect(plotNamed(plotsOf(input), 'noise-budget').finding).toContain(`would leave ${(left * 1e6).toPrecision(3)}\u00a0µVrms.`);
  });

  it('calls its percentages shares of the square', () => {
    expect(plotNamed(plotsOf(input), 'noise-budget').svg).toContain('of the square');
  });

  it('draws a ratio as the noise that would just meet it', () => {
    const asked = pageInput({ 'limits.outputNoise': '', 'limits.snr': '60 dB' });
    const { required, offered, terms } = asked.chosen!.verdicts.find(({ check }) => check === 'noise')!;
    const allowed = (Math.hypot(...terms.map(({ value }) => value)) * (offered as number)) / (required as number);
    expect(plotNamed(plotsOf(asked), 'noise-budget').svg).toContain(`limit ${(allowed * 1e6).toPrecision(3)}\u00a0µVrms`);
  });

  it('is drawn as it was', async () => {
    await expect(lines(plotNamed(plotsOf(input), 'noise-budget').svg)).toMatchFileSnapshot('golden/noise-budget.svg');
  });
});
