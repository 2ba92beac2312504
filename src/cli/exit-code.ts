/** Exit codes of the contract; frozen. */
export const EXIT = {
  /** Yes, or done. */
  yes: 0,
  /** Answered "no". */
  no: 1,
  /** The request itself is wrong. */
  request: 2,
  /** Data refused. */
  data: 3,
  /** Cannot be decided. */
  undecided: 4,
  /** Surroundings: file unreadable, disk full, database locked. */
  surroundings: 5,
  /** Internal fault. */
  fault: 70,
  interrupted: 130,
} as const;

export type ExitCode = (typeof EXIT)[keyof typeof EXIT];

/** Exit code of a judged part, or of a whole shortlist by its counts. */
export function exitOfOutcome(outcome: 'fits' | 'undecided' | 'does-not-fit'): ExitCode {
  return { fits: EXIT.yes, undecided: EXIT.undecided, 'does-not-fit': EXIT.no }[outcome];
}

/** Something fits; else some cannot be decided; else nothing fits. */
export function exitOfCounts(counts: { readonly fit: number; readonly undecided: number }): ExitCode {
  if (counts.fit > 0) return EXIT.yes;
  return counts.undecided > 0 ? EXIT.undecided : EXIT.no;
}
