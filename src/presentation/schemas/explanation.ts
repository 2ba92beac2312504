import * as z from 'zod';
import { asking, data } from './answer.js';
import { advice, change } from './change.js';
import { envelope } from './envelope.js';
import { confirmation, informed, outcome, proof, tier } from './judged-part.js';
import { partLookups } from './lookups.js';
import { predicted } from './prediction.js';
import { price } from './price.js';
import { sensitivity } from './sensitivity.js';
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
  changes: z.array(change).nullable().describe('What would let it in, least factor first, judged again in full; empty where it fits or nothing that may move does; null with a reason'),
  changesReason: z.enum(['not-built', 'not-asked']).optional().describe('not-built: written by an earlier railfit; not-asked: made without the file to try again'),
  advice: z.array(advice).optional().describe('Ways the stage file cannot say'),
  lookups: partLookups.optional().describe('Undecided only: what would decide it'),
  sensitivity: z.array(sensitivity).describe('Whether verdicts hang on borrowed or typical figures'),
  predicted: z.strictObject({ checks: z.array(z.string()).describe('Checks without a closed form for this stage'), ...predicted }).optional().describe('What no closed form answers, simulated: told, not judged'),
  formulas: z
    .array(z.strictObject({ check: z.string(), relation: z.string(), numbers: z.string().nullable().describe('What stands on both sides on this stage; null where words are compared'), source: z.string() }))
    .optional()
    .describe('With --formulas: the relation, numbers and source of each check'),
  cautions: z.array(z.string()),
  fitting: z.array(z.string()).describe('Up to three parts that fit as things stand'),
  asking,
  data,
});
