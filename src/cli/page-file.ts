import { createHash } from 'node:crypto';
import { renderPage, reportLine, type Review } from '../index.js';

/** SHA-256 of a text in UTF-8, hexadecimal. */
export const sha256Of = (text: string): string => createHash('sha256').update(text).digest('hex');

/** The page of a review with the document it embeds and that document's hash. */
export function pageOf(review: Review): string {
  const text = reportLine(review);
  return renderPage(review, { text, sha256: sha256Of(text) });
}
