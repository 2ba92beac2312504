import type { JudgedPart } from '../screening/index.js';
import { glued } from './spelling.js';
import { safeLine } from './safe-text.js';

/** So many ids are named beside the first. */
const NAMED = 2;

/** A caution as the part placed first has it, and who else has one like it. */
interface Like {
  readonly sentence: string;
  readonly first: string;
  readonly others: Set<string>;
  /** Word for word, numbers too. */
  same: boolean;
}

/** Cautions that differ in their numbers alone are one line: that of the part placed first, then who else has it. `explain` tells each in full. */
export function likeCautions(shown: readonly JudgedPart[], sentencesOf: (one: JudgedPart) => readonly string[]): string[] {
  const alike = new Map<string, Like>();
  for (const one of shown) {
    const id = safeLine(one.part.id);
    for (const sentence of sentencesOf(one)) {
      const kind = kindOf(sentence);
      const found = alike.get(kind) ?? { sentence, first: id, others: new Set(), same: true };
      alike.set(kind, found);
      if (id !== found.first) found.others.add(id);
      found.same &&= found.sentence === sentence;
    }
  }
  return [...alike.values()].map(lineOf);
}

/** The sentence without its numbers, their prefixes and what is plural by them. */
function kindOf(sentence: string): string {
  return sentence.replaceAll(/[-−]?\d[\d.,]*\s*(?:[fpnµmkMG](?=[VAΩFHs]))?/gu, '#').replaceAll(/\bsections?\b/gu, 'sections');
}

function lineOf({ sentence, first, others, same }: Like): string {
  const said = `${first}: ${glued(safeLine(sentence))}`;
  return others.size === 0 ? said : `${said}; ${same ? 'the same of' : 'likewise, with their own numbers,'} ${listed([...others])}`;
}

/** The first ids, and how many more there are. */
function listed(ids: readonly string[]): string {
  const rest = ids.length - NAMED;
  const named = [...ids.slice(0, NAMED), ...(rest > 0 ? [`${rest} more ${rest === 1 ? 'part' : 'parts'}`] : [])];
  return named.length < 2 ? named.join('') : `${named.slice(0, -1).join(', ')} and ${named.at(-1) ?? ''}`;
}
