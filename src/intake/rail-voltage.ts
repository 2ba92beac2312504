/** A voltage as a list states the ends of a range: against ground, or from one of the rails (`V+ - 1.5`, `(V-) - 0.1 V`, `VCC-1,5`). */
export interface RailVoltage {
  readonly rail: 'low' | 'high' | null;
  /** The number with its unit, as written, sign included; `0` where only the rail is named. */
  readonly text: string;
}

const RAIL = /^\(?\s*(v\s?\+|v\s?-|v\s?cc|v\s?dd|v\s?s|v\s?ss|v\s?ee|gnd|ground)\s*\)?\s*(?:([+-])\s*(.+))?$/iu;
const LOW: ReadonlySet<string> = new Set(['v-', 'vss', 'vee', 'gnd', 'ground']);

/** Reads one end of a range; typographic minus signs count as hyphens. */
export function readRailVoltage(text: string): RailVoltage {
  const plain = text.replace(/[−–]/gu, '-').trim();
  const match = RAIL.exec(plain);
  if (match === null) return { rail: null, text: plain };
  const [, name = '', sign = '', number] = match;
  const rail = LOW.has(name.replace(/\s/gu, '').toLowerCase()) ? 'low' : 'high';
  return { rail, text: number === undefined ? '0' : `${sign === '-' ? '-' : ''}${number.trim()}` };
}

/** The two ends of `-0.1 to V+ - 1.5`, `V-..V+`, `0…3.5 V`; null when there are not two. */
export function rangeEnds(cell: string): readonly [RailVoltage, RailVoltage] | null {
  const [low, high, more] = cell.split(/\s+to\s+|\s*\.{2,3}\s*|\s*…\s*/iu);
  if (low === undefined || high === undefined || more !== undefined || low.trim() === '' || high.trim() === '') return null;
  // `0 to 3.5 V`: the unit at the end covers both.
  const unit = /\d\s*(m?V)\s*$/u.exec(high)?.[1];
  const first = readRailVoltage(low);
  return [unit !== undefined && /\d$/u.test(first.text) ? { ...first, text: `${first.text} ${unit}` } : first, readRailVoltage(high)];
}
