import type { PredictionReport } from '../report.js';
import { document } from './json.js';
import { bodyOf } from './prediction-body.js';
import { stageJson } from './stage-json.js';

/** One part on one stage, simulated: numbers in SI, arrays for plots; with --compare the second part under `compared`. */
export function predictionJson({ prediction, compared, asking, data }: PredictionReport): string {
  return document('prediction', {
    stage: stageJson(prediction.stage),
    ...bodyOf(prediction),
    compared: compared === null ? null : bodyOf(compared),
    limits: prediction.limits,
    asking,
    data: { catalog: data.catalog, rules: data.rules },
  });
}
