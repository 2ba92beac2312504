import type { CrossoverDemand } from '../demands/index.js';
import type { Reading } from '../parts/reading.js';
import type { Readings } from '../parts/readings.js';
import { formatDecibels, formatQuantity } from '../quantities/format.js';
import type { Finding, Measure, WordFinding } from '../verdicts/finding.js';
import type { Check } from './check.js';
import { crossoverPerRejection, ONE_PAIR, USUAL } from './input-crossover.js';

/** The region where one input pair hands over to the other must not be reached (M9). */
export const crossover: Check<CrossoverDemand> = {
  id: 'crossover',
  title: 'input crossover',
  unit: null,
  reads: ['inputCrossover', 'crossoverFree', 'inputHighHeadroom', 'commonModeRejection'],
  hasMargin: false,
  asks: ({ crossover: asked }) => (asked.avoided ? asked : null),
  judge: judgeCrossover,
};

function judgeCrossover(asked: CrossoverDemand, readings: Readings): Finding {
  const { required, unit, sense: _sense } = asked;
  const clear = (note: string, basis: WordFinding['basis'] = 'guaranteed'): WordFinding => ({ kind: 'words', required, offered: 'not reached', basis, notes: [note] });
  if (readings.identity.crossoverFree === true) return clear('the list says the offset makes no step over the whole input range');
  const region = regionOf(readings);
  if (region !== null) return reaches(asked, region) ? reached(asked, readings, region) : clear(`the pairs hand over ${span(region)} below V+, the inputs stay outside`);
  const room = readings.figure('inputHighHeadroom');
  if (room !== null && room.value >= ONE_PAIR) return clear(`inputs that stop ${formatQuantity(room.value, 'V')} below V+ have one pair (common practice)`, 'estimated');
  if (asked.inputs.min >= USUAL) return clear(`no region stated; the inputs stay ${USUAL} V and more below V+, where no pairs hand over (common practice)`, 'estimated');
  return { kind: 'undecided', required, unit, sense: null, cause: 'missing-figure', missing: [{ figure: 'inputCrossover', kind: null }] };
}

/** Both ends as distances below V+, V. */
export interface CrossoverRegion {
  readonly min: number;
  readonly max: number;
}

function regionOf(readings: Readings): CrossoverRegion | null {
  const [min, max] = [readings.figure('inputCrossover', 'min'), readings.figure('inputCrossover', 'max')];
  return min === null || max === null ? null : { min: min.value, max: max.value };
}

/** True when the inputs come inside the region; its edge alone is outside. */
export function reaches({ inputs }: CrossoverDemand, region: CrossoverRegion): boolean {
  return inputs.max > region.min && inputs.min < region.max;
}

function reached(asked: CrossoverDemand, readings: Readings, region: CrossoverRegion): WordFinding {
  const rejection = readings.figureOrClass('commonModeRejection');
  const step = rejection === null ? null : stepOf(asked, region, rejection);
  const times = asked.moves ? PER_PERIOD : 0;
  const often: Measure[] = asked.moves ? [{ name: 'hand-overs a period', value: times, unit: '1', basis: 'guaranteed' }] : [];
  return {
    kind: 'words',
    required: asked.required,
    offered: asked.moves ? 'crossed twice a period' : 'rested in',
    notes: [`the pairs hand over ${span(region)} below V+, the stage takes the inputs ${span(asked.inputs)} below it`, stepText(asked, step)],
    measures: [...often, ...(step === null ? [] : measuresOf(step))],
  };
}

/** A level that is crossed on the way up is crossed on the way down. */
export const PER_PERIOD = 2;

/** Size of the step at the inputs, V, and its distortion at the output at the largest swing, fraction; null of inputs that rest. */
export interface CrossoverStep {
  readonly volts: number;
  readonly distortion: number | null;
  readonly basis: Measure['basis'];
}

/** No list states the step: the rejection over the whole supply contains it, so it is at most supply/CMRR. */
export function stepOf(asked: CrossoverDemand, region: CrossoverRegion, rejection: Pick<Reading, 'value' | 'basis'>): CrossoverStep {
  const basis = rejection.basis === 'guaranteed' || rejection.basis === 'derated' ? 'estimated' : rejection.basis;
  const volts = asked.supply / rejection.value;
  if (asked.swings.length === 0) return { volts, distortion: null, basis };
  // Between the corners of the supply the region may be met anywhere in the swing.
  const met = crossoverPerRejection(asked.swings, { from: region.min, to: region.max });
  const anywhere = crossoverPerRejection(asked.swings, { from: -Infinity, to: Infinity });
  return { volts, distortion: (met > 0 ? met : anywhere) / rejection.value, basis };
}

function measuresOf({ volts, distortion, basis }: CrossoverStep): Measure[] {
  const step: Measure = { name: 'offset step', value: volts, unit: 'V', basis };
  return distortion === null ? [step] : [step, { name: 'distortion', value: distortion, unit: '1', basis }];
}

/** `the offset steps by up to 4.2 mV there, twice a period, 4 kHz in all: distortion up to -58 dB`. */
export function stepText({ moves, frequency }: Pick<CrossoverDemand, 'moves' | 'frequency'>, step: CrossoverStep | null): string {
  const size = step === null ? 'the offset steps there, by how much is not known' : `the offset steps by up to ${formatQuantity(step.volts, 'V', { round: 'up' })} there`;
  if (!moves) return `${size}; the inputs rest within it`;
  const often = frequency === null ? ', twice a period' : `, twice a period (${formatQuantity(PER_PERIOD * frequency, 'Hz')})`;
  const distortion = step?.distortion == null || step.distortion === 0 ? '' : `: distortion up to ${formatDecibels(step.distortion)}`;
  return `${size}${often}${distortion}`;
}

function span({ min, max }: CrossoverRegion): string {
  return min === max ? formatQuantity(min, 'V') : `${formatQuantity(min, 'V')}..${formatQuantity(max, 'V')}`;
}
