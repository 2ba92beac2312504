import * as z from 'zod';
import { asking, data } from './answer.js';
import { envelope } from './envelope.js';
import { confirmation, informed, outcome, proof, tier } from './judged-part.js';
import { price } from './price.js';
import { stage } from './stage.js';
import { verdict } from './verdict.js';

const part = z.strictObject({
  id: z.string(),
  tier,
  class: z.string().nullable(),
  description: z.string().nullable(),
  family: z.string().nullable(),
  package: z.string().nullable(),
  channels: z.number().nullable().describe('Amplifiers in one package'),
  price,
});

const change = z.strictObject({
  set: z.record(z.string(), z.string()).describe('Fields of the stage and what they would become, as they are written'),
  design: z.string().optional().describe('What it means for the circuit'),
  factor: z.number().describe('How far the field moves: new to old'),
  fits: z.boolean().describe('Judged again in full'),
  lets: z.int().min(0).optional().describe('How many parts it lets in'),
});

/** `railfit explain --json` */
export const explanation = envelope('explanation', 'Every check of one part on one stage', {
  stage,
  part,
  outcome,
  proof: proof.nullable().describe('Fits only'),
  rank: z.int().min(1).nullable().describe('Place among what fits'),
  likely: z.boolean().optional().describe('Undecided only: with the worst figures of its class it would pass'),
  verdicts: z.array(verdict),
  confirm: z.array(confirmation),
  ...informed,
  changes: z.array(change).nullable().describe('What would let it in; null with a reason'),
  changesReason: z.literal('not-built').optional(),
  cautions: z.array(z.string()),
  fitting: z.array(z.string()).describe('Up to three parts that fit as things stand'),
  asking,
  data,
});
