/** Data as text, so that equal data are equal texts; null when there is anything in it that is not plain data, as functions are. */
export function plainText(data: unknown): string | null {
  try {
    return JSON.stringify(data, (_key, value: unknown) => plain(value));
  } catch (error) {
    if (error instanceof NotPlain) return null;
    throw error;
  }
}

class NotPlain extends Error {}

function plain(value: unknown): unknown {
  if (typeof value === 'number') return Number.isFinite(value) && !Object.is(value, -0) ? value : `number ${Object.is(value, -0) ? '-0' : value}`;
  if (value === undefined) return { undefined: true };
  if (typeof value === 'function' || typeof value === 'symbol' || typeof value === 'bigint') throw new NotPlain();
  if (typeof value !== 'object' || value === null || Array.isArray(value)) return value;
  const kind: unknown = Object.getPrototypeOf(value);
  if (kind !== Object.prototype && kind !== null) throw new NotPlain();
  return value;
}
