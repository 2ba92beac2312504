import { safeText } from './safe-text.js';

const ENTITIES: Readonly<Record<string, string>> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;', "'": '&apos;' };

/**
 * Text for an XML 1.0 document, as content or between the quotes of an attribute: markup is escaped, and what XML cannot hold
 * (controls, lone surrogates, U+FFFE, U+FFFF) or a reader would not see is written as `\u{1b}`. Line ends of content stay.
 * Source: W3C, Extensible Markup Language (XML) 1.0, 5th ed. 2008, production 2 and section 2.4 (from memory).
 */
export function xmlText(text: string): string {
  return text.split('\n').map(escaped).join('\n');
}

/** The same on one line, for an attribute. */
export const xmlAttribute = (text: string): string => escaped(text.replaceAll(/[\r\n\t ]+/gu, ' ').trim());

function escaped(line: string): string {
  return safeText(line).replaceAll(/[\ufffe\uffff]/gu, (one) => `\\u{${one.charCodeAt(0).toString(16)}}`).replaceAll(/[&<>"']/gu, (sign) => ENTITIES[sign] ?? sign);
}
