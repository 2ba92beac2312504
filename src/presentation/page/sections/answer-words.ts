import { failures } from '../../rejected-text.js';
import { counted } from '../../words.js';
import type { ChosenPart, ReviewedStage } from '../review.js';

/** Who chose it: a page never passes railfit's order off as somebody's decision. */
export function chosenBy({ report }: ReviewedStage, { by, judged, withdrawn }: ChosenPart): string {
  const tier = withdrawn !== undefined ? 'No longer on the approved list.' : judged.part.tier === 'approved' ? 'On the approved list.' : 'A generic set: a class of parts, not something to order.';
  const first = report.fit.length === 1 ? 'The only one in the shortlist; nobody has chosen it yet.' : 'First in the order of the shortlist; nobody has chosen it yet.';
  return `${{ named: 'Named for this review.', saved: 'The part kept with this stage.', first }[by]} ${tier}`;
}

/** What the checks say together, in one sentence. */
export function checksLine({ judged }: ChosenPart): string {
  const { verdicts, outcome } = judged;
  const failing = verdicts.filter((verdict) => verdict.outcome === 'fail').length;
  const open = verdicts.filter((verdict) => verdict.outcome === 'unknown').length;
  if (outcome === 'does-not-fit') return `${failing} of ${counted(verdicts.length, 'check')} fail: ${failures(judged)}.`;
  if (outcome === 'undecided') return `${verdicts.length - open} of ${counted(verdicts.length, 'check')} pass, ${open} cannot be decided${judged.likely ? '; with the worst figures of its class all would pass' : ''}.`;
  const proof = judged.proof === 'limits' ? 'all of them on limits' : `${counted(judged.confirm.length, 'figure')} of it ${judged.confirm.length === 1 ? 'is' : 'are'} no limit and to be confirmed`;
  return `All ${counted(verdicts.length, 'check')} pass in the worst case, ${proof}.`;
}
