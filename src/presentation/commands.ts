import { displayWidth, padded } from './layout.js';
import { safeText } from './safe-text.js';
import { PASTE, spelled } from './spelling.js';
import { isNarrow, type CommandContext, type Style } from './style.js';

/** A command to paste, with what it is for. */
export interface Offer {
  readonly words: readonly string[];
  readonly why: string;
}

/**
 * `railfit explain PART stage.yaml`, with the options of the answer it follows; every word quoted for a shell where it must be.
 * `command` is the command and its operands, `more` are options. An operand that starts like an option stands behind `--`, at the end.
 */
export function commandOf(context: CommandContext, command: readonly string[], more: readonly string[] = []): string[] {
  const stage = context.stageFile === null ? [] : [context.stageFile === 'standard input' ? '-' : context.stageFile];
  const [name = '', ...named] = command;
  const operands = [...named, ...stage];
  const options = [...(context.changes ?? []), ...more, ...(context.catalog ?? [])];
  const behind = operands.some(looksLikeOption) ? [...options, '--', ...operands] : [...operands, ...options];
  return [context.command, name, ...behind].map(shellWord);
}

/** A command about nothing but its operands: `railfit part -- -X`. */
export const plainCommand = (...command: readonly string[]): string => commandOf({ command: 'railfit', stageFile: null }, command).join(' ');

/** A minus alone is standard input. */
const looksLikeOption = (word: string): boolean => word.startsWith('-') && word !== '-';

/** POSIX quoting; left alone when no shell would change it. Blanks are kept as they are: an id is compared exactly. */
function shellWord(word: string): string {
  const safe = safeText(word);
  return /^[\w./:=+@%,-]+$/u.test(safe) ? safe : `'${safe.replaceAll("'", String.raw`'\''`)}'`;
}

/** What is to be pasted keeps its letters; only ASCII, where asked, respells them. */
const pasted = (text: string, style: Style): string => (style.ascii ? spelled(text, style) : text);

/** Commands under `Next`, each pasteable: a long one goes on after a backslash. What it is for stands beside where all have room. */
export function nextLines(offers: readonly Offer[], style: Style): string[] {
  const commands = offers.map(({ words }) => pasted(words.map((word) => word.replaceAll(' ', PASTE)).join(PASTE), style));
  const lead = (at: number): string => padded(at === 0 ? 'Next' : '', LEAD);
  const line = (at: number, width: number): string => `${lead(at)}${padded(commands[at] ?? '', width)}${' '.repeat(GAP)}${spelled(offers[at]?.why ?? '', style)}`;
  const fits = (text: string): boolean => !isNarrow(style) && displayWidth(text) <= style.width;
  const widths = commands.map(displayWidth).sort((a, b) => b - a);
  // The widest column in which every command not wider than it keeps its reason on the line.
  const width = widths.find((one) => commands.every((command, at) => displayWidth(command) > one || fits(line(at, one)))) ?? 0;
  return offers.flatMap(({ words }, at) => (fits(line(at, width)) ? [line(at, width)] : commandLines(words, style, lead(at))));
}

const LEAD = 8;
const GAP = 4;

/** One command in as many lines as it takes. */
export function commandLines(words: readonly string[], style: Style, lead: string): string[] {
  const lines: string[] = [];
  let line = lead;
  let isEmpty = true;
  for (const word of words.map((one) => pasted(one.replaceAll(' ', PASTE), style))) {
    const joined = isEmpty ? line + word : `${line}${PASTE}${word}`;
    if (!isEmpty && displayWidth(joined) + 2 > style.width) {
      lines.push(`${line}${PASTE}\\`);
      line = ' '.repeat(displayWidth(lead) + 2) + word;
    } else line = joined;
    isEmpty = false;
  }
  return [...lines, line];
}
