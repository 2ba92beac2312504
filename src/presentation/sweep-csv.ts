import type { SweptState } from '../explanation/index.js';
import type { SweepReport } from '../report.js';
import { csvText } from './csv-cell.js';

/** The sweep as a table, by value: every step, and every turn with what holds from there on. SI numbers. */
export function sweepCsv({ over, points, turns }: SweepReport): string {
  const steps = points.map(({ value, state }) => ({ kind: 'step', value, state }));
  const rows = [...steps, ...turns.map(({ at, to }) => ({ kind: 'turn', value: at, state: to }))];
  rows.sort((a, b) => a.value - b.value || Number(a.kind === 'step') - Number(b.kind === 'step'));
  const header = ['kind', `${over.path} (${over.unit})`, 'fit', 'cannot be decided', 'do not fit', 'first choice', 'no such stage'];
  return csvText([header, ...rows.map(({ kind, value, state }) => [kind, value, ...cellsOf(state)])]);
}

function cellsOf(state: SweptState): (string | number | null)[] {
  if ('contradiction' in state) return [null, null, null, null, state.contradiction];
  return [state.counts.fit, state.counts.undecided, state.counts.rejected, state.first, null];
}
