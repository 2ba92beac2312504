import { fork } from 'node:child_process';
import { parseArgs } from 'node:util';
import { draw } from './draw.js';
import { disagreements, report, told, type Told } from './report.js';
import { confirm } from './simulate.js';

/** `npm run simulate -- --seed 1 -n 2000`, or `--only 17 --full` for one of them again. Leaves with 1 when anything disagrees. */
const { values } = parseArgs({
  options: {
    seed: { type: 'string', default: '1' },
    number: { type: 'string', short: 'n', default: '200' },
    from: { type: 'string', default: '0' },
    only: { type: 'string' },
    full: { type: 'boolean', default: false },
  },
});

/** The simulator keeps memory of every run and its process ends at a few thousand: a fresh one for every so many verdicts. */
const SLICE = 150;
const AT_A_TIME = 2;

const seed = whole(values.seed, '--seed');
const first = whole(values.only ?? values.from, values.only === undefined ? '--from' : '--only');
const count = values.only === undefined ? whole(values.number, '-n') : 1;

if (process.send === undefined) await lead();
else {
  // Without the one that leads there is nobody to tell.
  process.once('disconnect', () => process.exit());
  process.send(await confirmed(), () => process.disconnect());
}

function whole(text: string, option: string): number {
  const value = Number(text);
  if (!Number.isInteger(value) || value < 0) throw new RangeError(`${option} wants a whole number, not ${text}`);
  return value;
}

/** A process of its own for each slice; the answers stay in order. */
async function lead(): Promise<void> {
  const starts = Array.from({ length: Math.ceil(count / SLICE) }, (_, k) => first + k * SLICE);
  const slices: Told[][] = [];
  const next = async (): Promise<void> => {
    for (let at = starts.shift(); at !== undefined; at = starts.shift()) {
      slices[(at - first) / SLICE] = await slice(at, Math.min(SLICE, first + count - at));
      const done = slices.flat();
      process.stderr.write(`${done.length} of ${count}, ${disagreements(done).length} disagreements\n`);
    }
  };
  await Promise.all(Array.from({ length: AT_A_TIME }, next));
  const all = slices.flat();
  process.stdout.write(`Seed ${seed}, ${all.length} verdicts.\n\n${report(all, values.full)}\n`);
  process.exitCode = disagreements(all).length > 0 ? 1 : 0;
}

function slice(from: number, length: number): Promise<Told[]> {
  return new Promise((resolve, reject) => {
    const child = fork(process.argv[1]!, ['--seed', `${seed}`, '--from', `${from}`, '-n', `${length}`]);
    child.once('message', (message) => resolve(message as Told[]));
    child.once('exit', (code) => reject(new Error(`verdicts ${from} to ${from + length - 1} ended with ${code}`)));
  });
}

async function confirmed(): Promise<Told[]> {
  const found: Told[] = [];
  for (let number = first; number < first + count; number += 1) {
    try {
      found.push(told(await confirm(draw(seed, number))));
    } catch (cause) {
      throw new Error(`seed ${seed}, number ${number}`, { cause });
    }
  }
  return found;
}
