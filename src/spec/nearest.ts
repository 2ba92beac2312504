import { suggest } from '../quantities/suggest.js';

/** Longer words are no misspelling of anything, and comparing them would take long. */
const LONGEST = 60;

/** What was probably meant by a word: the same but for case, blanks, - and _, else the nearest; undefined when nothing is near. */
export function nearest(word: string, candidates: readonly string[]): string | undefined {
  if (word.length > LONGEST) return undefined;
  const same = HABITS[fold(word)] ?? fold(word);
  return candidates.find((candidate) => fold(candidate) === same) ?? suggest(word, candidates)[0];
}

/** What circuit diagrams write for words of the stage file. */
const HABITS: Readonly<Record<string, string | undefined>> = Object.assign(Object.create(null) as Record<string, string>, {
  gnd: 'ground', vss: 'ground', vcc: 'supply', vdd: 'supply', 'v+': 'supply', vref: 'reference', ref: 'reference', halfsupply: 'midsupply', buffer: 'follower', freq: 'frequency', temp: 'temperature', vin: 'input', vout: 'output',
});

export function fold(word: string): string {
  return word.replace(/[-_ ]/g, '').toLowerCase();
}

/** A word as it may stand in a message. */
export function shown(word: string): string {
  if (word === '') return 'an empty word';
  return word.length > LONGEST ? `${word.slice(0, LONGEST)}…` : word;
}
