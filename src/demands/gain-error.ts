import { divide, magnitude } from '../formulas/complex.js';
import { feedbackFactor } from '../formulas/feedback-loop.js';
import { gainBandwidthForDeviation } from '../formulas/filter-error.js';
import { handbookGainBandwidth } from '../formulas/filter-rules.js';
import { gainBandwidthForShift } from '../formulas/filters.js';
import { gainBandwidthForMagnitudeError, gainBandwidthForVectorError } from '../formulas/gain-bandwidth.js';
import { gainBandwidthForLoopError, type GainDeviation } from '../formulas/loop-error.js';
import { gainBandwidthForTransimpedanceError } from '../formulas/transimpedance-error.js';
import { formatQuantity } from '../quantities/format.js';
import { USUAL, type Stage } from '../stage/index.js';
import { hasEdge, remembering, type Criterion } from './bandwidth-criteria.js';
import { feedbackCapacitance } from './closed-loop.js';

/** What the gain error asks of the bandwidth. Nothing without a frequency (a filter is then held to its corner), and of a step. */
export function gainErrorCriterion(stage: Stage): Criterion[] {
  const { response, frequency } = stage;
  if (response.kind === 'oscillator') return [];
  if (response.kind === 'low-pass') return [filterCriterion(stage, response)];
  if (frequency === null || hasEdge(stage)) return [];
  const at = { frequency, error: errorOf(stage), kind: kindOf(stage) };
  const where = `${at.kind} error ${formatQuantity(at.error * 100, '%')} at ${formatQuantity(frequency, 'Hz')}`;
  switch (response.kind) {
    case 'amplifier':
      return [amplifierCriterion(stage, at, where)];
    case 'transimpedance': {
      const inputAt = (own: number) => ({ ...response, inputCapacitance: response.inputCapacitance + own });
      const capacitor = response.feedbackCapacitance === null ? 'with the maximally flat capacitor' : `with ${formatQuantity(response.feedbackCapacitance, 'F')}`;
      const what = `${formatQuantity(response.feedback, 'Ω')} ${capacitor} and ${formatQuantity(response.inputCapacitance, 'F')} at the input, ${where}`;
      return [{ what, needed: remembering((own) => gainBandwidthForTransimpedanceError(inputAt(own), at)) }];
    }
    case 'integrator': {
      const unity = 1 / (2 * Math.PI * response.resistance * response.capacitance);
      // Of R and C alone β = jωRC/(1 + jωRC), so j·f/β = j·f + 1/(2πRC).
      const z = stage.network === null ? { re: unity, im: frequency } : divide({ re: 0, im: frequency }, feedbackFactor(stage.network)(frequency));
      return [{ what: `integrator with a unity crossover at ${formatQuantity(unity, 'Hz')}, ${where}`, needed: () => gainBandwidthForLoopError(z, at.error, at.kind) }];
    }
  }
}

interface At {
  readonly frequency: number;
  readonly error: number;
  readonly kind: GainDeviation;
}

function amplifierCriterion(stage: Stage, { frequency, error, kind }: At, where: string): Criterion {
  const noiseGain = stage.noiseGain.nominal;
  const capacitor = feedbackCapacitance(stage);
  const bypass = bypassOf(stage);
  if ((capacitor === 0 && bypass === null) || stage.network === null) {
    const form = kind === 'vector' ? gainBandwidthForVectorError : gainBandwidthForMagnitudeError;
    return { what: `noise gain ${formatQuantity(noiseGain, 'V/V')}, ${where}`, needed: () => form(noiseGain, frequency, error) };
  }
  const z = divide({ re: 0, im: frequency }, feedbackFactor(stage.network)(frequency));
  const shorted = bypass === null ? '' : ` with ${formatQuantity(bypass, 'F')} across the resistance of the reference (${formatQuantity(stage.dcNoiseGain.nominal, 'V/V')} at DC)`;
  const counted = bypass === null ? noiseGain : magnitude(z) / frequency;
  const across = capacitor === 0 ? '' : ` with ${formatQuantity(capacitor, 'F')} across the feedback resistor`;
  const what = `noise gain ${formatQuantity(counted, 'V/V')}${shorted}${across}, ${where}, against the same stage with an ideal amplifier`;
  return { what, needed: () => gainBandwidthForLoopError(z, error, kind) };
}

/** F across the reference in the feedback's own leg, where it decides the noise gain; null without. |1/β| rises with frequency: the top counts. */
function bypassOf({ network }: Stage): number | null {
  return network?.minus.elements.find(({ name }) => name === 'bypass')?.value ?? null;
}

type Filter = Extract<Stage['response'], { readonly kind: 'low-pass' }>;

/** The exact filter, searched in the gain bandwidth; the handbook's rule stands beside it for comparison. */
function filterCriterion(stage: Stage, filter: Filter): Criterion {
  const error = errorOf(stage);
  const responseAt = (gainBandwidth: number) => filter.responseAt(gainBandwidth);
  const kind = stage.asked.limits.gainErrorKind ?? (stage.frequency === null ? 'corner' : 'magnitude');
  const top = Math.min(stage.frequency === null || hasEdge(stage) ? filter.corner : stage.frequency, filter.corner);
  const hertz = kind === 'corner' ? gainBandwidthForShift(responseAt, error) : gainBandwidthForDeviation(responseAt, { top, error, kind });
  const shape = `${filter.form === 'sallen-key' ? 'Sallen-Key' : 'multiple feedback'} with Q ${formatQuantity(filter.q, '1')} at ${formatQuantity(filter.corner, 'Hz')}`;
  const percent = formatQuantity(error * 100, '%');
  const what = kind === 'corner' ? `-3 dB frequency off by at most ${percent}` : `largest ${kind} error ${percent} up to ${formatQuantity(top, 'Hz')}`;
  const rule = handbookGainBandwidth(Math.abs(stage.gain), filter.corner, filter.q);
  return { what: `${shape}, ${what} (rule of thumb, not counted: ${formatQuantity(rule, 'Hz')})`, needed: () => hertz };
}

const errorOf = (stage: Stage): number => stage.asked.limits.gainError?.value ?? USUAL.gainError;

/** A shift of the corner means something of a filter only. */
const kindOf = (stage: Stage): GainDeviation => (stage.asked.limits.gainErrorKind === 'vector' ? 'vector' : 'magnitude');
