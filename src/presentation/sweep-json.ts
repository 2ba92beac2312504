import type { SweptState, SweptTurn } from '../explanation/index.js';
import type { SweepReport } from '../report.js';
import { document } from './json.js';
import { sweptTexts, turnAmount } from './sweep-amounts.js';
import { GLUE } from './spelling.js';

/** The document `sweep`: what the values of one field cost. */
export function sweepJson(report: SweepReport): string {
  const { over, points, turns, turnsOf, asking, data } = report;
  const texts = sweptTexts(report);
  const { isShare: _isShare, ...field } = over;
  return document('sweep', {
    over: { ...field, steps: points.length },
    points: points.map(({ value, state }, at) => ({ value, text: plain(texts[at] ?? ''), ...stateJson(state) })),
    turnsOf,
    turns: turns.map((turn) => turnJson(turn, plain(turnAmount(over, turn.at)))),
    asking,
    data: { catalog: data.catalog, rules: data.rules },
  });
}

const plain = (text: string): string => text.replaceAll(GLUE, ' ');

function stateJson(state: SweptState): object {
  if ('contradiction' in state) return { counts: null, first: null, reason: state.contradiction };
  return { counts: state.counts, first: state.first };
}

function turnJson({ at, from, to, gained, lost }: SweptTurn, text: string): object {
  return { at, text, from: stateJson(from), to: stateJson(to), gained, lost };
}
