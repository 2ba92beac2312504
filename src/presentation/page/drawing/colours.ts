/**
 * Colours as the page sets them for light, dark and print; the fallbacks are those of a white page, each at least 3:1 against it
 * (Okabe and Ito, Color Universal Design, 2008, darkened; WCAG 2.2, 1.4.11). A colour never says anything alone.
 */
export const INK = 'var(--ink,#1a1a1a)';
export const PAPER = 'var(--paper,#fff)';
export const GRID = 'var(--grid,#d9d9d9)';
export const FAINT = 'var(--faint,#6b6b6b)';
export const PASS = 'var(--pass,#0072b2)';
export const FAIL = 'var(--fail,#b84a00)';

export type MarkerShape = 'circle' | 'square' | 'triangle' | 'diamond' | 'cross';

/** One series: colour, dash pattern and marker shape go together, everywhere. */
export interface Series {
  readonly colour: string;
  /** Undefined: solid. */
  readonly dash: string | undefined;
  readonly marker: MarkerShape;
}

const FIRST: Series = { colour: 'var(--series-1,#0072b2)', dash: undefined, marker: 'circle' };
const SECOND: Series = { colour: 'var(--series-2,#b84a00)', dash: '8 4', marker: 'square' };
const THIRD: Series = { colour: 'var(--series-3,#007a59)', dash: '2 3', marker: 'triangle' };
const FOURTH: Series = { colour: 'var(--series-4,#a8527f)', dash: '9 3 2 3', marker: 'diamond' };

/** The chosen part is always the first. */
export const SERIES = { first: FIRST, second: SECOND, third: THIRD, fourth: FOURTH } as const;
