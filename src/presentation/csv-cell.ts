/** Starts that a spreadsheet would run as a formula (OWASP, CSV injection). */
const RISKY = /^[=+\-@\t\r\n＝＋－＠]/u;
const STRICT_NUMBER = /^-?\d+(?:\.\d+)?(?:[eE][+-]?\d+)?$/u;

/** One CSV cell, RFC 4180: quoted where needed, formulas disarmed with a leading apostrophe. Null is an empty cell. */
export function csvCell(value: string | number | null): string {
  if (value === null) return '';
  const text = String(value);
  const safe = RISKY.test(text) && !STRICT_NUMBER.test(text) ? `'${text}` : text;
  return /[",\r\n]/u.test(safe) ? `"${safe.replaceAll('"', '""')}"` : safe;
}

/** Rows of cells as RFC 4180 text with CRLF line ends. */
export function csvText(rows: readonly (readonly (string | number | null)[])[]): string {
  return rows.map((row) => `${row.map(csvCell).join(',')}\r\n`).join('');
}
