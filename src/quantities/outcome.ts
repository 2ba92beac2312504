import { refuseImplausible, type Measured } from './measure.js';
import type { Quantity } from './quantity.js';
import type { Reading } from './reading.js';
import { Refusal } from './refusal.js';

/** What a phrase comes to, before the texts are added. */
export type Outcome = Pick<Quantity, 'min' | 'nominal' | 'max' | 'limit' | 'tolerance' | 'echo'> & { readonly measured: readonly Measured[] };

/** Unit of the numbers; of a price, its currency. */
export function unitOf(measured: readonly Measured[], { rule, kind }: Reading): string {
  return kind === 'price' ? (measured[0]?.unit.canonical ?? rule.unit) : rule.unit;
}

/** A falling unit turns an upper limit into a lower one. */
export const opposite = (limit: 'min' | 'typ' | 'max'): 'min' | 'typ' | 'max' => (limit === 'min' ? 'max' : limit === 'max' ? 'min' : 'typ');

/** Checks size and, for counts, wholeness of a figure that ends up in the quantity. Throws Refusal. */
export function refuseUnfit(measured: Measured, reading: Reading): void {
  refuseImplausible(measured.value, measured, reading);
  const { value, figure } = measured;
  if (reading.kind !== 'count' || Number.isInteger(value)) return;
  const typed = reading.text.slice(figure.start, figure.end);
  throw new Refusal('Q013', `${typed} is not a whole number`, { start: figure.start, end: figure.end });
}
