import type { Problem } from '../quantities/problem.js';
import type { ListQuestion, ListShape, RefusedList } from './list.js';
import { LIMITS } from './list.js';

/** A problem of the whole file. */
export interface FileFault {
  readonly code: string;
  readonly message: string;
  readonly fix: string;
  /** Absent where the file has no lines. */
  readonly line?: number;
}

/** More columns than any list has by far, so that row and column fit one number. */
const WIDEST = 2 ** 20;

/** Collects what is wrong with one list: counts everything, keeps up to the limit, tells a repeated note once per column. */
export class ProblemLog {
  readonly file: string;
  rows = 0;
  /** Row of the header, once it is found: what is wrong there is wrong in no part. */
  headerRow = 0;
  errors = 0;
  shape: ListShape | null = null;
  /** Sentences that need no act. */
  readonly notes: string[] = [];
  readonly questions: ListQuestion[] = [];
  readonly #problems: Problem[] = [];
  readonly #later: Problem[] = [];
  /** Row and column in one number. */
  readonly #cells = new Set<number>();
  readonly #rows = new Set<number>();
  readonly #notes = new Set<string>();

  constructor(file: string) {
    this.file = file;
  }

  add(problem: Problem): void {
    if (problem.severity === 'error') this.#count(problem);
    else if (this.#isRepeated(problem)) return;
    if (this.#problems.length < LIMITS.problems) this.#problems.push(problem);
  }

  /** Counted now, kept behind everything that is added otherwise: what is found row by row and told of the list as a whole. */
  addLater(problem: Problem): void {
    if (problem.severity === 'error') this.#count(problem);
    if (this.#later.length < LIMITS.problems) this.#later.push(problem);
  }

  /** How many are kept so far. */
  get kept(): number {
    return this.#problems.length + this.#later.length;
  }

  addAll(problems: readonly Problem[]): void {
    for (const problem of problems) this.add(problem);
  }

  /** In file order: by row, then by column. */
  list(): readonly Problem[] {
    return [...this.#problems, ...this.#later].slice(0, LIMITS.problems).sort(
      (a, b) => (a.place?.row ?? 0) - (b.place?.row ?? 0) || (a.place?.column ?? 0) - (b.place?.column ?? 0),
    );
  }

  refused(): RefusedList {
    const counts = { rows: this.rows, errors: this.errors, cells: this.#cells.size, parts: this.#rows.size };
    return { ok: false, file: this.file, problems: this.list(), counts, shape: this.shape, notes: this.notes, questions: this.questions };
  }

  refuse({ code, message, fix, line }: FileFault): RefusedList {
    this.add({ code, severity: 'error', message, fix, place: { file: this.file, ...(line === undefined ? {} : { line }) } });
    return this.refused();
  }

  #count({ place }: Problem): void {
    this.errors += 1;
    if (place?.row === undefined) return;
    if (place.row > this.headerRow) this.#rows.add(place.row);
    if (place.column !== undefined) this.#cells.add(place.row * WIDEST + place.column);
  }

  // Notes on how cells were read are told once per column: the first cell stands for the others.
  #isRepeated({ code, message, place, text }: Problem): boolean {
    if (code !== 'I515') return false;
    const key = `${place?.column ?? ''} ${message.slice((text ?? '').trim().length)}`;
    if (this.#notes.has(key)) return true;
    this.#notes.add(key);
    return false;
  }
}
