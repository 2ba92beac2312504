import type { ReadList } from '../../src/intake/list.js';
import { readList } from '../../src/intake/read-list.js';
import type { Tier } from '../../src/parts/part.js';

/** A list that reads without error. */
export function list(lines: readonly string[], { tier = 'approved', file = 'list.csv' }: { tier?: Tier; file?: string } = {}): ReadList {
  const result = readList(new TextEncoder().encode(`${lines.join('\r\n')}\r\n`), { file, tier });
  if (!result.ok) throw new Error(result.problems.map(({ code, message }) => `${code} ${message}`).join('; '));
  return result;
}
