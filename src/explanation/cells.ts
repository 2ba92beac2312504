import type { LimitKind } from '../parts/figures.js';
import type { ListCell, PartSource } from '../parts/part.js';

const KINDS: readonly LimitKind[] = ['min', 'typ', 'max'];

/** The cells of a part by figure. A source that keeps origins alone tells the cell of each limit kind by them. */
export function cellsOf(source: PartSource): NonNullable<PartSource['cells']> {
  if (source.cells !== undefined) return source.cells.bind(source);
  return (partId, figure) =>
    KINDS.flatMap((kind): ListCell[] => {
      const origin = source.origin(partId, `${figure}.${kind}`);
      return origin?.kind === 'cell' ? [{ ...origin, kind, condition: {}, empty: true }] : [];
    });
}
