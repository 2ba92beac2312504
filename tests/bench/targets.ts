import { spreadOf, type Run } from './timing.js';

/** One line of the answer: a target and the figure beside it. */
export interface Line {
  readonly id: string;
  readonly measure: string;
  readonly target: string;
  readonly figure: string;
  readonly met: boolean | null;
}

/** How the measures of review pages are named; the stage file follows. */
export const PAGE = 'page of ';

/** Runs by the name of what was run. */
export type Runs = ReadonlyMap<string, readonly Run[]>;

const median = (runs: Runs, name: string, told?: string): number => spreadOf((runs.get(name) ?? []).map((run) => (told === undefined ? run.milliseconds : (run.told[told] ?? Number.NaN)))).median;

/** A ratio of two medians against the most it may be. */
function ratio(id: string, measure: string, { over, under, most }: { over: number; under: number; most: number }): Line {
  const figure = over / under;
  if (Number.isNaN(figure)) return { id, measure, target: `<= ${most}`, figure: 'not measured here', met: null };
  return { id, measure, target: `<= ${Number(most.toPrecision(3))}`, figure: `${Number(figure.toPrecision(3))} (${Math.round(over)} ms / ${Math.round(under)} ms)`, met: figure <= most };
}

/** A time of a whole process against the most it may be, s. */
function seconds(measure: string, milliseconds: number, most: number): Line {
  return { id: 'time', measure, target: `<= ${most} s`, figure: `${(milliseconds / 1000).toPrecision(3)} s`, met: milliseconds <= most * 1000 };
}

/** A ratio nobody set a target for. */
function beside(measure: string, over: number, under: number): Line {
  const figure = over / under;
  return { id: '-', measure, target: 'none', figure: Number.isNaN(figure) ? 'not measured here' : `${Number(figure.toPrecision(3))} (${Math.round(over)} ms / ${Math.round(under)} ms)`, met: null };
}

export function linesOf(runs: Runs, { large, middle, rows, same }: { large: number; middle: number; rows: number; same: boolean | null }): Line[] {
  const ms = (name: string, told?: string): number => median(runs, name, told);
  const memory = (name: string): number => ms(name, 'maxRSS') / 1024;
  const extra = memory('shortlist large') - memory('empty node');
  const start = ms('shortlist shipped');
  const pages = [...runs.keys()].filter((name) => name.startsWith(PAGE)).map((name) => ({ name, milliseconds: ms(name) })).sort((a, b) => b.milliseconds - a.milliseconds);
  return [
    ratio('S1', `shortlist, ${large} parts / sqlite3 shell COUNT10`, { over: ms('shortlist large'), under: ms('shell COUNT10 large'), most: 1.2 }),
    ratio('S2', `shortlist, ${middle} parts / node + better-sqlite3 COUNT10`, { over: ms('shortlist middle'), under: ms('node COUNT10 middle'), most: 1.5 }),
    ratio('S3', 'shortlist, shipped catalog / empty node', { over: start, under: ms('empty node'), most: 2 }),
    ratio('S4', `shortlist, ${large} parts / the job in the sqlite3 shell`, { over: ms('shortlist large'), under: ms('shell job large'), most: 1 / 12 }),
    beside(`shortlist, ${rows} parts / all of it but the phase margin as SQL in the shell, once`, ms('shortlist rows'), ms('shell whole job rows')),
    ratio('S5', `in the library, the same stage again, ${large} parts / COUNT10 in the process`, { over: ms('library large', 'again'), under: ms('library large', 'count'), most: 0.3 }),
    ratio('S6', `in the library, one limit changed, ${large} parts / COUNT10 in the process`, { over: ms('library large', 'changed'), under: ms('library large', 'count'), most: 0.04 }),
    ratio('S7', `import of ${middle} parts, canonical CSV / sqlite3 shell .import`, { over: ms('import middle'), under: ms('shell import middle'), most: 6 }),
    { id: 'S8', measure: `peak memory of shortlist, ${large} parts, above bare node`, target: '<= 80 MiB', figure: `${Math.round(extra)} MiB`, met: extra <= 80 },
    { id: 'S8', measure: `peak memory of the import, ${middle} parts`, target: '<= 300 MiB', figure: `${Math.round(memory('import middle'))} MiB`, met: memory('import middle') <= 300 },
    { id: 'S9', measure: 'the same bytes from dictionary and rows', target: 'always', figure: same === null ? 'not compared' : same ? 'yes' : 'NO', met: same },
    seconds('explain with all changes, shipped catalog', ms('explain shipped'), 0.3),
    seconds(`explain with all changes, ${middle} parts`, ms('explain middle'), 1),
    seconds('sweep of a limit, 100 values, shipped catalog', ms('sweep shipped'), 5),
    seconds(`sweep of a limit, 100 values, ${middle} parts, once`, ms('sweep middle'), 5),
    seconds(`review page of a shipped stage, written: the slowest, ${pages[0]?.name.slice(PAGE.length) ?? 'none'}`, pages[0]?.milliseconds ?? Number.NaN, 1),
    ratio('S10', `growth ${middle} to ${large} parts, start-up taken off`, { over: ms('shortlist large') - start, under: ms('shortlist middle') - start, most: 1.05 * (large / middle) }),
  ];
}

/** Every measure with its median and quarters, and how it compares with the command. Markdown. */
export function tableOf(runs: Runs): string {
  const own = median(runs, 'shortlist large');
  const rows = [...runs].map(([name, all]) => {
    const { median: middle, low, high } = spreadOf(all.map(({ milliseconds }) => milliseconds));
    return `| ${name} | ${middle.toFixed(0)} | ${low.toFixed(0)}..${high.toFixed(0)} | ${(middle / own).toPrecision(2)} |`;
  });
  const inside = ['first', 'again', 'changed', 'count'].map((told) => `| library large: ${told} | ${median(runs, 'library large', told).toFixed(1)} | | |`);
  return ['| what ran | median, ms | quarters, ms | of shortlist large |', '| --- | --- | --- | --- |', ...rows, ...inside].join('\n');
}

export function targetTable(lines: readonly Line[]): string {
  const words = (met: boolean | null): string => (met === null ? '-' : met ? 'met' : 'missed');
  return ['| id | measure | target | figure | |', '| --- | --- | --- | --- | --- |', ...lines.map((line) => `| ${line.id} | ${line.measure} | ${line.target} | ${line.figure} | ${words(line.met)} |`)].join('\n');
}
