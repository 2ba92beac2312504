import { formatQuantity } from '../quantities/format.js';
import { nearestE96 } from '../quantities/e-series.js';
import type { LegSpec, SignalSpec, StageSpec, Swing } from '../spec/spec.js';
import { inputOf, type Circuit, type RatioCorner, type Surroundings } from './circuit.js';
import type { Excitation } from './excitation.js';
import { toleranceOf } from './fitted.js';
import { AMPLIFIER, type Maker } from './making.js';
import { feedbackLeg, pinOf, referencePin, resistor } from './networks.js';
import type { InputPoint, Span } from './stage.js';

interface Leg {
  readonly name: string;
  readonly level: LegSpec['level'];
  /** Ω, nominal. */
  readonly resistance: number;
}

const DEFAULT_FEEDBACK = 100e3;

/**
 * Inverting summer: vo = Vref(1+Σρ) − Σρk·vk, NG = 1+Σρ with every leg counted, also one at a fixed level
 * (Mancini (ed.), Op Amps for Everyone, 2002, ch. 3, from memory).
 */
export const makeSumming: Maker = (spec, _settled, around) => {
  const feedback = spec.resistors?.feedback?.value ?? DEFAULT_FEEDBACK;
  const legs = (spec.legs ?? []).map((leg): Leg => ({ name: leg.name, level: leg.level, resistance: resistanceOf(leg, feedback) }));
  const circuit = summer({ feedback, legs, tolerance: toleranceOf(spec), around });
  return { ok: true, made: { circuit, excitation: driveOf(spec), response: AMPLIFIER, fitNotes: notesOf(spec, legs, feedback), cautions: [] } };
};

function resistanceOf(leg: LegSpec, feedback: number): number {
  if (leg.resistance !== undefined) return leg.resistance.value;
  return nearestE96(feedback / Math.abs(leg.gain?.value ?? 1));
}

function notesOf(spec: StageSpec, legs: readonly Leg[], feedback: number): string[] {
  const ohms = (value: number): string => formatQuantity(value, 'Ω', { digits: 4 });
  const chosen = legs.filter((leg) => spec.legs?.find(({ name }) => name === leg.name)?.resistance === undefined);
  return [
    ...(spec.resistors?.feedback === undefined ? [`feedback resistor ${ohms(feedback)}`] : []),
    ...chosen.map((leg) => `leg ${leg.name}: ${ohms(leg.resistance)} from E96, gain ${formatQuantity(-feedback / leg.resistance, 'V/V', { digits: 4 })}`),
  ];
}

interface Summer {
  readonly feedback: number;
  readonly legs: readonly Leg[];
  readonly tolerance: number;
  readonly around: Surroundings;
}

function summer({ feedback, legs, tolerance, around }: Summer): Circuit {
  const first = legs.find(({ level }) => level.kind === 'signal');
  // AC-coupled, a capacitor in each signal leg blocks direct current; legs at a fixed level are joined straight.
  const direct = around.ac ? legs.filter(({ level }) => level.kind !== 'signal') : legs;
  const rf = [feedback * (1 - tolerance), feedback * (1 + tolerance)];
  return {
    gain: first === undefined ? 0 : -feedback / first.resistance,
    gainUnit: 'V/V',
    noiseGain: noiseGainOf(legs, feedback, tolerance),
    dcNoiseGain: noiseGainOf(direct, feedback, tolerance),
    resistors: { feedback, input: first?.resistance ?? joined(legs), tolerance },
    nominal: cornerOf({ legs, feedback, around, ends: null, tolerance }),
    corners: rf.flatMap((value) => (['up', 'down', 'most'] as const).map((ends) => cornerOf({ legs, feedback: value, around, ends, tolerance }))),
    networkConductance: 1 / feedback,
    networkEnd: (_commonMode, reference) => reference,
    seriesPositive: around.referenceResistance,
    seriesNegative: 1 / (1 / feedback + 1 / joined(direct)),
    resistorRejection: null,
    network: { plus: referencePin(around), minus: pinOf([...feedbackLeg(feedback, around), ...legs.flatMap((leg) => resistor(`leg ${leg.name}`, leg.resistance, ['pin', leg === first ? 'input' : 'ground']))]) },
    notes: [],
  };
}

/** 1 + Σρ over these legs: every one counts, also one that rests. */
function noiseGainOf(legs: readonly Leg[], feedback: number, tolerance: number): Span {
  const at = (end: 1 | 0 | -1): number => legs.reduce((total, leg) => total + (feedback * (1 - end * tolerance)) / (leg.resistance * (1 + end * tolerance)), 1);
  return { min: at(1), nominal: at(0), max: at(-1) };
}

/** Legs in parallel, Ω; Infinity without any. */
function joined(legs: readonly Leg[]): number {
  return 1 / legs.reduce((total, leg) => total + 1 / leg.resistance, 0);
}

interface CornerOf {
  readonly legs: readonly Leg[];
  readonly feedback: number;
  readonly around: Surroundings;
  /** Each leg's resistor at the end that moves the output up, or down; `most`: all at their low end, the largest swing; null: nominal. */
  readonly ends: 'up' | 'down' | 'most' | null;
  readonly tolerance: number;
}

/** With the feedback resistor at one end every leg adds ρk(Vref − vk) by itself, so the worst end of each can be taken leg by leg. */
function cornerOf({ legs, feedback, around, ends, tolerance }: CornerOf): RatioCorner {
  const added = (leg: Leg, difference: number): number => {
    if (ends === null) return (feedback / leg.resistance) * difference;
    const least = feedback / (leg.resistance * (1 + tolerance));
    const most = feedback / (leg.resistance * (1 - tolerance));
    const wantsMost = ends === 'most' || (ends === 'up' ? difference > 0 : difference < 0);
    return (wantsMost ? most : least) * difference;
  };
  return {
    noiseGain: 1 + legs.reduce((total, leg) => total + feedback / leg.resistance, 0),
    output: (point, reference, supply) =>
      legs.reduce((total, leg) => {
        const level = levelOf(leg, point, { reference, supply });
        return total + added(leg, around.ac && leg.level.kind === 'signal' ? -level : reference - level);
      }, reference),
    commonMode: (_point, reference) => reference,
  };
}

function levelOf(leg: Leg, point: InputPoint, { reference, supply }: { reference: number; supply: number }): number {
  if (leg.level.kind === 'supply') return supply;
  return leg.level.kind === 'reference' ? reference : inputOf(point, leg.name);
}

/**
 * Every leg turns the same way, so the two ends of the output are all legs at their upper and all at their lower end. AC-coupled
 * pulses stand (1−D)·Vpp above the bias and D·Vpp below, either side up to Vpp when the duty is free.
 */
function driveOf(spec: StageSpec): Excitation {
  const swings = (spec.legs ?? []).flatMap(({ name, level }): [string, Ends][] => (level.kind === 'signal' ? [[name, swingOf(spec.signal, level.swing)]] : []));
  const at = (pick: (swing: Ends) => number): InputPoint => Object.fromEntries(swings.map(([name, swing]) => [name, pick(swing)]));
  const still = at(() => 0);
  return {
    points: [at(({ min }) => min), at(({ max }) => max)],
    centre: at(({ min, max }) => (min + max) / 2),
    steps: swings.map(([name, { min, max }]) => ({ ...still, [name]: (max - min) / 2 })),
    stepShare: isFree(spec.signal) ? 0.5 : 1,
  };
}

type Ends = Pick<Swing, 'min' | 'max'>;

/** Each leg about its own average. */
function swingOf(signal: SignalSpec, swing: Ends): Ends {
  if (signal.coupling === 'dc' || signal.shape === 'sine' || signal.shape === 'band-limited') return swing;
  const whole = swing.max - swing.min;
  if (isFree(signal)) return { min: -whole, max: whole };
  const duty = signal.duty?.value ?? 0;
  return { min: -duty * whole, max: (1 - duty) * whole };
}

/** The average of a pulse of free duty, or of a lone step, may stand anywhere between its levels. */
function isFree({ coupling, shape, duty }: SignalSpec): boolean {
  return coupling === 'ac' && (shape === 'step' || (shape === 'pulse' && duty === undefined));
}
