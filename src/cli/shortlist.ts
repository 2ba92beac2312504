import { renderShortlist, shortlist, shortlistCsv, shortlistJson } from '../index.js';
import { withCatalog } from './catalog-file.js';
import { commandContext } from './command-context.js';
import { exitOfCounts } from './exit-code.js';
import { judgingInput, type JudgingOptions } from './judging-input.js';
import { twoForms } from './request-error.js';
import { DEFAULT_TOP, styleFor, type Outcome, type Session } from './session.js';
import { readStageOf } from './stage-input.js';

/** `railfit shortlist [STAGE]`: derive, judge the whole catalog, rank, explain. */
export async function runShortlist(session: Session, operand: string | undefined, options: JudgingOptions): Promise<Outcome> {
  const { stage, file } = await readStageOf(operand, { ...options, already: [...(options.already ?? []), ...twoForms(options)] });
  return withCatalog(session, options, (catalog) => {
    const { source, asking } = judgingInput(catalog, options);
    const report = shortlist(stage, source, asking);
    const exit = exitOfCounts(report.counts);
    if (options.json === true) return { text: shortlistJson(report, { top: options.top ?? DEFAULT_TOP, all: options.all === true }), exit };
    if (options.csv === true) return { text: shortlistCsv(report), exit };
    return { text: renderShortlist(report, styleFor(session, options), commandContext(file, options)), exit };
  });
}
