import * as z from 'zod';
import { envelope } from './envelope.js';
import { proof } from './judged-part.js';
import { count, sha256 } from './measures.js';
import { problem } from './problem.js';

const change = z.strictObject({
  part: z.string().describe('Id of the part'),
  field: z.string().describe('Canonical header'),
  was: z.string().nullable().describe('As the canonical cell says it; null when the list said nothing'),
  now: z.string().nullable(),
  cell: z.string().nullable().optional().describe('Cell of the new list, as a spreadsheet names it'),
  at: z.string().nullable().optional().describe('The same as RFC 7111 has it: approved.csv#cell=6,13'),
});

const tally = z.strictObject({
  header: z.string(),
  letter: z.string().describe('Of the column, as a spreadsheet names it'),
  values: z.array(z.strictObject({ value: z.string(), parts: count('Parts with this cell') })).nullable().describe('Its cells; null when they differ too much to be listed'),
});

const difference = z.strictObject({
  added: z.array(z.string()).describe('Ids'),
  withdrawn: z.array(z.string()).describe('Ids'),
  changes: z.array(change).describe('Figure by figure; of the first thousand parts that changed'),
  columns: z
    .strictObject({ added: z.array(z.string()), removed: z.array(z.string()), tallies: z.array(tally).describe('Of the added ones, those that are kept as text') })
    .describe('Headers that only one of the lists has'),
});

const standing = z.strictObject({
  first: z.string().nullable().describe('First choice; null when nothing fits'),
  fit: count('Parts that fit'),
  undecided: count('Parts that cannot be decided'),
  rejected: count('Parts that do not fit'),
  chosen: z
    .strictObject({ outcome: z.enum(['fits', 'undecided', 'does-not-fit', 'absent']), proof: proof.nullable(), rank: z.int().min(1).nullable() })
    .nullable()
    .describe('How the chosen part stands; null when none is chosen, absent when the catalog has no such part'),
});

const stageChange = z.strictObject({
  file: z.string().describe('The stage file, as it can be typed'),
  part: z.string().nullable().describe('The part chosen for it'),
  outcome: z.enum(['same', 'other', 'not-judged']),
  before: standing.nullable(),
  after: standing.nullable(),
  reason: z.string().optional().describe('Not judged only'),
});

/** `railfit import --json` */
export const imported = envelope('import', 'What an import did, or would do, to the approved list', {
  outcome: z.enum(['imported', 'no-change', 'refused', 'dry-run', 'undone']),
  file: z.string().describe('Name of the list; empty for --undo'),
  sha256: sha256.nullable().describe('Of the file; null when refused or undone'),
  counts: z.strictObject({
    rows: count('Parts in the file'),
    added: count('Parts that are new'),
    changed: count('Parts with another value'),
    removed: count('Parts that are gone'),
    unchanged: count('Parts that are the same'),
  }),
  patch: z.strictObject({ cells: count('Cells filled'), parts: count('Parts they belong to'), list: z.string().describe('The list they were added to') }).optional().describe('With --patch only'),
  problems: z.array(problem),
  difference: difference.optional().describe('Against the list before; absent when the two were not compared'),
  stages: z.array(stageChange).optional().describe('The saved stages on the list before and on this one; absent when none is saved, or nothing changed'),
  held: z.literal(true).optional().describe('Refused only: the list reads, but changes more than it may without --accept'),
  refused: z.strictObject({ cells: count('Cells that must be corrected'), parts: count('Parts they belong to') }).optional().describe('Refused only'),
});
