import type { Advice, Change, Changes } from '../explanation/index.js';
import type { Explanation } from '../report.js';
import { amount } from './amounts.js';
import { changeOptions, fieldWords, moveText } from './change-words.js';
import { commandLines, commandOf } from './commands.js';
import { paragraph } from './layout.js';
import type { CommandContext, Style } from './style.js';
import { checkWords, counted } from './words.js';

/** What would let one part in, each as a command that pastes back; why not, where nothing does; and what was left as it is. */
export function changesLines(explanation: Explanation, style: Style, context: CommandContext): string[] {
  const { changes, judged } = explanation;
  if (changes === null) return [];
  const { options } = changes;
  // What is missing is told under "What to do"; no change of the stage stands in for it.
  if (judged.outcome === 'undecided' && options.length === 0) return [];
  if (options.length === 0) return [...paragraph(noneText(changes), style), ...beyondLines(changes, style), ...adviceLines(changes, style), ...keptLines(changes, style)];
  const title = `What would let it in (${options.length === 1 ? 'judged' : 'each judged'} again in full, all ${counted(judged.verdicts.length, 'check')}):`;
  return [
    ...paragraph(title, style),
    ...options.flatMap((option, at) => [
      ...optionLines(option, `  ${at + 1}  `, style),
      ...changeCommand(option, { command: ['explain', judged.part.id], context }, style),
    ]),
    ...severalLines(changes, style),
    ...adviceLines(changes, style),
    ...keptLines(changes, style),
  ];
}

/** The command that makes a change: what it moves takes the place of what the answer was asked with. */
export function changeCommand(change: Pick<Change, 'moves'>, { command, context }: { readonly command: readonly string[]; readonly context: CommandContext }, style: Style): string[] {
  const changes = withoutMoved(context.changes ?? [], change.moves.map(({ path }) => path));
  const words = commandOf({ ...context, changes }, command, changeOptions(change));
  return commandLines(withOptionsHeld(words), style, ' '.repeat(7));
}

/** Options of the command line that stand for a field by another name. */
const NAMED: Readonly<Record<string, string>> = { '--input': 'signal.input', '--frequency': 'signal.frequency' };

function withoutMoved(options: readonly string[], paths: readonly string[]): string[] {
  const fieldOf = (option: string, value: string): string => (option === '--set' ? value.slice(0, value.indexOf('=')).trim() : (NAMED[option] ?? option.slice(2)));
  return options.flatMap((option, at) => {
    const isValue = options[at - 1]?.startsWith('--') === true && !ALONE.has(options[at - 1] ?? '');
    const [name, value] = isValue ? [options[at - 1] ?? '', option] : [option, options[at + 1] ?? ''];
    return ALONE.has(name) || !paths.includes(fieldOf(name, value)) ? [option] : [];
  });
}

/** Options that take no value. */
const ALONE: ReadonlySet<string> = new Set(['--strict']);

/** `--set` and what it sets on one line. */
function withOptionsHeld(words: readonly string[]): string[] {
  return words.reduce<string[]>((held, word) => (held.at(-1) === '--set' ? [...held.slice(0, -1), `--set ${word}`] : [...held, word]), []);
}

/** The moves of one change, one under the other. */
export function optionLines({ moves, design }: Change, lead: string, style: Style): string[] {
  const blank = ' '.repeat(lead.length);
  const lines = moves.map((move, at) => (at === 0 ? moveText(move) : `and ${moveText(move)}`));
  const first = design === null ? [] : [design];
  return [...first, ...lines].flatMap((line, at) => paragraph(line, style, { lead: at === 0 ? lead : blank, indent: lead.length + 2 }));
}

function noneText({ stuck, movable }: Changes): string {
  if (movable.length === 0) return 'What would let it in: nothing in this stage may move.';
  if (stuck.length === 0) return 'What would let it in: no change of up to three inputs that may move does.';
  const checks = stuck.map(checkWords);
  const list = checks.length === 1 ? (checks[0] ?? '') : `${checks.slice(0, -1).join(', ')} and ${checks.at(-1) ?? ''}`;
  return `What would let it in: nothing that may move. No input that may move brings ${list} round.`;
}

/** What would do, of the inputs that are kept fixed: told, not proposed. */
function beyondLines({ beyond }: Changes, style: Style): string[] {
  return beyond.flatMap(({ moves, design }, at) => {
    const words = [...(design === null ? [] : [design]), ...moves.map(moveText)].join(', and ');
    return paragraph(`${at === 0 ? 'With what is kept fixed it would' : 'or'}: ${words}.`, style, { lead: '  ', indent: 4 });
  });
}

/** Ways that no field of the stage stands for, and how far they were looked at. */
function adviceLines({ advice }: Changes, style: Style): string[] {
  return advice.flatMap((one) => paragraph(adviceText(one), style, { lead: '  or ', indent: 5 }));
}

function adviceText(advice: Advice): string {
  if (advice.kind === 'calibrate') {
    const { left, allowed, moves } = advice;
    const also = moves.length === 0 ? '' : `, and ${moves.map(moveText).join(', and ')}`;
    return `calibrate the offset once at 25 °C: the DC error falls to ${amount(left, 'V', { round: 'up' })} of ${amount(allowed, 'V')}, its drift still counted${also}. Computed without the offset term, all other checks in full.`;
  }
  const { gain, gainError, dcErrors } = advice;
  const dc = dcErrors === null ? '' : ` and DC error ≤ ${amount(dcErrors[0], 'V')} at the first, ${amount(dcErrors[1], 'V')} at the second output`;
  return `split the gain over two stages of ${amount(gain, '1')}, each with gain error ≤ ${amount(100 * gainError, '%')}${dc}: this part was judged in full in both; two amplifiers draw twice the current, and resistor tolerances count twice.`;
}

/** Checks that ask different inputs need as many changes. */
function severalLines({ options, notPassing }: Changes, style: Style): string[] {
  if (options.some(({ moves }) => moves.length === 1)) return [];
  const what = notPassing.length === 1 ? 'the check depends on several inputs' : `the ${notPassing.length} checks that do not pass depend on different inputs`;
  return paragraph(`One change alone is never enough: ${what}.`, style, { lead: '  ' });
}

/** Groups of inputs a designer thinks of, and the fields they hold. */
const GROUPS: readonly (readonly [string, readonly string[]])[] = [
  ['supply', ['supply', 'supplyPeak']],
  ['signal', ['signal', 'gain', 'filter', 'oscillator', 'shunt', 'photodiode', 'legs', 'integrator']],
  ['load', ['load']],
  ['temperature', ['temperature']],
  ['approval', ['wishes.status', 'wishes.lifecycle', 'wishes.qualification']],
];

function keptLines({ options, movable, untried }: Changes, style: Style): string[] {
  // An isolation resistor is a part of the circuit: the load stays what it is.
  const moved = [...movable, ...options.flatMap(({ moves }) => moves.map(({ path }) => path))].filter((path) => path !== 'load.isolation');
  const within = (path: string, fields: readonly string[]): boolean => fields.some((field) => path === field || path.startsWith(`${field}.`));
  const kept = GROUPS.filter(([, fields]) => !moved.some((path) => within(path, fields))).map(([name]) => name);
  const fixed = kept.length === 0 ? '' : `Kept fixed: ${kept.join(', ')}. `;
  const tried = untried.length === 0 ? '' : ` Named there and not tried: ${untried.map(fieldWords).join(', ')}.`;
  return paragraph(`${fixed}mayChange in the stage names what may move.${tried}`, style, { lead: '  ' });
}
