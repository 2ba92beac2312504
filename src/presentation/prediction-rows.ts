import type { Form, Predicted, Prediction, Quantity } from '../prediction/index.js';
import { formatDecibels, formatPercent } from '../quantities/format.js';
import { amount } from './amounts.js';
import { held } from './spelling.js';

/** Each quantity as a line begins with it. */
export const QUANTITY_WORDS: Readonly<Record<Quantity, string>> = {
  outputHigh: 'highest output',
  outputLow: 'lowest output',
  clipped: 'clipped, of the time',
  slewing: 'slewing, of the time',
  distortion: 'distortion (THD)',
  gain: 'gain at the top',
  phase: 'phase shift at the top',
  bandwidth: '-3 dB frequency',
  peaking: 'peaking',
  settling: 'settling time',
  rise: 'rise, 10..90 %',
  fall: 'fall, 10..90 %',
  noise: 'noise, rms',
  frequency: 'frequency',
  duty: 'duty',
};

const ORDER = Object.keys(QUANTITY_WORDS) as Quantity[];

const UNITS: Readonly<Record<Exclude<Quantity, 'gain'>, string>> = {
  outputHigh: 'V', outputLow: 'V', clipped: '1', slewing: '1', distortion: '1', phase: '°', bandwidth: 'Hz', peaking: 'dB', settling: 's', rise: 's', fall: 's', noise: 'V', frequency: 'Hz', duty: '1',
};

/** The unit of a quantity in this stage; an integrator's gain at a frequency is a plain ratio. */
export function unitOf(quantity: Quantity, { stage }: Pick<Prediction, 'stage'>): string {
  if (quantity !== 'gain') return UNITS[quantity];
  return stage.gainUnit === 'V/A' ? 'V/A' : 'V/V';
}

/** Quantities that mean something for this stage, in their order. */
export function quantitiesOf({ typical, worst }: Pick<Prediction, 'typical' | 'worst'>): Quantity[] {
  return ORDER.filter((quantity) => typical.results[quantity] !== undefined || worst.results[quantity] !== undefined);
}

/** Less distortion than this is rounding. */
const CLEAN = 1e-6;
/** Ratio in dB below which nothing peaks. */
const FLAT = 5e-4;

/** A number as its quantity is spoken of. */
export function spokenValue(quantity: Quantity, value: number, prediction: Pick<Prediction, 'stage'>): string {
  switch (quantity) {
    case 'clipped':
    case 'slewing':
      return value === 0 ? 'none' : held(formatPercent(value));
    case 'duty':
      return held(formatPercent(value));
    case 'distortion':
      return value < CLEAN ? held('below -120 dB') : held(formatDecibels(value));
    case 'peaking':
      return value < FLAT ? 'none' : amount(value, 'dB');
    case 'gain':
      return amount(value, unitOf(quantity, prediction), { digits: 4 });
    case 'phase':
      return amount(value, '°');
    case 'bandwidth':
    case 'frequency':
      return amount(value, 'Hz', { digits: 4 });
    case 'settling':
    case 'rise':
    case 'fall':
      return amount(value, 's');
    case 'noise':
      return amount(value, 'V');
    case 'outputHigh':
    case 'outputLow':
      return amount(value, 'V', { digits: 4 });
  }
}

/** A cell of the table; a dash where there is no number, told below why. */
export function cellOf(quantity: Quantity, found: Predicted | undefined, prediction: Prediction): string {
  if (found === undefined) return '';
  return found.value === null ? '–' : spokenValue(quantity, found.value, prediction);
}

/** What the stage asks of it. */
export function wantedCell(quantity: Quantity, prediction: Prediction): string {
  const wanted = prediction.wanted[quantity];
  if (wanted === undefined) return '';
  const words = { 'at-least': 'at least ', 'at-most': 'at most ', about: '' }[wanted.sense];
  return `${words}${spokenValue(quantity, wanted.value, prediction)}`;
}

/** Why numbers are missing, those of one reason together. */
export function reasonsOf(form: Form): string[] {
  const byReason = new Map<string, string[]>();
  for (const quantity of ORDER) {
    const found = form.results[quantity];
    if (found?.value === null) byReason.set(found.reason, [...(byReason.get(found.reason) ?? []), QUANTITY_WORDS[quantity]]);
  }
  return [...byReason].map(([reason, names]) => `${names.join(', ')}: ${reason}`);
}
