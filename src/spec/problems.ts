import type { Problem } from '../quantities/problem.js';
import type { Position } from './spec.js';
import type { Leaf } from './tree.js';

/** Where a problem about a stage is reported: an option by its name, a field by file, line, column and path. */
export interface Spot {
  readonly path: string;
  readonly at: Position;
  readonly file?: string | undefined;
}

export interface Complaint {
  readonly code: string;
  readonly message: string;
  readonly fix?: string | undefined;
}

/** A problem at a field or at the option that set it. */
export function problemAt(spot: Spot, complaint: Complaint): Problem {
  return {
    code: complaint.code,
    severity: 'error',
    message: complaint.message,
    ...(complaint.fix === undefined ? {} : { fix: complaint.fix }),
    place: placeOf(spot),
  };
}

/** The same with the value as typed and the part of it that is meant; the whole of it when no span is given. */
export function problemIn(leaf: Leaf, spot: Spot, complaint: Complaint & { readonly span?: readonly [number, number] }): Problem {
  const offset = leaf.whole?.offset ?? 0;
  const [start, end] = complaint.span ?? [0, leaf.text.length];
  return { ...problemAt(spot, complaint), text: leaf.whole?.text ?? leaf.text, span: [start + offset, end + offset] };
}

function placeOf(spot: Spot): NonNullable<Problem['place']> {
  if (spot.at.option !== undefined) return { path: spot.at.option };
  return {
    ...(spot.file === undefined ? {} : { file: spot.file }),
    ...(spot.at.line === undefined ? {} : { line: spot.at.line }),
    ...(spot.at.column === undefined ? {} : { column: spot.at.column }),
    ...(spot.path === '' ? {} : { path: spot.path }),
  };
}

/** File order first, then options in the order given, then what is missing. */
export function inOrder(problems: readonly Problem[], options: readonly string[]): Problem[] {
  return withoutEchoes(problems).sort((a, b) => {
    const [x, y] = [rank(a, options), rank(b, options)];
    return x.map((part, at) => part - (y[at] ?? 0)).find((difference) => difference !== 0) ?? 0;
  });
}

function rank(problem: Problem, options: readonly string[]): readonly number[] {
  const { line, column = 0, path = '' } = problem.place ?? {};
  const start = problem.span?.[0] ?? 0;
  if (line !== undefined) return [0, line, column, start];
  const at = options.indexOf(path);
  return at >= 0 ? [1, at, 0, start] : [2, 0, 0, 0];
}

/** A value that is an anchor or alias is refused as that, not also for what it then fails to say. */
function withoutEchoes(problems: readonly Problem[]): Problem[] {
  const spot = ({ place }: Problem): string => `${String(place?.line)}:${String(place?.column)}`;
  const marked = new Set(problems.filter(({ code, place }) => code === 'S111' && place?.line !== undefined).map(spot));
  return problems.filter((problem) => problem.code === 'S111' || !marked.has(spot(problem)));
}
