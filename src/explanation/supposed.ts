import { figureSlot, type Condition, type Figure, type LimitKind } from '../parts/figures.js';
import { LIFECYCLES, STATUSES, type Part } from '../parts/part.js';
import type { Missing } from '../verdicts/finding.js';

/** What could be looked up: a figure with its limit kind and condition, or an identity field. */
export interface Subject {
  readonly figure: Missing['figure'];
  readonly kind: LimitKind | null;
  readonly condition: Condition;
}

/** SI for figures, an amount for a price, a count for channels, else a word. */
export type Answer = number | string;

/** The part as it would be with this answer in its list: a figure as a limit that was printed, in the place of what stood in that slot. */
export function supposed(part: Part, subject: Subject, answer: Answer): Part {
  const { figure, kind, condition } = subject;
  if (isIdentity(figure)) return withIdentity(part, figure, answer);
  const told: Figure = { parameter: figure, kind: kind ?? 'typ', value: Number(answer), condition };
  return { ...part, figures: [...part.figures.filter((one) => figureSlot(one) !== figureSlot(told)), told] };
}

export type IdentityField = Exclude<Missing['figure'], Figure['parameter']>;

const FIELDS: ReadonlySet<string> = new Set<IdentityField>(['channels', 'package', 'qualification', 'status', 'lifecycle', 'price', 'phaseReversal', 'inputClamp']);

export const isIdentity = (figure: Missing['figure']): figure is IdentityField => FIELDS.has(figure);

/** A price is supposed in the currency the stage asks in: `currency:amount`. */
function withIdentity(part: Part, field: IdentityField, answer: Answer): Part {
  switch (field) {
    case 'channels':
      return { ...part, channels: Number(answer) };
    case 'price': {
      const [currency = 'EUR', amount = '0'] = String(answer).split(':');
      return { ...part, price: { amount: Number(amount), currency, quantity: null } };
    }
    case 'status':
      return { ...part, status: STATUSES.find((word) => word === answer) ?? null };
    case 'lifecycle':
      return { ...part, lifecycle: LIFECYCLES.find((word) => word === answer) ?? null };
    case 'package':
      return { ...part, package: String(answer) };
    case 'qualification':
      return { ...part, qualification: String(answer) };
    case 'phaseReversal':
    case 'inputClamp':
      return { ...part, [field]: answer === 'yes' };
  }
}
