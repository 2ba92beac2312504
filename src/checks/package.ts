import type { WordDemand } from '../demands/index.js';
import type { Check } from './check.js';
import { compareWord } from './compare-word.js';

/** The part's package against those wanted. A generic set is a class, not something to order, so it is not judged on it. */
export const packageWish: Check<WordDemand> = {
  id: 'package',
  title: 'package',
  unit: null,
  reads: ['tier', 'package'],
  hasMargin: false,
  asks: (demands) => demands.package,
  judge: (asked, { identity }) => (identity.tier === 'generic' ? null : compareWord(asked, 'package', identity.package)),
};
