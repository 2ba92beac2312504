import type { ChildProcess } from 'node:child_process';
import { beforeAll, describe, expect, it } from 'vitest';
import { requireBuilt } from '../support/built.js';
import { ended, makeWorkplace, type Ran, type Workplace } from '../support/railfit.js';

let place: Workplace;

beforeAll(async () => {
  requireBuilt();
  place = makeWorkplace();
  await place.run(['import', 'approved.csv']);
  return () => { place.remove(); };
});

/** Ctrl-C while the command waits for the rest of its input. More than a pipe holds was taken, so it is reading. */
async function interrupted(child: ChildProcess, text: string): Promise<Ran> {
  await new Promise<void>((resolve) => child.stdin?.write(text.padEnd(300_000, '\n'), () => { resolve(); }));
  const out: Buffer[] = [];
  child.stdout?.on('data', (piece: Buffer) => out.push(piece));
  const closed = new Promise<number | null>((resolve) => child.on('close', resolve));
  child.kill('SIGINT');
  return { exit: await closed, stdout: Buffer.concat(out).toString('utf8'), stderr: '' };
}

// A signal cannot be sent to a process of Windows.
describe.skipIf(process.platform === 'win32')('Ctrl-C', () => {
  it('ends a command that waits for its stage, exit 130', async () => {
    expect(await interrupted(place.start(['demands', '-']), 'topology: follower\n')).toMatchObject({ exit: 130, stdout: '' });
  });

  it('ends an import and leaves the list that was in force', async () => {
    const before = await ended(place.start(['parts', '--csv']));
    expect(await interrupted(place.start(['import', '-']), 'id,status\nA,approved\n')).toMatchObject({ exit: 130, stdout: '' });
    expect(await ended(place.start(['parts', '--csv']))).toEqual(before);
  });
});
