import * as z from 'zod';
import { envelope } from './envelope.js';
import { count, sha256 } from './measures.js';
import { problem } from './problem.js';

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
  problems: z.array(problem),
  refused: z.strictObject({ cells: count('Cells that must be corrected'), parts: count('Parts they belong to') }).optional().describe('Refused only'),
});
