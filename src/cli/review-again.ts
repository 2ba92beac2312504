import { buildStage, ORDERS, readStage, shortlist, type Order, type RecordedReport, type RecordedStage, type Review, type ReviewedStage, type Stage, type StageSpec } from '../index.js';
import type { Catalog } from '../catalog/index.js';
import { chosenFor } from './chosen.js';
import { judgingInput, type JudgingOptions } from './judging-input.js';
import { RequestError } from './request-error.js';
import { reviewFigures } from './review-figures.js';
import { sha256Of } from './page-file.js';
import { VERSION } from './version.js';

/** A recorded stage that is no stage any more. */
export interface Failed {
  readonly file: string | null;
  readonly message: string;
}

export type Again = { readonly ok: true; readonly review: Review } | { readonly ok: false; readonly failed: readonly Failed[] };

/** The request of a recorded report, asked again of the catalog in force. */
export function reviewAgain(recorded: RecordedReport, catalog: Catalog): Again {
  const failed: Failed[] = [];
  const stages: ReviewedStage[] = [];
  for (const one of recorded.stages) {
    const again = stageAgain(one, catalog);
    if ('message' in again) failed.push(again);
    else stages.push(again);
  }
  if (failed.length > 0) return { ok: false, failed };
  const { name, time, command, symbols, top, all } = recorded;
  return { ok: true, review: { stages, name, time, tool: VERSION, command, symbols, top, all } };
}

function stageAgain(recorded: RecordedStage, catalog: Catalog): ReviewedStage | Failed {
  const { file, text, changes } = recorded;
  const built = builtAgain(recorded);
  if ('message' in built) return built;
  const { spec, stage } = built;
  const options = askedOf(recorded);
  try {
    const { source, asking } = judgingInput(catalog, options);
    const report = shortlist(stage, source, asking);
    const { chosen, origin } = chosenFor({ file: null, inFile: null, report, source, catalog, options });
    const told = chosen === null || recorded.chosen === null || chosen.by !== 'named' ? chosen : { ...chosen, by: recorded.chosen.by };
    return { file, text, sha256: text === null ? null : sha256Of(text), changes, chosen: told, report: { ...report, origin }, ...reviewFigures({ spec, stage, given: { text, overrides: changes }, source, asking, chosen }) };
  } catch (error) {
    if (!(error instanceof RequestError)) throw error;
    return { file, message: error.message };
  }
}

function builtAgain({ file, text, changes }: RecordedStage): { readonly spec: StageSpec; readonly stage: Stage } | Failed {
  const read = readStage(text, { overrides: changes, ...(file === null ? {} : { file }) });
  if (!read.ok) return { file, message: read.problems.map(({ message }) => message).join('; ') };
  const built = buildStage(read.spec);
  return built.ok ? { spec: read.spec, stage: built.stage } : { file, message: built.problems.map(({ message }) => message).join('; ') };
}

/** A part somebody chose is looked up again; the first in order may be another one now. */
function askedOf({ chosen, shortlist: { asking } }: RecordedStage): JudgingOptions & { part?: string } {
  const order = ORDERS.find((one): one is Order => one === asking.order) ?? 'merit';
  const part = chosen === null || chosen.by === 'first' ? {} : { part: chosen.part };
  return { strict: asking.strict, order, assume: asking.assumed, ...part };
}
