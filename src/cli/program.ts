import { Command, CommanderError, Option } from 'commander';
import type { CheckOptions } from './check.js';
import type { DraftOptions } from './draft.js';
import type { ExplainOptions } from './explain.js';
import type { ImportCommandOptions } from './import.js';
import type { PartsOptions } from './parts.js';
import type { CommonOptions, Outcome, Session } from './session.js';
import type { ShortlistOptions } from './shortlist.js';
import type { ReportOptions } from './report.js';
import type { StageOptions } from './stage-input.js';
import type { PredictOptions } from './predict.js';
import type { StagesOptions } from './stages.js';
import type { SweepOptions } from './sweep.js';
import { collect, judged, judging, ordered, staging, steps } from './command-options.js';
import { GUARD_WORDS, guardWord } from './guard-words.js';
import { onlyOperands, operandsOf } from './operands.js';
import { withReadingOptions } from './reading-options.js';
import { VERSION } from './version.js';

/** Commands load their rooms only when they run: start-up stays short. */
export type Deliver = (outcome: Outcome) => void;

/** The command line: every command, every option, one line of help each. */
export function makeProgram(session: Session, deliver: Deliver): Command {
  const program = quiet(new Command('railfit'));
  program
    .description('Ranks operational amplifiers for one single-supply stage, proves each verdict with worst-case numbers, and explains every rejection.')
    .version(VERSION, '-V, --version', 'tool and rules version')
    .helpCommand(false)
    // So that -- reaches the command it belongs to.
    .enablePositionalOptions()
    .addHelpText('after', AFTER);

  judging(add(program, 'shortlist [STAGE]', 'derive, judge the whole catalog, rank, explain'))
    .option('--csv', 'the list as a table')
    .option('--lookups', 'what to look up so that undecided parts are decided, most worth first')
    .option('-o, --output <FILE>', 'with --lookups: a new sheet to fill in, taken back by import --patch')
    .option('--force', 'with -o: write over an existing file')
    .action(async (...received) => {
      const { command, options } = lastOf<ShortlistOptions>(received);
      const { operands, problems } = operandsOf(command, 1);
      deliver(await (await import('./shortlist.js')).runShortlist(session, operands[0], { ...options, already: problems }));
    });
  judging(add(program, 'explain [PART] [STAGE]', 'every check of one part on this stage'))
    .option('--formulas', 'the relation, numbers and source of each check')
    .option('--against <ID>', 'this part side by side with that one')
    .action(async (...received) => {
      const { command, options } = lastOf<ExplainOptions>(received);
      const { operands, problems } = operandsOf(command, 2);
      const wanted = { part: operands[0], stage: operands[1] };
      deliver(await (await import('./explain.js')).runExplain(session, wanted, { ...options, already: problems }));
    });
  judged(staging(add(program, 'predict [PART] [STAGE]', "the stage simulated with a part's own figures; judges nothing")))
    .option('--compare <PART>', 'a second part side by side')
    .option('--csv', 'the waveform as a table')
    .action(async (...received) => {
      const { command, options } = lastOf<PredictOptions>(received);
      const { operands, problems } = operandsOf(command, 2);
      const wanted = { part: operands[0], stage: operands[1] };
      deliver(await (await import('./predict.js')).runPredict(session, wanted, { ...options, already: problems }));
    });
  staging(add(program, 'demands [STAGE]', 'what the stage asks of any amplifier; looks at no part'))
    .action(async (...received) => {
      const { command, options } = lastOf<CommonOptions & StageOptions>(received);
      const { operands, problems } = operandsOf(command, 1);
      deliver(await (await import('./demands.js')).runDemands(session, operands[0], { ...options, already: problems }));
    });
  ordered(judged(staging(add(program, 'sweep [STAGE]', 'what a limit costs: how many parts fit, and which comes first, over the values of one field'))))
    .option('--over <PATH=A..B>', 'the field and its values: supply=2.7V..5.5V, gain, frequency, load, temperature, limits.dcError, ...', collect)
    .option('--steps <N>', 'how many values, both ends included (21)', steps)
    .option('--log', 'values in even ratios (the default over a decade or more)')
    .option('--linear', 'values in even steps')
    .option('--csv', 'the values and turns as a table')
    .action(async (...received) => {
      const { command, options } = lastOf<SweepOptions>(received);
      const { operands, problems } = operandsOf(command, 1);
      deliver(await (await import('./sweep.js')).runSweep(session, operands[0], { ...options, already: problems }));
    });
  add(program, 'draft [TOPOLOGY]', 'a commented stage file with every field, or guided entry with --ask')
    .option('--ask', 'ask on the terminal: each answer checked, demands shown; ends with the file and its shortlist')
    .option('--ac', 'an AC-coupled stage')
    .option('-o, --output <FILE>', 'a new file instead of stdout')
    .option('--force', 'write over an existing file')
    .action(async (...received) => {
      const { command, options } = lastOf<DraftOptions>(received);
      deliver(await (await import('./draft.js')).runDraft(session, onlyOperands(command, 1)[0], options));
    });
  add(program, 'parts [WORDS...]', 'list the catalog, or the parts whose id, class or description has every word')
    .addOption(new Option('--tier <TIER>', 'only this tier').choices(['approved', 'generic']))
    .option('--stage <STAGE>', 'a stage to judge them on')
    .option('--failing <CHECK>', 'only parts that fail this check on --stage')
    .option('--csv', 'canonical CSV, as import reads it (approved list unless --tier)')
    .option('--raw', 'with --csv: cells that start like a formula as they are, without an apostrophe in front')
    .action(async (...received) => {
      const { command, options } = lastOf<PartsOptions>(received);
      deliver(await (await import('./parts.js')).runParts(session, onlyOperands(command, Number.POSITIVE_INFINITY), options));
    });
  add(program, 'part [ID]', 'every figure of one part with kind, condition and origin')
    .option('--sources', 'file, hash, line, row and cell of each figure')
    .action(async (...received) => {
      const { command, options } = lastOf<CommonOptions>(received);
      deliver(await (await import('./part.js')).runPart(session, onlyOperands(command, 1)[0], options));
    });
  withReadingOptions(add(program, 'import [FILE]', "read the team's approved list, all or nothing"))
    .option('-n, --dry-run', 'the same report, nothing is written')
    .option('--patch', 'a filled look-up sheet: only its filled cells change the list in force')
    .option('--undo', 'return to the list before the last import')
    .option('--accept <WHAT>', `what a guard held back: ${GUARD_WORDS.join(', ')} (again for another)`, guardWord)
    .option('--errors <FILE>', 'one line per faulty cell, for the owner of the list')
    .action(async (...received) => {
      const { command, options } = lastOf<ImportCommandOptions>(received);
      deliver(await (await import('./import.js')).runImport(session, onlyOperands(command, 1)[0], options));
    });
  judged(add(program, 'check [STAGES...]', 'do the parts chosen for these stages still fit; without a stage, for every saved one'))
    .option('--part <ID>', 'this part instead of the chosen ones')
    .option('--junit <FILE>', 'the same as a JUnit file for a build server; - for stdout')
    .action(async (...received) => {
      const { command, options } = lastOf<CheckOptions>(received);
      const { operands, problems } = operandsOf(command, Number.POSITIVE_INFINITY);
      deliver(await (await import('./check.js')).runCheck(session, operands, { ...options, already: problems }));
    });
  add(program, 'stages [ACTION] [FILES...]', "the team's stage files: list, add FILE..., remove FILE...")
    .option('--part <ID>', 'with add: the part chosen for the stages')
    .option('--no-part', 'with add: no part is chosen any more')
    .action(async (...received) => {
      const { command, options } = lastOf<StagesOptions>(received);
      deliver(await (await import('./stages.js')).runStages(session, onlyOperands(command, Number.POSITIVE_INFINITY), options));
    });
  judging(add(program, 'report [STAGES...]', 'the design review of one stage or several: a page to look at, print and send'))
    .option('-o, --output <FILE>', 'a new file instead of stdout')
    .option('--force', 'write over an existing file')
    .addOption(new Option('--format <FORMAT>', 'html: one page; md: for a pull request; csv: every verdict').choices(['html', 'md', 'csv']))
    .option('--part <ID>', 'the chosen part, instead of the one kept with the stage or the first in order')
    .addOption(new Option('--symbols <RULES>', 'symbols of the schematic: IEC 60617 or IEEE 315').choices(['iec', 'ieee']))
    .option('--time <TIME>', 'when it was made, ISO 8601 with zone (else SOURCE_DATE_EPOCH, else the clock)')
    .action(async (...received) => {
      const { command, options } = lastOf<ReportOptions>(received);
      const { operands, problems } = operandsOf(command, Number.POSITIVE_INFINITY);
      deliver(await (await import('./report.js')).runReport(session, operands, { ...options, already: problems }));
    });
  add(program, 'verify [FILE]', 'judge a report again from what it carries, and tell what differs')
    .option('--all', 'every difference')
    .action(async (...received) => {
      const { command, options } = lastOf<CommonOptions>(received);
      deliver(await (await import('./verify.js')).runVerify(session, onlyOperands(command, 1)[0], options));
    });
  add(program, 'help [TOPIC]', 'long help: commands, stage, figures, checks, exit-codes, quantities, any message code')
    .action(async (...received) => {
      const { command, options } = lastOf<CommonOptions>(received);
      const asked = { topic: onlyOperands(command, 1)[0], overview: () => program.helpInformation(), commandHelp: (name: string) => helpOf(program, name) };
      deliver((await import('./help.js')).runHelp(session, asked, options));
    });
  return program;
}

/** Commander hands operands first, then options, then the command; operands are sorted by `operandsOf`. */
// eslint-disable-next-line @typescript-eslint/no-unnecessary-type-parameters -- commander does not type what it hands over; the caller declared it
function lastOf<Options>(received: readonly unknown[]): { command: Command; options: Options } {
  return { command: received.at(-1) as Command, options: received.at(-2) as Options };
}

function helpOf(program: Command, name: string): string | null {
  return program.commands.find((command) => command.name() === name)?.helpInformation() ?? null;
}

const AFTER = `
The chosen part's datasheet governs; prototypes are measured. Where failure can hurt someone
(medical, mains-connected, automotive, machinery), qualified review and the applicable codes decide.
Normal text may change between versions; scripts read --json.  Long help: railfit help TOPIC`;

function quiet(command: Command): Command {
  return command
    .exitOverride()
    .configureOutput({ writeErr: () => undefined, outputError: () => undefined })
    .allowUnknownOption()
    .allowExcessArguments();
}

/** `usage` is the name and the operands. */
function add(program: Command, usage: string, description: string): Command {
  const [name = '', ...operands] = usage.split(' ');
  const command = quiet(program.command(name));
  for (const operand of operands) command.argument(operand);
  return command
    .description(description)
    .option('--json', 'the answer as JSON (schemas ship with the package)')
    .addOption(new Option('--color <WHEN>', 'colour on a terminal').choices(['auto', 'always', 'never']).default('auto'))
    .option('--ascii', 'ASCII only: uV, ohm, nV/rtHz')
    .option('--catalog <FILE>', 'catalog file (else RAILFIT_CATALOG, else the user data folder)')
    .option('--debug', 'stack trace of an internal fault');
}

export { CommanderError };
