import * as z from 'zod';
import { unit } from './measures.js';

export const sense = z.enum(['at-least', 'at-most', 'one-of']).meta({ id: 'sense', description: 'How offered must stand to required; met exactly is met' });

/** What is asked: a number, words of which one must hold, or null where the limit is known only in words. */
export const required = z.union([z.number(), z.array(z.string()), z.null()]);

/** What the stage asks of any amplifier in one respect. */
export const demand = z
  .strictObject({
    check: z.string().describe('Id of the check'),
    required: required.describe('What is asked, in the unit beside it; words for one-of'),
    unit: unit.nullable(),
    sense: sense.nullable(),
    because: z.string().describe('The figures of the stage it came from'),
    source: z.string().describe('Section of the method or published source'),
    reason: z.literal('not-built').optional().describe('This version has no such check: every part is undecided on it'),
  })
  .meta({ id: 'demand', title: 'Demand', description: 'What the stage asks of any amplifier in one respect' });
