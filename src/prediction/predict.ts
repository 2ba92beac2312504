import { magnitude } from '../formulas/complex.js';
import type { Part } from '../parts/part.js';
import type { ReadingRules } from '../parts/reading.js';
import type { Stage } from '../stage/index.js';
import { idealTransfer } from './equations.js';
import { modelLimits } from './model-limits.js';
import { once } from '../quantities/once.js';
import { outcomeOf, type Told } from './outcome.js';
import type { FrequencyResponse, Prediction, Waveform } from './prediction.js';
import { gridOf, responseOver } from './small-signal.js';
import { resampled } from './step.js';
import { wantedOf } from './wanted.js';

/** Points of the printed waveform and of the printed response. */
const WAVE_POINTS = 257;
const RESPONSE_POINTS = 161;

/**
 * The stage with this part in it, simulated in the typical and in the guaranteed worst outcome of its figures. A figure that is missing
 * takes away what depends on it, with the reason; the rest is predicted all the same. What is costly is made when it is first looked at.
 */
export function predictStage(stage: Stage, part: Part, rules: ReadingRules): Prediction {
  const typical = outcomeOf(stage, part, { form: 'typical', rules });
  const worst = outcomeOf(stage, part, { form: 'worst', rules });
  const waveform = once(() => waveformOf(typical, worst));
  const response = once(() => responseOf(stage, typical, worst));
  return {
    stage,
    part,
    wanted: wantedOf(stage, { gain: idealGain(stage, typical) }),
    get typical() { return typical.form; },
    get worst() { return worst.form; },
    get waveform() { return waveform(); },
    get response() { return response(); },
    limits: modelLimits(stage),
  };
}

function idealGain({ frequency }: Stage, { around }: Told): number | null {
  const ideal = frequency === null || around === null ? null : idealTransfer(around, 2 * Math.PI * frequency);
  return ideal === null ? null : magnitude(ideal);
}

/** Both outcomes on one axis: that of the longer. */
function waveformOf(typical: Told, worst: Told): Waveform | null {
  const told = [typical, worst].flatMap(({ over }) => (over?.wave == null ? [] : [{ kind: over.kind, wave: over.wave }]));
  const longest = told.reduce<(typeof told)[number] | null>((best, next) => (best === null || (next.wave.t.at(-1) ?? 0) > (best.wave.t.at(-1) ?? 0) ? next : best), null);
  const first = told[0];
  if (longest === null || first === undefined) return null;
  const end = longest.wave.t.at(-1) ?? 0;
  const t = Array.from({ length: WAVE_POINTS }, (_, at) => (at * end) / (WAVE_POINTS - 1));
  const onAxis = ({ over }: Told): readonly number[] | null => (over?.wave == null ? null : resampled(over.wave.t, over.wave.output, t));
  return { kind: first.kind, t, ideal: resampled(first.wave.t, first.wave.ideal, t), typical: onAxis(typical), worst: onAxis(worst) };
}

/** From a thousandth of the top frequency (or of the loop's own) to above the gain bandwidth. */
function responseOf(stage: Stage, typical: Told, worst: Told): FrequencyResponse | null {
  if (stage.response.kind === 'oscillator') return null;
  const speed = [typical, worst].flatMap(({ form }) => form.figures.filter(({ parameter }) => parameter === 'gainBandwidth').map(({ value }) => value));
  const most = Math.max(...speed);
  if (speed.length === 0 || (typical.linear === null && worst.linear === null)) return null;
  const from = Math.min(stage.frequency ?? Infinity, most / stage.noiseGain.nominal) / 100;
  const f = gridOf(from, 3 * most, RESPONSE_POINTS);
  const [own, worse] = [typical, worst].map(({ linear }) => (linear === null ? null : responseOver(linear, f)));
  return { f, magnitude: own?.magnitude ?? null, phase: own?.phase ?? null, worst: worse == null ? null : { magnitude: worse.magnitude, phase: worse.phase } };
}
