import { readHeader } from './header.js';
import type { HeaderReading } from './column-reading.js';
import { readOrdinaryHeader } from './ordinary-header.js';

const tidy = (cell: string): string => cell.replace(/\s+/gu, ' ').trim();

/** A header in the canonical words, else in those of the trade. A header that is canonical but incomplete may still be ordinary. */
export function readAnyHeader(header: string): HeaderReading {
  const canonical = readHeader(header);
  if (canonical.kind !== 'text' && canonical.kind !== 'problem') return canonical;
  const ordinary = header === '' ? null : readOrdinaryHeader(header);
  if (ordinary === null) return canonical;
  // Told in the words of the canonical form, with its fix.
  return ordinary.kind === 'problem' && canonical.kind === 'problem' ? canonical : ordinary;
}

/** True for a header that names the id of a part. */
export function isPartId(cell: string): boolean {
  const reading = readAnyHeader(tidy(cell));
  return reading.kind === 'identity' && reading.field === 'id';
}

/** How many headers are known. */
export function recognised(cells: readonly string[]): number {
  return cells.filter((cell) => readAnyHeader(tidy(cell)).kind !== 'text').length;
}
