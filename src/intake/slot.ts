import type { Figure } from '../parts/figures.js';
import { figureSlot } from '../parts/figures.js';

const SLOTS = new WeakMap<Figure, string>();

/** The slot of a figure. Equal cells of a column share their figures, so each slot is spelled once. */
export function slotOf(figure: Figure): string {
  const known = SLOTS.get(figure);
  if (known !== undefined) return known;
  const slot = figureSlot(figure);
  SLOTS.set(figure, slot);
  return slot;
}
