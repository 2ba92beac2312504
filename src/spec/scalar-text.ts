/**
 * A typed text as a value of the stage file that reads back as the same text: as it is where YAML takes it so, else in double
 * quotes (JSON's, which YAML shares). A map, a list or a quoted text is YAML already.
 */
export function scalarText(text: string): string {
  const trimmed = text.trim();
  if (/^[[{"']/.test(trimmed)) return trimmed;
  return isPlain(trimmed) ? trimmed : JSON.stringify(trimmed);
}

/** YAML 1.2.2, sections 7.3.3 and 6.6: what a plain scalar may begin with and hold. */
function isPlain(text: string): boolean {
  const begins = /^(?:-(?=[^\s])|[^\s\-?:,[\]{}#&*!|>'"%@`])/.test(text);
  return begins && !/:(?:\s|$)|\s#|[\p{Cc}\p{Cf}\p{Zl}\p{Zp}]/u.test(text) && !/^(?:~|null|true|false|yes|no|on|off|\.{3}|---)$/i.test(text) && !text.startsWith('---');
}
