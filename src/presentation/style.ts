/** How text is laid out and written; decided by whoever knows the terminal. */
export interface Style {
  /** Columns, 40..200; below 60 tables are written upright. */
  readonly width: number;
  readonly ascii: boolean;
  readonly colour: boolean;
  /** How many parts of each kind are listed. Counts are always complete. */
  readonly top: number;
  readonly all: boolean;
  readonly sources: boolean;
  /** Explanations: the relation, numbers and source of each check. */
  readonly formulas?: boolean;
  /** Bars of one line beside the numbers: on a terminal that is wide enough. The numbers stand in the text with them and without. */
  readonly bars?: boolean;
  /** U+00A0 between number and unit, for terminals. Without it a plain blank; they stay on one line either way. */
  readonly gluedUnits: boolean;
}

/** Where a text comes from, for the commands it offers. */
export interface CommandContext {
  /** The program as typed. */
  readonly command: string;
  /** Null when options alone describe the stage. */
  readonly stageFile: string | null;
  /** Options that changed the stage or the judging, as typed: another command about the same answer repeats them. */
  readonly changes?: readonly string[];
  /** `--catalog FILE`, as typed. */
  readonly catalog?: readonly string[];
}

const NARROW = 60;

export const isNarrow = (style: Style): boolean => style.width < NARROW;

type Tone = 'good' | 'bad' | 'open';
const SGR: Record<Tone, readonly [number, number]> = { good: [32, 39], bad: [31, 39], open: [33, 39] };

/** A verdict word in colour. The word says all: nothing is told by colour alone. */
export function toned(words: string, tone: Tone, style: Style): string {
  if (!style.colour) return words;
  const [on, off] = SGR[tone];
  return words.split(' ').map((word) => `\u001b[${on}m${word}\u001b[${off}m`).join(' ');
}
