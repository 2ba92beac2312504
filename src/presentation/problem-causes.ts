import type { Problem } from '../quantities/problem.js';

/** Problems that have one cause, in the order given. */
export interface Cause {
  readonly problems: readonly Problem[];
  /** How many there are when some were cut off. */
  readonly total: number;
}

/** Problems of a list's cells gathered by cause, each cause where it first stands. Other problems stand alone: their places differ. */
export function causesOf(problems: readonly Problem[]): Cause[] {
  const groups = new Map<string, Problem[]>();
  for (const [at, problem] of problems.entries()) {
    const key = problem.place?.row === undefined ? String(at) : causeKey(problem);
    groups.set(key, [...(groups.get(key) ?? []), problem]);
  }
  return [...groups.values()].map((group) => ({ problems: group, total: group.length }));
}

/** The sentence without the value it quotes. */
function causeKey({ code, severity, message, text }: Problem): string {
  return [severity, code, withoutValue(message, text)].join('\n');
}

/** `40 nV/Hz: the square root is missing` → `the square root is missing`. */
export function withoutValue(message: string, text: string | undefined): string {
  if (text === undefined || text === '') return message;
  return message.startsWith(`${text}: `) ? message.slice(text.length + 2) : message.replaceAll(text, '…');
}
