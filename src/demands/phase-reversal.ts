import { formatQuantity } from '../quantities/format.js';
import type { Stage } from '../stage/index.js';
import type { InputReach, PhaseReversalDemand } from './hazard-demand.js';
import { inputReach } from './input-reach.js';

const SOURCE = 'M9: phase reversal of an input beyond its range (common practice)';

/** The output must not jump to the other rail when an input leaves its range. */
export function phaseReversal(stage: Stage): PhaseReversalDemand {
  const reach = inputReach(stage);
  const because = `${reachText(reach)}, and the file says avoid`;
  return { check: 'phase-reversal', required: ['none'], unit: null, sense: 'one-of', because, source: SOURCE, avoided: stage.asked.avoid.includes('phase-reversal'), reach };
}

/** What the stage says about its inputs. */
export function reachText({ beyond, unpowered, still }: InputReach): string {
  if (still) return 'the inputs rest at the reference';
  const said = [
    ...(beyond === null ? [] : [beyond === 0 ? 'no input leaves the rails' : `an input goes up to ${formatQuantity(beyond, 'V')} beyond a rail`]),
    ...(unpowered === null ? [] : [unpowered === 0 ? 'the supply is there before the signal' : `up to ${formatQuantity(unpowered, 'V')} of signal with the supply off`]),
  ];
  return said.length === 0 ? 'the stage does not say whether an input can leave its range' : said.join(', ');
}
