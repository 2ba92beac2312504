import { formatQuantity } from '../quantities/format.js';
import type { TurningPoint } from '../verdicts/finding.js';
import { falsePosition, type Place } from './phase-margin-crossover.js';
import { atEitherEnd, type Ends, type Loop } from './phase-margin-loop.js';

/** Between nothing and more than any input has, F; of an open-loop output resistance, Ω. */
const INPUT: Bracket = [1e-15, 10e-9];
const OUTPUT: Bracket = [0.01, 1e6];

type Bracket = readonly [from: number, to: number];

/** A capacitance at the input that nobody stated is not counted: told at which value the margin (degrees) falls to the limit. */
export function unknownInput(loop: Loop, ends: Ends, required: number): string[] {
  const farad = fallsAt((stray) => atEitherEnd({ ...loop, stray }, ends) - required, INPUT);
  if (farad === null) return [];
  return [`input capacitance not known and not counted: at ${formatQuantity(farad, 'F', { round: 'down' })} the margin falls to ${formatQuantity(required, '°')}`];
}

/** The output resistance that takes the margin (degrees) of a loaded loop down to the limit; null where none in reach does. */
export function turningResistance(loop: Loop, ends: Ends, required: number): TurningPoint | null {
  const { load } = loop;
  if (load === null) return null;
  const ohms = fallsAt((outputResistance) => atEitherEnd({ ...loop, load: { ...load, outputResistance } }, ends) - required, OUTPUT);
  return ohms === null ? null : { figure: 'outputResistance', kind: 'typ', value: ohms, unit: 'Ω' };
}

/** Where what is left falls below zero, a hair to the good side. Null without such a place. */
function fallsAt(left: (value: number) => number, [from, to]: Bracket): number | null {
  const at = (position: number): number => left(Math.exp(position));
  const [good, bad] = [from, to].map((value) => ({ position: Math.log(value), left: left(value) })) as [Place, Place];
  if (good.left < 0 || bad.left >= 0) return null;
  return Math.exp(falsePosition(at, good, bad)) * (1 - HAIR);
}

const HAIR = 1e-7;
