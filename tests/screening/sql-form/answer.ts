import Database from 'better-sqlite3';
import type { Demands } from '../../../src/demands/index.js';
import type { Tier } from '../../../src/parts/part.js';
import type { PartOutcome } from '../../../src/screening/judged-part.js';
import type { Outcome } from '../../../src/verdicts/verdict.js';
import { askedBeyondSql, PARTS, type SqlAsking, sqlForm, TALLY } from './statement.js';

/** One part as SQL answers it. */
export interface SqlPart {
  readonly tier: Tier;
  readonly id: string;
  readonly outcome: PartOutcome;
  /** Place among what fits, each variant one of its own, and the place of the first of its line. */
  readonly place: number | null;
  readonly line: number | null;
  /** The margin is that of the order, on the worst reading. */
  readonly verdicts: Readonly<Record<string, readonly [outcome: Outcome, basis: number, margin: number | null]>>;
}

/** Parts that a check fails, lets pass and leaves open. */
export type Tally = Readonly<Record<string, readonly [fail: number, pass: number, open: number]>>;

/** What SQLite answers from the part table. */
export interface SqlAnswer {
  readonly parts: readonly SqlPart[];
  readonly tally: Tally;
}

type Row = [Tier, string, PartOutcome, number | null, number | null, string];

/** On a connection of its own, which may not write the catalog. */
export function answerBySql(file: string, demands: Demands, asking: SqlAsking): SqlAnswer {
  const beyond = askedBeyondSql(demands);
  if (beyond.length > 0) throw new RangeError(`no SQL answers ${beyond.join(', ')}`);
  const database = new Database(file, { readonly: true });
  try {
    database.exec(sqlForm(demands, asking));
    const parts = database.prepare<[], Row>(PARTS).raw().all();
    const tally = database.prepare<[], [string, number, number, number]>(TALLY).raw().all();
    return {
      parts: parts.map(([tier, id, outcome, place, line, verdicts]) => ({ tier, id, outcome, place, line, verdicts: JSON.parse(verdicts) as SqlPart['verdicts'] })),
      tally: Object.fromEntries(tally.map(([check, ...counts]) => [check, counts])),
    };
  } finally {
    database.close();
  }
}
