type Named = Readonly<Record<string, number>>;

/** An interval: `from`/`to` include the end, `above`/`below` exclude it. */
export interface Interval {
  readonly from?: number;
  readonly above?: number;
  readonly to?: number;
  readonly below?: number;
}

/** @throws RangeError naming the argument, its limit and its value. NaN and infinite values are always outside. */
export function requireWithin(where: string, values: Named, interval: Interval): void {
  // Names without their values: no list of pairs is made for what is nearly always inside.
  for (const name of Object.keys(values)) {
    const value = values[name] ?? NaN;
    if (!inside(value, interval)) throw new RangeError(`${where}: ${name} must be ${describe(interval)}, but is ${value}`);
  }
}

/** @throws RangeError unless every value is finite and above 0. */
export function requirePositive(where: string, values: Named): void {
  requireWithin(where, values, { above: 0 });
}

/** @throws RangeError unless every value is finite and at least 0. */
export function requireNotNegative(where: string, values: Named): void {
  requireWithin(where, values, { from: 0 });
}

/** @throws RangeError unless every value is a finite number. */
export function requireFinite(where: string, values: Named): void {
  requireWithin(where, values, {});
}

function inside(value: number, { from, above, to, below }: Interval): boolean {
  if (!Number.isFinite(value)) return false;
  if (from !== undefined && value < from) return false;
  if (above !== undefined && value <= above) return false;
  if (to !== undefined && value > to) return false;
  return below === undefined || value < below;
}

function describe({ from, above, to, below }: Interval): string {
  const limits: string[] = [];
  if (from !== undefined) limits.push(`at least ${from}`);
  if (above !== undefined) limits.push(`above ${above}`);
  if (to !== undefined) limits.push(`at most ${to}`);
  if (below !== undefined) limits.push(`below ${below}`);
  return ['finite', ...limits].join(', ');
}
