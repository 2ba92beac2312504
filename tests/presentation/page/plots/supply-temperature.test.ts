import { describe, expect, it } from 'vitest';
import { plotsOf } from '../../../../src/presentation/page/plots/index.js';
import { validityOf } from '../../../../src/presentation/page/plots/supply-temperature.js';
import { lines, PAGE_PARTS, pageInput, plotNamed } from '../../../support/page.js';

const finding = (...of: Parameters<typeof pageInput>): string => plotNamed(plotsOf(pageInput(...of)), 'supply-temperature').finding;

describe('supply against temperature', () => {
  it('reads the ends as the checks do', () => {
    expect(validityOf(pageInput().chosen!)).toEqual({ supplyLow: 1.8, supplyHigh: 5.5, absolute: 6, coldest: -40, hottest: 125 });
  });

  it('says that use lies inside', () => {
    expect(finding({}, { about: 'TEAM-0005' })).toBe('The stage works at 3\u00a0V..4.2\u00a0V and −20\u00a0°C..60\u00a0°C, inside of what TEAM-0005 is specified for: 1.8\u00a0V..5.5\u00a0V and −40\u00a0°C..125\u00a0°C.');
  });

  it('says at which end it does not', () => {
    expect(finding({ temperature: '-55..60 °C', supply: '1.5..4.2 V', 'signal.input': '25 mV..100 mV' }, { about: 'TEAM-0005' })).toMatch(/: TEAM-0005 is not specified at its lowest supply and its cold end\.$/u);
  });

  it('says which end is not known', () => {
    const part = { ...PAGE_PARTS[0]!, figures: PAGE_PARTS[0]!.figures.filter(({ parameter, kind }) => !(parameter === 'temperature' && kind === 'max')) };
    expect(finding({}, { parts: [part] })).toMatch(/for TEAM-0005 its hot end is not known\.$/u);
  });

  it.each([
    ['a narrow range of supplies, as of a regulated rail', { supply: '3.14..3.47 V', supplyPeak: '3.6 V', temperature: '0..50 °C' }],
    ['a wide one', {}],
    ['a single supply', { supply: '3.3 V' }],
    ['one near the lowest the part is specified for', { supply: '1.9..2.4 V', supplyPeak: '2.5 V', 'signal.input': '25 mV..150 mV' }],
  ] as const)('names the brown-out end at the left edge of what is used, never at the other: %s', (_name, changes) => {
    const input = pageInput(changes, { about: 'TEAM-0005' });
    const { svg } = plotNamed(plotsOf(input), 'supply-temperature');
    const [, x = '', rest = ''] = /<text x="([\d.]+)"([^>]*)>brown-out end/u.exec(svg) ?? [];
    // The heavy line is that edge; the mark of the cold corner stands at its foot.
    const [, edge = ''] = /<path d="M([\d.]+),[^"]*"[^>]*stroke-width="5"/u.exec(svg) ?? [];
    expect(edge).not.toBe('');
    const anchor = /text-anchor="(\w+)"/u.exec(rest)?.[1] ?? 'start';
    const off = Number(x) - Number(edge);
    expect(Math.abs(off)).toBeLessThanOrEqual(8);
    if (Math.abs(off) > 3) expect(anchor).toBe('end');
  });

  it('is drawn as it was', async () => {
    await expect(lines(plotNamed(plotsOf(pageInput()), 'supply-temperature').svg)).toMatchFileSnapshot('golden/supply-temperature.svg');
  });
});
