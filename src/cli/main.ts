import { setFlagsFromString } from 'node:v8';
import { EXIT } from './exit-code.js';
import { lateOptimising } from './late-optimising.js';
import { runCommandLine } from './run.js';

const flag = lateOptimising(process.versions.v8);
if (flag !== null) setFlagsFromString(flag);

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

const exit = await runCommandLine(process.argv.slice(2), {
  env: process.env,
  stdout: { isTTY: process.stdout.isTTY, columns: process.stdout.columns },
  stderr: { isTTY: process.stderr.isTTY, columns: process.stderr.columns },
  write: (stream, text) => void process[stream].write(text),
});
process.exitCode = answer.unwritable ? EXIT.surroundings : exit;
