import { describe, expect, it } from 'vitest';
import type { Figure } from '../../src/parts/figures.js';
import { headroomPoints, pointCurrent, type HeadroomPoint } from '../../src/parts/headroom.js';
import { amperes, AT_25, max, ohms, typ, under } from '../support/parts.js';

const point = (figure: Figure, rules = {}): HeadroomPoint => headroomPoints(under([figure], rules), figure.parameter === 'outputLowHeadroom' ? 'low' : 'high')[0]!;

describe('a head-room point as current', () => {
  it('is the current stated', () => {
    expect(pointCurrent(point(max('outputHighHeadroom', 0.1, amperes(2e-3, 5))), 'high', 5)).toBe(2e-3);
  });

  it.each([
    ['high', 'ground', (5 - 0.1 - 0) / 2e3],
    ['high', 'mid-supply', (5 - 0.1 - 2.5) / 2e3],
    ['high', 'supply', 0],
    ['low', 'supply', (5 - 0.1) / 2e3],
    ['low', 'mid-supply', (2.5 - 0.1) / 2e3],
    ['low', 'ground', 0],
  ] as const)('%s with 2 kΩ to %s flows by its own load and supply', (side, to, expected) => {
    const figure = max(side === 'low' ? 'outputLowHeadroom' : 'outputHighHeadroom', 0.1, ohms(2e3, to, 5));
    expect(pointCurrent(point(figure), side, 5)).toBeCloseTo(expected, 15);
  });

  it('is converted from the head-room as printed, not as derated', () => {
    const typical = point(typ('outputHighHeadroom', 0.2, ohms(10e3, 'ground', 5)));
    expect(typical.value).toBeCloseTo(0.3, 15);
    expect(pointCurrent(typical, 'high', 5)).toBeCloseTo((5 - 0.2) / 10e3, 15);
  });

  it('is 10 kΩ to mid-supply where no load is stated: assumed, at best no loss', () => {
    const figure = max('outputHighHeadroom', 0.1, { supply: 5 });
    expect(pointCurrent(point(figure), 'high', 5)).toBeCloseTo((5 - 0.1 - 2.5) / 10e3, 15);
    expect(point(figure)).toMatchObject({ value: 0.1, basis: 'assumed' });
    expect(point(figure, { outlook: 'optimistic' })).toMatchObject({ value: 0, basis: 'assumed' });
  });
});

describe('assisted points', () => {
  it('are low ones with the load to ground and high ones with it to the supply', () => {
    const assisted = (parameter: 'outputLowHeadroom' | 'outputHighHeadroom', to: 'ground' | 'supply' | 'mid-supply'): boolean => point(max(parameter, 0.1, ohms(2e3, to, 5))).assisted;
    expect([assisted('outputLowHeadroom', 'ground'), assisted('outputLowHeadroom', 'supply'), assisted('outputLowHeadroom', 'mid-supply')]).toEqual([true, false, false]);
    expect([assisted('outputHighHeadroom', 'supply'), assisted('outputHighHeadroom', 'ground'), assisted('outputHighHeadroom', 'mid-supply')]).toEqual([true, false, false]);
    expect(point(max('outputLowHeadroom', 0.1, amperes(1e-3, 5))).assisted).toBe(false);
  });
});

describe('which figure is the point', () => {
  const AT = amperes(1e-3, 5);

  it('per condition the maximum, else the typical with half its magnitude added', () => {
    expect(headroomPoints(under([max('outputLowHeadroom', 0.1, AT), typ('outputLowHeadroom', 0.04, AT)]), 'low').map(({ value }) => value)).toEqual([0.1]);
    expect(point(typ('outputLowHeadroom', 0.04, AT))).toMatchObject({ value: 0.06, basis: 'derated' });
  });

  it('@ 25 °C grows by 0.005 per K of the largest distance, more than 15 K away', () => {
    const figure = max('outputLowHeadroom', 0.1, { ...AT, temperature: 25 });
    const from = (coldest: number, hottest: number): HeadroomPoint => point(figure, { operating: { ...AT_25, coldest, hottest } });
    expect(from(10, 40)).toMatchObject({ value: 0.1, basis: 'guaranteed' });
    expect(from(10, 41).value).toBeCloseTo(0.1 * (1 + 0.005 * 16), 15);
    expect(from(-20, 60).value).toBeCloseTo(0.1 * (1 + 0.005 * 45), 15);
    expect(from(-20, 60).basis).toBe('estimated');
  });

  it('prefers a rating over temperature beyond 15 K and the one at 25 °C within', () => {
    const both = [max('outputLowHeadroom', 0.1, { ...AT, temperature: 25 }), max('outputLowHeadroom', 0.2, { ...AT, temperature: 'over' })];
    const at = (hottest: number): number | undefined => headroomPoints(under(both, { operating: { ...AT_25, hottest } }), 'low')[0]?.value;
    expect([at(40), at(41)]).toEqual([0.1, 0.2]);
  });

  it('without a supply counts as rated at the vertex, assumed', () => {
    expect(point(max('outputLowHeadroom', 0.1, amperes(1e-3)))).toMatchObject({ supply: null, basis: 'assumed', value: 0.1 });
  });

  it('far from the nominal supply is assumed, its value kept on both readings', () => {
    expect(point(max('outputLowHeadroom', 0.1, amperes(1e-3, 30)), { outlook: 'optimistic' })).toMatchObject({ value: 0.1, basis: 'assumed' });
  });

  it('is none of the typical ones with --strict', () => {
    expect(headroomPoints(under([typ('outputLowHeadroom', 0.1, AT)], { strict: true }), 'low')).toEqual([]);
  });
});
