import type { ListOptions, ListResult, ReadList, RefusedList } from '../../src/intake/list.js';
import { readList } from '../../src/intake/read-list.js';

/** Reads CSV text as an approved list named list.csv. */
export function read(text: string | Uint8Array, options: Partial<ListOptions> = {}): ListResult {
  const bytes = typeof text === 'string' ? new TextEncoder().encode(text) : text;
  return readList(bytes, { file: 'list.csv', tier: 'approved', ...options });
}

export function accepted(text: string | Uint8Array, options: Partial<ListOptions> = {}): ReadList {
  const result = read(text, options);
  if (!result.ok) throw new Error(`refused: ${result.problems.map(({ code, message }) => `${code} ${message}`).join('; ')}`);
  return result;
}

export function refused(text: string | Uint8Array, options: Partial<ListOptions> = {}): RefusedList {
  const result = read(text, options);
  if (result.ok) throw new Error(`accepted ${result.parts.length} parts, a refusal was expected`);
  return result;
}

/** `code line row column` of each problem, in order. */
export function places(problems: RefusedList['problems']): string[] {
  return problems.map(({ code, place }) => `${code} ${place?.line ?? '-'} ${place?.row ?? '-'} ${place?.columnLetter ?? '-'}`);
}
