import * as z from 'zod';
import { envelope } from './envelope.js';
import { tier } from './judged-part.js';
import { sha256, unit } from './measures.js';
import { origin } from './origin.js';
import { price } from './price.js';
import { limitKind } from './verdict.js';

const identity = z.strictObject({
  id: z.string(),
  tier,
  description: z.string().nullable(),
  status: z.enum(['approved', 'conditional', 'restricted', 'not-approved']).nullable(),
  lifecycle: z.enum(['preliminary', 'active', 'nrnd', 'last-time-buy', 'obsolete']).nullable(),
  package: z.string().nullable(),
  channels: z.number().nullable().describe('Amplifiers in one package'),
  qualification: z.string().nullable(),
  class: z.string().nullable(),
  family: z.string().nullable(),
  price,
  phaseReversal: z.boolean().nullable(),
  inputClamp: z.boolean().nullable(),
  inputType: z.enum(['fet', 'bipolar']).nullable(),
  crossoverFree: z.boolean().nullable().describe('Yes: the offset makes no step over the whole input range'),
});

const load = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('current'), amperes: z.number().describe('A') }),
  z.strictObject({ kind: z.literal('resistance'), ohms: z.number().describe('Ω'), to: z.enum(['ground', 'supply', 'mid-supply']) }),
]);

const condition = z.strictObject({
  supply: z.number().nullable().describe('Between V+ and V-, V'),
  load: load.nullable(),
  temperature: z.union([z.number(), z.literal('over')]).nullable().describe('°C, or over for the whole specified range'),
  gain: z.number().nullable().describe('Noise gain, V/V'),
});

const figure = z.strictObject({
  parameter: z.string(),
  kind: limitKind,
  value: z.number().describe('In the unit beside it, SI'),
  unit,
  condition: condition.nullable().describe('What is null was not stated; null when nothing was'),
  assumed: z.literal(true).optional().describe('Only of a figure nobody printed: from words, declared for the whole list, or lent by a class'),
  origin,
  cell: z.string().nullable().describe('The cell as written; null when not kept'),
});

/** `railfit part --json` */
export const part = envelope('part', 'Every figure of one part with kind, condition and origin; null is not known, never a default', {
  part: identity,
  withdrawn: z
    .strictObject({ file: z.string().describe('The list that no longer had it, or that had brought it'), sha256: sha256.describe('Of that list'), takenBack: z.boolean().describe('It came with an import that was taken back') })
    .optional()
    .describe('Only of a part that is on the approved list no more; its figures are as they were last'),
  figures: z.array(figure),
});
