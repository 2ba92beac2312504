import type { Advice, Change, Move } from '../explanation/index.js';
import type { Explanation, Report } from '../report.js';

/** What would let it in; empty where it fits, null where the stage could not be tried again. */
export function changesJson({ changes, judged }: Explanation): object {
  if (changes === null && judged.outcome !== 'fits') return { changes: null, changesReason: 'not-asked' };
  const advice = changes?.advice ?? [];
  return { changes: (changes?.options ?? []).map(changeJson), ...(advice.length === 0 ? {} : { advice: advice.map(adviceJson) }) };
}

function adviceJson(advice: Advice): object {
  if (advice.kind === 'split') return { kind: advice.kind, gain: advice.gain, gainError: advice.gainError, dcErrors: advice.dcErrors };
  return { kind: advice.kind, left: advice.left, allowed: advice.allowed, set: setOf(advice.moves) };
}

const setOf = (moves: readonly Move[]): object => Object.fromEntries(moves.map(({ path, text }) => [path, text]));

export function changeJson({ moves, design, factor }: Change): object {
  return { set: setOf(moves), ...(design === null ? {} : { design }), factor, fits: true };
}

/** Where nothing fits: what rules everything out, and what would let parts in. */
export function waysOutJson({ nothingFits }: Report): object {
  if (nothingFits === null) return {};
  const { conflict, changes } = nothingFits;
  return { nothingFits: { conflict: conflict?.blamed ?? [], changes: changes.map((one) => ({ ...changeJson(one), lets: one.lets, first: one.first })) } };
}
