import * as z from 'zod';
import { asking, data } from './answer.js';
import { envelope } from './envelope.js';
import { confirmation, informed, outcome, proof, tier } from './judged-part.js';
import { price } from './price.js';
import { stability } from './stability.js';
import { stage } from './stage.js';
import { verdict } from './verdict.js';

const side = z.union([z.literal(0), z.literal(1)]);

const part = z.strictObject({
  id: z.string(),
  tier,
  class: z.string().nullable(),
  description: z.string().nullable(),
  package: z.string().nullable(),
  channels: z.number().nullable().describe('Amplifiers in one package'),
  price,
  current: z.number().nullable().describe('Quiescent current of one amplifier as it counts, A'),
  outcome,
  likely: z.boolean().optional().describe('Undecided only: with the worst figures of its class it would pass'),
  proof: proof.nullable().describe('Fits only'),
  rank: z.int().min(1).nullable().describe('Place among what fits'),
  merit: z.number().nullable().describe('Fits only: 0..1, weighted geometric mean of three desirabilities'),
  meritShares: z.strictObject({ margins: z.number(), price: z.number(), current: z.number() }).nullable().describe('The three desirabilities, 0..1'),
  confirm: z.array(confirmation),
  ...informed,
  cautions: z.array(z.string()),
  verdicts: z.array(verdict),
});

/** `railfit explain A --against B --json` */
export const comparison = envelope('comparison', 'Two parts side by side on one stage', {
  stage,
  parts: z.tuple([part, part]),
  checks: z.array(z.strictObject({ check: z.string(), title: z.string(), better: side.nullable().describe('Which of the two stands better; null: neither') })),
  ahead: side.nullable().describe('Which of the two is ahead; null where neither fits'),
  decidedBy: z.string().nullable().describe('outcome, or the step of the order: tier, proof, merit, price, current, margin, estimates, id'),
  stability: stability.nullable().describe('Null unless both fit'),
  dominated: side.nullable().describe('The one that is nowhere better than the other in margins that count, price or current'),
  asking,
  data,
});
