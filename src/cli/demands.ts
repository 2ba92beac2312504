import { demandsJson, demandsOf, renderDemands } from '../index.js';
import { EXIT } from './exit-code.js';
import { styleFor, type CommonOptions, type Outcome, type Session } from './session.js';
import { readStageOf, type StageOptions } from './stage-input.js';

/** `railfit demands [STAGE]`: what the stage asks of any amplifier; looks at no part and opens no catalog. */
export async function runDemands(session: Session, operand: string | undefined, options: CommonOptions & StageOptions): Promise<Outcome> {
  const { stage } = await readStageOf(operand, options);
  const report = demandsOf(stage);
  const text = options.json === true ? demandsJson(report) : renderDemands(report, styleFor(session, options));
  return { text, exit: EXIT.yes };
}
