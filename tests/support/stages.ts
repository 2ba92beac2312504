import { deriveDemands, type Demands } from '../../src/demands/index.js';
import type { Interval, LoadSpec, ReferenceSpec, ResistorsSpec, SignalSpec, StageSpec, Swing, Topology, Value } from '../../src/spec/spec.js';
import { buildStage, type Stage } from '../../src/stage/index.js';

/** A stage specification as a literal: one supply of 5 V, nothing asked beyond the circuit, and what the test says. */
export function stageSpec(topology: Topology, signal: SignalSpec, more: Partial<StageSpec> = {}): StageSpec {
  return { topology, supply: exactly(5), signal, limits: {}, wishes: {}, margins: {}, avoid: [], notes: [], positions: {}, ...more };
}

/** The circuit of a specification; a contradiction fails the test. */
export function stageOf(spec: StageSpec): Stage {
  const built = buildStage(spec);
  if (built.ok) return built.stage;
  throw new Error(built.problems.map(({ code, message }) => `${code} ${message}`).join('\n'));
}

export const demandsOf = (spec: StageSpec): Demands => deriveDemands(stageOf(spec));

/** Codes of the contradictions of a specification; none when it is a stage. */
export function contradictionCodes(spec: StageSpec): string[] {
  const built = buildStage(spec);
  return built.ok ? [] : built.problems.map(({ code }) => code);
}

export const value = (number: number): Value => ({ value: number, text: String(number) });
export const swing = (min: number, max: number): Swing => ({ min, max, text: `${min}..${max}` });
/** A range: its middle is nominal. */
export const between = (min: number, max: number): Interval => ({ ...swing(min, max), nominal: (min + max) / 2 });
export const exactly = (number: number): Interval => between(number, number);
/** `5 V ± 5 %`: tolerance as a fraction. */
export const within = (nominal: number, tolerance: number): Interval => ({ ...swing(nominal * (1 - tolerance), nominal * (1 + tolerance)), nominal });

/** DC-coupled extremes against ground, and the top of the band in Hz. */
export const dc = (min: number, max: number, top?: number): SignalSpec => ({ ...DC, input: swing(min, max), ...upTo(top) });
/** AC-coupled peak volts. */
export const ac = (peak: number, top?: number): SignalSpec => ({ ...DC, coupling: 'ac', amplitude: value(peak), ...upTo(top) });
/** Difference: far ends of the legs, independent of each other. */
export const legs = (positive: Swing, negative: Swing, top?: number): SignalSpec => ({ ...DC, positive, negative, ...upTo(top) });
/** Difference: positive − negative, and their mean. */
export const coupled = (differential: Swing, commonMode: Swing, top?: number): SignalSpec => ({ ...DC, differential, commonMode, ...upTo(top) });

const DC = { coupling: 'dc', shape: 'band-limited' } as const;
const upTo = (top: number | undefined): Pick<SignalSpec, 'frequency'> => (top === undefined ? {} : { frequency: { top, text: `${top} Hz` } });

/** Feedback and input resistor in ohm with one tolerance as a fraction. */
export function resistors(feedback: number, input: number, tolerance = 0.01): ResistorsSpec {
  return { feedback: value(feedback), input: value(input), tolerance: value(tolerance) };
}

/** All four of a difference stage: R2, R1, R3, R4. */
export function fourResistors(ohms: { r1: number; r2: number; r3: number; r4: number }, tolerance = 0.01): ResistorsSpec {
  return { ...resistors(ohms.r2, ohms.r1, tolerance), positiveInput: value(ohms.r3), toReference: value(ohms.r4) };
}

export const GROUND: ReferenceSpec = { kind: 'ground', value: exactly(0) };
/** Half the supply; the tolerance (fraction) is one of its value, the resistance in ohm. */
export const midSupply = (tolerance = 0, ohms?: number): ReferenceSpec => ({ kind: 'mid-supply', value: within(1, tolerance), ...of(ohms) });
export const voltage = (volts: number, tolerance = 0, ohms?: number): ReferenceSpec => ({ kind: 'voltage', value: within(volts, tolerance), ...of(ohms) });

const of = (ohms: number | undefined): Pick<ReferenceSpec, 'resistance'> => (ohms === undefined ? {} : { resistance: value(ohms) });

export const source = (ohms: number, tolerance?: number): NonNullable<StageSpec['source']> => ({
  resistance: value(ohms),
  ...(tolerance === undefined ? {} : { tolerance: value(tolerance) }),
});

export function load(ohms: number, to: LoadSpec['to'] = 'ground', farad?: number): LoadSpec {
  return { resistance: value(ohms), to, ...(farad === undefined ? {} : { capacitance: value(farad) }) };
}
