/**
 * Windows-1252 (code page of Western Windows) where it differs from Latin-1: bytes 0x80 to 0x9F. Written out because the decoder of
 * Node 20 gives control characters for them. null: the code page has no character there (table as published by Unicode, CP1252.TXT).
 */
const UPPER: readonly (number | null)[] = [
  0x20ac, null, 0x201a, 0x0192, 0x201e, 0x2026, 0x2020, 0x2021, 0x02c6, 0x2030, 0x0160, 0x2039, 0x0152, null, 0x017d, null,
  null, 0x2018, 0x2019, 0x201c, 0x201d, 0x2022, 0x2013, 0x2014, 0x02dc, 0x2122, 0x0161, 0x203a, 0x0153, null, 0x017e, 0x0178,
];

/** Bytes of Windows-1252 as text, or the offset of the first byte that is no character of it. */
export function decodeWindows1252(bytes: Uint8Array): { readonly text: string } | { readonly bad: number } {
  const pieces: string[] = [];
  for (let start = 0; start < bytes.length; start += CHUNK) {
    const units = new Uint16Array(Math.min(CHUNK, bytes.length - start));
    for (let at = 0; at < units.length; at += 1) {
      const unit = unitOf(bytes[start + at] ?? 0);
      if (unit === null) return { bad: start + at };
      units[at] = unit;
    }
    pieces.push(String.fromCharCode(...units));
  }
  return { text: pieces.join('') };
}

const CHUNK = 8192;

function unitOf(byte: number): number | null {
  return byte < 0x80 || byte > 0x9f ? byte : (UPPER[byte - 0x80] ?? null);
}
