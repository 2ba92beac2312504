import { predict, type ReviewedStage } from '../index.js';
import { reviewSweep, type Reviewed } from './review-sweep.js';

/** What two of the plots are drawn from: the chosen part simulated on the stage, and what its first budget costs. */
export function reviewFigures(reviewed: Reviewed): Pick<ReviewedStage, 'prediction' | 'sweep'> {
  return { prediction: predictionOf(reviewed), sweep: reviewSweep(reviewed) };
}

function predictionOf({ stage, source, asking, chosen }: Reviewed): ReviewedStage['prediction'] {
  if (chosen === null) return null;
  const { part } = chosen.judged;
  return { part: part.id, waveform: predict(stage, source, { part, asking }).prediction.waveform };
}
