import { predict, predictionCsv, predictionJson, renderPrediction, type Part, type PartSource, type PredictionReport } from '../index.js';
import type { Problem } from '../quantities/problem.js';
import type { Catalog } from '../catalog/index.js';
import { withCatalog } from './catalog-file.js';
import { commandContext } from './command-context.js';
import { EXIT } from './exit-code.js';
import { withoutPart, type ExplainOperands } from './explain.js';
import { findPart } from './find-part.js';
import { judgingInput, type JudgingOptions } from './judging-input.js';
import { commandProblem, RequestError } from './request-error.js';
import { styleFor, type Outcome, type Session } from './session.js';
import { readStageOf } from './stage-input.js';

/** Options of `railfit predict`. */
export interface PredictOptions extends JudgingOptions {
  readonly compare?: string;
}

/** `railfit predict PART [STAGE]`: the stage simulated with the part's figures. `--compare A B` and `A --compare B` are the same question. */
export async function runPredict(session: Session, operands: ExplainOperands, options: PredictOptions): Promise<Outcome> {
  const { part, stage: stageFile } = withoutPart(operands) ? { part: undefined, stage: operands.part } : operands;
  const already = [...(options.already ?? []), ...(part === undefined ? [noPart(stageFile)] : [])];
  const { stage, file } = await readStageOf(stageFile, { ...options, already });
  return withCatalog(session, options, (catalog) => {
    const { source, asking } = judgingInput(catalog, options);
    const found = partsOf(source, catalog, [part ?? '', ...(options.compare === undefined ? [] : [options.compare])]);
    const [first, second] = found;
    if (first === undefined) throw new RangeError('a prediction without a part');
    const report = predict(stage, source, { part: first, ...(second === undefined ? {} : { compared: second }), asking });
    return { text: textOf(report, { session, options, file }), exit: EXIT.yes };
  });
}

function textOf(report: PredictionReport, { session, options, file }: { readonly session: Session; readonly options: PredictOptions; readonly file: string | null }): string {
  if (options.json === true) return predictionJson(report);
  if (options.csv === true) return predictionCsv(report);
  return renderPrediction(report, styleFor(session, options), commandContext(file, options));
}

/** Every part that is not there is told at once. */
function partsOf(source: PartSource, catalog: Catalog, ids: readonly string[]): Part[] {
  const found = ids.map((id) => findPart(source, id, (one) => catalog.withdrawn(one)));
  const problems = found.flatMap((one) => (one.ok ? [] : [one.problem]));
  if (problems.length > 0) throw new RequestError(problems, EXIT.request);
  return found.flatMap((one) => (one.ok ? [one.part] : []));
}

function noPart(stageFile = 'stage.yaml'): Problem {
  return commandProblem('C102', 'predict: no PART', { fix: `railfit predict PART ${stageFile}` });
}
