import type { WordDemand } from '../demands/index.js';
import type { Check } from './check.js';
import { compareWord } from './compare-word.js';

/** The part's status against those wanted. A generic set is a class, not something to order, so it is not judged on it. */
export const status: Check<WordDemand> = {
  id: 'status',
  title: 'status',
  unit: null,
  reads: ['tier', 'status'],
  hasMargin: false,
  asks: (demands) => demands.status,
  judge: (asked, { identity }) => (identity.tier === 'generic' ? null : compareWord(asked, 'status', identity.status)),
};
