/** They integrate, march or search. */
const DEAR: ReadonlySet<string> = new Set(['phase-margin', 'noise', 'distortion', 'settling', 'frequency-error']);
/** They go through corners or add up terms. */
const LONG: ReadonlySet<string> = new Set(['output-low', 'output-high', 'output-current', 'dc-error', 'slew-rate', 'stable-gain', 'junction-temperature']);

/** How long one judgement of a check takes, as a rank: the cheap ones are asked first where one failure settles the part. */
export function costOf(check: string | undefined): number {
  if (check === undefined) return 0;
  return DEAR.has(check) ? 2 : LONG.has(check) ? 1 : 0;
}
