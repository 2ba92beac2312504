import type { PriceDemand } from '../demands/index.js';
import type { Cause, UndecidedFinding } from '../verdicts/finding.js';
import type { Check } from './check.js';

/** Price against the most the team pays, in the same currency; another currency is not converted. */
export const price: Check<PriceDemand> = {
  id: 'price',
  title: 'price',
  unit: null,
  reads: ['price'],
  hasMargin: true,
  asks: (demands) => demands.price,
  judge: (asked, { identity }) => {
    if (identity.price === null) return undecided(asked, 'missing-figure');
    if (identity.price.currency !== asked.currency) return undecided(asked, 'currency');
    const { required, unit, sense } = asked;
    return { kind: 'numbers', required, unit, sense, offered: identity.price.amount, basis: 'guaranteed' };
  },
};

function undecided(asked: PriceDemand, cause: Cause): UndecidedFinding {
  const { required, unit, sense } = asked;
  return { kind: 'undecided', required, unit, sense, cause, missing: [{ figure: 'price', kind: null }] };
}
