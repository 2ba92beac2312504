import type { Draft } from './draft.js';
import type { SignalShape, SignalSpec, Swing, Value } from './spec.js';
import { present } from './present.js';
import { field } from './schema.js';
import { leafAt, refuse } from './refuse.js';
import { intervalOf, readQuantity, readSwing, readValue, withinBounds } from './value.js';
import { readChoice } from './words.js';

/** Everything under `signal`; what does not belong to the topology or coupling is gone from the draft by now. */
export function readSignal(draft: Draft): SignalSpec {
  const coupling = readChoice<'dc' | 'ac'>(draft, 'signal.coupling') ?? 'dc';
  const amplitude = readAmplitude(draft, 'signal.amplitude');
  const input = coupling === 'dc' ? (readSwing(draft, 'signal.input') ?? inputFrom(amplitude, readValue(draft, 'signal.center'))) : undefined;
  return present({
    coupling,
    shape: readChoice<SignalShape>(draft, 'signal.shape') ?? 'band-limited',
    input,
    amplitude: coupling === 'ac' ? amplitude : undefined,
    positive: readSwing(draft, 'signal.positive'),
    negative: readSwing(draft, 'signal.negative'),
    differential: readSwing(draft, 'signal.differential'),
    commonMode: readSwing(draft, 'signal.commonMode'),
    output: readSwing(draft, 'signal.output'),
    frequency: readFrequency(draft),
    edge: readValue(draft, 'signal.edge'),
    duty: readValue(draft, 'signal.duty'),
    observation: readValue(draft, 'signal.observation'),
  });
}

/** Peak volts; an rms figure is that of a sine, which is told unless the signal is one. */
export function readAmplitude(draft: Draft, path: string): Value | undefined {
  const amplitude = readValue(draft, path);
  const typed = leafAt(draft, path)?.text ?? '';
  const isRms = /rms|dB[uV]/i.test(typed);
  if (amplitude !== undefined && isRms && leafAt(draft, 'signal.shape')?.text !== 'sine') draft.notes.push(`${path} ${amplitude.text}: peak taken as that of a sine`);
  return amplitude;
}

function inputFrom(amplitude: Value | undefined, center: Value | undefined): Swing | undefined {
  if (amplitude === undefined || center === undefined) return undefined;
  return { min: center.value - amplitude.value, max: center.value + amplitude.value, text: `${amplitude.text} about ${center.text}` };
}

function readFrequency(draft: Draft): SignalSpec['frequency'] | undefined {
  const path = 'signal.frequency';
  const quantity = readQuantity(draft, path);
  if (quantity === undefined) return undefined;
  const { accepted, example } = field(path);
  if (quantity.tolerance === true) return refuse(draft, path, { code: 'S112', message: `${quantity.text} carries a tolerance; accepted: ${accepted}`, fix: example });
  const top = quantity.max ?? (quantity.limit === undefined ? quantity.nominal : undefined);
  if (top === undefined) return refuse(draft, path, { code: 'S112', message: `${quantity.text} does not say where the band ends; accepted: ${accepted}`, fix: example });
  if (!withinBounds(draft, path, [top])) return undefined;
  const bottom = intervalOf(quantity)?.min;
  return { ...(bottom === undefined || bottom === top ? {} : { bottom }), top, text: quantity.echo.replace(/^at most /, '') };
}
