import type { Problem } from '../quantities/problem.js';
import { paragraph } from './layout.js';
import { causesOf, type Cause } from './problem-causes.js';
import { problemLines, groupLines } from './problem-lines.js';
import { safeLine } from './safe-text.js';
import { finished, GLUE, glued } from './spelling.js';
import type { Style } from './style.js';

const SHOWN = 10;

/** What stands below the problems. */
export interface ProblemsEnding {
  readonly summary: string;
  /** File that got every problem, when there is one. */
  readonly written?: string;
}

/** Problems in the order given: what, where, the text with carets, the fix. One cause once; ten shown, the rest counted; the summary last. */
export function renderProblems(problems: readonly Problem[], style: Style, ending: string | ProblemsEnding): string {
  const { summary, written }: ProblemsEnding = typeof ending === 'string' ? { summary: ending } : ending;
  const causes = causesOf(problems);
  const most = style.all ? Number.POSITIVE_INFINITY : SHOWN;
  const { shown, left } = cut(causes, most);
  const lines = shown.flatMap((cause) => [...causeLines(cause, style), '']);
  const all = written === undefined ? '' : `${problems.length === 1 ? '' : `all ${problems.length} `}written to ${safeLine(written)}`;
  const file = all !== '' ? ` (${all})` : problems.some(({ place }) => place?.row !== undefined) ? ' (the full list: --errors FILE)' : ' (--all shows them)';
  return finished([
    ...lines,
    ...(left === 0 ? [] : [...paragraph(`… and ${left} more${file}`, style), '']),
    ...(left === 0 && all !== '' ? [...paragraph(capital(all), style), ''] : []),
    ...(summary === '' ? [] : paragraph(glued(summary).replace('(exit ', `(exit${GLUE}`), style)),
  ], style);
}

const capital = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);

function causeLines(cause: Cause, style: Style): string[] {
  const [only] = cause.problems;
  return cause.problems.length === 1 && only !== undefined ? problemLines(only, style) : groupLines(cause, style);
}

/** The first so many problems, counted over all causes. */
function cut(causes: readonly Cause[], most: number): { shown: Cause[]; left: number } {
  const shown: Cause[] = [];
  let room = most;
  for (const cause of causes) {
    if (room <= 0) break;
    shown.push({ ...cause, problems: cause.problems.slice(0, room), total: cause.problems.length });
    room -= Math.min(room, cause.problems.length);
  }
  const all = causes.reduce((sum, { problems }) => sum + problems.length, 0);
  return { shown, left: all - shown.reduce((sum, { problems }) => sum + problems.length, 0) };
}
