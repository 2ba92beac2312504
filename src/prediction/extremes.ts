/** Smallest of many values; Infinity of none. */
export const least = (values: readonly number[]): number => values.reduce((best, value) => Math.min(best, value), Infinity);
/** Largest of many values; −Infinity of none. */
export const most = (values: readonly number[]): number => values.reduce((best, value) => Math.max(best, value), -Infinity);
