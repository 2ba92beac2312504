import type { Explanation } from '../../report.js';
import type { Verdict } from '../../verdicts/verdict.js';
import { cautionsInShort, passingInShort } from '../check-text.js';
import { paragraph } from '../layout.js';
import type { Style } from '../style.js';
import { marginBars } from './margin-bars.js';
import { swingBars } from './swing-bars.js';

/** The margins as bars, and in short what passes without one; without bars all that passes in short. Nothing in short with --all. */
export function marginBlocks(verdicts: readonly Verdict[], style: Style): string[][] {
  const { lines, told } = style.bars === true ? marginBars(verdicts, style) : { lines: [], told: new Set<Verdict>() };
  const passing = style.all ? [] : verdicts.filter(({ outcome }) => outcome === 'pass');
  const [withBar, without] = [passing.filter((verdict) => told.has(verdict)), passing.filter((verdict) => !told.has(verdict))];
  return [[...lines, ...cautionsInShort(withBar, style)], passingInShort(without, style)];
}

/** Output and input pins between the rails. */
export function swingBlock({ judged, curves }: Explanation, style: Style): string[] {
  if (style.bars !== true) return [];
  const lines = swingBars({ swing: curves().swing, verdicts: judged.verdicts }, ['output', 'input'], style);
  return lines.length === 0 ? [] : [...paragraph('at the supply end with the least room, figures at their worst', style, { lead: 'Rails   ' }), ...lines];
}
