/** Where the document stands in the page; nothing the list says can end the element, since no `<` is left in it. */
const BLOCK = /<script type="application\/json" id="railfit-report">([^<]*)<\/script>/u;

/** What ends an element or deceives a reader of the source: signs of HTML, line separators, format characters, private use. */
const SIGNS = /[<>&\p{Cf}\p{Co}\p{Zl}\p{Zp}]/gu;

/** JSON as it may stand in a script element: the same document, with such signs written as escapes (HTML, 4.12.1.3; RFC 8259, 7). */
export function asEmbedded(json: string): string {
  return json.replace(SIGNS, (sign) => sign.split('').map((unit) => `\\u${unit.charCodeAt(0).toString(16).padStart(4, '0')}`).join(''));
}

/** The embedded document of a page; null when there is none. */
export function embeddedIn(page: string): string | null {
  return BLOCK.exec(page)?.[1] ?? null;
}
