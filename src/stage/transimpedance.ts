import { nearestE96 } from '../quantities/e-series.js';
import { formatQuantity } from '../quantities/format.js';
import type { PhotodiodeSpec, StageSpec } from '../spec/spec.js';
import { inputOf, UNITY, type Circuit, type RatioCorner } from './circuit.js';
import { excitation } from './excitation.js';
import { toleranceOf } from './fitted.js';
import type { Maker, Settled } from './making.js';
import { capacitor, feedbackLeg, pinOf, referencePin } from './networks.js';
import { solvedReference } from './solve.js';

/** A photodiode's dark current doubles per this many kelvin (common practice, from memory). */
const DOUBLING_KELVIN = 10;
const RATED_AT = 25;
const DEFAULT_FEEDBACK = 100e3;

/**
 * Photodiode into the inverting input: vo = Vref − i·Rf for a current pushed into the node, Vref + i·Rf for one pulled out; NG 1 at DC
 * (Graeme, Photodiode Amplifiers: Op Amp Solutions, 1996, ch. 2, from memory).
 */
export const makeTransimpedance: Maker = (spec, settled, around) => {
  const { photodiode } = spec;
  if (photodiode === undefined) throw new RangeError('a transimpedance stage without a photodiode reached the circuit');
  const currents = currentsOf(spec, photodiode);
  const feedback = feedbackOf(spec, currents);
  const tolerance = toleranceOf(spec);
  const sign = photodiode.direction === 'into-node' ? -1 : 1;
  const corner = (resistance: number): RatioCorner => ({
    noiseGain: 1,
    output: (point, reference) => reference + sign * inputOf(point, 'current') * resistance,
    commonMode: (_point, reference) => reference,
  });
  const circuit: Circuit = {
    gain: sign * feedback,
    gainUnit: 'V/A',
    noiseGain: UNITY,
    dcNoiseGain: UNITY,
    resistors: { feedback, input: Number.POSITIVE_INFINITY, tolerance },
    nominal: corner(feedback),
    corners: [corner(feedback * (1 - tolerance)), corner(feedback * (1 + tolerance))],
    networkConductance: 1 / feedback,
    networkEnd: (_commonMode, reference) => reference,
    seriesPositive: around.referenceResistance,
    seriesNegative: feedback,
    resistorRejection: null,
    network: { plus: referencePin(around), minus: pinOf([...feedbackLeg(feedback, around), ...capacitor('photodiode', photodiode.capacitance.value, ['pin', 'ground'])]) },
    notes: [],
  };
  const drive = excitation({ coupling: 'dc', shape: spec.signal.shape, input: { ...currents, text: photodiode.current.text } }, 'current');
  const response = {
    kind: 'transimpedance',
    feedback,
    inputCapacitance: photodiode.capacitance.value,
    feedbackCapacitance: spec.capacitors?.feedback?.value ?? null,
    largestCurrent: Math.max(Math.abs(currents.min), Math.abs(currents.max)),
  } as const;
  return { ok: true, made: { circuit, excitation: drive, response, fitNotes: notesOf(spec, feedback), cautions: [] } };
};

/** Signal, ambient light and dark current at the hottest, A: each end as low and as high as the three can be together. */
function currentsOf({ temperature }: StageSpec, { current, ambient, dark }: PhotodiodeSpec): { min: number; max: number } {
  const hottest = temperature?.max ?? RATED_AT;
  const grown = (dark?.value ?? 0) * 2 ** Math.max(0, (hottest - RATED_AT) / DOUBLING_KELVIN);
  return { min: current.min + (ambient?.min ?? 0), max: current.max + (ambient?.max ?? 0) + grown };
}

/** As written; else the E96 value that maps the currents onto `signal.output`. */
function feedbackOf(spec: StageSpec, currents: { readonly min: number; readonly max: number }): number {
  const { feedback } = spec.resistors ?? {};
  if (feedback !== undefined) return feedback.value;
  const output = spec.signal.output;
  if (output === undefined || output.max <= output.min || currents.max <= currents.min) return DEFAULT_FEEDBACK;
  return nearestE96((output.max - output.min) / (currents.max - currents.min));
}

function notesOf(spec: StageSpec, feedback: number): string[] {
  const { photodiode, resistors, capacitors } = spec;
  return [
    ...(resistors?.feedback === undefined ? [`feedback resistor ${formatQuantity(feedback, 'Ω', { digits: 4 })}${spec.signal.output === undefined ? '' : ', the E96 value for signal.output'}`] : []),
    ...(capacitors?.feedback === undefined ? ['feedback capacitor: for each part the one that makes its response maximally flat'] : []),
    ...(photodiode?.dark === undefined ? ['dark current not given: not counted'] : [`dark current ${photodiode.dark.text} at 25 °C, doubling per 10 K`]),
    ...(photodiode?.ambient === undefined ? ['no ambient light counted'] : []),
  ];
}

/** The reference a written output range asks for: the output at the least current, moved to none. */
export function transimpedanceReference(spec: StageSpec): Settled['reference'] | null {
  const { photodiode, signal } = spec;
  if (signal.output === undefined || spec.reference !== undefined || photodiode === undefined) return null;
  const currents = currentsOf(spec, photodiode);
  const least = currents.min * feedbackOf(spec, currents);
  const volts = photodiode.direction === 'into-node' ? signal.output.max + least : signal.output.min - least;
  return solvedReference(volts, spec.supply.nominal, formatQuantity(volts, 'V', { digits: 4 }));
}
