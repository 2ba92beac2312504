/** What stands for standard input where a file is expected, and what messages call it. */
export const STDIN = '-';
export const STDIN_NAME = 'standard input';

/** All of standard input. Not read synchronously: Ctrl-C must end a command that waits for it. */
export async function readStandardInput(): Promise<Buffer> {
  const chunks: Buffer[] = [];
  for await (const chunk of process.stdin) chunks.push(chunk as Buffer);
  return Buffer.concat(chunks);
}
