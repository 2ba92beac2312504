import * as z from 'zod';
import { envelope } from './envelope.js';
import { confirmation, outcome, proof } from './judged-part.js';
import { count, sha256 } from './measures.js';
import { shortlist } from './shortlist.js';
import { verdict } from './verdict.js';

const changed = z.strictObject({
  path: z.string().describe('Dotted path of the stage file'),
  text: z.string().describe('As typed'),
  option: z.string(),
});

const chosen = z
  .strictObject({
    part: z.string(),
    by: z.enum(['named', 'saved', 'first']).describe('Named for this review, kept with the stage, or the first in order'),
    withdrawn: z.string().optional().describe('Why it is on the list no more; it is judged as it was last, outside the shortlist'),
    rank: z.int().min(1).nullable().describe('Place among what fits'),
    outcome,
    proof: proof.nullable(),
    confirm: z.array(confirmation),
    verdicts: z.array(verdict),
  })
  .nullable()
  .describe('The part the review is about; null when nothing fits and none was named');

const stage = z.strictObject({
  file: z.string().nullable().describe('As typed; null when options alone describe the stage'),
  sha256: sha256.nullable().describe('SHA-256 of the text in UTF-8'),
  text: z.string().nullable().describe('The stage file as it was read'),
  changes: z.array(changed).describe('Fields that options changed'),
  chosen,
  outcomes: z
    .array(z.strictObject({ part: z.string(), outcome, rank: z.int().min(1).nullable(), checks: z.array(z.string()).describe('Checks it fails, or that are open') }))
    .describe('Every part of the catalog in short'),
  shortlist: shortlist.describe('What shortlist --json prints for this stage'),
});

/** `railfit report --json`, and the document a page embeds */
export const report = envelope('report', 'A design review: what the page shows, and what makes it again', {
  name: z.string().nullable().describe('Base name of the file it was written to'),
  time: z.string().describe('ISO 8601 with zone'),
  tool: z.string().describe('Name and versions of the tool'),
  command: z.string().describe('As it can be typed again'),
  symbols: z.enum(['iec', 'ieee']).describe('Symbols of the schematic: IEC 60617 or IEEE 315'),
  top: count('How many parts of each kind are listed'),
  all: z.boolean().describe('Rejected parts in full too'),
  stages: z.array(stage).min(1),
});
