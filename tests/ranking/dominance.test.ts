import { describe, expect, it } from 'vitest';
import { dominatorsOf } from '../../src/ranking/dominance.js';
import type { JudgedPart } from '../../src/screening/index.js';
import { fitting, passing } from '../support/fitting.js';

const with_ = (margin: number): { verdicts: ReturnType<typeof passing>[] } => ({ verdicts: [passing('slew-rate', margin)] });

/** The part that dominates `one` in a list; `one` is put in front when it is not in it. */
function dominatorOf(one: JudgedPart, list: readonly JudgedPart[]): JudgedPart | null {
  const all = list.includes(one) ? list : [one, ...list];
  return dominatorsOf(all)[all.indexOf(one)] ?? null;
}

describe('dominance', () => {
  const plain = fitting('PLAIN', { price: 0.5, current: 50e-6, ...with_(2) });

  it('is as good everywhere and better in one thing, on clamped margins: excess does not save a dearer part', () => {
    const excessive = fitting('EXCESSIVE', { price: 0.9, current: 50e-6, ...with_(50) });
    expect(dominatorOf(excessive, [plain, excessive])?.part.id).toBe('PLAIN');
    expect(dominatorOf(plain, [plain, excessive])).toBeNull();
  });

  it('is not said of equals or of trade-offs', () => {
    expect(dominatorOf(plain, [plain, fitting('TWIN', { price: 0.5, current: 50e-6, ...with_(2) })])).toBeNull();
    expect(dominatorOf(plain, [plain, fitting('OTHER', { price: 0.4, current: 51e-6, ...with_(2) })])).toBeNull();
    expect(dominatorOf(plain, [plain, fitting('TIGHT', { price: 0.4, current: 50e-6, ...with_(1.1) })])).toBeNull();
  });

  it('counts tier and proof', () => {
    const cheaper = { price: 0.4, current: 50e-6, ...with_(2) };
    expect(dominatorOf(plain, [fitting('GX', { ...cheaper, tier: 'generic' })])).toBeNull();
    expect(dominatorOf(plain, [fitting('TYPICAL', { ...cheaper, proof: 'typical' })])).toBeNull();
    expect(dominatorOf(plain, [fitting('B', cheaper)])?.part.id).toBe('B');
  });

  it('is not said where price or current is not known', () => {
    expect(dominatorOf(fitting('A', { price: null }), [plain])).toBeNull();
    expect(dominatorOf(fitting('A', { current: null }), [plain])).toBeNull();
    expect(dominatorOf(plain, [fitting('A', { price: null, current: 1e-9 })])).toBeNull();
  });
});
