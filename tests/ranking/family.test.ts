import { describe, expect, it } from 'vitest';
import { explain, shortlist } from '../../src/engine.js';
import type { Part, PartSource } from '../../src/parts/part.js';
import { cautionsOf } from '../../src/presentation/json.js';
import { renderShortlist } from '../../src/presentation/shortlist-text.js';
import { shortlistCsv } from '../../src/presentation/shortlist-csv.js';
import { linesOf } from '../../src/ranking/family.js';
import { CONTEXT, sampleReport, sampleStage, styleOf } from '../support/sample-report.js';

/** One die in three packages, and a stranger. All fit the sample stage. */
const model = sampleReport().fit[0]!.part;
const die = (id: string, changes: Partial<Part>): Part => ({ ...model, id, family: 'ONE-DIE', ...changes });
const price = (amount: number): Part['price'] => ({ amount, currency: 'EUR', quantity: 1000 });
const SINGLE = die('DIE-1', { package: 'SOT-23-5', channels: 1, price: price(0.3) });
const DUAL = die('DIE-2', { package: 'VSSOP-8', channels: 2, price: price(0.45) });
const QUAD = die('DIE-4', { package: 'TSSOP-14', channels: 4, price: price(0.8) });
const STRANGER = die('OTHER', { family: null, price: price(0.5) });

const source = (...parts: Part[]): PartSource => ({ parts, sha256: '0', origin: () => null });

describe('a family', () => {
  const report = shortlist(sampleStage(), source(QUAD, STRANGER, DUAL, SINGLE));

  it('is one ranked line at the place of its best member', () => {
    expect(report.fit.map(({ rank, part, variants }) => [rank, part.id, variants.map((one) => one.part.id)])).toEqual([
      [1, 'DIE-1', ['DIE-2', 'DIE-4']],
      [2, 'OTHER', []],
    ]);
  });

  it('counts its parts, so that counts are complete', () => {
    expect(report.counts).toEqual({ parts: 4, fit: 4, undecided: 0, rejected: 0 });
  });

  it('tells its members on the line', () => {
    const text = renderShortlist(report, styleOf(100), CONTEXT);
    expect(text).toContain('4 of 4 parts fit, on 2 lines (packages of one die share a line)');
    expect(text.replaceAll(/\s+/gu, ' ')).toContain('same die: DIE-2 VSSOP-8 dual, DIE-4 TSSOP-14 quad');
  });

  it('gives a variant the rank of its line when explained', () => {
    const explanation = explain(sampleStage(), source(QUAD, STRANGER, DUAL, SINGLE), { part: QUAD });
    expect([explanation.rank, explanation.judged.part.id]).toEqual([1, 'DIE-4']);
  });

  it('lists every variant in the table', () => {
    const rows = shortlistCsv(report).split('\r\n').slice(1, 5).map((row) => row.split(',').slice(0, 2).join(','));
    expect(rows).toEqual(['1,DIE-1', '1,DIE-2', '1,DIE-4', '2,OTHER']);
  });

  it('does not hold across tiers or proofs', () => {
    const one = report.fit[0]!;
    const generic = { ...one, part: { ...one.part, id: 'G', tier: 'generic' as const } };
    const typical = { ...one, part: { ...one.part, id: 'T' }, proof: 'typical' as const };
    const proven = { ...one, proof: 'limits' as const };
    expect(linesOf([proven, typical, generic])).toHaveLength(3);
  });
});

describe('a dual or quad for one stage', () => {
  it('tells what the idle sections draw: 3 of 4 at the quiescent current of one', () => {
    const { fit } = shortlist(sampleStage(), source(QUAD));
    const one = fit[0]!.current!;
    const microamperes = (amperes: number): string => `${Math.round(amperes * 1e6)} µA`;
    expect(cautionsOf(fit[0]!)).toEqual([
      `3 of 4 sections idle: they draw ${microamperes(3 * one)} of the ${microamperes(4 * one)} of the package; an idle section is tied off as a follower inside its input range`,
    ]);
  });

  it('is judged with its idle sections when the limit is per package', () => {
    const perPackage = { 'limits.supplyCurrentPer': 'package', 'limits.supplyCurrent': '100 µA' };
    const outcomes = [SINGLE, DUAL, QUAD].map((part) => shortlist(sampleStage(perPackage), source(part)).counts.fit);
    expect(outcomes).toEqual([1, 1, 0]);
  });
});
