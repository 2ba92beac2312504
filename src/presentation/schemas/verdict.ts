import * as z from 'zod';
import { required, sense } from './demand.js';
import { unit } from './measures.js';
import { origin } from './origin.js';

export const basis = z
  .enum(['guaranteed', 'derated', 'estimated', 'assumed', 'borrowed'])
  .meta({ id: 'basis', description: 'What a number stands on, strongest first: a limit, a typical after derating, an estimate, an assumption, a figure of the class' });

export const limitKind = z.enum(['min', 'typ', 'max']).meta({ id: 'limitKind', description: 'A guaranteed limit (min, max) or what a typical sample does (typ)' });

export const reason = z
  .enum(['missing-figure', 'beyond-data', 'no-counting-point', 'currency', 'not-built', 'not-said', 'typical-only', 'estimated', 'assumed', 'borrowed'])
  .meta({ id: 'reason', description: 'Why a check cannot be decided' });

/** A figure, its limit kind, and a value in its unit. */
export const figureValue = { kind: limitKind, value: z.number(), unit };

const term = z
  .strictObject({
    name: z.string(),
    value: z.number().describe('What it adds, in the unit of the check'),
    basis,
    figure: z.strictObject({ value: z.number(), unit }).nullable().describe('The figure as it counts'),
    how: z.string().nullable().describe('What the figure is multiplied by, or how it was derived'),
    origin,
  })
  .meta({ id: 'term', title: 'Term', description: 'One addend of an offered value' });

const offered = z.union([z.number(), z.string(), z.null()]);
const margin = z.number().nullable().describe('Offered to required for at-least, required to offered for at-most; 1 is met exactly; null for head-rooms, temperatures and words');

export const point = z.strictObject({ current: z.number(), supply: z.number() }).describe('Of a head-room: current towards the rail in A and supply in V it must hold at');

const missing = z.strictObject({
  figure: z.string(),
  kind: limitKind.nullable(),
  beyond: z
    .strictObject({ covers: z.number(), current: z.number(), supply: z.number() })
    .optional()
    .describe('Head-room points are known, but they cover less than the current that flows: both in A, at a supply in V'),
});

const numbers = {
  check: z.string().describe('Id of the check'),
  required: required.describe('What the stage asks, in the unit beside it'),
  offered: offered.describe('What the part has on the reading that decides; null when not known'),
  offeredBest: offered.describe('The same on the other reading'),
  unit: unit.nullable(),
  sense: sense.nullable(),
  margin,
  spare: z.number().optional().describe('What is left, in the unit of the check; negative when short'),
  known: z.number().optional().describe('The part of the offered value that is known when the whole is not'),
  missing: z.array(missing).optional().describe('Figures that are not known'),
  worstAt: z.record(z.string(), z.number()).nullable().describe('Corner it stands at: supply, reference, input, positive, negative in V, temperature and currentTemperature (of currents that double) in °C, load in A'),
  terms: z.array(term).optional().describe('What adds up to the offered value'),
  rss: z.number().optional().describe('Root-sum-square of the terms, shown beside their sum'),
  origin: origin.optional(),
  how: z.string().nullable().optional().describe('How the offered value follows from the figure'),
  cautions: z.array(z.string()).optional(),
  adds: z.literal('squares').optional().describe('Terms add as squares; without it as they are'),
  termUnit: unit.optional().describe('Unit of the terms where it is not that of the check'),
  notes: z.array(z.string()).optional().describe('The same result as engineers also say it'),
  measures: z
    .array(z.strictObject({ name: z.string(), value: z.number().describe('Worst reading'), unit, basis }))
    .optional()
    .describe('Numbers that belong to the verdict and are not compared'),
  remedies: z
    .array(z.strictObject({ path: z.string().describe('Field of the stage file'), text: z.string().describe('Value to write there'), offered: z.number().describe('What the check then offers, worst reading'), cost: z.string() }))
    .optional()
    .describe('What would turn the check, recomputed with it'),
  text: z.string().describe('The verdict in one sentence'),
};

const decided = z.strictObject({ ...numbers, outcome: z.enum(['pass', 'fail']), basis });

const open = z.strictObject({
  ...numbers,
  outcome: z.literal('unknown'),
  basis: z.null(),
  reason,
  decidesAt: z.strictObject({ figure: z.string(), ...figureValue, condition: point.optional() }).optional().describe('The value of one figure at which the check turns'),
});

/** One check of one part. */
export const verdict = z
  .discriminatedUnion('outcome', [decided, open])
  .meta({ id: 'verdict', title: 'Verdict', description: 'One check of one part, judged on both readings of its figures; unrounded numbers' });
