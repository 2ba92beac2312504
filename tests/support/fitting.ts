import type { Basis } from '../../src/parts/basis.js';
import type { Part } from '../../src/parts/part.js';
import type { JudgedPart } from '../../src/screening/index.js';
import type { Verdict } from '../../src/verdicts/verdict.js';
import { euro, partOf } from './parts.js';

/** A verdict as the order reads it: a pass with a margin on a basis. */
export function passing(check: string, margin: number | null, more: Partial<Verdict> = {}): Verdict {
  const basis: Basis = more.basis ?? 'guaranteed';
  return {
    check, title: check, outcome: 'pass', required: 1, offered: margin, offeredBest: margin, unit: 'V', sense: 'at-least', margin, spare: null, basis, standsOn: basis,
    worstAt: null, terms: [], rss: null, known: null, reason: null, missing: [], decidesAt: null, turnsAt: null, cautions: [], slot: null, how: null, ...more,
  };
}

interface Fitting extends Partial<Omit<JudgedPart, 'part'>> {
  readonly price?: number | null;
  readonly tier?: Part['tier'];
}

/** A part that fits: comfortable everywhere, of 1 EUR and 100 µA, unless the test says otherwise. */
export function fitting(id: string, { price = 1, tier = 'approved', ...more }: Fitting = {}): JudgedPart {
  return {
    part: partOf([], { id, tier, price: price === null ? null : euro(price) }),
    outcome: 'fits', proof: 'limits', likely: false, verdicts: [passing('slew-rate', 2)], deciding: [], confirm: [], hazards: [], current: 100e-6, dynamicRange: null, batteryHours: null, ...more,
  };
}
