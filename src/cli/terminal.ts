/** What a stream and the environment say about how to write. */
export interface StreamFacts {
  readonly isTTY: boolean;
  readonly columns: number | undefined;
}

export type Environment = Readonly<Record<string, string | undefined>>;
export type ColourWish = 'auto' | 'always' | 'never';

const LEAST = 40;
const MOST = 200;
const USUAL = 100;

/** Colour for one stream: `--color`, then NO_COLOR (present and not empty), then FORCE_COLOR, then a terminal that is not dumb. */
export function usesColour(wish: ColourWish, env: Environment, stream: StreamFacts): boolean {
  if (wish !== 'auto') return wish === 'always';
  if ((env['NO_COLOR'] ?? '') !== '') return false;
  const forced = env['FORCE_COLOR'];
  if (forced !== undefined && forced !== '') return forced !== '0' && forced !== 'false';
  return stream.isTTY && env['TERM'] !== 'dumb';
}

/** Columns of the terminal, else COLUMNS, else 100; never under 40 or over 200. */
export function widthOf(env: Environment, stream: StreamFacts): number {
  const told = /^\d+$/u.test(env['COLUMNS'] ?? '') ? Number(env['COLUMNS']) : undefined;
  return Math.min(MOST, Math.max(LEAST, stream.columns ?? told ?? USUAL));
}

/** From this width on the bars have room beside their names and numbers. */
const ROOM_FOR_BARS = 80;

/** Bars of one line: on a terminal of 80 columns or more that is not dumb; never in a pipe or a file. */
export function usesBars(env: Environment, stream: StreamFacts): boolean {
  return stream.isTTY && env['TERM'] !== 'dumb' && widthOf(env, stream) >= ROOM_FOR_BARS;
}

/** ASCII when asked, or when the locale names a character set that is not UTF-8; without any locale UTF-8 is taken. */
export function usesAscii(asked: boolean, env: Environment): boolean {
  if (asked) return true;
  const locale = env['LC_ALL'] || env['LC_CTYPE'] || env['LANG'];
  return locale !== undefined && locale !== '' && !/utf-?8/iu.test(locale);
}
