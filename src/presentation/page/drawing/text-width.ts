/** Advance widths in thousandths of the size, wide as a wide sans-serif face (measured), so that ordinary faces run shorter. */
const WIDTHS: readonly (readonly [number, string])[] = [
  [290, "'ijl"], [330, ' ,.IJ\u00a0'], [370, '/:;\\f|'], [410, '()-[]t'], [430, 'r!'], [470, '"'], [510, '*_`°'], [560, '?Lcsz'], [610, 'Fkvxy'],
  [650, '$0123456789EPSTYabdeghnopqu{}µ√'], [700, 'K'], [730, 'ABCRVXZ'], [770, 'HNU'], [800, '&DGOQΩ'], [850, '#+<=>^w~±×−≥≤→✓✕'], [880, 'M'], [960, '%'], [1010, '@Wm…'],
];

const ADVANCES: ReadonlyMap<string, number> = new Map(WIDTHS.flatMap(([width, characters]) => Array.from(characters).map((character): [string, number] => [character, width])));
/** Any other script. */
const OTHER = 1050;

/** Width a text takes at most at a size in user units; an estimate on the safe side, since a page cannot measure. */
export function textWidth(text: string, size: number): number {
  let thousandths = 0;
  for (const character of text) thousandths += ADVANCES.get(character) ?? OTHER;
  return (thousandths / 1000) * size;
}

/** The text cut in the middle to a width, whole characters only: `OPA-very…-long`. */
export function fitted(text: string, size: number, width: number): string {
  const characters = Array.from(text);
  let shown = text;
  for (let kept = characters.length - 1; kept > 1 && textWidth(shown, size) > width; kept -= 1) {
    const head = Math.ceil(kept * 0.6);
    shown = `${characters.slice(0, head).join('')}…${characters.slice(characters.length - (kept - head)).join('')}`;
  }
  return shown;
}
