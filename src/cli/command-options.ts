import { InvalidArgumentError, Option, type Command } from 'commander';

/** An option that may be given again. */
export const collect = (value: string, all: readonly string[] = []): string[] => [...all, value];

/** Options that stand for fields of the stage file. */
export function staging(command: Command): Command {
  return command
    .option('--topology <NAME>', 'non-inverting, summing, ...: railfit help stage lists all')
    .option('--supply <SUPPLY>', '"3.0..4.2 V", "5 V ± 5 %"')
    .option('--gain <GAIN>', 'V/V or dB')
    .option('--reference <REFERENCE>', 'ground, mid-supply, or a voltage')
    .option('--input <RANGE>', 'signal.input: "25 mV..330 mV"')
    .option('--frequency <FREQUENCY>', 'signal.frequency: "2 kHz"')
    .option('--load <LOAD>', '"10 kΩ to ground, 100 pF"')
    .option('--temperature <RANGE>', '-40..85C')
    .option('--set <PATH=VALUE>', 'any other field: --set limits.dcError="20 mV"', collect);
}

/** Options of every command that judges parts. */
export function judged(command: Command): Command {
  return command
    .option('--strict', 'only limits count: every other figure counts as missing')
    .option('--sources', 'where each figure comes from')
    .option('--assume <PART.figure=VALUE>', 'a figure for this run only (or =class), carried into the output', collect);
}

/** Options of the commands that list or explain judged parts. */
export function judging(command: Command): Command {
  const staged = staging(command)
    .option('--top <N>', 'how many parts to show (20)', count)
    .option('--all', 'rejected parts too, and passing checks in full');
  return ordered(judged(staged));
}

/** What is asked for first among what fits. */
export function ordered(command: Command): Command {
  return command.addOption(new Option('--order <BY>', 'order of what fits').choices(['merit', 'price', 'current', 'margin']).default('merit'));
}

/** A thousand values are a long table already. */
export function steps(text: string): number {
  if (!/^[1-9]\d{0,3}$/u.test(text) || Number(text) < 2 || Number(text) > 1000) throw new InvalidArgumentError('a whole number of values from 2 to 1000 is expected, such as 21');
  return Number(text);
}

function count(text: string): number {
  if (!/^[1-9]\d{0,6}$/u.test(text)) throw new InvalidArgumentError('a whole number of parts is expected, such as 20');
  return Number(text);
}
