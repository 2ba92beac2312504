import type { ListColumn, ListRecord } from './list.js';

/** More different cells than these are no answer to "what does it say". */
const MOST_TALLIED = 4;

/** The cells of a column and how many parts have each, in the order of their first; null: too many different ones. */
export type TextTally = readonly (readonly [value: string, parts: number])[] | null;

export interface TextTallies {
  add(record: Pick<ListRecord, 'cells'>): void;
  /** By number of the column. */
  found(): ReadonlyMap<number, TextTally>;
}

/** Counts what the columns say that are kept as text. */
export function textTallies(columns: readonly ListColumn[]): TextTallies {
  const counts = columns.filter(({ reading: { kind } }) => kind === 'text' || kind === 'known').map(({ number }) => ({ number, values: new Map<string, number>() }));
  return {
    add({ cells }) {
      for (const { number, values } of counts) {
        if (values.size > MOST_TALLIED) continue;
        const cell = (cells[number - 1] ?? '').trim();
        values.set(cell, (values.get(cell) ?? 0) + 1);
      }
    },
    found: () => new Map(counts.map(({ number, values }) => [number, values.size > MOST_TALLIED ? null : [...values]])),
  };
}
