import { PARAMETERS } from '../parts/figures.js';
import type { Form, Prediction } from '../prediction/index.js';
import { quantitiesOf, unitOf } from './prediction-rows.js';

/** What there is of one part; also the part of other documents. */
export function bodyOf(prediction: Prediction): object {
  const { part, waveform, response } = prediction;
  return {
    part: { id: part.id, tier: part.tier, class: part.class, description: part.description },
    wanted: Object.fromEntries(Object.entries(prediction.wanted).map(([name, { value, sense }]) => [name, { value, sense }])),
    typical: formJson(prediction.typical, prediction),
    worst: formJson(prediction.worst, prediction),
    waveform,
    response,
  };
}

function formJson({ at, figures, results, notes }: Form, prediction: Prediction): object {
  return {
    at,
    figures: figures.map(({ parameter, value, how }) => ({ parameter, value: Number.isFinite(value) ? value : null, unit: PARAMETERS[parameter].unit, how })),
    results: Object.fromEntries(
      quantitiesOf(prediction).flatMap((name) => {
        const found = results[name];
        return found === undefined ? [] : [[name, { ...found, unit: unitOf(name, prediction) }]];
      }),
    ),
    notes,
  };
}
