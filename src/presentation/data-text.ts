import type { DataUsed } from '../report.js';
import { labelled } from './layout.js';
import { held } from './spelling.js';
import type { Style } from './style.js';
import { counted } from './words.js';

/** What the answer rests on, short enough to compare by eye. */
export function dataLine({ catalog, rules }: DataUsed, style: Style): string[] {
  const hash = held(`sha256 ${style.sources ? catalog.sha256 : catalog.sha256.slice(0, HASH)}`);
  return labelled('Data', `catalog of ${counted(catalog.parts, 'part')} (${catalog.approved} approved, ${catalog.generic} generic, ${hash}), rules ${rules}`, style);
}

/** Hexadecimal digits shown of a hash. */
export const HASH = 8;
