/** They integrate, march or search. */
const DEAR: ReadonlySet<string> = new Set(['phase-margin', 'noise', 'distortion', 'settling', 'frequency-error']);
/** They go through corners or add up terms. */
const LONG: ReadonlySet<string> = new Set(['output-low', 'output-high', 'output-current', 'slew-rate', 'stable-gain', 'junction-temperature']);
/** Words and ratings: few values in a list however long, so that hardly anything is judged for all its parts. */
const FEW: ReadonlySet<string> = new Set(['supply-low', 'supply-high', 'supply-peak', 'input-low', 'input-high', 'temperature-low', 'temperature-high', 'channels', 'package', 'qualification', 'status', 'lifecycle', 'phase-reversal']);

/** The first to be asked: what turns most parts away for what it takes. */
const FIRST: readonly string[] = ['status', 'supply-low', 'supply-current'];

/** How much a check takes to sort out a list, as a rank: the cheap ones are asked first where one failure settles the part. */
export function costOf(check: string | undefined): number {
  if (check === undefined) return 0;
  const first = FIRST.indexOf(check);
  if (first >= 0) return first - FIRST.length;
  if (FEW.has(check)) return 0;
  if (check === 'dc-error') return 2;
  return DEAR.has(check) ? 4 : LONG.has(check) ? 3 : 1;
}
