import { figureSlot, type Condition } from '../parts/figures.js';
import type { ReadPart } from './identity.js';
import type { ListColumn, ReadList } from './list.js';
import { slotOf } from './slot.js';

/**
 * Which column each figure was read from, as far as the headers do not tell: columns with two figures in one cell, words, loads in a
 * column of their own, declarations. Rows of a list are much alike, so what most of them share is said once.
 */
export interface ListSources {
  /** Slot → number of the column that fills it where a part does not say otherwise; `DECLARED` where no column does. */
  readonly usual: ReadonlyMap<string, number>;
  /** By index of the part: the slots that something else fills. */
  readonly others: ReadonlyMap<number, ReadonlyMap<string, number>>;
  /** What the owner declared for the whole list; null when nothing was. */
  readonly declared: string | null;
}

/** Stands for the number of a column: the figure was declared for the whole list. */
export const DECLARED = 0;

/** Where the figures of parts come from, beside the columns that name one figure. */
export function listSources(columns: readonly ListColumn[], read: readonly ReadPart[], declared: string | null): ListSources {
  const told = new Map(columns.flatMap((column) => plainSlot(column)));
  const usual = new Map<string, number>();
  const others = new Map<number, Map<string, number>>();
  const plain = columnsThatTell(columns, told);
  read.forEach(({ part: { figures }, sources }, index) => {
    figures.forEach((figure, at) => {
      // Its header tells: nothing to keep.
      if (plain.get(sources[at] ?? null) === figure.condition) return;
      const slot = slotOf(figure);
      const number = sources[at]?.number ?? DECLARED;
      const known = usual.get(slot) ?? told.get(slot);
      if (known === undefined) usual.set(slot, number);
      else if (known !== number) others.set(index, (others.get(index) ?? new Map<string, number>()).set(slot, number));
    });
  });
  return { usual, others, declared };
}

/** The columns that fill the one slot they name, with the condition their figures share; that of a figure from elsewhere is another object. */
function columnsThatTell(columns: readonly ListColumn[], told: ReadonlyMap<string, number>): ReadonlyMap<ListColumn | null, Condition> {
  return new Map(columns.flatMap((column): [ListColumn, Condition][] => {
    const [slot] = plainSlot(column);
    return column.reading.kind === 'figure' && slot !== undefined && told.get(slot[0]) === column.number ? [[column, column.reading.condition]] : [];
  }));
}

/** The slot a column names by itself. */
export function plainSlot({ number, reading }: ListColumn): [string, number][] {
  if (reading.kind !== 'figure') return [];
  return [[figureSlot({ parameter: reading.parameter, kind: reading.limit, condition: reading.condition }), number]];
}

/** The column a slot of one part was read from, by the index of the part; null where none was. */
export function sourceColumn({ columns, sources }: Pick<ReadList, 'columns' | 'sources'>, slot: string, index?: number): ListColumn | null {
  const own = index === undefined ? undefined : sources.others.get(index)?.get(slot);
  const number = own ?? sources.usual.get(slot);
  if (number !== undefined) return columns.find((column) => column.number === number) ?? null;
  return columns.find((column) => plainSlot(column)[0]?.[0] === slot) ?? null;
}
