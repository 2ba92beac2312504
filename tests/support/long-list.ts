import { closeSync, openSync, writeSync } from 'node:fs';

const HEADER = 'id,description,status,lifecycle,package,supply voltage min (V),supply voltage max (V),slew rate min (V/µs),gain bandwidth min (MHz),offset voltage max (mV),quiescent current max (µA)';

/** Writes a list of so many parts in canonical CSV, piece by piece; `edition` changes every part. */
export function writeLongList(file: string, parts: number, edition = 0): void {
  const handle = openSync(file, 'w');
  let piece = `${HEADER}\r\n`;
  for (let at = 0; at < parts; at += 1) {
    const k = ((at * 7919 + edition) % 97) + 1;
    piece += `ORG-${String(at).padStart(6, '0')},"${k} MHz CMOS, rail-to-rail",approved,active,SOT-23-5,1.8,5.5,0.${k},${k},${k / 10},${40 + k}\r\n`;
    if (piece.length < 1 << 20 && at < parts - 1) continue;
    writeSync(handle, piece);
    piece = '';
  }
  closeSync(handle);
}
