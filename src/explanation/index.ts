export { changesFor } from './changes.js';
export type { Advice, Change, Changes, Changing, Move, Rerun } from './changing.js';
export type { Blamed, Conflict } from './conflict.js';
export { whyNothingFits, type CountedChange, type NothingFits } from './nothing-fits.js';
export { whyAhead, type Difference, type WhyAhead } from './why-ahead.js';
