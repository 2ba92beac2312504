import { safeLine } from '../../safe-text.js';

/** Text for an SVG element or attribute: invisible and controlling characters made visible, markup escaped. */
export function xml(text: string): string {
  return safeLine(text)
    .replace(/\p{M}{3,}/gu, (marks) => Array.from(marks).slice(0, 2).join(''))
    .replace(/[\ufffe\uffff]/gu, '\ufffd')
    .replace(/[&<>"']/gu, (character) => ENTITIES[character] ?? character);
}

/** The same for a sentence that may hold names kept to themselves (`named`): their isolates stay, everyone else's are made visible. */
export function sentence(text: string): string {
  return text
    .split(/(\u2068[^\u2068\u2069]*\u2069)/u)
    .map((piece) => (piece.startsWith('\u2068') && piece.endsWith('\u2069') ? `\u2068${xml(piece.slice(1, -1))}\u2069` : spaced(piece)))
    .join('');
}

/** Blanks at the ends of a piece are those round a name. */
const spaced = (piece: string): string => `${/^\s/u.test(piece) ? ' ' : ''}${xml(piece)}${/\S\s$/u.test(piece) ? ' ' : ''}`;

const ENTITIES: Readonly<Record<string, string>> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;', "'": '&#39;' };

/** A length in user units with one decimal at most: the same bytes for the same picture. Throws RangeError when it is not finite. */
export function px(value: number): string {
  if (!Number.isFinite(value)) throw new RangeError(`a drawing cannot place ${value}`);
  return String(Number(value.toFixed(1)) + 0);
}

export type Attributes = Readonly<Record<string, string | number | undefined>>;

/** One element; numbers are lengths, attributes left undefined are left out. `inside` is markup already. */
export function tag(name: string, attributes: Attributes, inside = ''): string {
  const written = Object.entries(attributes).flatMap(([key, value]) => {
    if (value === undefined) return [];
    return [` ${key}="${typeof value === 'number' ? px(value) : xml(value)}"`];
  });
  return inside === '' ? `<${name}${written.join('')}/>` : `<${name}${written.join('')}>${inside}</${name}>`;
}
