/** One period of samples → fundamental amplitude and total harmonic distortion, by plain Fourier sums. */
export function harmonics(samples: readonly number[]): { readonly fundamental: number; readonly distortion: number } {
  const amplitude = (order: number): number => harmonic(samples, order);
  const fundamental = amplitude(1);
  const mean = samples.reduce((sum, v) => sum + v, 0) / samples.length;
  const meanSquare = samples.reduce((sum, v) => sum + (v - mean) ** 2, 0) / samples.length;
  return { fundamental, distortion: Math.sqrt(Math.max(0, (2 * meanSquare) / fundamental ** 2 - 1)) };
}

/** Amplitude of one harmonic of one period of samples. */
export function harmonic(samples: readonly number[], order: number): number {
  let re = 0;
  let im = 0;
  samples.forEach((value, k) => {
    const angle = (2 * Math.PI * order * k) / samples.length;
    re += value * Math.cos(angle);
    im += value * Math.sin(angle);
  });
  return (2 * Math.hypot(re, im)) / samples.length;
}

/** A unit sine followed with a slope of at most `ratio` per radian: the settled period, by stepping through time. */
export function slewLimitedSine(ratio: number, points: number): readonly number[] {
  const step = (2 * Math.PI) / points;
  let output = 0;
  let period: number[] = [];
  for (let turn = 0; turn < 12; turn += 1) {
    period = [];
    for (let k = 1; k <= points; k += 1) {
      const wanted = Math.sin(k * step);
      output += Math.max(-ratio * step, Math.min(ratio * step, wanted - output));
      period.push(output);
    }
  }
  return period;
}

/** One settled period of a follower dv/dt = SR·pair(vd), pair of unit slope at 0, driven by a sine so that it needs r of its slewing current. */
export function followerWithPair(pair: (vd: number) => number, gainBandwidthPerFrequency: number, r: number): readonly number[] {
  const points = 40_000;
  const perStep = (2 * Math.PI * gainBandwidthPerFrequency) / points;
  const input = (k: number): number => r * gainBandwidthPerFrequency * Math.sin((2 * Math.PI * k) / points);
  let output = 0;
  let period: number[] = [];
  for (let turn = 0; turn < 3; turn += 1) {
    period = [];
    for (let k = 0; k < points; k += 1) {
      const middle = output + (perStep / 2) * pair(input(k) - output);
      output += perStep * pair(input(k + 0.5) - middle);
      period.push(output);
    }
  }
  return period;
}

/** Time until a one-pole loop with a slew limit stays within a fraction of a step, by stepping through time (midpoint rule). */
export function steppedSettling(loop: {
  readonly step: number;
  readonly slewRate: number;
  readonly timeConstant: number;
  readonly tolerance: number;
}): number {
  const { step, slewRate, timeConstant, tolerance } = loop;
  const slope = (error: number): number => Math.max(-slewRate, Math.min(slewRate, error / timeConstant));
  const dt = timeConstant / 2000;
  let error = step;
  let time = 0;
  while (error > tolerance * step) {
    const middle = error - (dt / 2) * slope(error);
    error -= dt * slope(middle);
    time += dt;
  }
  return time;
}

/** Integral by Simpson's rule with `pieces` pairs of intervals. */
export function integral(f: (x: number) => number, [from, to]: readonly [number, number], pieces = 2000): number {
  const h = (to - from) / (2 * pieces);
  let sum = f(from) + f(to);
  for (let k = 1; k < 2 * pieces; k += 1) sum += (k % 2 === 1 ? 4 : 2) * f(from + k * h);
  return (sum * h) / 3;
}
