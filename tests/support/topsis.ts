/**
 * Closeness to the ideal by TOPSIS with equal weights: the alternative that ranking does not use, kept to show why.
 * Source: Hwang & Yoon, Multiple Attribute Decision Making (1981).
 */
export function closeness(matrix: readonly (readonly number[])[], benefit: readonly boolean[]): readonly number[] {
  const norms = benefit.map((_, j) => Math.hypot(...matrix.map((row) => row[j]!)));
  // Signed so that more is better in every column.
  const scaled = matrix.map((row) => row.map((value, j) => ((benefit[j] ? 1 : -1) * value) / norms[j]! / benefit.length));
  const column = (j: number): number[] => scaled.map((row) => row[j]!);
  const ideal = benefit.map((_, j) => Math.max(...column(j)));
  const worst = benefit.map((_, j) => Math.min(...column(j)));
  const distance = (row: readonly number[], point: readonly number[]): number => Math.hypot(...row.map((v, j) => v - point[j]!));
  return scaled.map((row) => distance(row, worst) / (distance(row, worst) + distance(row, ideal)));
}
