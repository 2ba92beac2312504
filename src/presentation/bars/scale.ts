/** An evenly divided scale of character cells. */
export interface Scale {
  /** Value at the left edge and at the right edge, the second the larger. */
  readonly domain: readonly [number, number];
  readonly cells: number;
}

/** The cell a value lies in, counted from 0; what lies beyond an end stands in the last cell there. */
export function cellOf({ domain: [least, most], cells }: Scale, value: number): number {
  const at = Math.floor(((value - least) / (most - least)) * cells);
  return Math.min(cells - 1, Math.max(0, at));
}

/** The cell a span ends in: an end that lies just between two cells still belongs to the left one. */
export function endCellOf({ domain: [least, most], cells }: Scale, value: number): number {
  const at = Math.ceil(((value - least) / (most - least)) * cells) - 1;
  return Math.min(cells - 1, Math.max(0, at));
}

/** The cells of a span, one at least. */
export function cellsOf(scale: Scale, from: number, to: number): number[] {
  const first = cellOf(scale, from);
  return cellsBetween(first, Math.max(first, endCellOf(scale, to)));
}

/** Every cell from one to the other, both included; none when they are the wrong way round. */
export function cellsBetween(first: number, last: number): number[] {
  return Array.from({ length: Math.max(0, last - first + 1) }, (_, step) => first + step);
}
