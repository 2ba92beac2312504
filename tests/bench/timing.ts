import { spawnSync } from 'node:child_process';

/** One run of something, ms, and what else it told of itself. */
export interface Run {
  readonly milliseconds: number;
  readonly told: Readonly<Record<string, number>>;
}

/** What is measured; null: it cannot be had here. */
export interface Measure {
  readonly name: string;
  run(): Run;
}

/** Middle and quarters of several runs. */
export interface Spread {
  readonly median: number;
  readonly low: number;
  readonly high: number;
}

/** Peak resident memory of a node process, told on stderr when it ends. */
export const TELLING = ['--import', 'data:text/javascript,process.on("exit",()=>process.stderr.write("\\nmaxRSS "+process.resourceUsage().maxRSS+"\\n"))'];

/** A whole process, start to end. Exit codes that are answers count as done. */
export function timed(command: string, words: readonly string[], input = ''): Run & { readonly output: string } {
  const from = process.hrtime.bigint();
  const { status, stdout, stderr, error } = spawnSync(command, [...words], { input, maxBuffer: 1 << 30, encoding: 'utf8' });
  const milliseconds = Number(process.hrtime.bigint() - from) / 1e6;
  if (error !== undefined || status === null || ![0, 1, 4].includes(status)) throw new Error(`${command} ${words.join(' ').slice(0, 200)}: exit ${status} ${stderr.slice(-400)}`);
  const told = Object.fromEntries([...stderr.matchAll(/^(\w+) ([\d.]+)$/gmu)].map(([, name = '', value]) => [name, Number(value)]));
  return { milliseconds, told, output: stdout };
}

/** All measures once, then all again: what else the machine does falls on each alike. */
export function interleaved(measures: readonly Measure[], runs: number, progress: (text: string) => void): Map<string, Run[]> {
  const found = new Map<string, Run[]>(measures.map(({ name }) => [name, []]));
  for (let run = 1; run <= runs; run += 1) {
    for (const { name, run: once } of measures) {
      progress(`run ${run} of ${runs}: ${name}`);
      found.get(name)?.push(once());
    }
  }
  return found;
}

export function spreadOf(values: readonly number[]): Spread {
  const sorted = [...values].sort((a, b) => a - b);
  const at = (share: number): number => sorted[Math.floor(share * sorted.length)] ?? Number.NaN;
  return { median: at(0.5), low: at(0.25), high: at(0.75) };
}
