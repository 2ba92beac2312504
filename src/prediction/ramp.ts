import { limitsOf } from './limits-of.js';
import { walk } from './march.js';
import type { Run, Wave } from './run.js';
import { resampled } from './step.js';
import { zeros } from './dense.js';

/** An integrator from its reset: s of the window, V of the steady signal about the reference, V where it starts; s of R·C of the bleed resistor (Infinity: none). */
export interface Ramp {
  readonly window: number;
  readonly input: number;
  readonly reference: number;
  readonly rate: number;
  readonly bleed: number;
}

const POINTS = 1024;

/** The output from the reset to the end of the window, the signal at its end value all along. */
export function rampRun(run: Run, { window, input, reference, rate, bleed }: Ramp): Wave {
  const { linear, around, amplifier, corner } = run;
  const speed = 2 * Math.PI * (amplifier.gainBandwidth ?? 0) * around.restored;
  const leaking = amplifier.openLoopGain === Infinity ? 0 : linear.leak * around.restored * (corner.supply / 2 - reference);
  const going = walk(linear, {
    source: { omega: 0, weights: [0, 0, input], start: [0, 0], offset: speed * Math.sign(run.shift) * amplifier.offset, leaking },
    limits: limitsOf(run, reference),
    states: zeros(linear.order),
    steps: { linear: window / POINTS, slewing: window / POINTS, held: window / POINTS },
  });
  const times = [0];
  const output = [reference];
  const spent = { clipped: 0, slewing: 0 };
  let place = going.start;
  while (place.time < window) {
    const next = going.next(place);
    const span = Math.min(window, next.time) - place.time;
    if (place.mode === 'high' || place.mode === 'low') spent.clipped += span;
    if (place.mode === 'up' || place.mode === 'down') spent.slewing += span;
    times.push(next.time);
    output.push(reference + going.output(next));
    place = next;
  }
  const t = Array.from({ length: POINTS + 1 }, (_, at) => (at * window) / POINTS);
  const ideal = t.map((time) => reference + rate * (Number.isFinite(bleed) ? -bleed * Math.expm1(-time / bleed) : time));
  return { t, ideal, output: resampled(times, output, t), clipped: spent.clipped / window, slewing: spent.slewing / window };
}
