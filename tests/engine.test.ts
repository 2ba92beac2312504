import { describe, expect, it } from 'vitest';
import { demandsOf, explain, shortlist } from '../src/engine.js';
import { RULES } from '../src/rules.js';
import type { Part, PartSource } from '../src/parts/part.js';
import { euro, FULL, max, partOf, replacing, typ } from './support/parts.js';
import { dc, load, stageOf, stageSpec, value } from './support/stages.js';

const STAGE = stageOf(stageSpec('follower', dc(1, 3, 2e3), { load: load(10e3), limits: { dcError: value(20e-3), supplyCurrent: value(80e-6) } }));
const PARTS: readonly Part[] = [
  partOf(FULL, { id: 'GX', tier: 'generic', class: 'c', price: euro(0.1) }),
  partOf(replacing('slewRate', typ('slewRate', 1e6)), { id: 'TYPICAL', price: euro(0.1) }),
  partOf(replacing('quiescentCurrent', max('quiescentCurrent', 1e-3)), { id: 'THIRSTY' }),
  partOf(FULL, { id: 'DEAR', price: euro(2) }),
  partOf(replacing('gainBandwidth'), { id: 'OPEN', class: 'c' }),
  partOf(FULL, { id: 'CHEAP', price: euro(0.2) }),
];
const source = (parts: readonly Part[] = PARTS): PartSource => ({ parts, sha256: 'abc', origin: (id, slot) => ({ kind: 'assumption', text: `${id} ${slot}` }) });

describe('shortlist', () => {
  const report = shortlist(STAGE, source());

  it('ranks what fits: approved by limits, by typical figures, then generic', () => {
    expect(report.fit.map(({ rank, part }) => `${rank} ${part.id}`)).toEqual(['1 CHEAP', '2 DEAR', '3 TYPICAL', '4 GX']);
  });

  it('counts every part once', () => {
    expect(report.counts).toEqual({ parts: 6, fit: 4, undecided: 1, rejected: 1 });
    expect(report.undecided).toMatchObject([{ part: { id: 'OPEN' }, likely: true }]);
    expect(report.rejections).toEqual([{ check: 'supply-current', parts: 1 }]);
    expect(report.nearest.map(({ part }) => part.id)).toEqual(['THIRSTY']);
  });

  it('says why 1 is ahead of 2, what data it rests on, and where a figure came from', () => {
    expect(report.ahead).toMatchObject({ first: 'CHEAP', second: 'DEAR', decidedBy: 'merit' });
    expect(report.data).toEqual({ catalog: { parts: 6, approved: 5, generic: 1, sha256: 'abc' }, rules: RULES });
    expect(report.origin('CHEAP', 'slewRate.min')).toEqual({ kind: 'assumption', text: 'CHEAP slewRate.min' });
  });

  it('counts only limits when asked strictly', () => {
    const strict = shortlist(STAGE, source(), { strict: true, order: 'merit', assumed: [] });
    expect(strict.undecided.map(({ part, likely }) => [part.id, likely])).toEqual([['TYPICAL', false], ['OPEN', false]]);
  });

  it('orders as asked', () => {
    expect(shortlist(STAGE, source(), { strict: false, order: 'price', assumed: [] }).fit.map(({ part }) => part.id)).toEqual(['TYPICAL', 'GX', 'CHEAP', 'DEAR']);
  });

  it('is the same for the same input, whatever the order of the list', () => {
    const again = shortlist(STAGE, source([...PARTS].reverse()));
    expect(again.fit.map(({ part, merit }) => [part.id, merit])).toEqual(report.fit.map(({ part, merit }) => [part.id, merit]));
    expect(again.counts).toEqual(report.counts);
  });

  it('stands without any part', () => {
    expect(shortlist(STAGE, source([]))).toMatchObject({ counts: { parts: 0, fit: 0, undecided: 0, rejected: 0 }, fit: [], ahead: null, nearest: [] });
  });
});

describe('explain', () => {
  it('gives one part all its verdicts and its place', () => {
    const dear = explain(STAGE, source(), { part: PARTS[3]! });
    expect(dear).toMatchObject({ rank: 2, judged: { outcome: 'fits', part: { id: 'DEAR' } }, counts: { parts: 6 } });
    expect(dear.fitting.map(({ part }) => part.id)).toEqual(['CHEAP', 'TYPICAL', 'GX']);
    expect(dear.judged.verdicts).toEqual(shortlist(STAGE, source()).fit[1]!.verdicts);
  });

  it('gives a rejected part no place and up to three that fit', () => {
    const thirsty = explain(STAGE, source(), { part: PARTS[2]! });
    expect(thirsty).toMatchObject({ rank: null, judged: { outcome: 'does-not-fit' } });
    expect(thirsty.fitting).toHaveLength(3);
  });

  it('refuses a part that is not in the catalog', () => {
    expect(() => explain(STAGE, source(), { part: partOf([], { id: 'NONE' }) })).toThrow(new RangeError('part NONE is not in the catalog that was judged'));
  });
});

describe('demands', () => {
  it('look at no part', () => {
    const { demands, stage } = demandsOf(STAGE);
    expect(stage).toBe(STAGE);
    expect(demands.map(({ check }) => check)).toEqual(shortlist(STAGE, source([])).demands.map(({ check }) => check));
  });
});
