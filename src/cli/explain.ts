import { explain, explanationJson, renderExplanation } from '../index.js';
import type { Problem } from '../quantities/problem.js';
import { withCatalog } from './catalog-file.js';
import { commandContext } from './command-context.js';
import { runCompare } from './compare.js';
import { EXIT, exitOfOutcome } from './exit-code.js';
import { findPart } from './find-part.js';
import { judgingInput, type JudgingOptions } from './judging-input.js';
import { commandProblem, RequestError } from './request-error.js';
import { changingOf } from './rerun.js';
import { styleFor, type Outcome, type Session } from './session.js';
import { readStageOf } from './stage-input.js';

/** What `explain` is asked: a part and a stage. */
export interface ExplainOperands {
  readonly part: string | undefined;
  readonly stage: string | undefined;
}

export interface ExplainOptions extends JudgingOptions {
  /** Another part, to be held against this one. */
  readonly against?: string;
  /** The relation of every check. */
  readonly formulas?: boolean;
}

/** `railfit explain PART [STAGE]`: every check of one part on this stage. */
export async function runExplain(session: Session, operands: ExplainOperands, options: ExplainOptions): Promise<Outcome> {
  const { part, stage: stageFile } = withoutPart(operands) ? { part: undefined, stage: operands.part } : operands;
  const already = [...(options.already ?? []), ...(part === undefined ? [noPart(stageFile)] : [])];
  const { spec, stage, file, given } = await readStageOf(stageFile, { ...options, already });
  if (options.against !== undefined) return runCompare(session, { stage, file, ids: [part ?? '', options.against] }, options);
  return withCatalog(session, options, (catalog) => {
    const { source, asking } = judgingInput(catalog, options);
    const found = findPart(source, part ?? '', (id) => catalog.withdrawn(id));
    if (!found.ok) throw new RequestError([found.problem], EXIT.request);
    const explanation = explain(stage, source, { part: found.part, asking, changing: changingOf(spec, given) });
    const exit = exitOfOutcome(explanation.judged.outcome);
    if (options.json === true) return { text: explanationJson(explanation, { formulas: options.formulas === true }), exit };
    return { text: renderExplanation(explanation, styleFor(session, options), commandContext(file, options)), exit };
  });
}

/** A stage file alone: the part was forgotten, not the stage. */
export function withoutPart({ part, stage }: ExplainOperands): boolean {
  return part !== undefined && stage === undefined && /\.(?:ya?ml|json)$/iu.test(part);
}

function noPart(stageFile = 'stage.yaml'): Problem {
  return commandProblem('C102', 'explain: no PART', { fix: `railfit explain PART ${stageFile}` });
}
