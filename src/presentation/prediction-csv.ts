import type { Prediction } from '../prediction/index.js';
import type { PredictionReport } from '../report.js';
import { csvText } from './csv-cell.js';

/** The waveform as a table: s and V from V−. Two parts stand on the times of the first, the second one's own beside it. */
export function predictionCsv({ prediction, compared }: PredictionReport): string {
  const columns = [...columnsOf(prediction, compared === null ? '' : `${prediction.part.id} `), ...(compared === null ? [] : columnsOf(compared, `${compared.part.id} `))];
  const rows = Math.max(0, ...columns.map(({ values }) => values.length));
  return csvText([columns.map(({ title }) => title), ...Array.from({ length: rows }, (_, at) => columns.map(({ values }) => values[at] ?? null))]);
}

function columnsOf({ waveform }: Prediction, name: string): { readonly title: string; readonly values: readonly number[] }[] {
  if (waveform === null) return [];
  const { t, ideal, typical, worst } = waveform;
  return [
    { title: `${name}t (s)`, values: t },
    { title: `${name}ideal (V)`, values: ideal },
    { title: `${name}typical (V)`, values: typical ?? [] },
    { title: `${name}worst (V)`, values: worst ?? [] },
  ];
}
