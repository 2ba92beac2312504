import { KIND_RULES } from './kind-rules.js';
import type { FieldKind } from './kinds.js';

/** Whether a value in the kind's SI unit is one a designer can have meant. The wide ranges catch a wrong prefix, nothing else. */
export function isPlausible(value: number, kind: FieldKind): boolean {
  const rule = KIND_RULES[kind];
  const [low, high] = rule.plausible;
  if (!Number.isFinite(value)) return false;
  if (kind === 'temperature') return value >= low && value <= high;
  if (value === 0) return rule.zero !== false;
  if (value < 0 && rule.signed !== true) return false;
  return Math.abs(value) >= low && Math.abs(value) <= high;
}
