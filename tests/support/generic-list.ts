import { readFileSync } from 'node:fs';
import { readList } from '../../src/intake/read-list.js';
import type { Part } from '../../src/parts/part.js';

const read = readList(readFileSync(new URL('../../catalog/generic.csv', import.meta.url)), { file: 'generic.csv', tier: 'generic' });
if (!read.ok) throw new Error(read.problems.map(({ message }) => message).join('\n'));

/** The generic sets that ship, as they are read. */
export const genericList = read;

/** One of each die: package and channel variants of a family are the same amplifier. */
export const DIES: readonly Part[] = read.parts.filter((part, at) => part.family === null || read.parts.findIndex(({ family }) => family === part.family) === at);

export function genericSet(id: string): Part {
  const part = genericList.parts.find((one) => one.id === id);
  if (part === undefined) throw new Error(`no generic set ${id}`);
  return part;
}
