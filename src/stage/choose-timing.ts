import { E24, E96 } from '../quantities/e-series.js';
import { bestChoice, ladder, neighbours, type Choice } from './preferred.js';

/** Timing resistor Ω and capacitor F. */
export interface Timing {
  readonly resistance: number;
  readonly capacitance: number;
}

/** Timing resistors are sized about this, Ω: small currents, yet far below what bias currents disturb. */
const AIM = 100e3;
const RESISTORS = ladder(E96, 10e3, 1e6);
/** From 1 nF on strays of some pF do not count; high frequencies take smaller ones. */
const CAPACITORS = [ladder(E24, 1e-9, 100e-6), ladder(E24, 100e-12, 1e-9)];
/** Where the ladder ends, the nearest value may be far off: that is no choice. */
const REACHED = 0.05;

/** E96 resistor of 10 kΩ..1 MΩ and E24 capacitor whose product is nearest a time constant (s); what is written already stays. Null when none is near. */
export function chooseTiming(timeConstant: number, written: Partial<Timing>): Timing | null {
  if (written.resistance !== undefined) return bestChoice(ofResistor(timeConstant, written.resistance), AIM);
  const ladders = written.capacitance === undefined ? CAPACITORS : [[written.capacitance]];
  for (const capacitors of ladders) {
    const best = bestChoice(ofCapacitors(timeConstant, capacitors), AIM);
    if (best !== null) return best;
  }
  return null;
}

function* ofCapacitors(timeConstant: number, capacitors: readonly number[]): Generator<Choice<Timing>> {
  for (const capacitance of capacitors) {
    for (const resistance of neighbours(RESISTORS, timeConstant / capacitance)) yield* choice(timeConstant, { resistance, capacitance });
  }
}

function* ofResistor(timeConstant: number, resistance: number): Generator<Choice<Timing>> {
  for (const capacitance of neighbours(ladder(E24, 100e-12, 100e-6), timeConstant / resistance)) yield* choice(timeConstant, { resistance, capacitance });
}

function* choice(timeConstant: number, parts: Timing): Generator<Choice<Timing>> {
  const error = Math.abs((parts.resistance * parts.capacitance) / timeConstant - 1);
  if (error <= REACHED) yield { parts, error, resistors: [parts.resistance] };
}
