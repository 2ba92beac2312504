import { divide, magnitude, multiply, subtract, type Complex } from '../formulas/complex.js';
import { DRIVE, HELD, type Around } from './circuit.js';
import type { NetworkStates } from './states.js';
import { dot, matrixOf, solveReal, steadyState, unitVector, zeros, type Matrix, type Vector } from './dense.js';

/** What of the amplifier closes the loop: Hz, Hz (Infinity: none), V/V. */
export interface LoopFigures {
  readonly gainBandwidth: number;
  readonly ownPole: number;
  readonly openLoopGain: number;
}

/** The closed loop within its limits: x' = rates·x + signal·u; the output and the slope the amplifier wants are rows of x and u. */
export interface LinearStage {
  /** States: those of the network, the integrating amplifier, what its own pole leaves of it. */
  readonly order: number;
  readonly rates: Matrix;
  readonly signal: Vector;
  /** Of the amplifier's integrator among the states; its slope is the one that is limited. */
  readonly integrator: number;
  readonly output: Row;
  /** V/s that its input stage gives it: this is what slews. What the finite gain leaks comes on top. */
  readonly given: Row;
  /** 1/s. */
  readonly leak: number;
}

/** Weights of the states and of the signal. */
export interface Row {
  readonly states: Vector;
  readonly signal: number;
}

/** The circuit with its amplifier as first-order equations: an integrator (GBW), its own second pole, the output resistance in the network. */
export function linearStage({ states, signal, restored }: Around, { gainBandwidth, ownPole, openLoopGain }: LoopFigures): LinearStage {
  const network = states.order;
  const hasPole = Number.isFinite(ownPole);
  const order = network + (hasPole ? 2 : 1);
  const speed = 2 * Math.PI * gainBandwidth * restored;
  const leak = speed / openLoopGain / restored;
  /** What stands at the network for given states and signal. */
  const input = (x: Vector): number[] => {
    const u = x[order] ?? 0;
    const held = HELD.map((_, at) => (at === DRIVE ? (x[order - 1] ?? 0) : 0) + (signal.held[at] ?? 0) * u);
    return [...x.slice(0, network), ...held, ...signal.fed.map((share) => share * u)];
  };
  const rowsOf = (matrix: Matrix): number[][] => matrixOf(order + 1, (x) => matrix.map((row) => dot(row, input(x))));
  const [output = [], plus = [], minus = []] = rowsOf(states.volts);
  const error = plus.map((value, at) => value - (minus[at] ?? 0));
  const given = error.map((value) => speed * value);
  const wanted = given.map((value, at) => value - (at === network ? leak : 0));
  const pole = 2 * Math.PI * ownPole;
  const following = hasPole ? [zeros(order + 1).map((_, at) => (at === network ? pole : at === network + 1 ? -pole : 0))] : [];
  const rates = [...rowsOf(states.rates), wanted, ...following];
  const split = (row: Vector): Row => ({ states: row.slice(0, order), signal: row[order] ?? 0 });
  return {
    order,
    rates: rates.map((row) => row.slice(0, order)),
    signal: rates.map((row) => row[order] ?? 0),
    integrator: network,
    output: split(output),
    given: split(given),
    leak,
  };
}

/** States (per unit of signal) at a frequency, rad/s; null where a pole stands. */
export function statesAt({ rates, signal }: LinearStage, omega: number): Complex[] | null {
  return steadyState(rates, signal.map((re) => ({ re, im: 0 })), omega);
}

/** States at rest for a unit of signal; null for what adds up for ever. */
export function statesAtRest({ rates, signal }: LinearStage): number[] | null {
  return solveReal(rates, signal.map((value) => -value));
}

/** A row of complex states, for a unit of signal. */
export function valueOf(row: Row, states: readonly Complex[]): Complex {
  return states.reduce((sum, { re, im }, at) => ({ re: sum.re + (row.states[at] ?? 0) * re, im: sum.im + (row.states[at] ?? 0) * im }), { re: row.signal, im: 0 });
}

/** Signal to output about an endless amplifier, V or V/A: what makes the voltage between its inputs vanish. Null where that has no answer. */
export function idealTransfer({ states, signal }: Around, omega: number): Complex | null {
  const none = signal.fed.map(() => 0);
  const [fromSignal, fromDrive] = [tapsAt(states, [...signal.held, ...signal.fed], omega), tapsAt(states, [...unitVector(HELD.length, DRIVE), ...none], omega)];
  if (fromSignal === null || fromDrive === null || !(magnitude(fromDrive.error) > 0)) return null;
  const drive = divide(fromSignal.error, fromDrive.error);
  return subtract(fromSignal.output, multiply(drive, fromDrive.output));
}

/** Output and voltage between the inputs for given held voltages and fed currents. */
function tapsAt({ order, rates, volts }: NetworkStates, given: Vector, omega: number): { readonly output: Complex; readonly error: Complex } | null {
  const right = rates.map((row) => ({ re: dot(row.slice(order), given), im: 0 }));
  const inner = steadyState(rates.map((row) => row.slice(0, order)), right, omega);
  if (inner === null) return null;
  const [output, plus, minus] = volts.map((row) => valueOf({ states: row.slice(0, order), signal: dot(row.slice(order), given) }, inner));
  return output === undefined || plus === undefined || minus === undefined ? null : { output, error: subtract(plus, minus) };
}
