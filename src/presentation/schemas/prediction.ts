import * as z from 'zod';
import { asking, data } from './answer.js';
import { envelope } from './envelope.js';
import { tier } from './judged-part.js';
import { unit } from './measures.js';
import { stage } from './stage.js';

const values = (what: string) => z.array(z.number()).describe(what);

const result = z.strictObject({
  value: z.number().nullable().describe('Null with a reason'),
  reason: z.string().optional().describe('Why there is no number'),
  unit,
});

const form = z.strictObject({
  at: z.strictObject({ supply: z.number().describe('V'), reference: z.number().describe('V') }).describe('Corner of the stage it was taken at'),
  figures: z.array(z.strictObject({ parameter: z.string(), value: z.number().nullable(), unit: z.string(), how: z.string().nullable().describe('How it was made from the printed figure; null: as printed') })).describe('What the model of the amplifier is made of'),
  results: z.record(z.string(), result).describe('outputHigh, outputLow, clipped, slewing, distortion, gain, phase, bandwidth, peaking, settling, rise, fall, noise, frequency, duty: those that mean something for the stage'),
  notes: z.array(z.string()),
});

const waveform = z.strictObject({
  kind: z.enum(['sine', 'step', 'ramp', 'oscillation']),
  t: values('s'),
  ideal: values('V from V−, with an endless amplifier'),
  typical: values('V from V−').nullable(),
  worst: values('V from V−').nullable(),
});

const response = z.strictObject({
  f: values('Hz'),
  magnitude: values('Typical gain from signal to output, in the unit of the gain').nullable(),
  phase: values('Typical, degrees').nullable(),
  worst: z.strictObject({ magnitude: values('In the unit of the gain'), phase: values('Degrees') }).nullable(),
});

export const predicted = {
  part: z.strictObject({ id: z.string(), tier, class: z.string().nullable(), description: z.string().nullable() }),
  wanted: z.record(z.string(), z.strictObject({ value: z.number(), sense: z.enum(['at-least', 'at-most', 'about']) })).describe('What the stage asks of a result of the same name'),
  typical: form.describe('With typical figures'),
  worst: form.describe('With guaranteed figures, typical ones derated'),
  waveform: waveform.nullable().describe('The settled period, step, ramp or oscillation; null where it cannot be told'),
  response: response.nullable().describe('Small-signal; null of an oscillator'),
};

/** `railfit predict --json` */
export const prediction = envelope('prediction', 'One part in one stage, simulated; predicted, not judged', {
  stage,
  ...predicted,
  compared: z.strictObject(predicted).nullable().describe('The part of --compare'),
  limits: z.array(z.string()).describe('What the model does not have'),
  asking,
  data,
});
