import type { Condition, Figure, LimitKind } from '../parts/figures.js';
import type { CellFault } from './cell-fault.js';
import type { MeasuredReading } from './column-reading.js';
import { possible } from './possible.js';
import { targetParameter } from './target.js';

export type MeasuredCell =
  | { readonly ok: true; readonly figures: readonly Figure[]; readonly notes: readonly string[] }
  | { readonly ok: false; readonly fault: CellFault };

/** A limit kind and the value with it, in the SI unit. */
export type Value = readonly [LimitKind, number];

export interface Making {
  readonly column: MeasuredReading;
  readonly condition: Condition;
  readonly notes: readonly string[];
}

/** The figures the values of a cell stand for, each as it is kept; or why no amplifier can have one of them. */
export function figuresOf(values: readonly Value[], { column, condition, notes }: Making): MeasuredCell {
  const figures: Figure[] = [];
  const all = [...notes];
  for (const [kind, value] of values) {
    for (const made of figuresFor(column, { kind, value, condition })) {
      const kept = possible(made.parameter, made.value);
      if (!kept.ok) return kept;
      if (kept.note !== undefined && !all.includes(kept.note)) all.push(kept.note);
      figures.push({ ...made, value: kept.value });
    }
  }
  return { ok: true, figures, notes: all };
}

type Rated = Pick<Figure, 'kind' | 'value' | 'condition'>;

function figuresFor({ target }: MeasuredReading, { kind, value, condition }: Rated): Figure[] {
  const parameter = targetParameter(target);
  // One swing number is that of both rails.
  if (target === 'bothSwings') return (['outputLowHeadroom', 'outputHighHeadroom'] as const).map((side) => ({ parameter: side, kind, value, condition }));
  if (target === 'outputHighVoltage') return [{ parameter, kind: kind === 'typ' ? 'typ' : 'max', value: difference(condition.supply ?? 0, value), condition }];
  return [{ parameter, kind, value, condition }];
}

/** Volts as printed have few decimals; their difference has no more. */
export const difference = (a: number, b: number): number => Number((a - b).toPrecision(12));
