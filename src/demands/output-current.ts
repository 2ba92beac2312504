import { formatQuantity } from '../quantities/format.js';
import type { CurrentPeak, Stage } from '../stage/index.js';
import type { DirectedPeak, OutputCurrentDemand } from './demand.js';

const SOURCE = 'M6: load and feedback network; resistive and capacitive peaks add as phasors';
/** Below this no current flows in a direction, A. */
const NOTHING = 1e-12;

/** Peak current the output must give, in either direction, A. */
export function outputCurrent(stage: Stage): OutputCurrentDemand {
  const peaks = stage.peaks.flatMap(directions);
  const worst = peaks.reduce((best, next) => (next.amperes > best.amperes ? next : best));
  const required = Math.max(0, worst.amperes);
  return {
    check: 'output-current',
    required,
    unit: 'A',
    sense: 'at-least',
    because: `${formatQuantity(required, 'A')} ${worst.side === 'high' ? 'out of' : 'into'} the output at the peak, feedback network included, resistors nominal${withoutFrequency(stage)}`,
    source: SOURCE,
    peaks: peaks.filter((peak) => peak.amperes > NOTHING),
    corner: worst.corner,
  };
}

function withoutFrequency(stage: Stage): string {
  if (stage.response.kind === 'oscillator') return (stage.load?.capacitance ?? 0) > 0 ? '; what charges the load capacitance at the edges is left out' : '';
  const moves = stage.shape === 'step' || stage.shape === 'pulse' ? stage.edge : stage.frequency;
  const capacitive = (stage.load?.capacitance ?? 0) > 0 && moves === null;
  return `${capacitive ? '; neither frequency nor edge, so the load capacitance is left out' : ''}${withoutFilter(stage)}`;
}

/** The capacitor back from the output of a Sallen-Key filter counts at the top frequency only. */
function withoutFilter({ response, shape, frequency }: Stage): string {
  if (response.kind !== 'low-pass' || response.form !== 'sallen-key') return '';
  if (shape === 'step' || shape === 'pulse') return '; what C1 takes during the edge is left out';
  return frequency === null ? '; no frequency, so what C1 takes is left out' : ', what C1 takes at the top frequency too';
}

/** At the centre of the signal, plus its amplitude, towards either rail. */
function directions(at: CurrentPeak): DirectedPeak[] {
  const corner = { supply: at.supply, reference: at.reference };
  return [
    { side: 'high', amperes: at.centre + at.swing, supply: at.supply, corner },
    { side: 'low', amperes: at.swing - at.centre, supply: at.supply, corner },
  ];
}
