/** One wound of a file: where (taken modulo its length), of what kind, and the byte that goes in. */
export interface Wound {
  readonly at: number;
  readonly kind: (typeof WOUNDS)[number];
  readonly byte: number;
}

export const WOUNDS = ['flip', 'drop', 'double', 'cut', 'insert'] as const;

/** A copy of the file with all wounds, in order. */
export function damaged(bytes: Uint8Array, wounds: readonly Wound[]): Uint8Array {
  let all = [...bytes];
  for (const { at, kind, byte } of wounds) {
    const place = all.length === 0 ? 0 : at % all.length;
    if (kind === 'flip') all[place] = byte;
    else if (kind === 'drop') all.splice(place, 1);
    else if (kind === 'double') all.splice(place, 0, ...all.slice(place, place + 20));
    else if (kind === 'cut') all = all.slice(0, place);
    else all.splice(place, 0, byte);
  }
  return Uint8Array.from(all);
}
