import { CommanderError } from 'commander';
import { EXIT } from './exit-code.js';
import { makeProgram } from './program.js';
import type { Session } from './session.js';

/** The process as the command line sees it. */
export interface Process extends Omit<Session, 'tell'> {
  write(stream: 'stdout' | 'stderr', text: string): void;
}

/** Runs one command line and answers its exit code; never ends the process, so that what was written is delivered. */
export async function runCommandLine(argv: readonly string[], world: Process): Promise<number> {
  const session: Session = { ...world, tell: (line) => world.write('stderr', `${line}\n`) };
  let exit: number = EXIT.yes;
  const program = makeProgram(session, (outcome) => {
    if (outcome.talk !== undefined) world.write('stderr', outcome.talk);
    world.write('stdout', outcome.text);
    exit = outcome.exit;
  });
  if (argv.length === 0) {
    world.write('stdout', program.helpInformation());
    return EXIT.yes;
  }
  try {
    await program.parseAsync([...argv], { from: 'user' });
    return exit;
  } catch (error) {
    // Help and version have been written by then and are an answer: nothing more is loaded for them.
    if (error instanceof CommanderError && error.exitCode === 0) return EXIT.yes;
    const { answerFor } = await import('./refusal.js');
    return answerFor(error, { argv, session, world, names: program.commands.map((command) => command.name()) });
  }
}
