import { setting, type Move } from './changing.js';
import type { Errand } from './boundary.js';
import type { Mover } from './movers.js';

/** The words of a wish with the part's own among them; a single word (a qualification) is replaced. Null where that does not help. */
export function wordMove({ path, input }: Mover, { bench, before }: Errand, check: string): Move | null {
  const finding = bench.tried(before)?.check(check)?.worst;
  if (finding?.kind !== 'words' || input.form !== 'words') return null;
  const text = path === 'wishes.qualification' ? finding.offered : `[${[...input.words, finding.offered].map(plain).join(', ')}]`;
  const passes = bench.tried([...before, setting(path, text)])?.check(check)?.outcome === 'pass';
  return passes ? { path, text, was: input.text, written: input.written, value: null, boundary: null, direction: null, factor: 1 } : null;
}

/** A word of a YAML list; anything but letters, digits and joints in quotes. */
const plain = (word: string): string => (/^[\p{L}\d][\p{L}\d ./+-]*$/u.test(word) ? word : JSON.stringify(word));
