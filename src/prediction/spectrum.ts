import FFT from 'fft.js';

/** Of one settled period: amplitude of the fundamental in the unit of the samples, and all harmonics together as a share of it. */
export interface Spectrum {
  readonly fundamental: number;
  readonly distortion: number;
}

/** Whole periods only, so that no window is needed: every harmonic stands on a line of its own. The number of samples is a power of two. */
export function spectrumOf(samples: readonly number[]): Spectrum {
  const fft = new FFT(samples.length);
  const out = fft.createComplexArray();
  fft.realTransform(out, samples);
  const size = (line: number): number => (2 * Math.hypot(out[2 * line] ?? 0, out[2 * line + 1] ?? 0)) / samples.length;
  const fundamental = size(1);
  let harmonics = 0;
  for (let line = 2; line < samples.length / 2; line += 1) harmonics += size(line) ** 2;
  return { fundamental, distortion: fundamental === 0 ? 0 : Math.sqrt(harmonics) / fundamental };
}
