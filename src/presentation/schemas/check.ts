import * as z from 'zod';
import { envelope } from './envelope.js';
import { confirmation, outcome, proof } from './judged-part.js';
import { verdict } from './verdict.js';

const judged = z.strictObject({
  file: z.string().describe('The stage file, as it can be typed'),
  part: z.string().describe('The part chosen for it'),
  outcome,
  proof: proof.nullable().describe('Fits only'),
  confirm: z.array(confirmation),
  verdicts: z.array(verdict),
});

const notJudged = z.strictObject({
  file: z.string(),
  part: z.string().nullable(),
  outcome: z.null(),
  reason: z
    .enum(['withdrawn', 'unknown-part', 'not-chosen', 'gone', 'unreadable', 'wrong'])
    .describe('The part is on the list no more, or never was; the stage has no part; the file is gone, cannot be read, or is no stage'),
  text: z.string().describe('The same in words'),
  proof: z.null(),
  confirm: z.array(confirmation).max(0),
  verdicts: z.array(verdict).max(0),
});

/** `railfit check --json` */
export const check = envelope('check', 'Whether the parts chosen for stages still fit', { stages: z.array(z.union([judged, notJudged])) });
