/** Offset of the first byte that is not part of well-formed UTF-8 (RFC 3629, section 4), or null. */
export function firstBadByte(bytes: Uint8Array): number | null {
  for (let at = 0; at < bytes.length; ) {
    const length = sequenceLength(bytes, at);
    if (length === 0) return at;
    at += length;
  }
  return null;
}

function sequenceLength(bytes: Uint8Array, at: number): number {
  const lead = bytes[at] ?? 0;
  if (lead < 0x80) return 1;
  const length = lead >= 0xc2 && lead < 0xe0 ? 2 : lead >= 0xe0 && lead < 0xf0 ? 3 : lead >= 0xf0 && lead < 0xf5 ? 4 : 0;
  if (length === 0 || !secondFits(lead, bytes[at + 1] ?? 0)) return 0;
  for (let next = 2; next < length; next += 1) if (((bytes[at + next] ?? 0) & 0xc0) !== 0x80) return 0;
  return length;
}

// The second byte excludes overlong forms, surrogates and code points above U+10FFFF.
function secondFits(lead: number, second: number): boolean {
  const low = lead === 0xe0 ? 0xa0 : lead === 0xf0 ? 0x90 : 0x80;
  const high = lead === 0xed ? 0x9f : lead === 0xf4 ? 0x8f : 0xbf;
  return second >= low && second <= high;
}
