import type { WordDemand } from '../demands/index.js';
import type { Check } from './check.js';
import { compareWord } from './compare-word.js';

/** The part's qualification against the grade wanted: one at least as good. */
export const qualification: Check<WordDemand> = {
  id: 'qualification',
  title: 'qualification',
  unit: null,
  reads: ['qualification'],
  hasMargin: false,
  asks: (demands) => demands.qualification,
  judge: (asked, { identity }) => compareWord(asked, 'qualification', identity.qualification),
};
