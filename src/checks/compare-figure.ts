import type { NumberDemand } from '../demands/index.js';
import type { LimitKind, Parameter } from '../parts/figures.js';
import type { Reading } from '../parts/reading.js';
import type { NumberFinding, UndecidedFinding } from '../verdicts/finding.js';

/** A demand with the corner it stands at, if it has one. */
type Asked = NumberDemand & { readonly corner?: Readonly<Record<string, number>> };

/** The figure a check compares: which limit would settle it. */
export interface Compared {
  readonly figure: Parameter;
  readonly kind: LimitKind;
  /** Unit of the figure itself. */
  readonly unit: string;
}

/** One figure against one demand: two numbers side by side, or undecided for want of the figure. */
export function compareFigure(asked: Asked, compared: Compared, reading: Reading | null): NumberFinding | UndecidedFinding {
  const turnsAt = { ...compared, value: asked.required };
  const corner = asked.corner === undefined ? {} : { corner: asked.corner };
  const { required, unit, sense } = asked;
  if (reading === null) {
    const missing = [{ figure: compared.figure, kind: compared.kind }];
    return { kind: 'undecided', required, unit, sense, cause: 'missing-figure', missing, turnsAt, ...corner };
  }
  return { kind: 'numbers', required, unit, sense, offered: reading.value, basis: reading.basis, slot: reading.slot, how: reading.how, turnsAt, ...corner };
}
