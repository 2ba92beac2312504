import type { Style } from '../style.js';
import type { Review } from './review.js';

/** Sentences come in one piece: the browser breaks lines. */
const ENDLESS = 1_000_000;

/** How the texts of other presenters are asked for when they go on a page. */
export function pageStyle({ top }: Pick<Review, 'top'>): Style {
  return { width: ENDLESS, ascii: false, colour: false, top, all: true, sources: false, gluedUnits: true };
}

/** A paragraph of another presenter as one sentence, without the lead of its lines. */
export const sentence = (lines: readonly string[]): string => lines.map((line) => line.trim()).join(' ');
