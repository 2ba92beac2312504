/**
 * Up to three candidates near a word, nearest first, ties in the order given. Never acted on: only offered.
 * A candidate is near when the distance is at most max(1, a third of its length); letter case costs nothing.
 */
export function suggest(word: string, candidates: readonly string[]): string[] {
  const near = [];
  for (const candidate of candidates) {
    const distance = wordDistance(word.toLowerCase(), candidate.toLowerCase());
    if (distance <= Math.max(1, candidate.length / 3)) near.push({ candidate, distance });
  }
  near.sort((a, b) => a.distance - b.distance);
  return near.slice(0, 3).map((entry) => entry.candidate);
}

/** A part id with letter case, O and 0, I and 1 folded: what a reader cannot tell apart in print. */
export function foldId(id: string): string {
  return id.trim().toUpperCase().replaceAll('O', '0').replaceAll('I', '1');
}

/** Swapping two neighbours is the commonest slip of the fingers, so it costs half an edit. */
const TRANSPOSITION = 0.5;

/**
 * Restricted Damerau-Levenshtein distance (optimal string alignment), with a cheap transposition.
 * Damerau, F. J.: A technique for computer detection and correction of spelling errors, Comm. ACM 7 (1964) 171-176.
 */
export function wordDistance(a: string, b: string): number {
  const rows: number[][] = [Array.from({ length: b.length + 1 }, (_, j) => j)];
  for (let i = 1; i <= a.length; i++) {
    const row = [i];
    for (let j = 1; j <= b.length; j++) row.push(cell(rows, row, { a, b, i, j }));
    rows.push(row);
  }
  return at(rows, a.length, b.length);
}

const at = (rows: readonly (readonly number[])[], i: number, j: number): number => rows[i]?.[j] ?? Number.POSITIVE_INFINITY;

function cell(rows: readonly number[][], row: readonly number[], place: { a: string; b: string; i: number; j: number }): number {
  const { a, b, i, j } = place;
  const same = a[i - 1] === b[j - 1] ? 0 : 1;
  const edited = Math.min(at(rows, i - 1, j) + 1, (row[j - 1] ?? 0) + 1, at(rows, i - 1, j - 1) + same);
  const swapped = i > 1 && j > 1 && a[i - 1] === b[j - 2] && a[i - 2] === b[j - 1] && same === 1;
  return swapped ? Math.min(edited, at(rows, i - 2, j - 2) + TRANSPOSITION) : edited;
}
