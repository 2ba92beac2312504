/** Encodings a list is read in. */
export const ENCODINGS = ['utf-8', 'utf-16le', 'utf-16be', 'windows-1252'] as const;
export type Encoding = (typeof ENCODINGS)[number];

export interface Limits {
  readonly bytes: number;
  readonly records: number;
  readonly columns: number;
  /** Characters in one cell. */
  readonly cell: number;
  /** Stored problems; all are counted. */
  readonly problems: number;
}

/** Over one of these a list is refused, naming the limit and, where there is one, the option that lifts it. */
export const LIMITS: Limits = { bytes: 64 * 1024 * 1024, records: 200_000, columns: 512, cell: 64 * 1024, problems: 10_000 };

/** With `--large`: what a machine with a few gigabytes of memory still holds. */
const LARGE: Limits = { ...LIMITS, bytes: 384 * 1024 * 1024, records: 2_000_000 };

export const limitsOf = (large: boolean): Limits => (large ? LARGE : LIMITS);

/** What a file of so many bytes is refused with, before anything of it is read; null when it is not. */
export function sizeFault(bytes: number, large: boolean): { readonly code: string; readonly reason: string; readonly fix: string; readonly line: number } | null {
  const limit = limitsOf(large).bytes;
  if (bytes <= limit) return null;
  const fix = large ? 'split the list' : 'split the list, or lift the limit with --large';
  return { code: 'I105', reason: `the file has ${bytes} bytes, the limit is ${limit / 1024 / 1024} MiB`, fix, line: 1 };
}
