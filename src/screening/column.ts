type Numbers = Int32Array | Float64Array | Uint8Array;

/** Numbers by place, in a typed array that grows with the places that are used. */
export interface Column<Kept extends Numbers> {
  /** What was put there, or the blank. */
  at(place: number): number;
  put(place: number, value: number): void;
  /** As it stands: replaced when it grows. */
  numbers(): Kept;
}

const FIRST_SIZE = 64;

export function column<Kept extends Numbers>(make: new (size: number) => Kept, blank: number): Column<Kept> {
  const blankOf = (size: number): Kept => (blank === 0 ? new make(size) : (new make(size).fill(blank) as Kept));
  let kept = blankOf(FIRST_SIZE);
  return {
    at: (place) => kept[place] ?? blank,
    put(place, value) {
      if (place >= kept.length) {
        const larger = blankOf(Math.max(kept.length * 2, place + 1));
        larger.set(kept);
        kept = larger;
      }
      kept[place] = value;
    },
    numbers: () => kept,
  };
}
