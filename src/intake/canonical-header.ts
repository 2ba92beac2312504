import type { Condition, LimitKind, Parameter } from '../parts/figures.js';
import { PARAMETERS } from '../parts/figures.js';
import { conditionWords } from './condition.js';

/** The header of a figure as the canonical CSV writes it: `output low headroom max (mV) @ 2 kΩ to ground, 5 V`. */
export function canonicalHeader(parameter: Parameter, kind: LimitKind, condition: Condition = {}): string {
  const words = conditionWords(condition);
  const header = `${canonicalWords(parameter, kind)} (${PARAMETERS[parameter].headerUnit})`;
  return words === '' ? header : `${header} @ ${words}`;
}

/** Parameter and limit kind in words. "Absolute maximum" says its kind already. */
export function canonicalWords(parameter: Parameter, kind: LimitKind): string {
  const words = PARAMETERS[parameter].words;
  return kind === 'max' && words.endsWith(' maximum') ? words : `${words} ${kind}`;
}

/** Words differing only in case, spaces, hyphens and underscores are the same words. */
export function foldWords(text: string): string {
  return text.toLowerCase().replace(/[\s_-]+/gu, '');
}
