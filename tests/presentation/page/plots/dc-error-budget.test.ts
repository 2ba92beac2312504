import { describe, expect, it } from 'vitest';
import { shares } from '../../../../src/presentation/page/plots/dc-error-budget.js';
import { plotsOf } from '../../../../src/presentation/page/plots/index.js';
import { lines, pageInput, plotNamed } from '../../../support/page.js';

const input = pageInput();
const verdict = input.chosen!.verdicts.find(({ check }) => check === 'dc-error')!;

describe('DC error budget', () => {
  it('adds up to what is offered, largest first', () => {
    const terms = shares(input.chosen!, verdict);
    expect(terms.reduce((sum, { value }) => sum + value, 0)).toBeCloseTo(verdict.offered as number, 12);
    expect(terms.reduce((sum, { share }) => sum + share, 0)).toBeCloseTo(1, 12);
    expect(terms.map(({ value }) => value)).toEqual([...terms].map(({ value }) => value).sort((a, b) => b - a));
  });

  it('scales a limit by its typical figure, a rejection the other way round', () => {
    // TEAM-0012: 0.5 mV limit and 0.2 mV typical offset; A0 of 100 000 at least, 1 000 000 typical.
    const about = pageInput({}, { about: 'TEAM-0012' }).chosen!;
    const terms = shares(about, about.verdicts.find(({ check }) => check === 'dc-error')!);
    const offset = terms.find(({ name }) => name === 'offset')!;
    const gain = terms.find(({ name }) => name === 'open-loop gain')!;
    expect(offset.typical! / offset.value).toBeCloseTo(0.4, 9);
    expect(gain.typical! / gain.value).toBeCloseTo(0.1, 9);
  });

  it('knows no typical share of a term that is typical already', () => {
    const about = pageInput({}, { about: 'TEAM-0012' }).chosen!;
    const drift = shares(about, about.verdicts.find(({ check }) => check === 'dc-error')!).find(({ name }) => name === 'offset drift');
    expect(drift!.typical).toBeNull();
  });

  it('is left out where no DC error is asked', () => {
    expect(plotsOf({ ...input, chosen: { ...input.chosen!, verdicts: [] } }).map(({ id }) => id)).not.toContain('dc-error-budget');
  });

  it('is drawn as it was', async () => {
    await expect(lines(plotNamed(plotsOf(input), 'dc-error-budget').svg)).toMatchFileSnapshot('golden/dc-error-budget.svg');
  });
});
