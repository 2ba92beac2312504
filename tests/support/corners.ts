/** Every combination of −1 and +1 for a number of independent tolerances. */
export function corners(count: number): readonly (readonly (-1 | 1)[])[] {
  return Array.from({ length: 2 ** count }, (_, index) => {
    return Array.from({ length: count }, (_, bit) => ((index >> bit) & 1 ? 1 : -1));
  });
}
