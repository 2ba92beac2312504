import type { Demands } from '../demands/index.js';
import type { Part } from '../parts/part.js';
import { readingsOf } from '../parts/readings.js';
import { rulesFor, type Judging } from '../screening/index.js';
import type { Stage } from '../stage/index.js';
import type { Curves } from './curves.js';
import { loopCurves } from './loop.js';
import { swingWindows } from './swing.js';

export type { Crossing, Curves, LoopCurves, OpenLoop, Rails, Span, SwingWindow } from './curves.js';

/** What a picture of this stage with this part shows, read with the same figures the verdicts stand on. */
export function curvesOf(run: Judging, stage: Stage, part: Part): Curves {
  const rules = rulesFor(run, part);
  const test = { part, ...rules, outlook: 'pessimistic' } as const;
  const demands: Demands = run.demands;
  const standing = { stage, demands, part, worst: readingsOf(test), best: readingsOf({ ...test, outlook: 'optimistic' }) };
  return { swing: swingWindows(standing), loop: loopCurves(standing, test) };
}
