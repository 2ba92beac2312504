import { safeLine } from '../safe-text.js';
import type { Difference } from './differences.js';

/**
 * Where a page parts from what would be written now while all answers are the same: somebody edited it, or another version wrote it.
 * Told as a reader sees it: the section, and a few words before and after, without markup.
 */
export function pageDifference(page: string, written: string): Difference {
  const [was, is] = [page.split('\n'), written.split('\n')];
  const found = was.findIndex((line, at) => line !== is[at]);
  const at = found < 0 ? was.length : found;
  const [before, after] = [read(was[at]), read(is[at])];
  const section = sectionAt(is, at);
  const isMarkup = section === null || before === after;
  const where = section === null ? `in what no reader sees (${hiddenAt(is, at)})` : `in section "${section}"${isMarkup ? ', in its markup, not its words' : ''}`;
  const [shownBefore, shownAfter] = isMarkup ? ['another text', 'as this railfit writes it'] : parted(before, after);
  return { stage: null, what: 'page', subject: `the answers are the same, but the text of the file was changed after it was written, or another version wrote it; first ${where}, line ${at + 1}`, was: shownBefore, is: shownAfter };
}

/** A line as it is read: no tags, signs for their entities, nothing that deceives; null: the text ends before. */
function read(line: string | undefined): string | null {
  if (line === undefined) return null;
  const plain = line.replace(/<(?:style|script)\b.*$/u, '').replace(/<[^>]*>?/gu, ' ');
  return safeLine(plain.replace(/&#(\d{1,7});/gu, (entity, code: string) => characterOf(Number(code)) ?? entity));
}

const characterOf = (code: number): string | null => (code > 0 && code <= 0x10ffff ? String.fromCodePoint(code) : null);

const HEADING = /<h([1-4])\b[^>]*>(.*?)<\/h\1>/gu;

/** Headings over a line, from its stage down; null in the head, the style sheet and after the last section. */
function sectionAt(lines: readonly string[], at: number): string | null {
  const over: string[] = [];
  const body = lines.findIndex((line) => line === '<body>');
  const end = lines.findIndex((line) => line.startsWith('<script'));
  if (at <= body || (end >= 0 && at >= end)) return null;
  for (const line of lines.slice(body, at + 1)) {
    for (const [, level = '1', title = ''] of line.matchAll(HEADING)) over.splice(Number(level) - 1, over.length, read(title) ?? '');
  }
  const names = over.filter((name) => name !== '');
  return (names.length > 1 ? names.slice(1) : names).join(', ') || null;
}

function hiddenAt(lines: readonly string[], at: number): string {
  const body = lines.findIndex((line) => line === '<body>');
  if (at > body) return 'the embedded document or the script';
  return lines.slice(0, at + 1).some((line) => line.startsWith('<style')) ? 'the style sheet' : 'the head of the file';
}

/** Characters shown before the place where two texts part, and altogether. */
const [LEAD, LENGTH] = [30, 100];

/** Both texts from a little before they part. */
function parted(was: string | null, is: string | null): [string, string] {
  const [one, other] = [Array.from(was ?? ''), Array.from(is ?? '')];
  const same = one.findIndex((sign, at) => sign !== other[at]);
  const from = Math.max(0, (same < 0 ? one.length : same) - LEAD);
  return [excerpt(was, from), excerpt(is, from)];
}

function excerpt(text: string | null, from: number): string {
  if (text === null) return 'the file ends here';
  const characters = Array.from(text);
  if (characters.length === 0) return 'nothing';
  const shown = characters.slice(from, from + LENGTH).join('').trim();
  return `${from > 0 ? '…' : ''}${shown}${characters.length > from + LENGTH ? '…' : ''}`;
}
