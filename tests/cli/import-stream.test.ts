import { appendFileSync, readFileSync, truncateSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { EXIT } from '../../src/cli/exit-code.js';
import { openListFile } from '../../src/cli/list-file.js';
import { writeLongList } from '../support/long-list.js';
import { ended, makeWorkplace, type Ran, type Workplace } from '../support/railfit.js';

const PARTS = 3000;

async function inPlace(work: (place: Workplace) => Promise<void>): Promise<void> {
  const place = makeWorkplace();
  try {
    await work(place);
  } finally {
    place.remove();
  }
}

/** The same file read row by row, and as a whole because its delimiter is named. */
async function bothWays(place: Workplace, file: string): Promise<[Ran, Ran]> {
  const words = ['import', file, '--json', '--accept', 'removed', '--accept', 'scaled'];
  return [await place.run([...words, '--catalog', 'a.sqlite']), await place.run([...words, '--delimiter', ',', '--catalog', 'b.sqlite'])];
}

describe('a canonical list read row by row', () => {
  it('is told as it is when read as a whole: imported, the next one, the same again, refused', async () => {
    await inPlace(async (place) => {
      const path = (name: string): string => join(place.folder, name);
      writeLongList(path('old.csv'), 200);
      writeLongList(path('next.csv'), 150, 3);
      const [header = '', ...rows] = readFileSync(path('old.csv'), 'utf8').trimEnd().split('\r\n');
      const wider = [`${header},bin`, ...rows.map((row, at) => `${row},${at % 3}`)];
      writeFileSync(path('wider.csv'), wider.join('\r\n'));
      writeFileSync(path('bad.csv'), [`\ufeff${wider[0] ?? ''}`, ...wider.slice(1).map((row, at) => (at % 5 === 0 ? row.replace(/,/u, ',nonsense,').replace(/,[^,]*$/u, '') : row))].join('\n'));
      const exits: (number | null)[] = [];
      for (const file of ['old.csv', 'next.csv', 'next.csv', 'wider.csv', 'bad.csv']) {
        const [one, other] = await bothWays(place, file);
        expect(one.stdout).toBe(other.stdout);
        expect(one.exit).toBe(other.exit);
        exits.push(one.exit);
      }
      expect(exits).toEqual([EXIT.yes, EXIT.yes, EXIT.yes, EXIT.yes, EXIT.data]);
    });
  });

  it('two at once both come in, one after the other', async () => {
    await inPlace(async (place) => {
      writeLongList(join(place.folder, 'list.csv'), PARTS);
      await place.run(['parts']);
      const both = await Promise.all([place.run(['import', 'list.csv', '--json']), place.run(['import', 'list.csv', '--json'])]);
      const outcomes = both.map(({ stdout }) => (JSON.parse(stdout) as { outcome: string }).outcome);
      expect(outcomes.sort()).toEqual(['imported', 'no-change']);
    });
  });

  it('comes in while shortlists read, which answer from the list before or the one after', async () => {
    await inPlace(async (place) => {
      writeLongList(join(place.folder, 'list.csv'), PARTS);
      await place.run(['parts']);
      const importing = ended(place.start(['import', 'list.csv', '--json']));
      const answers = await Promise.all([1, 2, 3].map(() => place.run(['shortlist', 'soil-moisture-probe.yaml', '--json'])));
      expect((await importing).exit).toBe(EXIT.yes);
      for (const { exit, stderr } of answers) expect([exit, stderr]).toEqual([EXIT.yes, '']);
    });
  });

  it('a text over the limit is refused by its size, in either reading', async () => {
    await inPlace(async (place) => {
      const file = join(place.folder, 'large.csv');
      writeFileSync(file, 'id,x\n');
      truncateSync(file, 3 * 2 ** 30);
      for (const words of [['import', 'large.csv'], ['import', 'large.csv', '--large'], ['import', 'large.csv', '--patch']]) {
        const { exit, stderr } = await place.run(words);
        expect(exit).toBe(EXIT.data);
        expect(stderr).toContain('error[I105]: the file has 3221225472 bytes, the limit is');
      }
    });
  });

  it('a file that changes while it is read is refused as one that cannot be read', async () => {
    await inPlace(async (place) => {
      const file = join(place.folder, 'list.csv');
      writeFileSync(file, 'id,x\n'.repeat(100_000));
      const opened = await openListFile(file);
      const read = opened.source.chunks()[Symbol.iterator]();
      read.next();
      appendFileSync(file, 'more');
      const refusal = { problems: [{ code: 'E502', severity: 'error', message: `${file}: was changed while it was read`, fix: 'run the command again when nobody is writing it', place: { path: file } }], exit: EXIT.surroundings, summary: 'Nothing was imported. (exit 5)' };
      expect(() => read.next()).toThrow(expect.objectContaining({ ...refusal, summary: expect.stringContaining('Nothing was imported.') as string }));
      expect(() => opened.bytes()).toThrow(expect.objectContaining({ problems: refusal.problems }));
      opened.close();
      expect(() => [...opened.source.chunks()]).toThrow(expect.objectContaining({ problems: [expect.objectContaining({ code: 'E502', message: `${file}: cannot be read (EBADF)` })] }));
    });
  });
});
