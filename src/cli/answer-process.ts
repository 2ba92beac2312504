import { EXIT } from './exit-code.js';
import type { Process } from './run.js';

/** Runs this process's command line and leaves its exit code, once everything written is delivered. */
export async function answerProcess(run: (argv: readonly string[], world: Process) => Promise<number>): Promise<void> {
  const answer = { unwritable: false };

  // A reader that has seen enough closes the pipe: that is its right, not an error.
  for (const stream of [process.stdout, process.stderr]) {
    stream.on('error', (error: NodeJS.ErrnoException) => {
      if (error.code === 'EPIPE') return;
      if (stream === process.stdout && !answer.unwritable) process.stderr.write(`error[E504]: the answer could not be written (${error.code ?? error.message}) (exit ${EXIT.surroundings})\n   fix: free some space, or write it elsewhere\n`);
      answer.unwritable = true;
      process.exitCode = EXIT.surroundings;
    });
  }
  process.on('SIGINT', () => {
    process.exit(EXIT.interrupted);
  });

  const exit = await run(process.argv.slice(2), {
    env: process.env,
    stdout: { isTTY: process.stdout.isTTY, columns: process.stdout.columns },
    stderr: { isTTY: process.stderr.isTTY, columns: process.stderr.columns },
    write: (stream, text) => void process[stream].write(text),
  });
  process.exitCode = answer.unwritable ? EXIT.surroundings : exit;
}
