/**
 * A number of a dense array; NaN outside it, which no sum hides.
 * @param values any unit
 * @param index whole number
 * @returns same unit
 * @example cell(Float64Array.of(1, 2), 1) is 2
 * Source: definition.
 */
export function cell(values: Float64Array, index: number): number {
  return values[index] ?? NaN;
}

/**
 * Adds to a number of a dense array.
 * @param values any unit
 * @param index whole number inside the array
 * @param more same unit
 * @example increase(Float64Array.of(1, 2), 1, 3) leaves 1, 5
 * Source: definition.
 */
export function increase(values: Float64Array, index: number, more: number): void {
  values[index] = cell(values, index) + more;
}
