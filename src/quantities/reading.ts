import type { KindRule } from './kind-rules.js';
import type { FieldKind } from './kinds.js';
import type { ReadingContext } from './quantity.js';
import type { UnitReading } from './unit-reading.js';

/** What is known while one text is being read. */
export interface Reading {
  /** Normalised text. */
  readonly text: string;
  readonly kind: FieldKind;
  readonly rule: KindRule;
  readonly context: ReadingContext;
  readonly header: UnitReading | null;
}

/** The text with [start, end) replaced: what a fix shows, so that the rest of what was typed stays. */
export function patched(reading: Reading, where: { start: number; end: number }, replacement: string): string {
  const rest = reading.text.slice(where.end);
  return (reading.text.slice(0, where.start) + replacement + (/^[±+]/.test(rest) ? ` ${rest}` : rest)).trim();
}
