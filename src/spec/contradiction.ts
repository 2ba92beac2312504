import type { Problem } from '../quantities/problem.js';
import type { Position } from './spec.js';

export interface Contradiction {
  readonly code: string;
  /** Stage-file fields that contradict each other, the one to blame first. */
  readonly paths: readonly string[];
  readonly message: string;
  readonly fix: string;
}

/** Where the fields were written, and in which file when messages name it. */
export interface Written {
  readonly positions: Readonly<Record<string, Position>>;
  readonly file?: string | undefined;
}

/** A contradiction of the stage as a problem, standing at the first of its fields that was written and citing the others. */
export function contradiction({ positions, file }: Written, what: Contradiction): Problem {
  const written = what.paths.filter((path) => positions[path] !== undefined);
  const cited = written.slice(1).map((path) => `${path} in line ${positions[path]?.line ?? '–'}`);
  const lines = written.slice(1).every((path) => positions[path]?.line !== undefined) ? cited : written.slice(1);
  const first = written[0] === undefined ? undefined : positions[written[0]];
  return {
    code: what.code,
    severity: 'error',
    message: lines.length === 0 ? what.message : `${what.message} (see ${lines.join(', ')})`,
    fix: what.fix,
    place: {
      ...(file === undefined || first?.line === undefined ? {} : { file }),
      path: first?.option ?? written[0] ?? what.paths[0] ?? 'stage',
      ...(first?.line === undefined ? {} : { line: first.line }),
      ...(first?.column === undefined ? {} : { column: first.column }),
    },
  };
}
