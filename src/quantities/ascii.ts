const REPLACEMENTS: readonly [RegExp, string][] = [
  [/µ/g, 'u'],
  [/Ω/g, 'ohm'],
  [/√Hz/g, 'rtHz'],
  [/±/g, '+/-'],
  [/−/g, '-'],
  [/°C/g, 'C'],
  [/°/g, ' deg'],
  [/≤/g, '<='],
  [/≥/g, '>='],
  [/[\u00a0\u202f]/g, ' '],
];

/** Text with the signs of quantities in ASCII, in spellings that are read back: uV, kohm, nV/rtHz, +/-. */
export function asciiText(text: string): string {
  let result = text;
  for (const [pattern, replacement] of REPLACEMENTS) result = result.replace(pattern, replacement);
  return result.replaceAll('  deg', ' deg');
}
