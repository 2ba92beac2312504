/** Which reading of a figure: the worst it may be, or the best. */
export type Outlook = 'w' | 'b';

/** A number as SQL reads it: always a real, since SQLite divides whole numbers as whole numbers. */
export function real(value: number): string {
  if (value === Number.POSITIVE_INFINITY) return '9e999';
  if (value === Number.NEGATIVE_INFINITY) return '-9e999';
  if (Number.isNaN(value)) throw new RangeError('not a number');
  const text = String(value);
  return /[.e]/u.test(text) ? text : `${text}.0`;
}

export const realOrNull = (value: number | null): string => (value === null ? 'null' : real(value));

export const text = (value: string): string => `'${value.replaceAll("'", "''")}'`;

/** 1 where a condition of the stage holds, which SQL need not work out. */
export const flag = (holds: boolean): string => (holds ? '1' : '0');

/** Met exactly is met: within 1e-9 of the larger or 1e-12. Null where one side is not known. */
export function meets(required: string, offered: string, sense: 'at-least' | 'at-most'): string {
  // An endless offer has no tolerance of its own.
  const close = `max(1e-12, 1e-9 * max(abs(${required}), min(abs(${offered}), 1e300)))`;
  const short = sense === 'at-least' ? `(${required}) - (${offered})` : `(${offered}) - (${required})`;
  return `(${short} <= 0.0 or ${short} <= ${close})`;
}

/** A table of numbers, as they stand in the stage. */
export function rows(name: string, columns: readonly string[], values: readonly (readonly string[])[]): string {
  const given = values.length === 0 ? `select ${columns.map(() => 'null').join(', ')} where 0` : `values ${values.map((row) => `(${row.join(', ')})`).join(', ')}`;
  return `create temp table ${name} as with given(${columns.join(', ')}) as (${given}) select * from given`;
}

/** What a check says of the parts: how the worst and the best reading stand (1 pass, 0 fail, null open), what it rests on, and its ratio for the order. */
export interface Standing {
  readonly check: string;
  readonly worst: string;
  readonly best: string;
  /** 0 guaranteed, 1 derated, 2 estimated, 3 assumed, 4 borrowed. */
  readonly basis: string;
  /** Offered over required, or the other way round, on the worst reading; 1.25 for 50 mV of spare. Absent where the order does not look at it. */
  readonly margin?: string;
  /** Parts it is asked of; all where absent. */
  readonly where?: string;
  /** `known` where absent. */
  readonly from?: string;
}

export function standing({ check, worst, best, basis, margin = 'null', where = '1', from = 'known' }: Standing): string {
  return `select key, ${text(check)} as check_id, ${worst} as worst, ${best} as best, ${basis} as basis, ${margin} as margin from ${from} where ${where}`;
}
