import * as z from 'zod';
import { asking, data } from './answer.js';
import { change } from './change.js';
import { demand } from './demand.js';
import { envelope } from './envelope.js';
import { groupCounts, judgedPart, rankedPart } from './judged-part.js';
import { count, unit } from './measures.js';
import { stability } from './stability.js';
import { stage } from './stage.js';

const difference = z.strictObject({
  check: z.string().describe('Id of the check'),
  title: z.string(),
  first: z.number().describe('What the first offers, in the unit beside it'),
  second: z.number().describe('What the second offers'),
  unit,
});

const pair = (what: string) => z.tuple([z.number().nullable(), z.number().nullable()]).describe(`${what} of the first and of the second; null when not known`);

const ahead = z.strictObject({
  first: z.string(),
  second: z.string(),
  decidedBy: z.string().describe('Step of the order that decided: tier, proof, merit, price, current, margin, estimates, id'),
  merits: z.tuple([z.number(), z.number()]),
  prices: pair('Price in EUR'),
  currents: pair('Supply current in A'),
  better: z.array(difference).describe('Where the first offers more by a tenth or more'),
  worse: z.array(difference).describe('Where the second does'),
  stability: stability.optional(),
});

const blamed = z.strictObject({
  check: z.string(),
  leaves: count('Parts this check alone would leave'),
  alone: count('Parts that fail nothing else'),
});

const nothingFits = z.strictObject({
  conflict: z.array(blamed).describe('Checks that together rule out every part that does not fit, none of them superfluous'),
  changes: z.array(change).describe('Smallest changes that let parts in, least factor first; giving up swing first where the output is wanted at a rail'),
});

/** `railfit shortlist --json` */
export const shortlist = envelope('shortlist', 'The whole catalog judged on one stage, and what fits in order', {
  stage,
  demands: z.array(demand),
  counts: groupCounts.describe('Always complete, whatever --top shows'),
  fit: z.array(rankedPart).describe('By rank, as many as --top'),
  undecided: z.array(judgedPart).describe('As many as --top'),
  rejections: z.array(z.strictObject({ check: z.string(), parts: count('Parts that fail it') })).describe('Most frequent first; one part can fail several'),
  nearest: z.array(judgedPart).describe('Up to three rejected parts closest to fitting'),
  ahead: ahead.nullable().describe('Why 1 is ahead of 2; null when fewer than two fit'),
  nothingFits: nothingFits.optional().describe('Only where no part fits'),
  rejected: z.array(judgedPart).optional().describe('With --all: every rejected part'),
  asking,
  data,
});
