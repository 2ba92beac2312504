import type { WordDemand } from '../demands/index.js';
import type { Check } from './check.js';
import { compareWord } from './compare-word.js';

/** The part's lifecycle against those wanted. A generic set is a class, not something to order, so it is not judged on it. */
export const lifecycle: Check<WordDemand> = {
  id: 'lifecycle',
  title: 'lifecycle',
  unit: null,
  reads: ['tier', 'lifecycle'],
  hasMargin: false,
  asks: (demands) => demands.lifecycle,
  judge: (asked, { identity }) => (identity.tier === 'generic' ? null : compareWord(asked, 'lifecycle', identity.lifecycle)),
};
