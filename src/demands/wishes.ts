import type { Stage } from '../stage/index.js';
import type { NumberDemand, PriceDemand, WordDemand } from './demand.js';

const SOURCE = 'a wish of the team';
/** AEC-Q100 Rev-H (2014): grades 0 to 3, a lower number being the wider range. */
const GRADES = ['AEC-Q100 grade 0', 'AEC-Q100 grade 1', 'AEC-Q100 grade 2', 'AEC-Q100 grade 3'] as const;

export function channels(stage: Stage): NumberDemand | null {
  const wanted = stage.asked.wishes.channels;
  if (wanted === undefined) return null;
  return { check: 'channels', required: wanted, unit: '1', sense: 'at-least', because: `${wanted} amplifier${wanted === 1 ? '' : 's'} in one package`, source: SOURCE };
}

export function wantedPackage(stage: Stage): WordDemand | null {
  return words('package', stage.asked.wishes.package);
}

export function status(stage: Stage): WordDemand | null {
  return words('status', stage.asked.wishes.status);
}

export function lifecycle(stage: Stage): WordDemand | null {
  return words('lifecycle', stage.asked.wishes.lifecycle);
}

/** A grade at least as good; any other word must be met as it is. */
export function qualification(stage: Stage): WordDemand | null {
  const wanted = stage.asked.wishes.qualification;
  if (wanted === undefined) return null;
  const at = GRADES.findIndex((grade) => grade.toLowerCase() === wanted.trim().toLowerCase());
  return words('qualification', at < 0 ? [wanted] : GRADES.slice(0, at + 1));
}

export function price(stage: Stage): PriceDemand | null {
  const wanted = stage.asked.wishes.price;
  if (wanted === undefined) return null;
  return { check: 'price', required: wanted.amount, unit: wanted.currency, sense: 'at-most', because: `at most ${wanted.text}`, source: SOURCE, currency: wanted.currency };
}

function words(check: WordDemand['check'], required: readonly string[] | undefined): WordDemand | null {
  if (required === undefined || required.length === 0) return null;
  return { check, required, unit: null, sense: 'one-of', because: `one of ${required.join(', ')}`, source: SOURCE };
}
