import { turningPoint } from './bisection.js';
import { divide, magnitude, multiply, type Complex } from './complex.js';
import { requireWithin } from './domain.js';
import type { LowPass } from './low-pass-response.js';
import { polesOf } from './poles.js';

interface Mode {
  readonly pole: Complex;
  /** Share of the error that decays with this pole. */
  readonly share: Complex;
}

/**
 * What a unit step still lacks after a time: 1 − y(t), y without its gain. Exact, from the poles.
 * @param response stable low-pass
 * @returns V/V as a function of the time in s
 * @example stepError({gain: 1, a: 1e-6, b: 0, c: 0})(1e-6) is 0.3679
 * Source: partial fractions, any text on linear systems.
 */
export function stepError(response: LowPass): (time: number) => number {
  const modes = modesOf(response);
  return (time) => sum(modes, time, ({ share }) => share);
}

/**
 * Time until a unit step stays within a tolerance, exact: the last crossing.
 * @param response low-pass
 * @param tolerance fraction of the step, above 0 and below 1
 * @returns s; Infinity when the loop is unstable
 * @example stepSettling({gain: 1, a: 1e-6, b: 0, c: 0}, 1e-3) is 6.908 µs
 * Source: as stepError(); searched backwards from where the envelope is within.
 */
export function stepSettling(response: LowPass, tolerance: number): number {
  requireWithin('stepSettling', { tolerance }, { above: 0, below: 1 });
  const modes = modesOf(response);
  if (modes.some(({ pole }) => pole.re >= 0)) return Infinity;
  const error = (time: number): number => Math.abs(sum(modes, time, ({ share }) => share));
  const end = envelopeEnd(modes, tolerance);
  const points = samples(modes, end);
  for (let k = points - 1; k >= 0; k -= 1) {
    const time = (end * k) / points;
    if (error(time) > tolerance) return turningPoint((at) => error(at) <= tolerance, { low: time, high: (end * (k + 1)) / points });
  }
  return 0;
}

/**
 * 10 % to 90 % time of a unit step: between its first crossings.
 * @param response stable low-pass
 * @returns s
 * @example stepRiseTime({gain: 1, a: 1e-6, b: 0, c: 0}) is 2.197 µs
 * Source: as stepError().
 */
export function stepRiseTime(response: LowPass): number {
  const modes = modesOf(response);
  const end = envelopeEnd(modes, 0.05);
  const points = samples(modes, end);
  const crossing = (level: number): number => {
    const reached = (time: number): boolean => 1 - sum(modes, time, ({ share }) => share) >= level;
    let k = 1;
    while (!reached((end * k) / points)) k += 1;
    return turningPoint(reached, { low: (end * (k - 1)) / points, high: (end * k) / points });
  };
  return crossing(0.9) - crossing(0.1);
}

/**
 * Steepest slope of a unit step.
 * @param response stable low-pass
 * @returns 1/s
 * @example stepPeakSlope({gain: 1, a: 1e-6, b: 0, c: 0}) is 1e6 1/s
 * Source: as stepError(), sampled and refined.
 */
export function stepPeakSlope(response: LowPass): number {
  const modes = modesOf(response);
  const slope = (time: number): number => -sum(modes, time, ({ share, pole }) => multiply(share, pole));
  const end = envelopeEnd(modes, 0.05);
  const step = end / samples(modes, end);
  let best = 0;
  for (let time = 0; time <= end; time += step) if (slope(time) > slope(best)) best = time;
  return highest(slope, Math.max(0, best - step), best + step);
}

/** Largest value of a function with one top, by golden sections. */
function highest(of: (x: number) => number, from: number, to: number): number {
  const golden = (Math.sqrt(5) - 1) / 2;
  let [low, high] = [from, to];
  for (let turn = 0; turn < 60; turn += 1) {
    const [left, right] = [high - golden * (high - low), low + golden * (high - low)];
    if (of(left) < of(right)) low = left;
    else high = right;
  }
  return Math.max(of(from), of((low + high) / 2), of(to));
}

/** Poles that coincide are moved apart by this share: the response changes by less, and no fraction has a zero below it. */
const APART = 1e-5;

function modesOf(response: LowPass): readonly Mode[] {
  const poles = polesOf(response).reduce<Complex[]>((all, pole) => [...all, apartFrom(all, pole)], []);
  return poles.map((pole, at) => ({ pole, share: shareOf(pole, poles.filter((_other, index) => index !== at)) }));
}

function apartFrom(others: readonly Complex[], pole: Complex): Complex {
  const near = others.filter((other) => Math.hypot(pole.re - other.re, pole.im - other.im) < APART * magnitude(pole));
  return near.length === 0 ? pole : { re: pole.re * (1 + 2 * near.length * APART), im: pole.im };
}

function shareOf(pole: Complex, others: readonly Complex[]): Complex {
  const product = others.reduce<Complex>((all, other) => {
    const ratio = divide(pole, other);
    return multiply(all, { re: 1 - ratio.re, im: -ratio.im });
  }, { re: 1, im: 0 });
  return divide({ re: 1, im: 0 }, product);
}

function sum(modes: readonly Mode[], time: number, weight: (mode: Mode) => Complex): number {
  return modes.reduce((total, mode) => {
    const { re, im } = weight(mode);
    const angle = mode.pole.im * time;
    return total + Math.exp(mode.pole.re * time) * (re * Math.cos(angle) - im * Math.sin(angle));
  }, 0);
}

/** A time after which no mode can bring the error out again. */
function envelopeEnd(modes: readonly Mode[], tolerance: number): number {
  return Math.max(...modes.map(({ pole, share }) => Math.log(Math.max(2, ((modes.length + 1) * magnitude(share)) / tolerance)) / -pole.re));
}

const PER_PERIOD = 40;
const LEAST = 400;
const MOST = 20_000;

function samples(modes: readonly Mode[], end: number): number {
  const fastest = Math.max(...modes.map(({ pole }) => Math.abs(pole.im)));
  return Math.round(Math.min(MOST, Math.max(LEAST, (PER_PERIOD * fastest * end) / (2 * Math.PI))));
}
