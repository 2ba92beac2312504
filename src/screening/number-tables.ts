import { STANDS, type AnyNumbers } from '../checks/index.js';
import type { Finding } from '../verdicts/finding.js';
import type { TermQuestion } from './composed-question.js';

/** Both readings of one part. */
export interface BothFindings {
  readonly pessimistic: Finding;
  readonly optimistic: Finding;
}

/** The answers of each term as numbers side by side, in either outlook. */
export interface NumberTables {
  /** Both findings of the part with these answers, term by term at `place`; null: numbers alone do not tell. */
  findings(columns: readonly Int32Array[], place: number): BothFindings | null;
  /** How both stand, without making them. */
  stands(columns: readonly Int32Array[], place: number): BothStanding;
}

/** Each one of `STANDS`. The same object is filled anew for every part. */
export interface BothStanding {
  worst: number;
  best: number;
}

/** Tables that grow with the answers. */
export function numberTables({ terms, finding, stands }: AnyNumbers, questions: readonly TermQuestion[]): NumberTables {
  const tables = questions.map((question, number) => tableOf(question, terms[number] ?? NOTHING));
  const row = new Float64Array(terms.reduce((sum, { width }) => sum + width, 0));
  /** Whether both readings have these numbers. */
  const fillWorst = (columns: readonly Int32Array[], place: number): boolean => {
    let [at, isSame] = [0, true];
    for (let number = 0; number < tables.length; number += 1) {
      const [table, column] = [tables[number], columns[number]];
      if (table === undefined || column === undefined) continue;
      const answer = column[place] ?? 0;
      if (answer >= table.known) reach(table, answer);
      if (table.same[answer] !== 1) isSame = false;
      const { worst, width } = table;
      // Written out: a call of its own for each term takes longer than what it copies.
      for (let from = answer * width, end = from + width; from < end; from += 1, at += 1) row[at] = worst[from] ?? NaN;
    }
    return isSame;
  };
  /** After the other, for the same part: what both readings have in common stands there already. */
  const fillBest = (columns: readonly Int32Array[], place: number): void => {
    let at = 0;
    for (let number = 0; number < tables.length; number += 1) {
      const [table, column] = [tables[number], columns[number]];
      if (table === undefined || column === undefined) continue;
      const answer = column[place] ?? 0;
      const { best, width, same } = table;
      if (same[answer] === 1) at += width;
      else for (let from = answer * width, end = from + width; from < end; from += 1, at += 1) row[at] = best[from] ?? NaN;
    }
  };
  const standing: BothStanding = { worst: 0, best: 0 };
  return {
    findings(columns, place) {
      const isSame = fillWorst(columns, place);
      const pessimistic = finding(row);
      if (pessimistic === null) return null;
      if (isSame) return { pessimistic, optimistic: pessimistic };
      fillBest(columns, place);
      const optimistic = finding(row);
      return optimistic === null ? null : { pessimistic, optimistic };
    },
    stands(columns, place) {
      const isSame = fillWorst(columns, place);
      const worst = stands(row);
      let best = worst;
      // What fails or passes in one reading only is open; what is not told in one is told in none.
      if (!isSame && worst !== STANDS.untold) {
        fillBest(columns, place);
        best = stands(row);
      }
      standing.worst = best === STANDS.untold ? best : worst;
      standing.best = best;
      return standing;
    },
  };
}

type InNumbers = AnyNumbers['terms'][number];

const NOTHING: InNumbers = { width: 0, write: () => undefined };

/** By answer; as far as `known`. */
interface Table {
  readonly question: TermQuestion;
  readonly width: number;
  readonly write: InNumbers['write'];
  known: number;
  worst: Float64Array<ArrayBuffer>;
  best: Float64Array<ArrayBuffer>;
  /** 1: both readings have the same numbers. */
  same: Uint8Array<ArrayBuffer>;
}

const FIRST = 64;

function tableOf(question: TermQuestion, { width, write }: InNumbers): Table {
  return { question, width, write, known: 0, worst: new Float64Array(FIRST * width), best: new Float64Array(FIRST * width), same: new Uint8Array(FIRST) };
}

/** Has the numbers of this answer ready. */
function reach(table: Table, answer: number): void {
  const { question, width, write } = table;
  for (; table.known <= answer; table.known += 1) {
    const { known } = table;
    if (known === table.same.length) {
      table.worst = enlarged(table.worst, new Float64Array(2 * known * width));
      table.best = enlarged(table.best, new Float64Array(2 * known * width));
      table.same = enlarged(table.same, new Uint8Array(2 * known));
    }
    const [low, high] = [question.worst[known], question.best[known]];
    write(low, { row: table.worst, at: known * width });
    write(high, { row: table.best, at: known * width });
    table.same[known] = low === high ? 1 : 0;
  }
}

function enlarged<Numbers extends Float64Array<ArrayBuffer> | Uint8Array<ArrayBuffer>>(before: Numbers, larger: Numbers): Numbers {
  larger.set(before);
  return larger;
}
