import { compare, comparisonJson, renderComparison, type Part, type PartSource, type Stage } from '../index.js';
import type { Catalog } from '../catalog/index.js';
import { withCatalog } from './catalog-file.js';
import { commandContext } from './command-context.js';
import { EXIT, exitOfOutcome } from './exit-code.js';
import { findPart } from './find-part.js';
import { judgingInput, type JudgingOptions } from './judging-input.js';
import { commandProblem, RequestError } from './request-error.js';
import { styleFor, type Outcome, type Session } from './session.js';

/** Two parts by their ids, and the stage they are held against each other on. */
export interface CompareRequest {
  readonly stage: Stage;
  readonly file: string | null;
  readonly ids: readonly [part: string, against: string];
}

/** `railfit explain PART --against ID [STAGE]`: two parts side by side; exits as `explain PART` does. */
export async function runCompare(session: Session, { stage, file, ids }: CompareRequest, options: JudgingOptions): Promise<Outcome> {
  return withCatalog(session, options, (catalog) => {
    const { source, asking } = judgingInput(catalog, options);
    const comparison = compare(stage, source, { parts: twoParts(source, ids, catalog), asking });
    const exit = exitOfOutcome(comparison.parts[0].judged.outcome);
    if (options.json === true) return { text: comparisonJson(comparison), exit };
    return { text: renderComparison(comparison, styleFor(session, options), commandContext(file, options)), exit };
  });
}

/** Both, or a refusal that names everything that is wrong with either. */
function twoParts(source: PartSource, [id, against]: CompareRequest['ids'], catalog: Catalog): readonly [Part, Part] {
  const [one, other] = [id, against].map((wanted) => findPart(source, wanted, (gone) => catalog.withdrawn(gone)));
  const problems = [
    ...(one?.ok === false ? [one.problem] : []),
    ...(other?.ok === false ? [{ ...other.problem, place: { path: '--against' } }] : []),
    ...(id === against && one?.ok === true ? [commandProblem('C106', `--against ${against}: a part is held against another one`, { fix: 'railfit shortlist lists what fits', path: '--against' })] : []),
  ];
  if (one?.ok !== true || other?.ok !== true || problems.length > 0) throw new RequestError(problems, EXIT.request);
  return [one.part, other.part];
}
