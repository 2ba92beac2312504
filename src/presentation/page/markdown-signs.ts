import { safeLine } from '../safe-text.js';

/** Our own sentence in Markdown: signs that mean something there are escaped (CommonMark 0.31, 2.4), line breaks are blanks. */
export function plainMarkdown(text: string): string {
  return safeLine(text.replaceAll('\u00a0', ' ')).replace(/[\\`*_[\]<>|~#]/gu, (sign) => `\\${sign}`);
}

/** A text of the list or the stage file as code: nobody is mentioned by it, nothing in it is markup. A bar would still end a table cell. */
export function codeMarkdown(text: string): string {
  const line = safeLine(text.replaceAll('\u00a0', ' ')) || ' ';
  const fence = '`'.repeat(Math.max(0, ...[...line.matchAll(/`+/gu)].map(([run]) => run.length)) + 1);
  const padded = line.startsWith('`') || line.endsWith('`') ? ` ${line} ` : line;
  return `${fence}${padded.replaceAll('|', '\\|')}${fence}`;
}

/** A table; cells are Markdown already. Nothing for no rows. */
export function tableMarkdown(titles: readonly string[], rows: readonly (readonly string[])[]): string[] {
  if (rows.length === 0) return [];
  const line = (cells: readonly string[]): string => `| ${cells.join(' | ')} |`;
  return [line(titles), line(titles.map(() => '---')), ...rows.map(line), ''];
}
