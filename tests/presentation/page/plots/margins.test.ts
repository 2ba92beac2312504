import { describe, expect, it } from 'vitest';
import { plotsOf } from '../../../../src/presentation/page/plots/index.js';
import { marginOf } from '../../../../src/presentation/page/plots/margins.js';
import type { Verdict } from '../../../../src/verdicts/verdict.js';
import { passing } from '../../../support/fitting.js';
import { lines, pageInput, plotNamed } from '../../../support/page.js';

const verdict = (more: Partial<Verdict>): Verdict => passing('slew-rate', 1, { unit: 'V/s', ...more });

describe('margins', () => {
  it.each([
    ['twice what is asked', { required: 1, offered: 2, sense: 'at-least' }, 1],
    ['exactly what is asked', { required: 1, offered: 1, sense: 'at-least' }, 0],
    ['half of what is asked', { required: 1, offered: 0.5, sense: 'at-least' }, -0.5],
    ['half of what is allowed', { required: 2, offered: 1, sense: 'at-most' }, 0.5],
    ['beyond the rail where nothing is left', { required: 0, offered: -0.1, sense: 'at-most' }, null],
    ['a temperature', { required: 60, offered: 85, sense: 'at-least', unit: '°C' }, null],
    ['a word', { required: ['SOT-23-5'], offered: 'SOT-23-5', sense: 'one-of', unit: null }, null],
    ['as good as can be', { required: 1, offered: Infinity, sense: 'at-least' }, null],
  ] as const)('%s', (_name, more, share) => {
    expect(marginOf(verdict(more)).share).toBe(share);
  });

  it('leaves an undecided check open from the worst to the best reading', () => {
    expect(marginOf(verdict({ outcome: 'unknown', required: 1, offered: 0.8, offeredBest: 1.5 }))).toMatchObject({ outcome: 'unknown', share: expect.closeTo(-0.2, 9) as number, best: 0.5 });
  });

  it('has one row for every check, words too', () => {
    const input = pageInput();
    const { table } = plotNamed(plotsOf(input), 'margins');
    expect(table.rows.length).toBe(input.chosen!.verdicts.length);
    expect(table.rows.map(([, outcome]) => outcome)).toEqual(input.chosen!.verdicts.map(({ outcome }) => ({ pass: '✓ met', fail: '✕ not met', unknown: '? not decided' })[outcome]));
  });

  it('marks outcomes by shape: a part that fails and one that cannot be decided', async () => {
    const input = pageInput({}, { about: 'TEAM-0031' });
    await expect(lines(plotNamed(plotsOf(input), 'margins').svg)).toMatchFileSnapshot('golden/margins-open.svg');
    expect(plotNamed(plotsOf(input), 'margins').finding).toContain('cannot be decided');
  });

  it('is drawn as it was', async () => {
    await expect(lines(plotNamed(plotsOf(pageInput()), 'margins').svg)).toMatchFileSnapshot('golden/margins.svg');
  });
});
