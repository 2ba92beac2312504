/**
 * Runs a long synchronous piece of work so that Ctrl-C ends the process at once. A handler written in JavaScript would wait for
 * the work to end first, and an import would then have been written; without one the system ends the process as it does any
 * other, which a shell shows as exit 130. What SQLite has begun and not committed is taken back by the next who opens the file.
 * A Ctrl-C that came just before is answered first: without a handler it would be lost.
 */
export async function interruptible<Result>(work: () => Result): Promise<Result> {
  await new Promise((resolve) => setImmediate(resolve));
  const handlers = process.listeners('SIGINT');
  process.removeAllListeners('SIGINT');
  try {
    return work();
  } finally {
    for (const handler of handlers) process.on('SIGINT', handler);
  }
}
