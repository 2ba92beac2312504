import * as z from 'zod';
import { count } from './measures.js';
import { price } from './price.js';
import { basis, figureValue, point, verdict } from './verdict.js';

export const tier = z.enum(['approved', 'generic']).meta({ id: 'tier', description: 'approved: on the approved list; generic: a class of parts, not something to order' });
export const outcome = z.enum(['fits', 'undecided', 'does-not-fit']).meta({ id: 'outcome', description: 'Any failing check: does not fit; else any unknown one: undecided; else fits' });
export const proof = z.enum(['limits', 'typical']).meta({ id: 'proof', description: 'limits: every deciding figure is a limit; typical: some are derated, estimated, assumed or borrowed' });

/** Identity of a part beside its verdicts. */
const identity = {
  part: z.string().describe('Id of the part'),
  tier,
  class: z.string().nullable().describe('Generic class it belongs to; null when none is named'),
  description: z.string().nullable(),
};

/** What is told of a part and not judged. */
export const informed = {
  dynamicRange: z
    .strictObject({
      available: z.number().describe('Swing at the lowest supply with the currents of the stage, V'),
      ideal: z.number().describe('From rail to rail, V'),
      lossDecibels: z.number().describe('What head-room takes of the dynamic range, dB'),
    })
    .nullable()
    .describe('Null where a head-room is not known'),
  battery: z
    .strictObject({
      hours: z.number(),
      amplifier: z.number().describe('Quiescent current of the whole package, A'),
      network: z.number().describe('Average current of load and feedback network, A'),
      others: z.number().describe('What else draws from it, A'),
    })
    .optional()
    .describe('Life of the battery the stage names'),
};

const judgements = {
  ...informed,
  cautions: z.array(z.string()).describe('Cautions of the part as a whole; those of a check stand beside its verdict'),
  verdicts: z.array(verdict).describe('In the order of the checks'),
};

export const confirmation = z
  .strictObject({
    figure: z.string().describe('Figure to confirm before release'),
    basis,
    how: z.string().nullable(),
    checks: z.array(z.string()).describe('Checks that rest on it'),
    needed: z.strictObject({ ...figureValue, condition: point.optional() }).nullable().describe('The limit that would still pass, where one figure decides'),
  })
  .meta({ id: 'confirmation', title: 'Confirmation', description: 'A figure a fit rests on that is not a limit' });

const variant = z.strictObject({
  part: z.string().describe('Id of the part'),
  package: z.string().nullable(),
  channels: z.number().nullable().describe('Amplifiers in one package'),
  price,
  current: z.number().nullable().describe('Quiescent current of one amplifier as it counts, A'),
});

/** A part that fits, with its place. */
export const rankedPart = z
  .strictObject({
    rank: z.int().min(1),
    ...identity,
    merit: z.number().describe('0..1, weighted geometric mean of three desirabilities'),
    meritShares: z.strictObject({ margins: z.number(), price: z.number(), current: z.number() }).describe('The three desirabilities, 0..1'),
    tightest: z.string().nullable().describe('Check with the least comfort; null when no check has a margin'),
    dominatedBy: z.string().nullable().describe('A part that is nowhere worse in margins, price or current'),
    variants: z.array(variant).describe('Other packages and channel counts of the same die that fit; they share the rank'),
    proof: proof.nullable(),
    confirm: z.array(confirmation),
    ...judgements,
  })
  .meta({ id: 'rankedPart', title: 'A part that fits' });

/** A part that does not fit, or cannot be decided. */
export const judgedPart = z
  .strictObject({ ...identity, outcome, likely: z.boolean().optional().describe('Undecided only: with the worst figures of its class it would pass'), ...judgements })
  .meta({ id: 'judgedPart', title: 'A part with its verdicts' });

export const groupCounts = z.strictObject({
  parts: count('Parts in the catalog'),
  fit: count('Parts that fit'),
  undecided: count('Parts that cannot be decided'),
  rejected: count('Parts that do not fit'),
});
