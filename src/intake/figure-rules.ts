import { compareConditions } from '../parts/figure-order.js';
import type { Figure } from '../parts/figures.js';
import { PARAMETERS } from '../parts/figures.js';
import type { CellFault } from './cell-fault.js';

/** Two figures of one part that contradict each other; the fault is told at the cell of `figure`. */
export interface Contradiction {
  readonly figure: Figure;
  readonly fault: CellFault;
  readonly severity: 'error' | 'warning';
}

/** A figure as its cell was written, with its unit and place: `3 mV (B2)`. */
export type AsWritten = (figure: Figure) => string;

/** Figures in canonical order → min over typ, typ over max, and an absolute maximum under the operating one. */
export function contradictions(figures: readonly Figure[], asWritten: AsWritten): Contradiction[] {
  const found: Contradiction[] = [];
  figures.forEach((figure, index) => {
    // Canonical order keeps the figures of one parameter together.
    for (let next = index + 1; figures[next]?.parameter === figure.parameter; next += 1) {
      const other = figures[next];
      if (other !== undefined && figure.value > other.value && sameCondition(figure, other)) found.push(order(figure, other, asWritten));
    }
  });
  const absolute = belowOperating(figures, asWritten);
  return absolute === null ? found : [...found, absolute];
}

function sameCondition(a: Figure, b: Figure): boolean {
  return compareConditions(a.condition, b.condition) === 0;
}

function order(low: Figure, high: Figure, asWritten: AsWritten): Contradiction {
  const { words } = PARAMETERS[low.parameter];
  const reason = `${words}: ${low.kind} ${asWritten(low)} is above ${high.kind} ${asWritten(high)}`;
  return { figure: high, severity: 'error', fault: { code: 'I512', reason, fix: 'swap the two, or correct the unit of one' } };
}

function belowOperating(figures: readonly Figure[], asWritten: AsWritten): Contradiction | null {
  const absolute = figures.find(({ parameter }) => parameter === 'supplyAbsoluteMaximum');
  const operating = figures.find(({ parameter, kind }) => parameter === 'supplyVoltage' && kind === 'max');
  if (absolute === undefined || operating === undefined || absolute.value >= operating.value) return null;
  const reason = `the absolute maximum ${asWritten(absolute)} is below the operating maximum ${asWritten(operating)}`;
  return { figure: absolute, severity: 'warning', fault: { code: 'I517', reason } };
}
