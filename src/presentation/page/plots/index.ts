import type { Figure } from '../figure.js';
import type { PageInput } from '../page-input.js';
import type { Drawing } from './assemble.js';
import { bode } from './bode.js';
import { dcErrorBudget } from './dc-error-budget.js';
import { limitCost } from './limit-cost.js';
import { margins } from './margins.js';
import { noiseBudget } from './noise-budget.js';
import { priceCurrent } from './price-current.js';
import { supplyTemperature } from './supply-temperature.js';
import { swingWindow } from './swing-window.js';
import { waveform } from './waveform.js';

/** In reading order; a plot whose numbers are not there answers null. */
const PLOTS: readonly ((input: Drawing) => Figure | null)[] = [swingWindow, margins, bode, waveform, dcErrorBudget, noiseBudget, priceCurrent, supplyTemperature, limitCost];

/** Every plot that this report has numbers for. Same input, same bytes. */
export function plotsOf(input: PageInput): readonly Figure[] {
  const drawing = { ...input, curves: input.chosen === null ? null : input.report.curves(input.chosen) };
  return PLOTS.flatMap((plot) => plot(drawing) ?? []);
}
