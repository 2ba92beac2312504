import type { Report } from '../../report.js';
import type { ChosenPart } from './review.js';

/** A part of the report by its id, or without one the first that fits; null when nothing fits. Throws RangeError for an id that was not judged. */
export function chosenPart(report: Report, id: string | null, by: ChosenPart['by']): ChosenPart | null {
  const [first] = report.fit;
  if (id === null) return first === undefined ? null : { judged: first, rank: first.rank, by: 'first' };
  const lines = report.fit.flatMap((line) => [line, ...line.variants].map((judged) => ({ judged, rank: line.rank })));
  const others = [...report.undecided, ...report.rejected].map((judged) => ({ judged, rank: null }));
  const found = [...lines, ...others].find(({ judged }) => judged.part.id === id);
  if (found === undefined) throw new RangeError(`part ${id} is not in the catalog that was judged`);
  return { ...found, by };
}
