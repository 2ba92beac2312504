import { formatQuantity } from '../quantities/format.js';
import type { Problem } from '../quantities/problem.js';
import { contradiction } from '../spec/contradiction.js';
import type { IntegratorSpec, StageSpec } from '../spec/spec.js';
import { inputOf, parallel, UNITY, type Circuit, type RatioCorner, type Surroundings } from './circuit.js';
import { excitation, type Excitation } from './excitation.js';
import { capacitorTolerance } from './filter-response.js';
import { toleranceOf } from './fitted.js';
import type { Maker } from './making.js';
import { capacitor, pinOf, referencePin, resistor, signalLeg } from './networks.js';
import type { InputPoint, Span } from './stage.js';

/** What the integrator is made of, Ω and F; `bleed` across the capacitor, Infinity without. */
interface Made {
  readonly resistance: number;
  readonly capacitance: number;
  readonly bleed: number;
}

/** How long, or from which frequency on, the input is added up. */
type Reach =
  /** From reset to reset, s, and how long of it the signal adds up with one sign at most. */
  | { readonly kind: 'window'; readonly window: number; readonly time: number }
  /** AC-coupled without a reset: the lowest frequency, Hz, swings widest. */
  | { readonly kind: 'frequency'; readonly bottom: number }
  /** Running on through a resistor across the capacitor: the steady state. */
  | { readonly kind: 'steady' };

/**
 * vo = Vref − (1/RC)·∫(vi − Vref)dt, the pins at Vref (Franco, Design with Operational Amplifiers and Analog Integrated Circuits, 3rd
 * ed. 2002, ch. 1, from memory). In each case the output is Vref − m·(vi − Vref), m being what the largest input makes of itself.
 */
export const makeIntegrator: Maker = (spec, _settled, around) => {
  const { integrator } = spec;
  if (integrator === undefined) throw new RangeError('an integrator stage without its components reached the circuit');
  const reach = reachOf(spec, integrator);
  if ('code' in reach) return { ok: false, problems: [reach] };
  const made = { resistance: integrator.resistance.value + around.sourceResistance, capacitance: integrator.capacitance.value, bleed: spec.resistors?.feedback?.value ?? Number.POSITIVE_INFINITY };
  const spans = spansOf(spec, made, { reach, around });
  const circuit = integrating(made, spans, { reach, around });
  const steepest = { ...spans[2], bleed: spans[0].bleed };
  const response = { kind: 'integrator', resistance: made.resistance, capacitance: made.capacitance, steepest, window: integrator.window?.value ?? null } as const;
  return { ok: true, made: { circuit, excitation: driveOf(spec, reach), response, fitNotes: notesOf(spec, made, reach), cautions: cautionsOf(made, reach) } };
};

function reachOf(spec: StageSpec, { window }: IntegratorSpec): Reach | Problem {
  const { coupling, frequency, shape } = spec.signal;
  // One figure of a sine is its frequency; of any other signal the top of a band that begins at nothing.
  const bottom = frequency?.bottom ?? (shape === 'sine' ? frequency?.top : undefined);
  if (window !== undefined) return { kind: 'window', window: window.value, time: coupling === 'ac' && bottom !== undefined ? longest(window.value, bottom) : window.value };
  if (coupling === 'ac' && bottom !== undefined) return spec.limits.dcError !== undefined && !hasBleed(spec) ? unbounded(spec, 'dcError cannot be held: bias current charges the capacitor for ever') : { kind: 'frequency', bottom };
  if (hasBleed(spec)) return { kind: 'steady' };
  return unbounded(spec, coupling === 'ac' ? 'nothing bounds the output of the integrator: no window, no lowest frequency' : 'nothing bounds the output of a DC-coupled integrator without a window: it runs into a rail');
}

const hasBleed = (spec: StageSpec): boolean => spec.resistors?.feedback !== undefined;

/** The largest ∫sin over a window: sin(πfT)/(πf), over half a period at most (own algebra). s. */
function longest(window: number, frequency: number): number {
  const angle = Math.min(Math.PI / 2, Math.PI * frequency * window);
  return Math.sin(angle) / (Math.PI * frequency);
}

function unbounded(spec: StageSpec, message: string): Problem {
  return contradiction(spec, {
    code: 'S212',
    paths: ['integrator', 'signal.frequency', 'signal.coupling', 'limits.dcError'],
    message,
    fix: 'write integrator.window, the time from reset to reset; or resistors: {feedback: 1 MΩ} across the capacitor',
  });
}

/** m: output per volt of input about the reference, after `elapsed` seconds. Without a bleed resistor t/(RC). */
function multiple({ resistance, capacitance, bleed }: Made, reach: Reach, elapsed: number): number {
  const isBled = Number.isFinite(bleed);
  if (reach.kind === 'steady') return bleed / resistance;
  if (reach.kind === 'frequency') {
    const omega = 2 * Math.PI * reach.bottom;
    return isBled ? bleed / resistance / Math.hypot(1, omega * bleed * capacitance) : 1 / (omega * resistance * capacitance);
  }
  return isBled ? (bleed / resistance) * -Math.expm1(-elapsed / (bleed * capacitance)) : elapsed / (resistance * capacitance);
}

/** Components where the output moves least, at their nominal values, and where it moves most: monotone in each of them. */
function spansOf(spec: StageSpec, made: Made, { around }: Context): readonly [Made, Made, Made] {
  const [t, tc] = [toleranceOf(spec), capacitorTolerance(spec)];
  const at = (sign: 1 | -1): Made => ({
    resistance: (made.resistance - around.sourceResistance) * (1 - sign * t) + around.sourceResistance * (1 - sign * around.sourceTolerance),
    capacitance: made.capacitance * (1 - sign * tc),
    bleed: made.bleed * (1 + sign * t),
  });
  return [at(-1), made, at(1)];
}

interface Context {
  readonly reach: Reach;
  readonly around: Surroundings;
}

function integrating(made: Made, [least, nominal, most]: readonly [Made, Made, Made], { reach, around }: Context): Circuit {
  const { resistance, capacitance, bleed } = made;
  const corner = (at: Made): RatioCorner => ({
    noiseGain: 1,
    output: (point, reference) => reference - multiple(at, reach, point['elapsed'] ?? 0) * (inputOf(point, 'input') - (around.ac ? 0 : reference)),
    commonMode: (_point, reference) => reference,
  });
  return {
    gain: -1 / (resistance * capacitance),
    gainUnit: '1/s',
    noiseGain: UNITY,
    ...directErrors({ least, nominal, most }, { reach, around }),
    resistors: Number.isFinite(bleed) ? { feedback: bleed, input: resistance - around.sourceResistance, tolerance: (bleed - least.bleed) / bleed } : null,
    nominal: corner(nominal),
    corners: [corner(least), corner(most)],
    // What the input sends through R leaves through C (and the bleed resistor) into the output, wherever that stands.
    networkConductance: 0,
    networkEnd: (_commonMode, reference) => reference,
    networkCurrent: ({ inputs, reference }) => -(inputOf(inputs, 'input') - (around.ac ? 0 : reference)) / resistance,
    seriesPositive: around.referenceResistance,
    resistorRejection: null,
    network: {
      plus: referencePin(around),
      minus: pinOf([
        ...signalLeg('input', resistance - around.sourceResistance, around),
        ...capacitor('integrating capacitor', capacitance, ['output', 'pin']),
        ...(Number.isFinite(bleed) ? resistor('bleed', bleed, ['output', 'pin']) : []),
      ]),
    },
    notes: [],
  };
}

/**
 * An offset Vos is integrated as an input of that size, and stands at the output itself: Vos·(1 + m), m = T/RC without a bleed
 * resistor (Vos/(RC) per second, Franco ch. 5). A bias current moves the capacitor as an input of Ib·R does: Ib·R·m, that is Ib·T/C.
 * With the noise gain 1 + m before everything that is m·R/(1 + m) of series resistance: R in parallel with m·R (own algebra).
 * AC-coupled no direct current comes through R: noise gain 1, and the bleed resistor alone carries the bias current; without one
 * the capacitor charges for ever, which is told as a caution.
 */
function directErrors({ least, nominal, most }: Record<'least' | 'nominal' | 'most', Made>, { reach, around }: Context): { dcNoiseGain: Span; seriesNegative: number } {
  const time = reach.kind === 'window' ? reach.window : 0;
  if (around.ac) {
    const held = reach.kind === 'window' ? multiple(nominal, reach, time) * nominal.resistance : nominal.bleed;
    return { dcNoiseGain: UNITY, seriesNegative: Number.isFinite(held) ? held : nominal.resistance };
  }
  const ends = { min: 1 + multiple(least, reach, time), nominal: 1 + multiple(nominal, reach, time), max: 1 + multiple(most, reach, time) };
  return { dcNoiseGain: ends, seriesNegative: parallel(nominal.resistance, (ends.nominal - 1) * nominal.resistance) };
}

/** With a reset the output stands at the reference just after it (elapsed 0), wherever the input is. */
function driveOf(spec: StageSpec, reach: Reach): Excitation {
  const drive = excitation(spec.signal);
  if (reach.kind !== 'window') return { ...drive, steps: [] };
  const after = (elapsed: number): InputPoint[] => drive.points.map((point) => ({ ...point, elapsed }));
  return { points: [...after(0), ...after(reach.time)], centre: { ...drive.centre, elapsed: reach.time / 2 }, steps: [], stepShare: drive.stepShare };
}

function notesOf(spec: StageSpec, { resistance, bleed }: Made, reach: Reach): string[] {
  const bottom = reach.kind === 'frequency' ? [`the output swings widest at ${formatQuantity(reach.bottom, 'Hz')}, the lowest frequency of the signal`] : [];
  const bled = Number.isFinite(bleed) ? [`${spec.resistors?.feedback?.text ?? ''} across the capacitor: DC gain ${formatQuantity(-bleed / resistance, 'V/V', { digits: 4 })}`] : [];
  const source = spec.source === undefined || spec.source.resistance.value === 0 ? [] : [`${formatQuantity(resistance, 'Ω', { digits: 4 })} with the source resistance in series`];
  return [...bottom, ...bled, ...source];
}

function cautionsOf({ bleed }: Made, reach: Reach): string[] {
  if (reach.kind === 'window' || Number.isFinite(bleed)) return [];
  return ['no path for direct current round the amplifier: bias current runs the output into a rail, unless something resets the capacitor or a resistor lies across it (resistors.feedback)'];
}
