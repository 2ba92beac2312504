import { describe, expect, it } from 'vitest';
import { readingsOf } from '../../src/parts/readings.js';
import { amperes, max, min, ohms, typ, under } from '../support/parts.js';

const OPTIMISTIC = { outlook: 'optimistic' } as const;

describe('a borrowed figure', () => {
  const classWorst = { openLoopGain: 1e5, offsetDrift: 5e-6 };

  it('is the worst of the class, at best no contribution; basis borrowed', () => {
    expect(readingsOf(under([], { classWorst })).figureOrClass('openLoopGain')).toMatchObject({ value: 1e5, basis: 'borrowed', slot: null });
    expect(readingsOf(under([], { classWorst, ...OPTIMISTIC })).figureOrClass('openLoopGain')?.value).toBe(Infinity);
    expect(readingsOf(under([], { classWorst, ...OPTIMISTIC })).figureOrClass('offsetDrift')?.value).toBe(0);
  });

  it('is not taken where the part has its own, where the class has none, or with --strict', () => {
    expect(readingsOf(under([min('openLoopGain', 1e3)], { classWorst })).figureOrClass('openLoopGain')).toMatchObject({ value: 1e3, basis: 'guaranteed' });
    expect(readingsOf(under([], { classWorst })).figureOrClass('supplyRejection')).toBeNull();
    expect(readingsOf(under([], { classWorst, strict: true })).figureOrClass('openLoopGain')).toBeNull();
    expect(readingsOf(under([], { classWorst })).figure('openLoopGain')).toBeNull();
  });
});

describe('an assumed figure', () => {
  const seventy = { value: 70, best: Infinity, why: 'nothing known' };

  it('stands in where nothing is printed, with --strict too', () => {
    expect(readingsOf(under([])).figureOrAssumed('temperature', seventy, 'max')).toMatchObject({ value: 70, basis: 'assumed', how: 'nothing known' });
    expect(readingsOf(under([], OPTIMISTIC)).figureOrAssumed('temperature', seventy, 'max')?.value).toBe(Infinity);
    expect(readingsOf(under([], { strict: true })).figureOrAssumed('temperature', seventy, 'max')?.value).toBe(70);
  });

  it('leaves a printed end alone and stands in for the other', () => {
    const readings = readingsOf(under([max('temperature', 85)]));
    expect(readings.figureOrAssumed('temperature', seventy, 'max')).toMatchObject({ value: 85, basis: 'guaranteed' });
    expect(readings.figureOrAssumed('temperature', { value: 0, best: -Infinity, why: '' }, 'min')).toMatchObject({ value: 0, basis: 'assumed' });
  });
});

describe('output current by head-room points', () => {
  it('is 1.5 × the heaviest point of that side, undecided beyond: at best no limit', () => {
    const figures = [max('outputHighHeadroom', 0.1, amperes(2e-3, 5)), max('outputLowHeadroom', 0.1, amperes(1e-3, 5))];
    expect(readingsOf(under(figures)).currentFromHeadroom('high', 5)).toMatchObject({ value: 3e-3, basis: 'estimated' });
    expect(readingsOf(under(figures)).currentFromHeadroom('low', 5)?.value).toBeCloseTo(1.5e-3, 15);
    expect(readingsOf(under(figures, OPTIMISTIC)).currentFromHeadroom('high', 5)?.value).toBe(Infinity);
  });

  it('is missing without a point that carries current', () => {
    expect(readingsOf(under([])).currentFromHeadroom('high', 5)).toBeNull();
    expect(readingsOf(under([max('outputHighHeadroom', 0.1, ohms(2e3, 'supply', 5))])).currentFromHeadroom('high', 5)).toBeNull();
  });

  it('is only assumed where the heaviest point is', () => {
    expect(readingsOf(under([max('outputHighHeadroom', 0.1, { supply: 5 })])).currentFromHeadroom('high', 5)?.basis).toBe('assumed');
  });
});

describe('a number known between two bounds', () => {
  it('is the worst or the best, by outlook', () => {
    expect(readingsOf(under([])).bounded(2, 1)).toBe(2);
    expect(readingsOf(under([], OPTIMISTIC)).bounded(2, 1)).toBe(1);
  });
});

describe('input currents', () => {
  it('are read by their own rule', () => {
    const operating = { coldest: 25, hottest: 45, nominalSupply: 5 };
    expect(readingsOf(under([typ('biasCurrent', 1e-12)], { operating })).figure('biasCurrent')?.value).toBeCloseTo(1e-12 * 4 * 4, 24);
  });
});
