/** They integrate, march or search. */
const DEAR: ReadonlySet<string> = new Set(['phase-margin', 'noise', 'distortion', 'settling', 'frequency-error']);
/** They go through corners or add up terms. */
const LONG: ReadonlySet<string> = new Set(['output-low', 'output-high', 'output-current', 'slew-rate', 'stable-gain', 'junction-temperature']);
/** Words and ratings: few values in a list however long, so that hardly anything is judged for all its parts. */
const FEW: ReadonlySet<string> = new Set(['supply-low', 'supply-high', 'supply-peak', 'input-low', 'input-high', 'temperature-low', 'temperature-high', 'channels', 'package', 'qualification', 'status', 'lifecycle', 'phase-reversal']);

/** How much a check takes to sort out a list, as a rank: the cheap ones are asked first where one failure settles the part. */
export function costOf(check: string | undefined): number {
  if (check === undefined || FEW.has(check)) return 0;
  // Of all checks it turns most parts away for what it takes.
  if (check === 'supply-current') return 1;
  if (check === 'dc-error') return 3;
  return DEAR.has(check) ? 5 : LONG.has(check) ? 4 : 2;
}
