/** A trial: whether it passes, and by how much, positive when it does; null where no number tells. */
export interface Trial {
  readonly passes: boolean;
  readonly slack: number | null;
}

/** Where trials fail and where they pass; `width` of the last bracket as a share of the value. */
export interface Bracket {
  readonly no: number;
  readonly yes: number;
  readonly width?: number;
}

interface Aim {
  readonly halve: boolean;
  /** The end that moved last. */
  readonly last: 'fails' | 'passes';
  /** How far a guess is pushed towards the end that has not moved, so that the bracket closes from both sides. */
  readonly push: number;
}

interface End {
  readonly x: number;
  readonly slack: number | null;
}

/** Usual width of the last bracket: well inside the 1e-6 a boundary is promised to. */
const WIDTH = 2e-7;
const MOST = 70;

/**
 * Where trials turn from not passing (at `no`) to passing (at `yes`), on the passing side. Regula falsi on the slack, every third
 * step a halving, halving alone where no slack is told. Source: any text on numerical methods (bracketing, false position).
 */
export function turnBetween(tried: (x: number) => Trial, { no, yes, width = WIDTH }: Bracket): number {
  let fails: End = { x: no, slack: tried(no).slack };
  let passes: End = { x: yes, slack: tried(yes).slack };
  let last: 'fails' | 'passes' = 'passes';
  for (let step = 0; step < MOST && Math.abs(passes.x - fails.x) > width * Math.abs(passes.x); step++) {
    const x = guess(fails, passes, { halve: step % 3 === 2, last, push: width / 4 });
    const { passes: holds, slack } = tried(x);
    if (holds) passes = { x, slack };
    else fails = { x, slack };
    last = holds ? 'passes' : 'fails';
  }
  return passes.x;
}

function guess(fails: End, passes: End, { halve, last, push }: Aim): number {
  const middle = fails.x + (passes.x - fails.x) / 2;
  if (halve || fails.slack === null || passes.slack === null || !(fails.slack < 0) || !(passes.slack >= 0)) return middle;
  const crossing = fails.x + ((passes.x - fails.x) * fails.slack) / (fails.slack - passes.slack);
  const towards = last === 'passes' ? fails.x : passes.x;
  const pushed = crossing + Math.sign(towards - crossing) * push * Math.abs(passes.x);
  const inside = (pushed - fails.x) * (passes.x - pushed) > 0;
  return inside && Number.isFinite(pushed) ? pushed : middle;
}
