/** Bytes of all files of a zip archive as its directory states them (PKWARE, APPNOTE.TXT, 4.3.12); null when there is no directory. Guards against an archive that unpacks to more than the machine holds. */
export function unpackedSize(bytes: Uint8Array): number | null {
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  const end = endOfDirectory(view);
  if (end === null) return null;
  const count = view.getUint16(end + 10, true);
  let at = view.getUint32(end + 16, true);
  let size = 0;
  for (let file = 0; file < count && at + ENTRY <= view.byteLength; file += 1) {
    if (view.getUint32(at, true) !== ENTRY_MARK) return null;
    size += view.getUint32(at + 24, true);
    at += ENTRY + view.getUint16(at + 28, true) + view.getUint16(at + 30, true) + view.getUint16(at + 32, true);
  }
  return size;
}

const ENTRY = 46;
const ENTRY_MARK = 0x02014b50;
const END = 22;
const END_MARK = 0x06054b50;
/** The comment behind the directory has at most this many bytes. */
const COMMENT = 0xffff;

function endOfDirectory(view: DataView): number | null {
  for (let at = view.byteLength - END; at >= Math.max(0, view.byteLength - END - COMMENT); at -= 1) if (view.getUint32(at, true) === END_MARK) return at;
  return null;
}
