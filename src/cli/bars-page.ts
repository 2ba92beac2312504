import type { Block } from './help-topics.js';

/** Where bars stand and where they do not; the same for both commands. */
const WHERE: Block = {
  text: 'Bars are drawn when stdout is a terminal of 80 columns or more; never in a pipe or a file, never with --json or --csv. TERM=dumb leaves them out, --ascii draws them in ASCII. Colour adds nothing: every bar has its verdict in a word or sign, and its numbers, beside it.',
};

const RAILS: Block = {
  text: 'Rails: a pin from V- to V+ on a linear scale, at the supply end where it has the least room. The solid bar (= in ASCII) is the signal over all corners, - what offset and drift may add, the shaded ends (/ in ASCII) the head-room the part keeps at its worst figures and load, x what is out of its reach, ? what is not known. < or > instead of a rail: the signal is asked beyond it. The numbers stand below.',
};

/** Topic pages of the two commands that draw bars. */
export const EXPLAIN_PAGE: readonly Block[] = [
  { text: 'railfit explain PART STAGE judges one part: what fails or is open with every term and its origin, what passes in short (--all: in full), and what would let the part in (railfit help changes).' },
  { text: 'Margins: one line a check, on one linear scale. The mark | is the limit; to its right the solid bar (= in ASCII) is what is left, to its left x what is missing, as a share of the limit from -100 % to 200 % (from 0 when nothing is missing); < and > go on beyond. ?..? is an open check between its worst and its best reading, without an end where none is known. What passes stands with the tightest first. Temperatures, counts and words have no share and follow without a bar.' },
  RAILS,
  WHERE,
];

export const SHORTLIST_PAGE: readonly Block[] = [
  { text: 'railfit shortlist STAGE judges every part of the catalog, ranks what fits and says why the rest is out.' },
  { text: 'On a terminal the output of the first part is drawn between the rails (where nothing fits, the nearest part on the pins that keep it out), and each row has a bar of its tightest check where no other column has to move for it: what is left, from 0 to 100 % of its limit, > for more.' },
  RAILS,
  WHERE,
];
