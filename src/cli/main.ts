import { runCommandLine } from './run.js';

// A reader that has seen enough closes the pipe: that is its right, not an error.
for (const stream of [process.stdout, process.stderr]) {
  stream.on('error', (error: NodeJS.ErrnoException) => {
    if (error.code !== 'EPIPE') throw error;
  });
}
process.on('SIGINT', () => {
  process.exit(130);
});

process.exitCode = await runCommandLine(process.argv.slice(2), {
  env: process.env,
  stdout: { isTTY: process.stdout.isTTY, columns: process.stdout.columns },
  stderr: { isTTY: process.stderr.isTTY, columns: process.stderr.columns },
  write: (stream, text) => void process[stream].write(text),
});
