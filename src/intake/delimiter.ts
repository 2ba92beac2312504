import type { Delimiter } from './list.js';

/** What a file gives when it is split at one delimiter. */
export interface Trial {
  readonly delimiter: Delimiter;
  /** Cells of the header; 0 when its quotes do not close. */
  readonly columns: number;
  /** Records below the header that hold something, and how many of them have as many cells as the header. */
  readonly rows: number;
  readonly fitting: number;
  /** The count of cells most of the rows have; null without rows. */
  readonly usual: number | null;
  /** Whether the header has an id, without which no split can be imported. */
  readonly hasId: boolean;
}

/**
 * The delimiter under which most rows have as many cells as the header, of several columns. Of two that do equally, the one with
 * an id column: `id;low (V);high (V) @ 10 kΩ, 5 V` over `A;1,8;5` falls into two columns at commas too. Null when still undecided.
 */
export function bestTrial(trials: readonly Trial[]): Trial | null {
  const fit = ({ rows, fitting }: Trial): number => fitting / rows;
  const several = trials.filter((trial) => trial.columns > 1 && fit(trial) > 0.5);
  const most = Math.max(...several.map(fit));
  const equal = several.filter((trial) => fit(trial) === most);
  const [best, next] = equal.length > 1 ? equal.filter(({ hasId }) => hasId) : equal;
  return best === undefined || next !== undefined ? null : best;
}

/** `at commas: 5 columns, most rows have 2`, for the message of a file that is split nowhere. */
export function trialWords({ delimiter, columns, rows, fitting, usual }: Trial): string {
  const start = `at ${NAMES[delimiter]}: ${columns} columns`;
  if (columns === 0) return `at ${NAMES[delimiter]}: a header that cannot be read`;
  if (fitting === rows) return `${start} everywhere`;
  return fitting === 0 && usual !== null ? `${start}, rows have ${usual}` : `${start} in ${fitting} of ${rows} rows`;
}

/** How delimiters are called in messages. */
export const NAMES: Readonly<Record<Delimiter, string>> = { ',': 'commas', ';': 'semicolons', '\t': 'tabs', '|': 'bars' };
