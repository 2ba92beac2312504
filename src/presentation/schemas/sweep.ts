import * as z from 'zod';
import { asking, data } from './answer.js';
import { envelope } from './envelope.js';
import { groupCounts } from './judged-part.js';
import { count } from './measures.js';

const keeps = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('nothing'), replaced: z.string().nullable().describe('The range the value stands in place of') }),
  z.strictObject({ kind: z.literal('lower-end'), lower: z.number().describe('The value is the upper end, this the lower one') }),
  z.strictObject({ kind: z.literal('tolerance'), below: z.number().describe('Fraction'), above: z.number().describe('Fraction') }),
]);

const over = z.strictObject({
  path: z.string().describe('Field of the stage, as --set takes it'),
  from: z.number(),
  to: z.number(),
  unit: z.string().describe('Unit of the values, SI; dB for ratios'),
  scale: z.enum(['linear', 'log']),
  keeps: keeps.describe('What becomes of the ends the field has in the stage'),
  steps: count('How many values'),
});

const state = {
  counts: groupCounts.nullable().describe('Null where the stage contradicts itself'),
  first: z.string().nullable().describe('First choice; null when nothing fits'),
  reason: z.string().optional().describe('Why there is no such stage'),
};

const turn = z.strictObject({
  at: z.number().describe('The first value at which `to` holds, to a millionth of it'),
  text: z.string(),
  from: z.strictObject(state),
  to: z.strictObject(state),
  gained: z.array(z.string()).describe('Parts that come in'),
  lost: z.array(z.string()).describe('Parts that go out'),
});

/** `railfit sweep --json` */
export const sweep = envelope('sweep', 'What the values of one field cost: how many parts fit and which comes first', {
  over,
  points: z.array(z.strictObject({ value: z.number(), text: z.string(), ...state })).describe('By value'),
  turnsOf: z.enum(['any', 'first']).describe('first: how many fit changes so often on a long list that only turns of the first choice are looked for'),
  turns: z.array(turn).describe('Where the count of fits or the first choice changes, or the stage stops being one; by value'),
  asking,
  data,
});
