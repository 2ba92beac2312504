import { asciiText } from '../quantities/ascii.js';
import type { Style } from './style.js';

/** Holds number and unit together; written as U+00A0 or a blank. */
export const GLUE = '\u00a0';
/** Holds together what is to be pasted; always written as a blank. */
export const PASTE = '\ue000';

const SIGNS: ReadonlyMap<string, string> = new Map([
  ['×', 'x'], ['÷', '/'], ['·', '*'], ['–', '-'], ['—', '-'], ['…', '...'], ['→', '->'], ['π', 'pi'], ['Δ', 'delta '], ['θ', 'theta'],
  ['√', 'sqrt'], ['²', '^2'], ['½', '1/2'], ['‰', ' permille'], ['‘', "'"], ['’', "'"], ['“', '"'], ['”', '"'], ['ε', 'epsilon'], ['τ', 'tau'], ['ρ', 'rho'], ['Σ', 'sum of '], ['∫', 'integral of '], ['β', 'beta'], ['≈', '~'],
]);

/** Text as this style spells it: the hyphen for the minus sign (U+2212 is for pages), and ASCII where asked. Keeps the joints. */
export function spelled(text: string, style: Style): string {
  const plain = text.replaceAll('−', '-');
  return style.ascii ? plain.split(GLUE).map(asciiOnly).join(GLUE) : plain;
}

function asciiOnly(text: string): string {
  return asciiText(text.replaceAll('\u03bc', 'µ')).replace(/[^\p{ASCII}]/gu, (character) => SIGNS.get(character) ?? inAscii(character));
}

function inAscii(character: string): string {
  return character === PASTE ? character : `\\u{${(character.codePointAt(0) ?? 0).toString(16)}}`;
}

/** Lines as the stream gets them: joints become blanks, ends are trimmed, one newline at the end. */
export function finished(lines: readonly string[], style: Style): string {
  const joint = style.gluedUnits && !style.ascii ? GLUE : ' ';
  const text = lines.map((line) => line.trimEnd()).join('\n').replace(/^\n+|\n+$/gu, '').replace(/\n{3,}/gu, '\n\n');
  return `${text.replaceAll(GLUE, joint).replaceAll(PASTE, ' ')}\n`;
}

/** Every blank held: for a word that must stay whole. */
export const held = (text: string): string => text.replaceAll(' ', GLUE);

const NUMBER = String.raw`[-−+±]?\d[\d.,]*(?:[eE][+-]?\d+)?`;
const UNIT = String.raw`(?:[fpnuµmkMGT]?(?:V|A|Ω|ohm|F|Hz|s|W|H|S|J|K|C)(?:/(?:[nµum]?s|√Hz|rtHz|V|K|°C|W|Hz))?|[µmn]?V(?:pk|pp|rms)|dB[Vu]?|%|°C|°|ppm(?:/°C)?|[A-Z]{3})`;
const PAIR = new RegExp(`(?<!\\w)(?<!\\d[.,])(?<!\\w-)(${NUMBER}) (?=${UNIT}(?![\\w/]))`, 'gu');
const FACTOR = /([×÷≤≥±]) (?=[-−]?\d)/gu;

/** Sentences from elsewhere with number and unit, and sign and number, held together. */
export function glued(text: string): string {
  return text.replace(PAIR, `$1${GLUE}`).replace(FACTOR, `$1${GLUE}`);
}
