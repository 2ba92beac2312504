import { describe, expect, it } from 'vitest';
import { euro } from '../support/parts.js';
import { judgingBy } from '../support/judged.js';
import { dc, stageSpec } from '../support/stages.js';

const judge = judgingBy('price');
const SPEC = stageSpec('follower', dc(1, 2), { wishes: { price: { amount: 1, currency: 'EUR', text: '1 EUR' } } });

describe('price', () => {
  it.each([[0.99, 'pass'], [1, 'pass'], [1.01, 'fail']])('at most 1 EUR against %f EUR: %s', (amount, outcome) => {
    expect(judge(SPEC, [], { identity: { price: euro(amount) } })).toMatchObject({ outcome, required: 1, offered: amount, unit: 'EUR', sense: 'at-most', margin: 1 / amount });
  });

  it('in another currency, or not known, is undecided', () => {
    expect(judge(SPEC, [], { identity: { price: { amount: 0.1, currency: 'USD', quantity: null } } })).toMatchObject({ outcome: 'unknown', reason: 'currency', offered: null });
    expect(judge(SPEC, [])).toMatchObject({ outcome: 'unknown', reason: 'missing-figure' });
  });
});
