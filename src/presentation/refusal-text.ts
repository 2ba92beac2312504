import type { Problem } from '../quantities/problem.js';
import { refusalLines } from './problem-lines.js';
import { finished } from './spelling.js';
import type { Style } from './style.js';

/** Why an answer is not taken and what to type instead, to stand under it; no newline at the end. */
export function renderRefusal(problems: readonly Problem[], style: Style): string {
  return finished(problems.flatMap((problem) => refusalLines(problem, style)), style).trimEnd();
}
